import { halfDeviance, stirlingError } from './stirling-error.ts';

const TINY = 1e-300;
const MOST_TERMS = 200_000;

/**
 * x^a e^(−x) / Γ(a), the factor common to the gamma density and the incomplete gamma function.
 *
 * @param a above 0
 * @param x at least 0
 * Source: C. Loader (2000), Fast and accurate computation of binomial probabilities (the Poisson form).
 * Checked by: test/core/numerics/distributions/tables.test.ts
 */
export function gammaKernel(a: number, x: number): number {
  if (x <= 0) return 0;
  return Math.exp(-stirlingError(a) - halfDeviance(a, x)) * Math.sqrt(a / (2 * Math.PI));
}

/**
 * Regularised lower incomplete gamma function P(a, x), small values to full relative precision.
 *
 * @param a above 0
 * @param x at least 0
 * Source: Abramowitz & Stegun (1964) 6.5.29 (series) and 6.5.31 (continued fraction).
 * Checked by: test/core/numerics/distributions/tables.test.ts
 */
export function incompleteGammaLower(a: number, x: number): number {
  if (x <= 0) return 0;
  if (x === Infinity) return 1;
  return x < a + 1 ? series(a, x) : 1 - fraction(a, x);
}

/**
 * Regularised upper incomplete gamma function Q(a, x) = 1 − P(a, x), small values to full relative precision.
 *
 * @param a above 0
 * @param x at least 0
 * Source: as for incompleteGammaLower.
 * Checked by: test/core/numerics/distributions/tables.test.ts
 */
export function incompleteGammaUpper(a: number, x: number): number {
  if (x <= 0) return 1;
  if (x === Infinity) return 0;
  return x < a + 1 ? 1 - series(a, x) : fraction(a, x);
}

function series(a: number, x: number): number {
  let term = 1 / a;
  let sum = term;
  for (let n = 1; n < MOST_TERMS; n++) {
    term *= x / (a + n);
    const next = sum + term;
    if (next === sum) break;
    sum = next;
  }
  return Math.min(1, gammaKernel(a, x) * sum);
}

function fraction(a: number, x: number): number {
  let b = x + 1 - a;
  let c = 1 / TINY;
  let d = 1 / b;
  let value = d;
  for (let n = 1; n < MOST_TERMS; n++) {
    const coefficient = -n * (n - a);
    b += 2;
    d = coefficient * d + b;
    d = 1 / (Math.abs(d) < TINY ? TINY : d);
    c = b + coefficient / c;
    if (Math.abs(c) < TINY) c = TINY;
    const change = d * c;
    value *= change;
    if (Math.abs(change - 1) <= 1e-16) break;
  }
  return Math.min(1, gammaKernel(a, x) * value);
}
