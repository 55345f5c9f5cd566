import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { criterionBound } from '#lib/core/design/bounds.ts';
import { addPairWeights, controlPairs, nearEqualReplication } from '#lib/core/design/search/search-problem.ts';
import type { SearchProblem } from '#lib/core/design/search/search-problem.ts';

interface Case {
  id: string;
  key: string;
  category: string;
  t: number;
  b: number;
  k: number;
  s: number;
  v_tests: number;
  block_sizes: number[];
  bounds_A: { A0: number; A1: number };
  bounds: { A0: number; U_res1: number; best: number; tc: number; tt: number };
  near_equal: { A_value: number };
  best: { A_value: number; E_pair: number };
}
const { cases } = JSON.parse(
  readFileSync(new URL('../../reference/designs/efficiency.json', import.meta.url), 'utf8')
) as { cases: Case[] };
const of = (category: string): Case[] => cases.filter((one) => one.category === category);

const problemOf = (t: number, sizes: number[], groupOf: number[] | null = null): SearchProblem => ({
  t,
  sizes,
  controls: [],
  groupOf,
  replication: nearEqualReplication(
    sizes.reduce((a, b) => a + b, 0),
    Array<number>(t).fill(sizes.length)
  ),
  forbidden: null,
  weights: null
});

describe('criterionBound', () => {
  test.each(of('equal'))(
    'criterionBound($key) is at least the published first bounds and below the best design',
    (one) => {
      const bound = criterionBound(problemOf(one.t, Array<number>(one.b).fill(one.k)));
      expect(bound.aValue).toBeGreaterThan(Math.max(one.bounds_A.A0, one.bounds_A.A1) * (1 - 1e-9));
      expect(bound.aValue).toBeLessThan(one.near_equal.A_value * (1 + 1e-9));
      if (bound.by === 'concurrence') expect(Math.abs(bound.aValue / one.bounds_A.A1 - 1)).toBeLessThan(1e-9);
    }
  );

  test.each(of('unequal'))('criterionBound($key) is the mean bound', (one) => {
    const bound = criterionBound(problemOf(one.t, one.block_sizes));
    expect(bound.by).toBe('mean');
    expect(Math.abs(bound.aValue / one.bounds.A0 - 1)).toBeLessThan(1e-9);
  });

  test.each(of('resolvable'))(
    'criterionBound($key) is at least the first bound of resolvable designs and below the best',
    (one) => {
      const sizes = Array<number>(one.b).fill(one.k);
      const groupOf = sizes.map((_, j) => Math.floor(j / one.s));
      const bound = criterionBound(problemOf(one.t, sizes, groupOf));
      // E = (2/r)/A for equal replication r = bk/t.
      const efficiency = 2 / ((one.b * one.k) / one.t) / bound.aValue;
      expect(efficiency).toBeLessThan(one.bounds.U_res1 * (1 + 1e-9));
      expect(efficiency).toBeGreaterThan(one.best.E_pair * (1 - 1e-9));
    }
  );

  test.each(of('augmented'))('criterionBound($key) is the reference bound of either variance', (one) => {
    const t = one.v_tests + 1;
    const pairs = controlPairs(t, [0]);
    const base = { ...problemOf(t, Array<number>(one.b).fill(one.k)), controls: [0] };
    const bound = (weights: Float64Array) => criterionBound({ ...base, weights });
    const tc = bound(addPairWeights(new Float64Array(t * t), t, pairs.testControl, 1));
    const tt = bound(addPairWeights(new Float64Array(t * t), t, pairs.testTest, 1));
    expect(tc.by).toBe('control');
    expect(tc.aValue).toBeCloseTo(one.bounds.tc, 9);
    expect(tt.aValue).toBeCloseTo(one.bounds.tt, 9);
  });

  test('criterionBound(...) is attained by a balanced design', () => {
    // 2kσ²/(λt) of the projective plane of order 2.
    expect(criterionBound(problemOf(7, Array<number>(7).fill(3))).aValue).toBeCloseTo(6 / 7, 12);
  });
});
