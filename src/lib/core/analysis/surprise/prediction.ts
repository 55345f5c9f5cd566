import { tUpper } from '../../numerics/distributions/student-t.ts';
import { findRoot } from '../../numerics/find-root.ts';

/** What the kept readings so far predict for one treatment in one session. */
export interface Prediction {
  /** Middle of the prediction. */
  readonly center: number;
  /** Between these lies the reading, but for the chance asked for. */
  readonly low: number;
  readonly high: number;
  /** Chance of a reading as far out as this one or further, two-sided. */
  readonly chance: (y: number) => number;
  /** `treatment`: from this treatment's own readings too; `all`: from all readings, while those say nothing yet. */
  readonly basis: 'treatment' | 'all';
}

/** One t distribution of a mixture. */
export interface Located {
  readonly weight: number;
  readonly mean: number;
  readonly scale: number;
}

/**
 * Centre, ends and tails of a mixture of t distributions with common degrees of freedom.
 *
 * @param alpha chance outside the ends, in (0, 1), half on each side
 * Checked by: test/core/analysis/surprise/running-model.test.ts
 */
export function mixture(parts: readonly Located[], df: number, alpha: number): Omit<Prediction, 'basis'> {
  const total = parts.reduce((s, part) => s + part.weight, 0);
  const center = parts.reduce((s, part) => s + part.weight * part.mean, 0) / total;
  const above = (y: number) =>
    parts.reduce((s, { weight, mean, scale }) => s + weight * tUpper((y - mean) / scale, df), 0) / total;
  const below = (y: number) =>
    parts.reduce((s, { weight, mean, scale }) => s + weight * tUpper((mean - y) / scale, df), 0) / total;
  const widest = Math.max(...parts.map(({ mean, scale }) => Math.abs(mean - center) + scale));
  const edge = (tail: (y: number) => number, sign: 1 | -1) => {
    const excess = (u: number) => Math.log(tail(center + sign * u * widest) / (alpha / 2));
    let near = 0;
    let far = 2;
    while (excess(far) > 0) [near, far] = [far, 2 * far];
    if (near === 0 && excess(0) <= 0) return center;
    return center + sign * findRoot(excess, near, far, 1e-6).root * widest;
  };
  return {
    center,
    low: edge(below, -1),
    high: edge(above, 1),
    chance: (y) => Math.min(1, 2 * Math.min(above(y), below(y)))
  };
}
