import { gammaKernel, incompleteGammaLower, incompleteGammaUpper } from './incomplete-gamma.ts';
import { normalQuantile } from './normal.ts';
import { logGamma } from './stirling-error.ts';
import { tailQuantile } from './tail-quantile.ts';

/**
 * P(X ≤ x) for chi-squared, to full relative precision.
 *
 * @param x any number
 * @param df degrees of freedom above 0, fractional allowed
 * Source: Abramowitz & Stegun (1964) 26.4.19 (incomplete gamma).
 * Checked by: test/core/numerics/distributions/tables.test.ts
 */
export function chiSquaredCdf(x: number, df: number): number {
  if (Number.isNaN(x) || !(df > 0)) return NaN;
  return incompleteGammaLower(df / 2, x / 2);
}

/** P(X > x) for chi-squared, to full relative precision. Arguments, source and check: as for chiSquaredCdf. */
export function chiSquaredUpper(x: number, df: number): number {
  if (Number.isNaN(x) || !(df > 0)) return NaN;
  return incompleteGammaUpper(df / 2, x / 2);
}

/** The x with P(X ≤ x) = p for chi-squared; p in [0, 1], df above 0. Check: as for chiSquaredCdf. */
export function chiSquaredQuantile(p: number, df: number): number {
  if (!(p >= 0 && p <= 1) || !(df > 0)) return NaN;
  if (p === 0) return 0;
  if (p === 1) return Infinity;
  return p <= 0.5 ? lowerQuantile(p, df) : upperQuantile(1 - p, df);
}

/** The x with P(X > x) = p for chi-squared; p in [0, 1], df above 0. Check: as for chiSquaredCdf. */
export function chiSquaredUpperQuantile(p: number, df: number): number {
  if (!(p >= 0 && p <= 1) || !(df > 0)) return NaN;
  if (p === 0) return Infinity;
  if (p === 1) return 0;
  return p < 0.5 ? upperQuantile(p, df) : lowerQuantile(1 - p, df);
}

function lowerQuantile(p: number, df: number): number {
  return tailQuantile(
    { probability: (x) => chiSquaredCdf(x, df), scaledDensity: (x) => gammaKernel(df / 2, x / 2), direction: 1 },
    p,
    firstGuess(normalQuantile(p), Math.log(p), df)
  );
}

function upperQuantile(p: number, df: number): number {
  return tailQuantile(
    { probability: (x) => chiSquaredUpper(x, df), scaledDensity: (x) => gammaKernel(df / 2, x / 2), direction: -1 },
    p,
    firstGuess(-normalQuantile(p), -Infinity, df)
  );
}

/** Wilson & Hilferty's cube; where it fails in the lower tail, the first term of the series. */
function firstGuess(z: number, logLower: number, df: number): number {
  const spread = 2 / (9 * df);
  const cube = df * (1 - spread + z * Math.sqrt(spread)) ** 3;
  if (logLower > -Infinity && cube < 0.2 * df) {
    const a = df / 2;
    return 2 * Math.exp(Math.max(-650, (logLower + logGamma(a + 1)) / a));
  }
  return Math.max(cube, 1e-10);
}
