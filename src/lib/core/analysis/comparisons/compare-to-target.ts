import { tukeyUpperQuantile } from '../../numerics/distributions/tukey.ts';
import type { BestComparison, BestLine } from '../comparison-result.ts';
import type { DifferenceSource } from './difference-source.ts';

/** Adjusted means with their standard errors and degrees of freedom. */
export interface MeanSource {
  readonly estimate: (treatment: number) => number;
  readonly se: (treatment: number) => number;
  readonly df: (treatment: number) => number;
}

interface Interval {
  readonly lower: number;
  readonly upper: number;
}

/**
 * Compares every treatment's distance from a target with the smallest distance of the others.
 *
 * The target is taken as one more mean without error. Tukey–Kramer intervals over the t + 1 means, each mean against the
 * target and all pairs, hold together with probability 1 − alpha; the range of |μ_i − target| − |μ_j − target| over them
 * then holds for all pairs too.
 *
 * @returns lines with the interval of distance − smallest distance of the others, made to include zero on the better
 *   side as Hsu's are; smaller is better
 *
 * Source: own work from Tukey–Kramer (C. Y. Kramer 1956, Biometrics 12, 307–310); conservative.
 * Checked by: test/core/analysis/comparisons/compare-to-target.test.ts
 */
export function compareToTarget(
  source: DifferenceSource,
  means: MeanSource,
  target: number,
  alpha: number
): BestComparison {
  const { present } = source;
  const known = new Map<number, number>();
  const critical = (df: number): number => {
    let value = known.get(df);
    if (value === undefined) {
      value = tukeyUpperQuantile(alpha, present.length + 1, df) / Math.SQRT2;
      known.set(df, value);
    }
    return value;
  };
  const away = new Map(
    present.map((i) => [i, around(means.estimate(i) - target, critical(means.df(i)) * means.se(i))])
  );
  const ranges = present.map((i) =>
    present
      .filter((j) => j !== i)
      .map((j) => {
        const gap = around(source.estimate(i, j), critical(source.df(i, j)) * source.se(i, j));
        return distanceGap(away.get(i)!, away.get(j)!, gap);
      })
  );
  const lines = present.map((treatment, at): BestLine => {
    // Distance − smallest distance of the others = largest of the gaps.
    const lower = Math.max(...ranges[at]!.map((range) => range.lower));
    const upper = Math.max(...ranges[at]!.map((range) => range.upper));
    return {
      treatment,
      lower: Math.min(0, lower) + 0,
      upper: Math.max(0, upper) + 0,
      mayBeBest: lower < 0,
      isBest: upper < 0
    };
  });
  return { lines, critical: Math.max(...known.values()) };
}

function around(estimate: number, half: number): Interval {
  return { lower: estimate - half, upper: estimate + half };
}

/** The range of |x| − |y| over x and y in their intervals with x − y in `gap`: its extremes lie at corners or zeros. */
function distanceGap(x: Interval, y: Interval, gap: Interval): Interval {
  let lower = Infinity;
  let upper = -Infinity;
  const look = (xi: number, yi: number) => {
    const slack = 1e-12 * (Math.abs(xi) + Math.abs(yi));
    const inside = (v: number, range: Interval) => v >= range.lower - slack && v <= range.upper + slack;
    if (!inside(xi, x) || !inside(yi, y) || !inside(xi - yi, gap)) return;
    lower = Math.min(lower, Math.abs(xi) - Math.abs(yi));
    upper = Math.max(upper, Math.abs(xi) - Math.abs(yi));
  };
  for (const xi of [x.lower, x.upper, 0]) {
    for (const yi of [y.lower, y.upper, 0]) look(xi, yi);
    for (const d of [gap.lower, gap.upper]) look(xi, xi - d);
  }
  for (const yi of [y.lower, y.upper, 0]) for (const d of [gap.lower, gap.upper]) look(yi + d, yi);
  return { lower, upper };
}
