import { expect, test } from 'vitest';
import { largestT } from '#lib/core/numerics/distributions/dunnett.ts';
import { largestNearProduct } from '#lib/core/numerics/distributions/near-product.ts';
import { largestOneFactor } from '#lib/core/numerics/distributions/largest-one-factor.ts';

const loadings = Float64Array.of(0.7, 0.65, 0.75, 0.7, 0.6);
const product = Float64Array.from({ length: 25 }, (_, i) =>
  i % 6 === 0 ? 1 : loadings[Math.floor(i / 5)]! * loadings[i % 5]!
);
/** Off product form by 0.03 and less, as correlations of differences to a control are in an unbalanced design. */
const nearly = product.map((rho, i) => {
  const [a, b] = [Math.floor(i / 5), i % 5];
  return a === b ? 1 : rho + 0.03 * Math.cos(a + b) * ((a * b) % 2 === 0 ? 1 : -1);
});

test('largestNearProduct(R, λ) of an exact product is the product', () => {
  const near = largestNearProduct(product, loadings, 'two');
  for (const c of [0.3, 1, 2, 4]) {
    const exact = largestOneFactor(c, loadings, 'two');
    expect(Math.abs(near(c)[1].upper / exact.upper - 1)).toBeLessThan(1e-12);
    expect(Math.abs(near(c)[1].inside / exact.inside - 1)).toBeLessThan(1e-12);
  }
});

test.each(['one', 'two'] as const)(
  'largestT(R, %s, expand) agrees with simulation within both stated errors',
  (sides) => {
    const expanded = largestT(nearly, 5, sides, 'expand');
    const simulated = largestT(nearly, 5, sides, { seed: 3, shifts: 6, points: 127 });
    expect(expanded.method).toBe('expansion');
    for (const q of [0.8, 1.7, 2.6, 4]) {
      const a = expanded.upper(q, 14);
      const b = simulated.upper(q, 14);
      expect(b.error).toBeLessThan(5e-5);
      expect(Math.abs(a.p - b.p)).toBeLessThan(a.error + 2 * b.error);
    }
    expect(Math.abs(expanded.quantile(0.05, 14) - simulated.quantile(0.05, 14))).toBeLessThan(2e-3);
  }
);
