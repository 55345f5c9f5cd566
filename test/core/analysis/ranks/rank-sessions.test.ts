import { expect, test } from 'vitest';
import { rankSessions, tieSum } from '#lib/core/analysis/ranks/rank-sessions.ts';

test('rankSessions(rows) gives equal readings their mean rank and keeps the order of the rows', () => {
  const rows = [5, 2, 5, 1].map((y, treatment) => ({ treatment, session: 3, y }));
  expect(rankSessions([...rows, { treatment: 0, session: 1, y: 9 }])).toEqual([
    { treatments: [0], ranks: [1] },
    { treatments: [0, 1, 2, 3], ranks: [3.5, 2, 3.5, 1] }
  ]);
});

test('tieSum(sessions) adds t³ − t over groups of equal readings', () => {
  expect(tieSum([{ treatments: [0, 1, 2], ranks: [2, 2, 2] }])).toBe(24);
  expect(tieSum([{ treatments: [0, 1, 2], ranks: [1, 2, 3] }])).toBe(0);
});
