import { chiSquaredCdf, chiSquaredQuantile, chiSquaredUpper, chiSquaredUpperQuantile } from './chi-squared.ts';
import { betaKernel, incompleteBeta } from './incomplete-beta.ts';
import { tailQuantile } from './tail-quantile.ts';

/**
 * P(F ≤ x) for the F distribution, to full relative precision.
 *
 * @param x any number
 * @param d1 numerator degrees of freedom above 0, fractional or Infinity
 * @param d2 denominator degrees of freedom above 0, fractional or Infinity
 * Source: Abramowitz & Stegun (1964) 26.5.28 (incomplete beta).
 * Checked by: test/core/numerics/distributions/tables.test.ts
 */
export function fCdf(x: number, d1: number, d2: number): number {
  if (Number.isNaN(x) || !(d1 > 0) || !(d2 > 0)) return NaN;
  if (x <= 0) return 0;
  if (x === Infinity) return 1;
  if (d1 === Infinity) return d2 === Infinity ? (x < 1 ? 0 : 1) : chiSquaredUpper(d2 / x, d2);
  if (d2 === Infinity) return chiSquaredCdf(x * d1, d1);
  const share = d1 * x;
  return incompleteBeta(share / (share + d2), d2 / (share + d2), d1 / 2, d2 / 2);
}

/** P(F > x) for the F distribution, to full relative precision. Arguments, source and check: as for fCdf. */
export function fUpper(x: number, d1: number, d2: number): number {
  if (Number.isNaN(x) || !(d1 > 0) || !(d2 > 0)) return NaN;
  if (x <= 0) return 1;
  return fCdf(1 / x, d2, d1);
}

/** The x with P(F ≤ x) = p; p in [0, 1]. Check: as for fCdf. */
export function fQuantile(p: number, d1: number, d2: number): number {
  if (!(p >= 0 && p <= 1) || !(d1 > 0) || !(d2 > 0)) return NaN;
  if (p === 0) return 0;
  if (p === 1) return Infinity;
  if (d1 === Infinity) return d2 === Infinity ? 1 : d2 / chiSquaredUpperQuantile(p, d2);
  if (d2 === Infinity) return chiSquaredQuantile(p, d1) / d1;
  return p <= 0.5 ? solve(p, d1, d2, 1) : solve(1 - p, d1, d2, -1);
}

/** The x with P(F > x) = p; p in [0, 1]. Check: as for fCdf. */
export function fUpperQuantile(p: number, d1: number, d2: number): number {
  if (!(p >= 0 && p <= 1) || !(d1 > 0) || !(d2 > 0)) return NaN;
  if (p === 0) return Infinity;
  if (p === 1) return 0;
  if (d1 === Infinity) return d2 === Infinity ? 1 : d2 / chiSquaredQuantile(p, d2);
  if (d2 === Infinity) return chiSquaredUpperQuantile(p, d1) / d1;
  return p < 0.5 ? solve(p, d1, d2, -1) : solve(1 - p, d1, d2, 1);
}

function solve(p: number, d1: number, d2: number, direction: 1 | -1): number {
  const probability = direction > 0 ? (x: number) => fCdf(x, d1, d2) : (x: number) => fUpper(x, d1, d2);
  const scaledDensity = (x: number) => {
    const share = d1 * x;
    return betaKernel(share / (share + d2), d2 / (share + d2), d1 / 2, d2 / 2);
  };
  return tailQuantile({ probability, scaledDensity, direction }, p, 1);
}
