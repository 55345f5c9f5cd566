import { noncentralTCdf, noncentralTUpper } from '#lib/core/numerics/distributions/noncentral-t.ts';
import { tUpperQuantile } from '#lib/core/numerics/distributions/student-t.ts';
import { tukeyUpperQuantile } from '#lib/core/numerics/distributions/tukey.ts';

/** How the error probability is shared out among pairs: not at all, or by Tukey's range of t means. */
export type PairAdjustment = { tag: 'unadjusted' } | { tag: 'tukey'; means: number };

/**
 * Returns the critical value of |t| for one pair: `t_{1 − α/2, df}`, or Tukey's `q_{1 − α, t, df}/√2`.
 *
 * **Source**: Tukey (1953), The problem of multiple comparisons.
 * **Checked by** test/core/design/detectable-difference.test.ts
 */
export const criticalT = (alpha: number, df: number, adjustment: PairAdjustment): number =>
  adjustment.tag === 'tukey'
    ? tukeyUpperQuantile(alpha, adjustment.means, df) / Math.SQRT2
    : tUpperQuantile(alpha / 2, df);

/**
 * Returns the power of the two-sided test of one difference: `P(|T| > critical)`, T non-central t with df degrees of
 * freedom and non-centrality `ratio`.
 *
 * @param ratio true difference divided by its standard error
 * @param critical critical value of |t|
 * @param df error degrees of freedom, above 0
 */
export const pairPower = (ratio: number, critical: number, df: number): number =>
  noncentralTUpper(critical, df, ratio) + noncentralTCdf(-critical, df, ratio);

/**
 * Returns the smallest true difference, in units of its standard error, that the two-sided test finds with the given
 * power.
 *
 * Bisection and secant on `pairPower`, to a relative 1e-12.
 *
 * @param critical critical value of |t|, above 0
 * @param df error degrees of freedom, above 0
 * @param power between the test's α and 1
 *
 * **Source**: Johnson, Kotz & Balakrishnan (1995), Continuous Univariate Distributions 2, section 31.5 (power of t tests).
 * **Checked by** test/core/design/detectable-difference.test.ts
 */
export function detectableRatio(critical: number, df: number, power: number): number {
  if (!(power > 0 && power < 1)) throw new RangeError(`detectableRatio: power is ${power}, not between 0 and 1`);
  let low = 0;
  let lowPower = pairPower(0, critical, df);
  if (power <= lowPower) return 0;
  let high = critical + 2;
  let highPower = pairPower(high, critical, df);
  while (highPower < power) {
    low = high;
    lowPower = highPower;
    high *= 1.5;
    highPower = pairPower(high, critical, df);
  }
  for (let round = 0; round < 100 && high - low > 1e-12 * high; round++) {
    // Every third step halves, so that a bent curve cannot hold one end for ever.
    const share = round % 3 === 2 ? 0.5 : (power - lowPower) / (highPower - lowPower);
    const middle = low + Math.min(0.98, Math.max(0.02, share)) * (high - low);
    const middlePower = pairPower(middle, critical, df);
    if (middlePower < power) [low, lowPower] = [middle, middlePower];
    else [high, highPower] = [middle, middlePower];
  }
  return 0.5 * (low + high);
}
