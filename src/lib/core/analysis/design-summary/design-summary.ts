import type { DesignCounts, DesignSummary } from '../analysis-result.ts';
import { buildRunTable } from '../model/build-run-table.ts';
import { momentsOf } from '../model/moments.ts';
import { withoutBetween, type RunTable } from '../model/run-table.ts';
import type { Observations } from '../observations.ts';
import { designCounts } from './design-counts.ts';
import { efficiencyOf } from './efficiency.ts';

const TREATMENTS_ONLY = { slot: false, machine: false, shift: false };

/**
 * Returns what was planned (every row handed in) beside what counts (the kept rows): replication, meetings, parts, efficiency,
 * and the pairs that were lost.
 *
 * @param kept positions of the kept rows
 * @param model the kept runs with all terms of the model
 */
export function designSummary(observations: Observations, kept: readonly number[], model: RunTable): DesignSummary {
  const all = observations.rows.map((_, r) => r);
  const count = (rows: readonly number[]): DesignCounts =>
    designCounts(buildRunTable(observations, rows, TREATMENTS_ONLY).table);
  const planned = count(all);
  const keptCounts = kept.length === all.length ? planned : count(kept);
  const inside = withoutBetween(model);
  return {
    planned,
    kept: keptCounts,
    keptAllFactors: inside.terms.length > 1 ? efficiencyOf(inside, momentsOf(inside)) : null,
    lostPairs: lostPairs(planned, keptCounts)
  };
}

/** Pairs in one part as planned that are in different parts, or without readings, among the kept runs. */
function lostPairs(planned: DesignCounts, kept: DesignCounts): DesignSummary['lostPairs'] {
  const part = new Map<number, number>();
  kept.parts.forEach(({ treatments }, i) => treatments.forEach((treatment) => part.set(treatment, i)));
  return planned.parts.flatMap(({ treatments }) =>
    treatments.flatMap((a, i) =>
      treatments.slice(i + 1).flatMap((b) => {
        const together = part.has(a) && part.get(a) === part.get(b);
        return together ? [] : [{ a, b }];
      })
    )
  );
}
