/** An optimiser's outcome: where, and how it went. */
export interface RootOutcome {
  root: number;
  evaluations: number;
  converged: boolean;
}

/**
 * Finds a zero of a continuous function between two points where its signs differ, by inverse quadratic interpolation
 * safeguarded by bisection.
 *
 * @param f function
 * @param from,to bracket; f(from) and f(to) must not have the same sign
 * @param relative wanted relative width of the bracket
 *
 * Source: R. P. Brent (1973), Algorithms for Minimization without Derivatives, ch. 4.
 * Checked by: test/core/numerics/find-root.test.ts
 */
export function findRoot(
  f: (x: number) => number,
  from: number,
  to: number,
  relative = 4 * Number.EPSILON,
  limit = 100
): RootOutcome {
  let a = from;
  let b = to;
  let fa = f(a);
  let fb = f(b);
  if (fa === 0) return { root: a, evaluations: 2, converged: true };
  if (fa * fb > 0) throw new Error(`findRoot: expected a change of sign, got f(${a}) = ${fa} and f(${b}) = ${fb}`);
  let c = a;
  let fc = fa;
  let step = b - a;
  let before = step;
  for (let evaluations = 2; evaluations < limit; evaluations++) {
    if (fb * fc > 0) {
      c = a;
      fc = fa;
      before = step = b - a;
    }
    if (Math.abs(fc) < Math.abs(fb)) [a, b, c, fa, fb, fc] = [b, c, b, fb, fc, fb];
    const tolerance = 0.5 * relative * Math.abs(b) + Number.MIN_VALUE;
    const half = (c - b) / 2;
    if (Math.abs(half) <= tolerance || fb === 0) return { root: b, evaluations, converged: true };
    if (Math.abs(before) >= tolerance && Math.abs(fa) > Math.abs(fb)) {
      const s = fb / fa;
      let p: number;
      let q: number;
      if (a === c) {
        p = 2 * half * s;
        q = 1 - s;
      } else {
        const u = fa / fc;
        const v = fb / fc;
        p = s * (2 * half * u * (u - v) - (b - a) * (v - 1));
        q = (u - 1) * (v - 1) * (s - 1);
      }
      if (p > 0) q = -q;
      else p = -p;
      if (2 * p < Math.min(3 * half * q - Math.abs(tolerance * q), Math.abs(before * q))) {
        before = step;
        step = p / q;
      } else before = step = half;
    } else before = step = half;
    a = b;
    fa = fb;
    b += Math.abs(step) > tolerance ? step : Math.sign(half) * tolerance;
    fb = f(b);
  }
  return { root: b, evaluations: limit, converged: false };
}
