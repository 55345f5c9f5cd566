import fc from 'fast-check';
import { expect, test } from 'vitest';
import { tTwoSided } from '#lib/core/numerics/distributions/student-t.ts';
import { tukeyUpper, tukeyUpperQuantile } from '#lib/core/numerics/distributions/tukey.ts';

// Upper 5 % and 1 % points of the studentised range, as printed in textbooks' tables of it (for example Montgomery,
// Design and Analysis of Experiments, appendix), from memory; the last column is means.
test.each([
  [3.64, 0.05, 5, 2],
  [5.67, 0.05, 5, 5],
  [4.33, 0.05, 10, 4],
  [5.27, 0.01, 10, 3],
  [3.96, 0.05, 20, 4],
  [22.3, 0.01, 2, 4],
  [3.63, 0.05, Infinity, 4]
])('tukeyUpperQuantile is the handbook %d at %d, df %d, %d means', (printed, alpha, df, means) => {
  const digits = printed > 20 ? 0.05 : 0.005;
  expect(Math.abs(tukeyUpperQuantile(alpha, means, df) - printed)).toBeLessThanOrEqual(digits * 1.001);
});

test('tukeyUpper(q, 2, df) is the two-sided t tail at q/√2', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.01, max: 40, noNaN: true }),
      fc.double({ min: 0.7, max: 1e6, noNaN: true }),
      (q, df) => {
        const expected = tTwoSided(q / Math.SQRT2, df);
        expect(Math.abs(tukeyUpper(q, 2, df) - expected)).toBeLessThan(1e-10 * expected + 1e-14);
      }
    )
  );
});

test('tukeyUpper(q, means, df) grows with the number of means and stays under Bonferroni', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.5, max: 20, noNaN: true }),
      fc.integer({ min: 2, max: 7 }),
      fc.double({ min: 1, max: 1000, noNaN: true }),
      (q, means, df) => {
        const tail = tukeyUpper(q, means, df);
        expect(tukeyUpper(q, means + 1, df)).toBeGreaterThanOrEqual(tail * (1 - 1e-9));
        expect(tail).toBeLessThanOrEqual(((means * (means - 1)) / 2) * tTwoSided(q / Math.SQRT2, df) * (1 + 1e-9));
      }
    ),
    { numRuns: 60 }
  );
});

test('tukeyUpperQuantile(alpha, means, df) undoes tukeyUpper', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 1e-6, max: 0.9, noNaN: true }),
      fc.integer({ min: 2, max: 9 }),
      fc.double({ min: 1, max: 1e4, noNaN: true }),
      (alpha, means, df) => {
        expect(Math.abs(tukeyUpper(tukeyUpperQuantile(alpha, means, df), means, df) / alpha - 1)).toBeLessThan(1e-8);
      }
    ),
    { numRuns: 40 }
  );
});
