import { halfDeviance, stirlingError } from './stirling-error.ts';

const CONVERGED = 2.3e-16;
const MOST_TERMS = 200_000;

/**
 * x^a y^b / B(a, b), the factor common to the beta density and the incomplete beta function.
 *
 * Loader's saddle-point form, so that nothing cancels when a and b are large.
 *
 * @param x in [0, 1]
 * @param y 1 − x, given apart so that neither loses digits
 * @param a above 0
 * @param b above 0
 * Source: C. Loader (2000), Fast and accurate computation of binomial probabilities, equation 5.
 * Checked by: test/core/numerics/distributions/tables.test.ts
 */
export function betaKernel(x: number, y: number, a: number, b: number): number {
  if (x <= 0 || y <= 0) return 0;
  const n = a + b;
  const exponent = stirlingOf(a, b) - halfDeviance(a, n * x) - halfDeviance(b, n * y);
  return Math.exp(exponent) * Math.sqrt((a * b) / (2 * Math.PI * n));
}

/** Questions with the same degrees of freedom come in runs: what depends on these alone is kept for the next. */
const last = { a: NaN, b: NaN, error: NaN };

function stirlingOf(a: number, b: number): number {
  if (last.a !== a || last.b !== b) {
    last.a = a;
    last.b = b;
    last.error = stirlingError(a + b) - stirlingError(a) - stirlingError(b);
  }
  return last.error;
}

/**
 * Regularised incomplete beta function I_x(a, b), small values to full relative precision.
 *
 * Upper tails are I_y(b, a): call it with both pairs swapped, so that no tail is got by subtraction.
 *
 * @param x in [0, 1]
 * @param y 1 − x, given apart so that neither loses digits
 * @param a above 0
 * @param b above 0
 * Source: A. R. DiDonato & A. H. Morris (1992), Algorithm 708, ACM TOMS 18, 360–373, the continued fraction (9); it
 * works with (a + b)y − b, which the textbook fraction gets by cancellation when a is large and b small.
 * Checked by: test/core/numerics/distributions/tables.test.ts
 */
export function incompleteBeta(x: number, y: number, a: number, b: number): number {
  if (x <= 0) return 0;
  if (y <= 0) return 1;
  // How far the mean a/(a + b) lies above x, times a + b; by the route that cancels least.
  const lambda = x < y ? a - (a + b) * x : (a + b) * y - b;
  const value = lambda < 0 ? 1 - fraction(y, x, b, a, -lambda) : fraction(x, y, a, b, lambda);
  return Math.min(1, Math.max(0, value));
}

function fraction(x: number, y: number, a: number, b: number, lambda: number): number {
  const front = betaKernel(x, y, a, b);
  if (front === 0) return 0;
  const c = 1 + lambda;
  const c0 = b / a;
  const c1 = 1 + 1 / a;
  let p = 1;
  let s = a + 1;
  let olderTop = 0;
  let olderBottom = 1;
  let top = 1;
  let bottom = c / c1;
  let value = c1 / c;
  for (let n = 1; n < MOST_TERMS; n++) {
    const t = n / a;
    const w = n * (b - n) * x;
    const e = a / s;
    const alpha = p * (p + c0) * e * e * (w * x);
    const beta = n + w / s + ((t + 1) / (c1 + t + t)) * (c + n * (y + 1));
    p = t + 1;
    s += 2;
    const nextTop = alpha * olderTop + beta * top;
    const nextBottom = alpha * olderBottom + beta * bottom;
    const next = nextTop / nextBottom;
    if (Math.abs(next - value) <= CONVERGED * next) return front * next;
    value = next;
    olderTop = top / nextBottom;
    olderBottom = bottom / nextBottom;
    top = next;
    bottom = 1;
  }
  return front * value;
}
