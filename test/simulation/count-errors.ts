import { compareToControl } from '#lib/core/analysis/comparisons/compare-to-control.ts';
import type { DifferenceSource } from '#lib/core/analysis/comparisons/difference-source.ts';
import { fitFixed, solveFixed } from '#lib/core/analysis/fixed/fit-fixed.ts';
import type { PairLine } from '#lib/core/analysis/fit-result.ts';
import { buildRunTable } from '#lib/core/analysis/model/build-run-table.ts';
import { momentsOf } from '#lib/core/analysis/model/moments.ts';
import { partsOf } from '#lib/core/analysis/model/parts.ts';
import { differenceSource } from '#lib/core/analysis/model-comparisons.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import { fitRandom, solveRandom } from '#lib/core/analysis/random/fit-random.ts';
import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { drawReadings } from './simulate-campaign.ts';

/** How often, of all campaigns, something happened with sessions fixed or random; all treatments are truly equal. */
export interface ModelCount {
  /** Share of the unadjusted intervals of all pairs that cover 0. */
  covered: number;
  /** Campaigns in which a pair differs by Tukey, or from the control by Dunnett. */
  tukey: number;
  dunnett: number;
  /** Campaigns in which the F test of the treatments rejects (Kenward–Roger's with sessions random). */
  f: number;
}

export interface Counts {
  campaigns: number;
  fixed: ModelCount;
  random: ModelCount;
  /** Campaigns with the session variance estimated at zero. */
  boundary: number;
}

const none = (): ModelCount => ({ covered: 0, tukey: 0, dunnett: 0, f: 0 });

/**
 * Simulates campaigns of one design without treatment differences and counts the wrong answers at 5 %.
 *
 * @param between standard deviation of the sessions; that of the runs is 1
 */
export function countErrors(input: Observations, between: number, campaigns: number, random: SeededRandom): Counts {
  const effects = input.treatments.map(() => 0);
  const rows = [...input.rows.keys()];
  const { table } = buildRunTable(input, rows);
  const moments = momentsOf(table);
  const parts = partsOf(table);
  const counts: Counts = { campaigns, fixed: none(), random: none(), boundary: 0 };
  for (let c = 0; c < campaigns; c++) {
    const drawn = buildRunTable(drawReadings(input, effects, between, random), rows).table;
    const fixed = fitFixed(solveFixed(drawn, moments), parts, 0.05, null);
    const solved = solveRandom(drawn, moments);
    const fit = solved.ok ? fitRandom(solved.value, 0.05) : solved;
    if (!fit.ok) throw new Error(fit.error.tag);
    const { means, pairs, tests } = fit.value.kenwardRoger;
    if (fit.value.variance.boundary) counts.boundary++;
    const f = fixed.anova.sources.find(({ source }) => source === 'treatment')!.adjusted.p!;
    count(counts.fixed, fixed.pairs, differenceSource(means.length, fixed.means, fixed.pairs), f);
    count(counts.random, pairs, differenceSource(means.length, means, pairs), tests[0]!.p);
  }
  for (const model of [counts.fixed, counts.random]) {
    for (const key of ['covered', 'tukey', 'dunnett', 'f'] as const) model[key] /= campaigns;
  }
  return counts;
}

function count(into: ModelCount, pairs: readonly PairLine[], source: DifferenceSource, f: number): void {
  into.covered += pairs.filter((line) => line.lower! <= 0 && line.upper! >= 0).length / pairs.length;
  if (pairs.some((line) => line.pTukey! <= 0.05)) into.tukey++;
  if (differsFromControl(pairs, source)) into.dunnett++;
  if (f <= 0.05) into.f++;
}

/** Does any treatment differ from the control by Dunnett? Computed only where the cheap bounds of p leave it open. */
function differsFromControl(pairs: readonly PairLine[], source: DifferenceSource): boolean {
  const control = pairs.filter((line) => line.a === 0);
  const least = Math.min(...control.map((line) => line.p!));
  // Never below the unadjusted p, never above Bonferroni's: C. W. Dunnett (1955), JASA 50, 1096–1121.
  if (least > 0.05) return false;
  if (least * control.length <= 0.05) return true;
  const compared = compareToControl(source, 0, 0.05, 1, true);
  if (!compared.ok) throw new Error(compared.error.tag);
  return compared.value.lines.some((line) => line.pDunnett <= 0.05);
}
