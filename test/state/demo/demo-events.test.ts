import { expect, test } from 'vitest';
import { replay } from '#lib/core/campaign/replay.ts';
import { demoEvents } from '#lib/state/demo/demo-events.ts';

const state = replay(demoEvents('test'));

test('demoEvents gives an issued plan of nine treatments in twelve sessions over four shifts', () => {
  expect(state.issued?.sessions).toHaveLength(12);
  expect(new Set(state.issued?.sessions.map(({ shift }) => shift)).size).toBe(4);
  expect(state.plan?.treatments).toHaveLength(9);
  expect(state.demo).toBe(true);
  expect(state.title).toContain('invented');
});

test('demoEvents has two thirds of its sessions closed, one ruined run, one odd reading, one missing', () => {
  expect(state.sessions.filter(({ status }) => status === 'closed')).toHaveLength(8);
  const runs = state.sessions.flatMap((session) => session.runs);
  expect(runs.filter(({ ruined }) => ruined)).toHaveLength(1);
  const readings = runs.flatMap((run) => run.readings);
  expect(readings.filter(({ current }) => current?.because)).toHaveLength(1);
  expect(readings.filter(({ missing }) => missing)).toHaveLength(1);
});

test('demoEvents contradicts nothing and raises no flag on its own record', () => {
  expect(state.contradictions).toEqual([]);
  expect(state.flags).toEqual([]);
});

test('demoEvents makes the same events every time', () => {
  expect(demoEvents('test')).toEqual(demoEvents('test'));
});
