import { normalDensity, normalUpper } from './normal.ts';

/**
 * P(range of n independent standard normals > w), small values to about 13 digits.
 *
 * With z the largest of them, ∫ n φ(z) Φ(z)^(n−1) (1 − (1 − Φ(z − w)/Φ(z))^(n−1)) dz by the trapezoidal rule, which
 * converges exponentially here; all terms are positive.
 *
 * @param w at least 0
 * @param n number of normals, at least 2
 * Source: H. O. Hartley (1942), The range in random samples, Biometrika 32, 334–348, written for the upper tail.
 * Checked by: test/core/numerics/distributions/tables.test.ts
 */
export function normalRangeUpper(w: number, n: number): number {
  if (w <= 0) return 1;
  if (n === 2) return 2 * normalUpper(w / Math.SQRT2);
  const step = 0.16;
  // Halfway between the extremes is likeliest; the largest then lies near w/2 (or the usual maximum, if further).
  const first = Math.round(Math.max(w / 2, Math.sqrt(2 * Math.log(n)) * 0.8) / step);
  let sum = 0;
  for (const direction of [1, -1] as const) {
    let largest = 0;
    for (let i = direction > 0 ? first : first - 1; Math.abs(i) < 400; i += direction) {
      const z = i * step;
      const below = normalUpper(-z);
      const ratio = normalUpper(w - z) / below;
      const inside = ratio < 1 ? -Math.expm1((n - 1) * Math.log1p(-ratio)) : 1;
      const term = normalDensity(z) * Math.pow(below, n - 1) * inside;
      sum += term;
      if (term > largest) largest = term;
      else if (term <= 1e-18 * sum) break;
    }
  }
  return Math.min(1, n * step * sum);
}
