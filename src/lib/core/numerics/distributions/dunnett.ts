import { largestCorrelatedUpper, type QuasiMonteCarlo } from './largest-correlated.ts';
import { largestOneFactor, type Sides } from './largest-one-factor.ts';
import { largestNearProduct } from './near-product.ts';
import { fitOneFactor } from './one-factor.ts';
import { residualFactor } from './residual-factor.ts';
import { ScaledMaximum } from './scaled-maximum.ts';
import { tUpper, tUpperQuantile } from './student-t.ts';
import { logOddsOf, tailsAround, type LogOdds } from './tail-around.ts';

export type { Sides } from './largest-one-factor.ts';

/** Below this residual correlations are rounding, and the product form counts as exact. */
const EXACT = 1e-10;
/** Up to this residual correlation the expansion is close. */
const NEARLY = 0.15;
/** What is not exact is tabulated with fewer digits: its own error is above 1e-7. */
const COARSE = 1.5;
const APPROXIMATE = 11;
const BINS = 64;

/** The largest of several correlated t statistics with one common error estimate. */
export interface LargestT {
  /**
   * `quadrature` is exact to about 10 digits; `quasi-monte-carlo` states three standard errors, `expansion` the size of
   * the first term that it leaves out.
   */
  readonly method: 'quadrature' | 'quasi-monte-carlo' | 'expansion';
  /** P(largest > q) and its stated error. */
  readonly upper: (q: number, df: number) => { p: number; error: number };
  /** The q with P(largest > q) = alpha. */
  readonly quantile: (alpha: number, df: number) => number;
}

/** Eight shifts of 127 points: errors near 1e-5 in the reference cases. */
export const USUAL_EFFORT: QuasiMonteCarlo = { seed: 1, shifts: 8, points: 127 };

/**
 * The distribution of the largest of m correlated t statistics (multivariate t), for Dunnett's comparisons with a
 * control and any other family of contrasts.
 *
 * Exact by quadrature where the correlations are products λ_i·λ_j (balanced designs, a control in every session, equal
 * correlations). Otherwise, around the nearest product form, quasi-Monte Carlo with a seed, or an expansion.
 *
 * @param correlation row-major m×m
 * @param sides `two` for the largest absolute value
 * @param effort seed and size of the quasi-Monte Carlo integration, or `expand` for the quick expansion
 * Cost: some 20 ms by quadrature and expansion; with 61 points 0.2 s for m = 6 and 0.4 s for m = 19 by quasi-Monte Carlo;
 * then microseconds a question.
 * Source: C. W. Dunnett (1955), JASA 50, 1096–1121; Genz & Bretz (2009).
 * Checked by: test/core/numerics/distributions/dunnett.test.ts, tables.test.ts
 */
export function largestT(
  correlation: Float64Array,
  m: number,
  sides: Sides,
  effort: QuasiMonteCarlo | 'expand' = USUAL_EFFORT
): LargestT {
  const { loadings, residual } = fitOneFactor(correlation, m);
  const start = (alpha: number, df: number) =>
    tUpperQuantile(Math.min(0.49, alpha / (sides === 'two' ? 2 * m : m)), df);
  if (residual < EXACT) {
    const exact = scaled((c) => largestOneFactor(c, loadings, sides).upper, m, sides);
    return {
      method: 'quadrature',
      upper: (q, df) => ({ p: exact.upper(q, df), error: 0 }),
      quantile: (alpha, df) => exact.quantile(alpha, df, start(alpha, df))
    };
  }
  // What the gathered loadings are off is part of the ratio that is tabulated around them.
  const few = gathered(loadings);
  const product = remembered((c) => logOddsOf(largestOneFactor(c, few, sides, COARSE)));
  const wide = { near: sides === 'two' ? 15 : 25, far: 5 };
  const orders = tailsAround(product, largestNearProduct(correlation, loadings, sides), 2, sides, wide);
  const approximate = (odds: LogOdds) => scaled((c) => 1 / (1 + Math.exp(-odds(c))), m, sides, APPROXIMATE);
  if (effort === 'expand') {
    const [first, second] = orders.map(approximate);
    return {
      method: 'expansion',
      upper: (q, df) => {
        const p = second!.upper(q, df);
        // Each further order is smaller by about the size of the residual correlations.
        return { p, error: 2 * residual * Math.abs(p - first!.upper(q, df)) };
      },
      quantile: (alpha, df) => second!.quantile(alpha, df, start(alpha, df))
    };
  }
  const simulate = largestCorrelatedUpper(residualFactor(correlation, m, loadings), sides, effort);
  // Around the expansion there is little left to tabulate, unless the correlations are far from any product.
  const [base, degrees] = residual < NEARLY ? [orders[1]!, { near: 9, far: 2 }] : [product, wide];
  const replicates = tailsAround(base, simulate, effort.shifts, sides, degrees).map(approximate);
  return {
    method: 'quasi-monte-carlo',
    upper: (q, df) => {
      const values = replicates.map((r) => r.upper(q, df));
      const p = mean(values);
      const squares = values.reduce((sum, v) => sum + (v - p) ** 2, 0);
      return { p, error: 3 * Math.sqrt(squares / (values.length * (values.length - 1))) };
    },
    quantile: (alpha, df) => mean(replicates.map((r) => r.quantile(alpha, df, start(alpha, df))))
  };
}

