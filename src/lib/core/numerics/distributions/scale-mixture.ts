import { stirlingError } from './stirling-error.ts';

/** Contributions below this share of the sum are rounding. */
const NEGLIGIBLE = 1e-18;
const MOST_NODES = 20_000;

/**
 * The mean of g(s) over s = √(χ²_df / df), the error of an estimated standard deviation: ∫ g(s) f_df(s) ds.
 *
 * The trapezoidal rule in u = ln s, where the density is 2√(a/2π) e^(−δ(a)) exp(a(1 + 2u − e^(2u))) with a = df/2 and
 * Stirling's error δ. For a smooth g the rule converges exponentially, so a fixed step reaches double precision; all
 * terms are positive, so small results keep their digits.
 *
 * @param g non-negative and bounded, smooth in ln s (a probability as a function of the scale)
 * @param df degrees of freedom above 0, fractional or Infinity (then g(1))
 * @param peak where in ln s to start; anywhere that g·f is not negligible
 * @param sharpness how steep g is as a function of ln s: the reciprocal of the width of its steepest step
 * Source: the rule and its error are L. N. Trefethen & J. A. C. Weideman (2014), SIAM Review 56, 385–458.
 * Checked by: test/core/numerics/distributions/tables.test.ts (by way of Tukey, Dunnett, non-central t)
 */
export function scaleMixture(g: (s: number) => number, df: number, peak = 0, sharpness = 0): number {
  if (df === Infinity) return g(1);
  const a = df / 2;
  const step = Math.min(0.12, 0.55 / Math.sqrt(2 * df + sharpness * sharpness));
  const start = Math.round(peak / step);
  let sum = 0;
  let largest = 0;
  for (const direction of [1, -1] as const) {
    for (let i = direction > 0 ? 0 : 1; i < MOST_NODES; i++) {
      const u = (start + direction * i) * step;
      const weight = Math.exp(a * (2 * u - Math.expm1(2 * u)));
      const term = weight === 0 ? 0 : weight * g(Math.exp(u));
      sum += term;
      if (term > largest) largest = term;
      // Past the peak and negligible; going up, the density alone falls doubly exponentially.
      else if (term <= NEGLIGIBLE * largest && (largest > 0 || (direction > 0 ? u > 0 : u < 0 && weight === 0))) break;
    }
  }
  return sum * step * 2 * Math.sqrt(a / (2 * Math.PI)) * Math.exp(-stirlingError(a));
}
