import { normalUpper } from './normal.ts';
import { scaleMixture } from './scale-mixture.ts';
import { tUpper } from './student-t.ts';

/**
 * Upper tail of the non-central t distribution, P((Z + ncp)/s > x), small values to about 12 digits.
 *
 * P = E[Φ(ncp − x s)] over s = √(χ²_df/df), by quadrature.
 *
 * @param x any number
 * @param df degrees of freedom above 0, fractional or Infinity
 * @param ncp non-centrality, the true difference in units of its standard error
 * Source: Johnson, Kotz & Balakrishnan (1995), Continuous Univariate Distributions 2, chapter 31 (the definition).
 * Checked by: test/core/numerics/distributions/tables.test.ts
 */
export function noncentralTUpper(x: number, df: number, ncp: number): number {
  if (Number.isNaN(x) || Number.isNaN(ncp) || !(df > 0)) return NaN;
  if (ncp === 0) return tUpper(x, df);
  if (x === Infinity) return 0;
  if (x === -Infinity) return 1;
  const peak = mostLikely(x, df, ncp);
  const sharpness = Math.max(Math.abs(ncp), Math.abs(x) * Math.exp(peak));
  return Math.min(
    1,
    scaleMixture((s) => normalUpper(x * s - ncp), df, peak, sharpness)
  );
}

/** P((Z + ncp)/s ≤ x) of the non-central t distribution. Arguments, source and check: as for noncentralTUpper. */
export function noncentralTCdf(x: number, df: number, ncp: number): number {
  return noncentralTUpper(-x, df, -ncp);
}

/** ln s near the peak of exp(−(x s − ncp)²₊/2) times the density of s. */
function mostLikely(x: number, df: number, ncp: number): number {
  if (x - ncp <= 0) return 0;
  // Maximise df (ln s − s²/2) − (x s − ncp)²/2: (df + x²) s² − x ncp s − df = 0.
  const a = df + x * x;
  const b = x * ncp;
  const s = (b + Math.sqrt(b * b + 4 * a * df)) / (2 * a);
  return Math.log(s);
}
