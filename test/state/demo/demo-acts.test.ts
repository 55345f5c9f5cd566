import { expect, test } from 'vitest';
import { replay } from '#lib/core/campaign/replay.ts';
import { makeEvent, type Head } from '#lib/core/campaign/make-event.ts';
import { noHash } from '#lib/core/campaign/seal.ts';
import { demoActs } from '#lib/state/demo/demo-acts.ts';

const uuid = (last: string): string => `019aa000-0000-7000-8000-${last.padStart(12, '0')}`;

const state = (() => {
  let head: Head = { campaign: uuid('1'), device: uuid('2'), seq: 0, hash: noHash, tick: 0 };
  const acts = demoActs();
  const first = acts[0]?.at ?? 0;
  return replay(
    acts.map(({ at, ...act }, i) => {
      const random = Uint8Array.from({ length: 10 }, (_, byte) => (byte < 8 ? 1 : byte === 8 ? i >> 8 : i & 255));
      const made = makeEvent(act as never, head, {
        now: at,
        offset: 0,
        mono: at - first,
        run: 'demo',
        app: 'test',
        random
      });
      if (!made.ok) throw new Error(JSON.stringify(made.error));
      head = made.value.head;
      return made.value.event;
    })
  );
})();

test('demoActs gives an issued plan of nine treatments in twelve sessions over four shifts', () => {
  expect(state.issued?.sessions).toHaveLength(12);
  expect(new Set(state.issued?.sessions.map(({ shift }) => shift)).size).toBe(4);
  expect(state.plan?.treatments).toHaveLength(9);
  expect(state.demo).toBe(true);
  expect(state.title).toContain('invented');
});

test('demoActs has two thirds of its sessions closed, one ruined run, one odd reading, one missing', () => {
  expect(state.sessions.filter(({ status }) => status === 'closed')).toHaveLength(8);
  const runs = state.sessions.flatMap((session) => session.runs);
  expect(runs.filter(({ ruined }) => ruined)).toHaveLength(1);
  const readings = runs.flatMap((run) => run.readings);
  expect(readings.filter(({ current }) => current?.because)).toHaveLength(1);
  expect(readings.filter(({ missing }) => missing)).toHaveLength(1);
});

test('demoActs contradicts nothing and raises no flag on its own record', () => {
  expect(state.contradictions).toEqual([]);
  expect(state.flags).toEqual([]);
});

test('demoActs makes the same acts every time', () => {
  expect(demoActs()).toEqual(demoActs());
});

test('demoActs gives every shift each treatment once', () => {
  const sessions = state.issued?.sessions ?? [];
  const shifts = [1, 2, 3, 4].map((shift) => sessions.filter((session) => session.shift === shift));
  for (const shift of shifts) {
    const treatments = shift.flatMap(({ slots }) => slots.map((slot) => slot?.treatment));
    expect([...treatments].sort()).toEqual(state.plan?.treatments.map(({ id }) => id));
  }
});
