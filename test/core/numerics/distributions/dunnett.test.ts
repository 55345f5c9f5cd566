import fc from 'fast-check';
import { expect, test } from 'vitest';
import { dunnettUpper, dunnettUpperQuantile, largestT } from '#lib/core/numerics/distributions/dunnett.ts';
import { fitOneFactor } from '#lib/core/numerics/distributions/one-factor.ts';
import { tTwoSided, tUpper } from '#lib/core/numerics/distributions/student-t.ts';
import { tukeyUpper } from '#lib/core/numerics/distributions/tukey.ts';

// Upper 5 % points as printed in textbooks' copies of Dunnett's tables (1955, 1964), from memory.
test.each([
  [2.57, 2, 10, 'two'],
  [2.76, 3, 10, 'two'],
  [2.54, 3, 20, 'two'],
  [2.21, 2, Infinity, 'two'],
  [2.15, 2, 10, 'one'],
  [1.92, 2, Infinity, 'one']
] as const)(
  'dunnettUpperQuantile(0.05) is the printed %d for %d comparisons, df %d, %s-sided',
  (printed, m, df, sides) => {
    expect(Math.abs(dunnettUpperQuantile(0.05, m, df, sides) - printed)).toBeLessThanOrEqual(0.00501);
  }
);

test('dunnettUpper(q, m, df) lies between the tail of one comparison and Bonferroni', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.1, max: 12, noNaN: true }),
      fc.integer({ min: 2, max: 5 }),
      fc.double({ min: 1, max: 500, noNaN: true }),
      (q, m, df) => {
        const two = dunnettUpper(q, m, df, 'two');
        expect(two).toBeGreaterThanOrEqual(tTwoSided(q, df) * (1 - 1e-9));
        expect(two).toBeLessThanOrEqual(m * tTwoSided(q, df) * (1 + 1e-9));
        const one = dunnettUpper(q, m, df, 'one');
        expect(one).toBeGreaterThanOrEqual(tUpper(q, df) * (1 - 1e-9));
        expect(one).toBeLessThanOrEqual(m * tUpper(q, df) * (1 + 1e-9));
      }
    ),
    { numRuns: 30 }
  );
});

test('largestT(R) of independent statistics with known error is the product', () => {
  const correlation = Float64Array.of(1, 0, 0, 0, 1, 0, 0, 0, 1);
  const { p, error } = largestT(correlation, 3, 'two').upper(1.3, Infinity);
  expect(error).toBe(0);
  expect(Math.abs(p - (1 - (1 - tTwoSided(1.3, Infinity)) ** 3))).toBeLessThan(1e-12);
});

test('largestT(R) by simulation agrees with Tukey for all pairs of three means, a singular correlation', () => {
  const correlation = Float64Array.of(1, 0.5, -0.5, 0.5, 1, 0.5, -0.5, 0.5, 1);
  const largest = largestT(correlation, 3, 'two');
  expect(largest.method).toBe('quasi-monte-carlo');
  for (const [t, df] of [
    [1.1, 8],
    [2.4, 8],
    [3.2, 30]
  ] as const) {
    const { p, error } = largest.upper(t, df);
    // A dependent variable is in or out: the integrand jumps, and the stated error says so.
    expect(error).toBeLessThan(0.01);
    expect(Math.abs(p - tukeyUpper(t * Math.SQRT2, 3, df))).toBeLessThan(Math.max(error * 2, 1e-5));
  }
});

test('largestT(R) by simulation gives the same digits for the same seed and others within the stated error', () => {
  const correlation = Float64Array.of(1, 0.5, 0.3, 0.6, 0.5, 1, 0.4, 0.5, 0.3, 0.4, 1, 0.2, 0.6, 0.5, 0.2, 1);
  const effort = { seed: 'wall paint', shifts: 6, points: 61 };
  const first = largestT(correlation, 4, 'one', effort).upper(2, 12);
  expect(largestT(correlation, 4, 'one', effort).upper(2, 12)).toEqual(first);
  const other = largestT(correlation, 4, 'one', { ...effort, seed: 'other' }).upper(2, 12);
  expect(other.p).not.toBe(first.p);
  expect(Math.abs(other.p - first.p)).toBeLessThan(2 * (first.error + other.error));
});

test('largestT(R).quantile(alpha, df) undoes upper, beyond the median as well', () => {
  const correlation = Float64Array.of(1, 0.5, 0.5, 0.5, 1, 0.5, 0.5, 0.5, 1);
  for (const sides of ['one', 'two'] as const) {
    const largest = largestT(correlation, 3, sides);
    for (const alpha of [1e-6, 0.05, 0.5, 0.9]) {
      expect(Math.abs(largest.upper(largest.quantile(alpha, 7), 7).p / alpha - 1)).toBeLessThan(1e-9);
    }
  }
});

test('fitOneFactor(R) finds loadings that made a product matrix', () => {
  const wanted = [0.3, -0.5, 0.9, 0.7, 0.1];
  const R = Float64Array.from({ length: 25 }, (_, i) => {
    const [a, b] = [Math.floor(i / 5), i % 5];
    return a === b ? 1 : wanted[a]! * wanted[b]!;
  });
  const { loadings, residual } = fitOneFactor(R, 5);
  expect(residual).toBeLessThan(1e-12);
  const sign = Math.sign(loadings[0]!);
  loadings.forEach((l, i) => expect(l * sign).toBeCloseTo(wanted[i]!, 10));
});
