import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { addPairWeights, controlPairs, nearEqualReplication } from '#lib/core/design/search/search-problem.ts';

describe('nearEqualReplication', () => {
  test('nearEqualReplication(runs, caps) is the floor and ceiling of the mean when nothing is scarce', () => {
    expect(nearEqualReplication(12, Array<number>(5).fill(9))).toEqual({
      least: Array(5).fill(2),
      most: Array(5).fill(3)
    });
    expect(nearEqualReplication(12, Array<number>(4).fill(9))).toEqual({
      least: Array(4).fill(3),
      most: Array(4).fill(3)
    });
  });

  test('nearEqualReplication(runs, caps) gives what the scarce ones lack to the others', () => {
    // By hand: 12 runs, one treatment has a single specimen: 11 over three others is 3 or 4 each.
    expect(nearEqualReplication(12, [1, 9, 9, 9])).toEqual({ least: [1, 3, 3, 3], most: [1, 4, 4, 4] });
    expect(() => nearEqualReplication(5, [1, 1])).toThrow(RangeError);
  });

  test('nearEqualReplication(runs, caps) always leaves room for exactly the runs', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 1, max: 9 }), { minLength: 1, maxLength: 9 }),
        fc.nat(60),
        (caps, runs) => {
          const sum = (list: readonly number[]): number => list.reduce((a, b) => a + b, 0);
          fc.pre(runs <= sum(caps));
          const { least, most } = nearEqualReplication(runs, caps);
          expect(sum(least)).toBeLessThanOrEqual(runs);
          expect(sum(most)).toBeGreaterThanOrEqual(runs);
          least.forEach((low, i) => expect(most[i]! - low === 0 || most[i]! - low === 1).toBe(true));
        }
      )
    );
  });
});

describe('weights', () => {
  test('addPairWeights(...) over all pairs is the A-value weight 2/(t − 1)·(I − J/t)', () => {
    const t = 5;
    const pairs = Array.from({ length: t * t }, (_, at) => [Math.floor(at / t), at % t] as [number, number]).filter(
      ([i, l]) => i < l
    );
    const weights = addPairWeights(new Float64Array(t * t), t, pairs, 1);
    weights.forEach((value, at) => {
      const diagonal = Math.floor(at / t) === at % t;
      expect(value).toBeCloseTo((2 / (t - 1)) * ((diagonal ? 1 : 0) - 1 / t), 12);
    });
  });

  test('controlPairs(t, controls) tells pairs with one control from pairs with none', () => {
    const { testControl, testTest } = controlPairs(5, [0, 3]);
    expect(testControl).toHaveLength(6);
    expect(testTest).toEqual([[1, 2], [1, 4], [2, 4]]); // prettier-ignore
  });
});
