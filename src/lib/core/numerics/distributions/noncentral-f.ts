import { chiSquaredCdf, chiSquaredUpper } from './chi-squared.ts';
import { fCdf, fUpper } from './f.ts';
import { incompleteBeta } from './incomplete-beta.ts';
import { halfDeviance, stirlingError } from './stirling-error.ts';

/**
 * Upper tail of the non-central F distribution, small values to about 12 digits.
 *
 * A Poisson(ncp/2) mixture of central beta tails, summed outward from the largest weight.
 *
 * @param x any number
 * @param d1 numerator degrees of freedom above 0
 * @param d2 denominator degrees of freedom above 0, fractional or Infinity
 * @param ncp non-centrality at least 0, Σ(effect²)/σ² in the units of the numerator
 * Cost: about 12 √ncp incomplete beta functions.
 * Source: Johnson, Kotz & Balakrishnan (1995), Continuous Univariate Distributions 2, equation 30.10.
 * Checked by: test/core/numerics/distributions/tables.test.ts
 */
export function noncentralFUpper(x: number, d1: number, d2: number, ncp: number): number {
  if (ncp === 0) return fUpper(x, d1, d2);
  if (!valid(x, d1, d2, ncp)) return NaN;
  if (x <= 0) return 1;
  if (d2 === Infinity) return poissonMixture(ncp / 2, (j) => chiSquaredUpper(x * d1, d1 + 2 * j));
  const share = d1 * x;
  const inside = share / (share + d2);
  const outside = d2 / (share + d2);
  return poissonMixture(ncp / 2, (j) => incompleteBeta(outside, inside, d2 / 2, d1 / 2 + j));
}

/** P(F ≤ x) of the non-central F distribution. Arguments, source and check: as for noncentralFUpper. */
export function noncentralFCdf(x: number, d1: number, d2: number, ncp: number): number {
  if (ncp === 0) return fCdf(x, d1, d2);
  if (!valid(x, d1, d2, ncp)) return NaN;
  if (x <= 0) return 0;
  if (d2 === Infinity) return poissonMixture(ncp / 2, (j) => chiSquaredCdf(x * d1, d1 + 2 * j));
  const share = d1 * x;
  const inside = share / (share + d2);
  const outside = d2 / (share + d2);
  return poissonMixture(ncp / 2, (j) => incompleteBeta(inside, outside, d1 / 2 + j, d2 / 2));
}

function valid(x: number, d1: number, d2: number, ncp: number): boolean {
  return !Number.isNaN(x) && d1 > 0 && d1 < Infinity && d2 > 0 && ncp > 0 && ncp < Infinity;
}

/** Σ_j Poisson(j; mean) g(j), from the mode outward until the terms no longer count. */
function poissonMixture(mean: number, g: (j: number) => number): number {
  const mode = Math.floor(mean);
  let sum = 0;
  for (const direction of [1, -1] as const) {
    let j = direction > 0 ? mode : mode - 1;
    let weight = poisson(j, mean);
    let largest = 0;
    while (j >= 0) {
      const term = weight * g(j);
      sum += term;
      if (term > largest) largest = term;
      // A term may still grow away from the mode while the tail it weighs does.
      else if (term <= 1e-17 * sum || weight === 0) break;
      weight *= direction > 0 ? mean / (j + 1) : j / mean;
      j += direction;
    }
  }
  return Math.min(1, sum);
}

function poisson(j: number, mean: number): number {
  if (j < 0) return 0;
  if (j === 0) return Math.exp(-mean);
  return Math.exp(-stirlingError(j) - halfDeviance(j, mean)) / Math.sqrt(2 * Math.PI * j);
}
