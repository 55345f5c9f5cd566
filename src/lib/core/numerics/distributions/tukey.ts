import { normalRangeUpper } from './normal-range.ts';
import { ScaledMaximum } from './scaled-maximum.ts';
import { tUpperQuantile } from './student-t.ts';

const KEPT = 8;

/** The distributions for the numbers of means asked for last. */
const known = new Map<number, ScaledMaximum>();

function studentisedRange(means: number): ScaledMaximum {
  let range = known.get(means);
  if (range) return range;
  range = new ScaledMaximum({
    tail: (w) => normalRangeUpper(w, means),
    from: 0,
    to: 54,
    decay: 0.25,
    // The range of 100 normals is about 5 ± 0.6: its distribution is a step of relative width 1/8.
    steepness: 8
  });
  if (known.size >= KEPT) known.delete(known.keys().next().value!);
  known.set(means, range);
  return range;
}

/**
 * Upper tail of the studentised range, P(range of `means` normals / s > q); absolute error below 1e-13, and about
 * 1e-12 relative in the tail.
 *
 * P = E[R(q s)] over s = √(χ²_df/df), with R the tail of the range of normals, by quadrature. R is tabulated once for
 * each number of means, so that many pairs with degrees of freedom of their own are quick.
 *
 * @param q at least 0: for a pair of means |difference| / (standard error of the difference / √2)
 * @param means number of means, at least 2
 * @param df degrees of freedom above 0, fractional or Infinity
 * Cost: a few milliseconds for the first call with a number of means, then about 6 µs.
 * Source: H. O. Hartley (1942), Biometrika 32, 334–348; Tukey (1953). Own integration: published programs that use
 * Algorithm AS 190 or Copenhaver & Holland (1988) are visibly wrong at few degrees of freedom.
 * Checked by: test/core/numerics/distributions/tukey.test.ts, tables.test.ts
 */
export function tukeyUpper(q: number, means: number, df: number): number {
  if (Number.isNaN(q) || !(means >= 2) || !(df > 0)) return NaN;
  return q <= 0 ? 1 : studentisedRange(means).upper(q, df);
}

/** P(studentised range ≤ q). Arguments, errors, source and check: as for tukeyUpper. */
export function tukeyCdf(q: number, means: number, df: number): number {
  return 1 - tukeyUpper(q, means, df);
}

/**
 * The q with P(studentised range > q) = alpha, relative error near 1e-11.
 *
 * @param alpha in (0, 1)
 * @param means number of means, at least 2
 * @param df degrees of freedom above 0, fractional or Infinity
 * Checked by: test/core/numerics/distributions/tukey.test.ts, tables.test.ts
 */
export function tukeyUpperQuantile(alpha: number, means: number, df: number): number {
  if (!(alpha > 0 && alpha < 1) || !(means >= 2) || !(df > 0)) return NaN;
  // Bonferroni over the pairs bounds q from above.
  const pairs = (means * (means - 1)) / 2;
  const start = Math.max(Math.SQRT2 * tUpperQuantile(Math.min(0.49, alpha / (2 * pairs)), df), 0.1);
  return studentisedRange(means).quantile(alpha, df, start);
}
