import fc from 'fast-check';
import { expect, test } from 'vitest';
import { fCdf, fQuantile, fUpper, fUpperQuantile } from '#lib/core/numerics/distributions/f.ts';
import { noncentralFCdf, noncentralFUpper } from '#lib/core/numerics/distributions/noncentral-f.ts';
import { tTwoSided } from '#lib/core/numerics/distributions/student-t.ts';

const df = fc.double({ min: 0.8, max: 1000, noNaN: true });

test('fUpper(t², 1, df) is the two-sided tail of t', () => {
  fc.assert(
    fc.property(fc.double({ min: 0.01, max: 30, noNaN: true }), df, (t, d2) => {
      const expected = tTwoSided(t, d2);
      expect(Math.abs(fUpper(t * t, 1, d2) - expected)).toBeLessThan(1e-12 * expected + 1e-300);
    })
  );
});

test('fUpper and fCdf exchange when F is turned over, and sum to one', () => {
  fc.assert(
    fc.property(fc.double({ min: 0.001, max: 1000, noNaN: true }), df, df, (x, d1, d2) => {
      expect(fUpper(x, d1, d2)).toBe(fCdf(1 / x, d2, d1));
      expect(fUpper(x, d1, d2) + fCdf(x, d1, d2)).toBeCloseTo(1, 12);
    })
  );
});

test('fQuantile and fUpperQuantile undo the tails', () => {
  fc.assert(
    fc.property(fc.double({ min: 1e-12, max: 1 - 1e-12, noNaN: true }), df, df, (p, d1, d2) => {
      expect(fCdf(fQuantile(p, d1, d2), d1, d2)).toBeCloseTo(p, 10);
      expect(fUpper(fUpperQuantile(p, d1, d2), d1, d2)).toBeCloseTo(p, 10);
    })
  );
});

test('fUpperQuantile(0.999, 1, 16) is the value whose tail is 0.999', () => {
  // mpmath 1.3: the upper tail at 1.620626865598558e-6 is 0.99899999999999999927.
  expect(Math.abs(fUpperQuantile(0.999, 1, 16) / 1.620626865598558e-6 - 1)).toBeLessThan(1e-12);
});

test('noncentralFUpper(x, d1, d2, ncp) grows with ncp, and both tails sum to one', () => {
  const ncp = fc.double({ min: 0.01, max: 100, noNaN: true });
  fc.assert(
    fc.property(fc.double({ min: 0.1, max: 20, noNaN: true }), df, df, ncp, (x, d1, d2, delta) => {
      expect(noncentralFUpper(x, d1, d2, delta * 1.1)).toBeGreaterThanOrEqual(
        noncentralFUpper(x, d1, d2, delta) * (1 - 1e-12)
      );
      expect(noncentralFUpper(x, d1, d2, delta) + noncentralFCdf(x, d1, d2, delta)).toBeCloseTo(1, 12);
    }),
    { numRuns: 50 }
  );
});
