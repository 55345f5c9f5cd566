import { largestT } from '../../numerics/distributions/dunnett.ts';
import { fail, ok } from '../../result.ts';
import type { BestComparison, BestLine } from '../comparison-result.ts';
import type { Direction } from '../observations.ts';
import type { Section } from '../reason.ts';
import { criticalByDf } from './compare-to-control.ts';
import { compareToTarget, type MeanSource } from './compare-to-target.ts';
import { differenceCorrelation, partsOf, type DifferenceSource } from './difference-source.ts';

/**
 * Compares every treatment with the best of the others: Hsu's constrained simultaneous intervals for
 * treatment − best of the others.
 *
 * With larger better and d_i the one-sided critical value of Dunnett's comparison of all others with treatment i,
 * D⁺_i = (min_{j≠i} μ̂_i − μ̂_j + d_i·se_ij)⁺, G = {i : D⁺_i > 0}, and D⁻_i = 0 if G = {i}, else
 * min_{j∈G, j≠i} −(μ̂_i − μ̂_j − d_j·se_ij)⁻. Smaller better: the same of the negative readings, turned back. Nearest to
 * a target: see compareToTarget.
 *
 * @param means adjusted means and their errors, for a target only
 * @returns intervals in the unit of the reading as treatment − best of the others (for a target: distance from it −
 *   smallest distance of the others, where smaller is better); `critical` is the largest critical value used
 *
 * Cost: one Dunnett distribution for each treatment.
 * Source: J. C. Hsu (1984), Annals of Statistics 12, 1136–1144; unequal variances and correlations as in J. C. Hsu
 * (1996), Multiple Comparisons: Theory and Methods, section 7.3.
 * Checked by: test/core/analysis/comparisons/compare-to-best.test.ts
 */
export function compareToBest(
  source: DifferenceSource,
  direction: Direction,
  alpha: number,
  means?: MeanSource
): Section<BestComparison> {
  const { present } = source;
  if (present.length === 0) return fail({ tag: 'no-kept-readings' });
  if (present.length === 1) return fail({ tag: 'one-treatment', treatment: present[0]! });
  const parts = partsOf(source);
  if (parts.length > 1) return fail({ tag: 'disconnected', parts: parts.length });
  for (const i of present)
    for (const j of present) if (i < j && !(source.se(i, j) > 0)) return fail({ tag: 'no-scatter' });
  if (typeof direction === 'object') {
    if (!means) throw new Error('compareToBest: a target needs the means themselves');
    return ok(compareToTarget(source, means, direction.target, alpha));
  }
  return ok(constrained(source, direction === 'higher' ? 1 : -1, alpha));
}

function constrained(source: DifferenceSource, sign: 1 | -1, alpha: number): BestComparison {
  const { present } = source;
  const gap = (i: number, j: number) => sign * source.estimate(i, j);
  const allowances = new Map(present.map((i) => [i, allowance(source, i, alpha)]));
  const most = new Map<number, number>();
  for (const i of present) {
    const reach = others(present, i).map((j) => gap(i, j) + allowances.get(i)!(j).half);
    most.set(i, Math.max(0, Math.min(...reach)));
  }
  const leaders = present.filter((i) => most.get(i)! > 0);
  let critical = 0;
  const lines = present.map((i): BestLine => {
    const rivals = others(leaders, i).map((j) => {
      const { half, multiple } = allowances.get(j)!(i);
      critical = Math.max(critical, multiple);
      return Math.min(0, gap(i, j) - half);
    });
    const least = rivals.length === 0 ? 0 : Math.min(...rivals);
    const [lower, upper] = sign > 0 ? [least, most.get(i)!] : [-most.get(i)!, -least];
    // Adding zero turns −0 into 0.
    return {
      treatment: i,
      lower: lower + 0,
      upper: upper + 0,
      mayBeBest: most.get(i)! > 0,
      isBest: leaders.length === 1 && leaders[0] === i
    };
  });
  return { lines, critical };
}

/** d_i·se_ij for every j, with treatment i in the control's place. */
function allowance(source: DifferenceSource, i: number, alpha: number) {
  const rest = others(source.present, i);
  const largest = largestT(differenceCorrelation(source, i, rest), rest.length, 'one', 'expand');
  const critical = criticalByDf(largest, alpha);
  return (j: number) => {
    const multiple = critical(source.df(i, j));
    return { multiple, half: multiple * source.se(i, j) };
  };
}

function others(treatments: readonly number[], i: number): number[] {
  return treatments.filter((j) => j !== i);
}
