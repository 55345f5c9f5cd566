import { PiecewiseChebyshev } from '../piecewise-chebyshev.ts';
import type { BothTails, Sides } from './largest-one-factor.ts';

/** ln of P(largest > c) / P(largest ≤ c), as a function of c. */
export type LogOdds = (c: number) => number;

/** Degrees of the series below and above c = 5. */
export interface Degrees {
  readonly near: number;
  readonly far: number;
}

const NEAR = 5;
/** Beyond this all correlations have lost their influence on the tail, but for rounding. */
const FAR = 9;

/** The log odds of both tails. */
export function logOddsOf({ upper, inside }: BothTails): number {
  return Math.log(upper) - Math.log(inside);
}

/**
 * Several approximate tails, tabulated around a tail that is known and close: its odds times their odds ratio. The
 * logarithm of that ratio is smooth in c from the middle of the box to the far tail, so that few c are enough.
 *
 * @param base log odds of the known tail
 * @param approximate all approximate tails at c; asked once for each c
 * @param count how many there are
 *
 * Checked by: test/core/numerics/distributions/dunnett.test.ts, near-product.test.ts
 */
export function tailsAround(
  base: LogOdds,
  approximate: (c: number) => readonly BothTails[],
  count: number,
  sides: Sides,
  degrees: Degrees
): LogOdds[] {
  const known = new Map<number, readonly BothTails[]>();
  const logRatio = (c: number, which: number): number => {
    let tails = known.get(c);
    if (!tails) known.set(c, (tails = approximate(c)));
    return logOddsOf(tails[which]!) - base(c);
  };
  const from = sides === 'two' ? 0 : -5;
  return Array.from({ length: count }, (_, which) => {
    const near = new PiecewiseChebyshev((c) => logRatio(c, which), from, NEAR, NEAR - from, degrees.near);
    const far = new PiecewiseChebyshev((c) => logRatio(c, which), NEAR, FAR, FAR - NEAR, degrees.far);
    return (c) => base(c) + (c < NEAR ? near.at(Math.max(from, c)) : far.at(Math.min(FAR, c)));
  });
}
