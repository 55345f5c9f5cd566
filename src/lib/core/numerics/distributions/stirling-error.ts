const HALF_LOG_TWO_PI = 0.9189385332046728;

/**
 * The error of Stirling's formula, ln Γ(x + 1) − [(x + ½) ln x − x + ½ ln 2π], to an absolute error below 1e-15.
 *
 * Shifts x upward with δ(x) = δ(x + 1) + (x + ½) ln(1 + 1/x) − 1 and then sums Stirling's series.
 *
 * @param x above 0 (fractional values allowed)
 * Source: C. Loader (2000), Fast and accurate computation of binomial probabilities; the series is
 * Abramowitz & Stegun (1964) 6.1.41.
 * Checked by: test/core/numerics/distributions/stirling-error.test.ts
 */
export function stirlingError(x: number): number {
  let shift = 0;
  let n = x;
  while (n < 16) {
    shift += (n + 0.5) * Math.log1p(1 / n) - 1;
    n += 1;
  }
  const r = 1 / (n * n);
  const series =
    (1 / 12 - (1 / 360 - (1 / 1260 - (1 / 1680 - (1 / 1188 - (691 / 360360 - r / 156) * r) * r) * r) * r) * r) / n;
  return shift + series;
}

/**
 * Half the deviance of a Poisson count, x ln(x/m) + m − x, without cancellation when x is near m.
 *
 * @param x above 0
 * @param m above 0
 * Source: C. Loader (2000), function bd0.
 * Checked by: test/core/numerics/distributions/stirling-error.test.ts
 */
export function halfDeviance(x: number, m: number): number {
  const difference = x - m;
  if (Math.abs(difference) < 0.1 * (x + m)) {
    const v = difference / (x + m);
    let sum = difference * v;
    let term = 2 * x * v;
    const v2 = v * v;
    for (let j = 3; j < 1000; j += 2) {
      term *= v2;
      const next = sum + term / j;
      if (next === sum) break;
      sum = next;
    }
    return sum;
  }
  return x * Math.log(x / m) + m - x;
}

/**
 * Natural logarithm of the gamma function, absolute error near 1e-15 (relative to the larger of 1 and the value).
 *
 * @param x above 0
 * Checked by: test/core/numerics/distributions/stirling-error.test.ts
 */
export function logGamma(x: number): number {
  const logX = Math.log(x);
  return stirlingError(x) + (x - 0.5) * logX - x + HALF_LOG_TWO_PI;
}
