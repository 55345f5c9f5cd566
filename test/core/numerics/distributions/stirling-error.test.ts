import { expect, test } from 'vitest';
import { halfDeviance, logGamma, stirlingError } from '#lib/core/numerics/distributions/stirling-error.ts';

// Expected values: mpmath 1.3 (Python) at 40 digits.

test.each([
  [0.25, 0.27251040121343206],
  [1, 0.08106146679532726],
  [7.5, 0.011104559758206917],
  [100, 0.0008333305556349147],
  [1e6, 8.333333333333056e-8]
])('stirlingError(%d) agrees with 40-digit arithmetic', (x, expected) => {
  expect(Math.abs(stirlingError(x) - expected)).toBeLessThan(1e-15);
});

test.each([
  [0.5, 0.5723649429247001],
  [1e-10, 23.025850929882736],
  [3.7, 1.4280723266653879],
  [1e6, 12815504.569147613]
])('logGamma(%d) agrees with 40-digit arithmetic', (x, expected) => {
  expect(Math.abs(logGamma(x) / expected - 1)).toBeLessThan(1e-14);
});

test('halfDeviance(x, m) keeps its digits when x is near m', () => {
  // 100 ln(100/100.001) + 0.001; the input 100.001 is a double, hence the tolerance.
  expect(Math.abs(halfDeviance(100, 100.001) / 4.999966666916664e-9 - 1)).toBeLessThan(1e-10);
  expect(Math.abs(halfDeviance(3, 40) / 29.22919850366252 - 1)).toBeLessThan(1e-15);
});
