import { normalRangeUpper } from './normal-range.ts';
import { PiecewiseChebyshev } from '../piecewise-chebyshev.ts';
import { scaleMixture } from './scale-mixture.ts';
import { tUpperQuantile } from './student-t.ts';

/** Beyond this range of normals the tail is below the smallest double. */
const FURTHEST = 54;
const PIECE = 1.5;
const DEGREE = 15;
const KEPT = 8;
/** The range of 100 normals is about 5 ± 0.6: its distribution is a step of relative width 1/8. */
const STEEPNESS = 8;

/** ln P(range of n normals > w) as a table, kept for the numbers of means asked for last. */
const tables = new Map<number, PiecewiseChebyshev>();

function tableOf(means: number): PiecewiseChebyshev {
  const known = tables.get(means);
  if (known) return known;
  const table = new PiecewiseChebyshev((w) => Math.log(normalRangeUpper(w, means)), 0, FURTHEST, PIECE, DEGREE);
  if (tables.size >= KEPT) tables.delete(tables.keys().next().value!);
  tables.set(means, table);
  return table;
}

/**
 * Upper tail of the studentised range, P(range of `means` normals / s > q); absolute error below 1e-12, and about
 * 1e-9 relative in the tail.
 *
 * P = E[R(q s)] over s = √(χ²_df/df), with R the tail of the range of normals, by quadrature. R is tabulated once for
 * each number of means, so that many pairs with degrees of freedom of their own are quick.
 *
 * @param q at least 0: for a pair of means |difference| / (standard error of the difference / √2)
 * @param means number of means, at least 2
 * @param df degrees of freedom above 0, fractional or Infinity
 * Cost: 5 to 10 ms for the first call with a number of means, then about 5 µs.
 * Source: H. O. Hartley (1942), Biometrika 32, 334–348; Tukey (1953). Own integration: published programs that use
 * Algorithm AS 190 or Copenhaver & Holland (1988) are visibly wrong at few degrees of freedom.
 * Checked by: test/core/numerics/distributions/tukey.test.ts, tables.test.ts
 */
export function tukeyUpper(q: number, means: number, df: number): number {
  if (Number.isNaN(q) || !(means >= 2) || !(df > 0)) return NaN;
  if (q <= 0) return 1;
  if (q === Infinity) return 0;
  const table = tableOf(means);
  const rangeTail = (s: number) => (q * s >= FURTHEST ? 0 : Math.exp(table.at(q * s)));
  // The tail of the range falls like exp(−w²/4): the likeliest s then solves (df + q²/2) s² = df.
  const peak = df === Infinity ? 0 : -0.5 * Math.log1p((q * q) / (2 * df));
  return Math.min(1, scaleMixture(rangeTail, df, peak, STEEPNESS));
}

/** P(studentised range ≤ q). Arguments, errors, source and check: as for tukeyUpper. */
export function tukeyCdf(q: number, means: number, df: number): number {
  return 1 - tukeyUpper(q, means, df);
}

/**
 * The q with P(studentised range > q) = alpha, relative error near 1e-10.
 *
 * @param alpha in (0, 1)
 * @param means number of means, at least 2
 * @param df degrees of freedom above 0, fractional or Infinity
 * Checked by: test/core/numerics/distributions/tukey.test.ts, tables.test.ts
 */
export function tukeyUpperQuantile(alpha: number, means: number, df: number): number {
  if (!(alpha > 0 && alpha < 1) || !(means >= 2) || !(df > 0)) return NaN;
  const target = Math.log(alpha);
  const excess = (u: number) => Math.log(tukeyUpper(Math.exp(u), means, df)) - target;
  // Bonferroni over the pairs bounds q from above.
  const pairs = (means * (means - 1)) / 2;
  const start = Math.log(Math.max(Math.SQRT2 * tUpperQuantile(Math.min(0.49, alpha / (2 * pairs)), df), 0.1));
  return Math.exp(decreasingRoot(excess, start));
}

/** The root of a falling function by secants inside a bracket. */
function decreasingRoot(f: (u: number) => number, start: number): number {
  let low = -Infinity;
  let high = Infinity;
  let u = start;
  let value = f(u);
  let slope = -1;
  for (let step = 0; step < 100 && value !== 0; step++) {
    if (value > 0) low = u;
    else high = u;
    let next = u - value / slope;
    if (!Number.isFinite(next) || next <= low || next >= high) {
      if (Math.abs(next - u) < 1e-14) return u;
      next = high === Infinity ? low + 0.5 : low === -Infinity ? high - 0.5 : (low + high) / 2;
    }
    const nextValue = f(next);
    if (Math.abs(next - u) < 1e-13) return next;
    const secant = (nextValue - value) / (next - u);
    slope = secant < 0 ? secant : -1;
    u = next;
    value = nextValue;
  }
  return u;
}
