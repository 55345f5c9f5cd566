import { expect, test } from 'vitest';
import { buildRunTable } from '#lib/core/analysis/model/build-run-table.ts';
import { treatmentOfRun } from '#lib/core/analysis/model/run-table.ts';
import { observations } from '../kept-model.ts';

const input = observations([
  [1, 2, 7, 1],
  [0, 0, 5, 0],
  [2, 2, 9, 0],
  [0, 2, 4, 2],
  [1, 0, 6, 1]
]);

test('buildRunTable(observations, rows) sorts runs by session and keeps where they came from', () => {
  const { table } = buildRunTable(input, [0, 1, 2, 3, 4]);
  expect([...table.rowIndex]).toEqual([1, 4, 0, 2, 3]);
  expect([...table.start]).toEqual([0, 2, 5]);
  // Session 1 holds no run.
  expect([...table.sessionIndex]).toEqual([0, 2]);
  expect(Array.from({ length: 5 }, (_, i) => treatmentOfRun(table, i))).toEqual([0, 1, 1, 2, 0]);
  expect(Array.from(table.y, (v) => v + table.centre)).toEqual([5, 6, 7, 9, 4]);
});

test('buildRunTable takes a reading as centre, so that an offset of 1e8 costs no digit', () => {
  const offset = { ...input, rows: input.rows.map((row) => ({ ...row, y: row.y! / 64 + 2 ** 27 })) };
  const { table } = buildRunTable(offset, [0, 1, 2, 3, 4]);
  expect(Array.from(table.y, (v) => v * 64)).toEqual([-1, 0, 1, 3, -2]);
  expect(table.magnitude).toBe(2 ** 27 + 9 / 64);
});

test('buildRunTable gives each level of a factor a column and says which factors it left out', () => {
  const asked = { ...input, factors: { slot: true, machine: true, shift: true, covariate: true } };
  const { table, leftOut } = buildRunTable(asked, [0, 1, 2, 3, 4]);
  expect(table.terms.map(({ name, start, size }) => [name, start, size])).toEqual([
    ['treatment', 0, 3],
    ['slot', 3, 3]
  ]);
  expect(table.width).toBe(2);
  expect([...table.column]).toEqual([0, 3, 1, 4, 1, 4, 2, 3, 0, 5]);
  expect(leftOut.map(({ factor, reason }) => [factor, reason.tag])).toEqual([
    ['machine', 'level-missing'],
    ['shift', 'level-missing'],
    ['covariate', 'covariate-missing']
  ]);
});
