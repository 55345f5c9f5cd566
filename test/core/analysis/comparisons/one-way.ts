import type { DifferenceSource } from '#lib/core/analysis/comparisons/difference-source.ts';
import type { MeanSource } from '#lib/core/analysis/comparisons/compare-to-target.ts';

/** Differences of independent means with a common error: the simplest fit there is. */
export function oneWay(
  means: readonly number[],
  sigma: number,
  replication: readonly number[],
  df: number
): DifferenceSource & { means: MeanSource } {
  const se = (a: number, b: number) => sigma * Math.sqrt(1 / replication[a]! + 1 / replication[b]!);
  return {
    treatments: means.length,
    present: means.map((_, i) => i),
    estimable: () => true,
    estimate: (a, b) => means[a]! - means[b]!,
    se,
    df: () => df,
    means: { estimate: (i) => means[i]!, se: (i) => sigma / Math.sqrt(replication[i]!), df: () => df }
  };
}
