import fc from 'fast-check';
import { expect, test } from 'vitest';
import { incompleteBeta } from '#lib/core/numerics/distributions/incomplete-beta.ts';

test('incompleteBeta(x, y, a, b) agrees with 40-digit arithmetic for a small and b huge', () => {
  // mpmath 1.3: betainc(0.25, 2e5, 0, 1e-6, regularized)
  expect(Math.abs(incompleteBeta(1e-6, 1 - 1e-6, 0.25, 2e5) / 0.7098508240925254 - 1)).toBeLessThan(1e-13);
});

test('incompleteBeta(x, y, a, b) and its mirror sum to one', () => {
  const shape = fc.double({ min: 0.05, max: 500, noNaN: true });
  fc.assert(
    fc.property(fc.double({ min: 0, max: 1, noNaN: true }), shape, shape, (x, a, b) => {
      expect(incompleteBeta(x, 1 - x, a, b) + incompleteBeta(1 - x, x, b, a)).toBeCloseTo(1, 12);
    })
  );
});

test('incompleteBeta(x, y, a, 1) is x to the power a', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.001, max: 0.999, noNaN: true }),
      fc.double({ min: 0.1, max: 200, noNaN: true }),
      (x, a) => {
        const expected = Math.pow(x, a);
        expect(Math.abs(incompleteBeta(x, 1 - x, a, 1) - expected)).toBeLessThanOrEqual(1e-12 * expected + 1e-300);
      }
    )
  );
});
