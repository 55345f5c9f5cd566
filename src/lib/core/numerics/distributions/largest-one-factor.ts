import { normalDensity, normalUpper } from './normal.ts';

/** `two`: the largest absolute value; `one`: the largest value. */
export type Sides = 'one' | 'two';

/** A probability and its complement, each to full relative precision. */
export interface BothTails {
  /** P(largest > c). */
  readonly upper: number;
  /** P(largest ≤ c). */
  readonly inside: number;
}

/**
 * P(largest of m correlated standard normals > c) and its complement for correlations λ_i·λ_j, each to about 13 digits
 * even where it is small.
 *
 * Given the factor x the normals are independent: ∫ φ(x) [1 − Π_i (1 − p_i(x))] dx by the trapezoidal rule, which
 * converges exponentially here.
 *
 * @param c any number
 * @param loadings λ, each in (−1, 1)
 * @param coarseness factor of the step; 1.5 takes two thirds of the time and keeps about 7 digits
 * Source: C. W. Dunnett & M. Sobel (1955), Biometrika 42, 258–260, for this form of correlation.
 * Checked by: test/core/numerics/distributions/dunnett.test.ts, tables.test.ts
 */
export function largestOneFactor(c: number, loadings: Float64Array, sides: Sides, coarseness = 1): BothTails {
  if (sides === 'two' && c <= 0) return { upper: 1, inside: 0 };
  const { loadings: distinct, counts } = gathered(loadings);
  const m = distinct.length;
  const spreads = distinct.map((l) => 1 / Math.sqrt((1 - l) * (1 + l)));
  let steepest = 0;
  for (let i = 0; i < m; i++) steepest = Math.max(steepest, Math.abs(distinct[i]! * spreads[i]!));
  const step = coarseness * Math.min(0.25, 0.5 / Math.sqrt(1 + steepest * steepest));
  let upper = 0;
  let inside = 0;
  const add = (x: number): number => {
    const weight = step * normalDensity(x);
    let log = 0;
    for (let i = 0; i < m; i++) {
      const shift = distinct[i]! * x;
      let p = normalUpper((c - shift) * spreads[i]!);
      if (sides === 'two') p += normalUpper((c + shift) * spreads[i]!);
      log += counts[i]! * Math.log1p(-Math.min(1, p));
    }
    upper -= weight * Math.expm1(log);
    inside += weight * Math.exp(log);
    return weight;
  };
  add(0);
  // What is left beyond x is at most the density there; the inside of one-sided boxes may lie far out as well.
  for (const direction of [1, -1]) {
    for (let i = 1; i * step < Math.abs(c) + 12; i++)
      if (add(direction * i * step) < 1e-18 * Math.min(upper, inside)) break;
  }
  return { upper: Math.min(1, upper), inside: Math.min(1, inside) };
}

/** Equal loadings are counted once: with equal correlations the cost no longer grows with m. */
function gathered(loadings: Float64Array): { loadings: Float64Array; counts: Float64Array } {
  const counts = new Map<number, number>();
  for (const loading of loadings) counts.set(loading, (counts.get(loading) ?? 0) + 1);
  return { loadings: Float64Array.from(counts.keys()), counts: Float64Array.from(counts.values()) };
}
