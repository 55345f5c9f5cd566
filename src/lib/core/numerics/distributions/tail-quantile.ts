/** One tail of a distribution on the positive numbers. */
export interface PositiveTail {
  /** Probability of the tail at x, to full relative precision. */
  readonly probability: (x: number) => number;
  /** x times the density at x. */
  readonly scaledDensity: (x: number) => number;
  /** −1 for an upper tail (it falls with x), 1 for a lower tail. */
  readonly direction: 1 | -1;
}

const MOST_STEPS = 200;

/**
 * The x > 0 at which one tail of a positive distribution has probability p.
 *
 * Newton's method on ln(probability) against ln x, where tails are nearly straight, kept inside a bracket.
 *
 * @param tail the tail; solve for the smaller of the two, nothing is lost then
 * @param p in (0, 1)
 * @param start a first guess above 0
 * Checked by: test/core/numerics/distributions/tables.test.ts
 */
export function tailQuantile(tail: PositiveTail, p: number, start: number): number {
  const target = Math.log(p);
  let low = -Infinity;
  let high = Infinity;
  let u = Math.log(start);
  for (let step = 0; step < MOST_STEPS; step++) {
    const x = Math.exp(u);
    const probability = tail.probability(x);
    const excess = Math.log(probability) - target;
    if (excess === 0) return x;
    // The root lies above u when the falling tail is still too large, or the rising tail still too small.
    if (excess > 0 === tail.direction < 0) low = u;
    else high = u;
    const slope = (tail.direction * tail.scaledDensity(x)) / probability;
    let next = u - excess / slope;
    // Newton's error after a step this short is far below rounding.
    if (Math.abs(next - u) < 1e-9) return x * (1 + (next - u));
    if (!Number.isFinite(next) || next <= low || next >= high) {
      if (high === Infinity) next = low + 2;
      else if (low === -Infinity) next = high - 2;
      else next = (low + high) / 2;
      if (next === low || next === high) return x;
    }
    u = next;
  }
  return Math.exp(u);
}