/** Loadings in bins, each replaced by the mean of its bin: with many treatments a few different ones are left. */
function gathered(loadings: Float64Array): Float64Array {
  const bins = new Map<number, { sum: number; count: number }>();
  const binOf = (loading: number) => Math.round(loading * BINS);
  for (const loading of loadings) {
    const bin = bins.get(binOf(loading)) ?? { sum: 0, count: 0 };
    bins.set(binOf(loading), { sum: bin.sum + loading, count: bin.count + 1 });
  }
  return loadings.map((loading) => {
    const { sum, count } = bins.get(binOf(loading))!;
    return sum / count;
  });
}

function remembered(odds: LogOdds): LogOdds {
  const known = new Map<number, number>();
  return (c) => {
    let value = known.get(c);
    if (value === undefined) known.set(c, (value = odds(c)));
    return value;
  };
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, v) => sum + v, 0) / values.length;
}

function scaled(tail: (c: number) => number, m: number, sides: Sides, degree?: number): ScaledMaximum {
  const from = sides === 'two' ? 0 : -10;
  const steepness = 2 + 2 * Math.sqrt(2 * Math.log(2 * m));
  return new ScaledMaximum({ tail, from, to: 38, decay: 0.5, steepness }, degree);
}

/**
 * Dunnett's tail for equal correlations ½, as when all treatments and the control have equal replication.
 *
 * @param q the observed (absolute) t
 * @param comparisons treatments other than the control
 * @param df degrees of freedom above 0, fractional or Infinity
 */
export function dunnettUpper(q: number, comparisons: number, df: number, sides: Sides): number {
  if (comparisons === 1) return sides === 'two' ? 2 * tUpper(Math.abs(q), df) : tUpper(q, df);
  return equal(comparisons, sides).upper(q, df).p;
}

/** Dunnett's critical value for equal correlations ½. Arguments as for dunnettUpper, alpha in (0, 1). */
export function dunnettUpperQuantile(alpha: number, comparisons: number, df: number, sides: Sides): number {
  if (comparisons === 1) return tUpperQuantile(sides === 'two' ? alpha / 2 : alpha, df);
  return equal(comparisons, sides).quantile(alpha, df);
}

const KEPT = 8;
const equalKnown = new Map<string, LargestT>();

function equal(m: number, sides: Sides): LargestT {
  const key = `${m} ${sides}`;
  let known = equalKnown.get(key);
  if (known) return known;
  const correlation = Float64Array.from({ length: m * m }, (_, i) => (i % (m + 1) === 0 ? 1 : 0.5));
  known = largestT(correlation, m, sides);
  if (equalKnown.size >= KEPT) equalKnown.delete(equalKnown.keys().next().value!);
  equalKnown.set(key, known);
  return known;
}
