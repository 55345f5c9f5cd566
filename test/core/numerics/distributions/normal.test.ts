import fc from 'fast-check';
import { expect, test } from 'vitest';
import { normalCdf, normalQuantile, normalUpper } from '#lib/core/numerics/distributions/normal.ts';

// Expected values: mpmath 1.3 (Python) at 40 digits.
test.each([
  [0.3, 0.3820885778110474],
  [1, 0.15865525393145705],
  [4, 3.1671241833119924e-5],
  [12, 1.776482112077679e-33],
  [37.5, 4.605353009581955e-308]
])('normalUpper(%d) agrees with 40-digit arithmetic', (x, expected) => {
  expect(Math.abs(normalUpper(x) / expected - 1)).toBeLessThan(1e-14);
});

test('normalQuantile(p) undoes normalCdf from the far lower tail to the upper quartile', () => {
  fc.assert(
    fc.property(fc.double({ min: -37, max: 1, noNaN: true }), (x) => {
      expect(Math.abs(normalQuantile(normalCdf(x)) - x)).toBeLessThan(1e-14 * (2 + Math.abs(x)));
    })
  );
});

test('normalQuantile(p) is infinite at 0 and 1 and NaN outside', () => {
  expect([normalQuantile(0), normalQuantile(1), normalQuantile(-0.1), normalQuantile(1.1)]).toEqual([
    -Infinity,
    Infinity,
    NaN,
    NaN
  ]);
});
