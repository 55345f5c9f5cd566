import { expect, test } from 'vitest';
import { checkObservations } from '#lib/core/analysis/check-observations.ts';
import { observations } from './kept-model.ts';

const base = observations([
  [0, 0, 4],
  [1, 0, 5],
  [0, 1, 6],
  [1, 1, 7]
]);
const row = (r: number, change: object) => ({
  ...base,
  rows: base.rows.map((old, i) => (i === r ? { ...old, ...change } : old))
});

test('checkObservations sorts every row into kept, ruined or unread', () => {
  const rows = [{ ...base.rows[0]!, ruined: true }, ...base.rows.slice(1, 3), { ...base.rows[3]!, y: null }];
  expect(checkObservations({ ...base, rows })).toEqual({
    ok: true,
    value: { kept: [1, 2], ruined: [0], unread: [3] }
  });
});

test('checkObservations counts a ruined run without a reading as ruined', () => {
  expect(checkObservations(row(2, { ruined: true, y: null }))).toMatchObject({ value: { ruined: [2], unread: [] } });
});

test('checkObservations names the row and what was found there', () => {
  expect(checkObservations(row(2, { y: NaN }))).toEqual({
    ok: false,
    error: { tag: 'not-a-number', row: 2, found: 'NaN' }
  });
  expect(checkObservations(row(1, { y: 'wet' }))).toMatchObject({ error: { tag: 'not-a-number', found: 'wet' } });
  expect(checkObservations(row(3, { covariate: Infinity }))).toMatchObject({ error: { row: 3, found: 'Infinity' } });
  expect(checkObservations(row(0, { slot: NaN }))).toMatchObject({ error: { row: 0 } });
  expect(checkObservations(row(1, { treatment: 2 }))).toMatchObject({ error: { tag: 'unknown-treatment', index: 2 } });
  expect(checkObservations(row(1, { session: -1 }))).toMatchObject({ error: { tag: 'unknown-session', index: -1 } });
});

test('checkObservations refuses a ruined reading that is no number as well: it is kept for the comparison', () => {
  expect(checkObservations(row(0, { ruined: true, y: NaN }))).toMatchObject({ error: { tag: 'not-a-number', row: 0 } });
});

test('checkObservations says what was asked wrongly before it looks at the rows', () => {
  const wrong = row(0, { y: NaN });
  expect(checkObservations({ ...wrong, alpha: 0.5 })).toMatchObject({ error: { tag: 'bad-alpha', alpha: 0.5 } });
  expect(checkObservations({ ...wrong, equivalenceMargin: -1 })).toMatchObject({ error: { tag: 'bad-margin' } });
  expect(checkObservations({ ...wrong, contrasts: [{ name: 'A − B', weights: [1, -0.5] }] })).toMatchObject({
    error: { tag: 'bad-contrast', name: 'A − B', need: 2, have: 2 }
  });
});
