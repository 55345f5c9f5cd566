import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { aValue } from '#lib/core/design/a-value.ts';
import { bestExtraSession } from '#lib/core/design/repair/extra-session.ts';

interface RepairCase {
  key: string;
  category: string;
  t: number;
  k: number;
  remaining_blocks: number[][];
  A_after_loss: number | null;
  A_best_after_one_extra: number;
  n_optimal: number;
  optimal_blocks: number[][];
}
const file = new URL('../../../reference/designs/efficiency.json', import.meta.url);
const cases = (JSON.parse(readFileSync(file, 'utf8')) as { cases: RepairCase[] }).cases.filter(
  ({ category }) => category === 'repair'
);
const all = (t: number): number[] => [...Array(t).keys()];

describe('bestExtraSession', () => {
  test.each(cases)('bestExtraSession($key) is the exhaustive optimum, with every tie', (one) => {
    const extra = bestExtraSession(one.remaining_blocks, one.t, all(one.t), one.k)!;
    expect(extra.exhaustive).toBe(true);
    expect(Math.abs(extra.aValue / one.A_best_after_one_extra - 1)).toBeLessThan(1e-9);
    expect(extra.sessions).toHaveLength(one.n_optimal);
    for (const block of one.optimal_blocks) expect(extra.sessions).toContainEqual([...block].sort((a, b) => a - b));
    for (const session of extra.sessions) {
      expect(Math.abs(aValue([...one.remaining_blocks, session], one.t) / extra.aValue - 1)).toBeLessThan(1e-9);
    }
  });

  test('bestExtraSession(...) uses only treatments that still have specimens', () => {
    const one = cases[0]!;
    const extra = bestExtraSession(one.remaining_blocks, one.t, [1, 2, 3, 5], one.k)!;
    expect(extra.sessions.flat().every((i) => [1, 2, 3, 5].includes(i))).toBe(true);
    expect(extra.aValue).toBeGreaterThan(one.A_best_after_one_extra);
  });

  test('bestExtraSession(...) says when no single session can connect the parts', () => {
    expect(bestExtraSession([[0, 1], [2, 3], [4, 5]], 6, all(6), 2)).toBeNull(); // prettier-ignore
    expect(bestExtraSession([[0, 1], [2, 3]], 4, [0, 1], 2)).toBeNull(); // prettier-ignore
    expect(bestExtraSession([[0, 1], [2, 3]], 4, [0, 2], 2)).toMatchObject({ sessions: [[0, 2]] }); // prettier-ignore
  });

  test('bestExtraSession(...) too large to price all comes by exchanges to a session no exchange improves', () => {
    // Sixty treatments in a ring of pairs; ten in the extra session: 7.5e10 sessions.
    const ring = all(60).map((i) => [i, (i + 1) % 60]);
    const extra = bestExtraSession(ring, 60, all(60), 10)!;
    expect(extra.exhaustive).toBe(false);
    const [session] = extra.sessions;
    expect(Math.abs(aValue([...ring, session!], 60) / extra.aValue - 1)).toBeLessThan(1e-9);
    for (const out of session!) {
      for (const i of [0, 7, 23, 41]) {
        if (session!.includes(i)) continue;
        const other = session!.map((n) => (n === out ? i : n));
        expect(aValue([...ring, other], 60)).toBeGreaterThan(extra.aValue * (1 - 1e-9));
      }
    }
  });

  test('bestExtraSession(...) of a large design in parts comes by exchanges too, priced exactly', () => {
    // Two rings of thirty pairs: no session of the design holds treatments of both.
    const rings = all(60).map((i) => [i, i < 30 ? (i + 1) % 30 : 30 + ((i + 1) % 30)]);
    const extra = bestExtraSession(rings, 60, all(60), 10)!;
    expect(extra.exhaustive).toBe(false);
    const [session] = extra.sessions;
    expect(Math.abs(aValue([...rings, session!], 60) / extra.aValue - 1)).toBeLessThan(1e-12);
    for (const out of session!) {
      for (const i of [0, 7, 23, 41]) {
        if (session!.includes(i)) continue;
        const other = session!.map((n) => (n === out ? i : n));
        expect(aValue([...rings, other], 60)).toBeGreaterThan(extra.aValue * (1 - 1e-3));
      }
    }
  });
});
