/** The five numbers of a balanced design: t treatments, b sessions of k, each treatment r times, each pair λ times together. */
export interface Parameters {
  t: number;
  b: number;
  r: number;
  k: number;
  lambda: number;
}

/**
 * The parameter set that t, k and r fix through bk = rt and λ(t−1) = r(k−1), or null where b or λ is no whole number.
 *
 * Source: R. C. Bose (1939), On the construction of balanced incomplete block designs, Ann. Eugenics 9, eq. (1.1)–(1.2).
 * Checked by: test/core/design/catalogue/balanced-design.test.ts
 */
export function parametersOf(t: number, k: number, r: number): Parameters | null {
  if (![t, k, r].every((x) => Number.isInteger(x) && x > 0)) return null;
  if (k < 2 || k > t) return null;
  if ((r * t) % k !== 0 || (r * (k - 1)) % (t - 1) !== 0) return null;
  return { t, k, r, b: (r * t) / k, lambda: (r * (k - 1)) / (t - 1) };
}

/** The parameter set of the complement: each session runs what the other left out. */
function complementParameters(p: Parameters): Parameters {
  return { t: p.t, b: p.b, k: p.t - p.k, r: p.b - p.r, lambda: p.b - 2 * p.r + p.lambda };
}

/**
 * The parameter set to look for: the design itself, or its complement where that has the smaller sessions. Leaving one
 * treatment out of each session stays as it is: its complement would be sessions of one.
 */
export function smallerOf(p: Parameters): Parameters {
  return 2 * p.k <= p.t || p.k >= p.t - 1 ? p : complementParameters(p);
}
