import fc from 'fast-check';
import { expect, test } from 'vitest';
import { tCdf, tQuantile, tTwoSided, tUpper, tUpperQuantile } from '#lib/core/numerics/distributions/student-t.ts';

// Expected values: mpmath 1.3 (Python) at 40 digits.
test.each([
  [6, 9.9e6, 9.866217073116452e-10],
  [12, 1.1e7, 1.777331104704662e-33],
  [3, 0.5, 0.18365407799297173],
  [1e-5, 2.5, 0.4999963819127598],
  [2, 4.37, 0.05506626090365203]
])('tUpper(%d, %d) agrees with 40-digit arithmetic', (x, df, expected) => {
  expect(Math.abs(tUpper(x, df) / expected - 1)).toBeLessThan(2e-13);
});

test('tUpperQuantile(p, 9) reaches the tail probability it was asked for at 1e-300', () => {
  // mpmath 1.3: the upper tail at 5.1494410746007835e33 is 9.9999999999996899697e-301.
  expect(Math.abs(tUpperQuantile(1e-300, 9) / 5.1494410746007835e33 - 1)).toBeLessThan(1e-13);
});

test('tUpperQuantile(p, df) undoes tUpper', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 1e-280, max: 0.4999, noNaN: true }),
      fc.double({ min: 1, max: 1e8, noNaN: true }),
      (p, df) => {
        expect(Math.abs(tUpper(tUpperQuantile(p, df), df) / p - 1)).toBeLessThan(1e-10);
      }
    )
  );
});

test('tQuantile(p, df), tCdf and tTwoSided are symmetric', () => {
  fc.assert(
    fc.property(
      fc.double({ min: 0.01, max: 50, noNaN: true }),
      fc.double({ min: 0.6, max: 1e5, noNaN: true }),
      (x, df) => {
        expect(tCdf(-x, df)).toBe(tUpper(x, df));
        expect(tTwoSided(-x, df)).toBe(tTwoSided(x, df));
        expect(tQuantile(0.025, df)).toBeCloseTo(
          -tQuantile(0.975, df),
          9 - Math.ceil(Math.log10(tQuantile(0.975, df)))
        );
      }
    )
  );
});
