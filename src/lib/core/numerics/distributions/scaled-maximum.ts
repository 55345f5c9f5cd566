import { PiecewiseChebyshev } from '../piecewise-chebyshev.ts';
import { scaleMixture } from './scale-mixture.ts';

/** A statistic of normal variables (their largest, their range) whose tail is known, before division by s. */
export interface NormalStatistic {
  /** P(statistic > c), to full relative precision. */
  readonly tail: (c: number) => number;
  /** Below this c the tail is 1 to double precision. */
  readonly from: number;
  /** Above this c the tail is below the smallest double. */
  readonly to: number;
  /** The tail falls like exp(−decay·c²). */
  readonly decay: number;
  /** How steep the tail is as a function of ln c. */
  readonly steepness: number;
}

const PIECE = 1;
const DEGREE = 15;

/**
 * The distribution of a statistic of normal variables divided by an independent s = √(χ²_df/df): the studentised range,
 * the largest of several t.
 *
 * The tail before the division is tabulated once, so that many questions with degrees of freedom of their own are quick.
 *
 * Checked by: test/core/numerics/distributions/tables.test.ts (Tukey and Dunnett)
 */
export class ScaledMaximum {
  readonly #statistic: NormalStatistic;
  readonly #logTail: PiecewiseChebyshev;

  /** @param degree of the table's pieces; 15 keeps 9 digits of the tail and more, 11 at least 5 */
  constructor(statistic: NormalStatistic, degree = DEGREE) {
    this.#statistic = statistic;
    const { tail, from, to } = statistic;
    // Where the tail underflows it is held at the smallest double, so that the last piece stays finite.
    const logTail = (c: number) => Math.log(Math.max(tail(c), Number.MIN_VALUE));
    this.#logTail = new PiecewiseChebyshev(logTail, from, to, PIECE, degree);
  }

  /** P(statistic / s > q); df above 0, fractional or Infinity. Cost: some 60 table look-ups. */
  upper(q: number, df: number): number {
    const { from, to, decay, steepness } = this.#statistic;
    if (q === Infinity) return 0;
    const tail = (s: number) => {
      const c = q * s;
      return c <= from ? 1 : c >= to ? 0 : Math.exp(this.#logTail.at(c));
    };
    // The likeliest s under density and tail together.
    const peak = df === Infinity || q <= 0 ? 0 : -0.5 * Math.log1p((2 * decay * q * q) / df);
    return Math.min(1, scaleMixture(tail, df, peak, steepness));
  }

  /**
   * The q with P(statistic / s > q) = alpha, relative error near 1e-12.
   *
   * @param alpha in (0, 1)
   * @param df degrees of freedom above 0, fractional or Infinity
   * @param start a first guess, such as Bonferroni's bound
   */
  quantile(alpha: number, df: number, start: number): number {
    const target = Math.log(alpha);
    return Math.sinh(fallingRoot((u) => Math.log(this.upper(Math.sinh(u), df)) - target, Math.asinh(start)));
  }
}

/** The root of a falling function by secants inside a bracket. */
function fallingRoot(f: (u: number) => number, start: number): number {
  let low = -Infinity;
  let high = Infinity;
  let u = start;
  let value = f(u);
  let slope = -1;
  for (let step = 0; step < 100 && value !== 0; step++) {
    if (value > 0) low = u;
    else high = u;
    let next = u - value / slope;
    if (Math.abs(next - u) < 1e-13) return next;
    if (!Number.isFinite(next) || next <= low || next >= high) {
      next = high === Infinity ? low + 0.5 : low === -Infinity ? high - 0.5 : (low + high) / 2;
      if (next === low || next === high) return u;
    }
    const nextValue = f(next);
    const secant = (nextValue - value) / (next - u);
    slope = secant < 0 ? secant : -1;
    u = next;
    value = nextValue;
  }
  return u;
}
