import fc from 'fast-check';
import { expect, test } from 'vitest';
import { allCombinations, combinationCount } from '#lib/core/design/catalogue/all-combinations.ts';

test('allCombinations(4, 2) lists the pairs of four treatments in order', () => {
  expect(allCombinations(4, 2)).toEqual([
    [0, 1],
    [0, 2],
    [0, 3],
    [1, 2],
    [1, 3],
    [2, 3]
  ]);
});

test('allCombinations(t, k) lists C(t, k) different increasing choices', () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 9 }), fc.integer({ min: 0, max: 9 }), (t, k) => {
      fc.pre(k <= t);
      const blocks = allCombinations(t, k);
      expect(blocks).toHaveLength(combinationCount(t, k));
      expect(new Set(blocks.map(String)).size).toBe(blocks.length);
      for (const block of blocks) expect(block.every((x, i) => x < t && (i === 0 || x > block[i - 1]!))).toBe(true);
    })
  );
});

test('combinationCount(t, k) equals binomial coefficients of a printed table', () => {
  // Abramowitz & Stegun (1964), table 24.1 (from memory).
  expect([combinationCount(10, 3), combinationCount(20, 10), combinationCount(50, 4)]).toEqual([120, 184756, 230300]);
});
