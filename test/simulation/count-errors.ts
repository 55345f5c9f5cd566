import { compareToControl } from '#lib/core/analysis/comparisons/compare-to-control.ts';
import type { ControlComparison } from '#lib/core/analysis/comparison-result.ts';
import type { MeanLine, PairLine } from '#lib/core/analysis/fit-result.ts';
import { fitFixed, solveFixed } from '#lib/core/analysis/fixed/fit-fixed.ts';
import { buildRunTable } from '#lib/core/analysis/model/build-run-table.ts';
import { momentsOf } from '#lib/core/analysis/model/moments.ts';
import { partsOf } from '#lib/core/analysis/model/parts.ts';
import { differenceSource } from '#lib/core/analysis/model-comparisons.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import { fitRandom, solveRandom } from '#lib/core/analysis/random/fit-random.ts';
import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { Share } from './share.ts';
import { drawReadings } from './simulate-campaign.ts';

export const QUANTITIES = ['covered', 'tukey', 'dunnett', 'f'] as const;

/**
 * How often something happens under one model, all treatments being equal: the unadjusted intervals of all pairs cover 0; a
 * pair differs by Tukey; a treatment differs from the control by Dunnett; the F test of the treatments rejects.
 */
export type ModelShares = Record<(typeof QUANTITIES)[number], Share>;

export interface Shares {
  fixed: ModelShares;
  /** By Kenward & Roger. */
  random: ModelShares;
  /** Campaigns with the session variance estimated at zero. */
  boundary: number;
}

const ALPHA = 0.05;
const none = (): ModelShares => ({ covered: new Share(), tukey: new Share(), dunnett: new Share(), f: new Share() });

/**
 * Simulates campaigns of one design without treatment differences and counts the wrong answers at 5 %.
 *
 * @param between standard deviation of the sessions; that of the runs is 1
 */
export function countErrors(input: Observations, between: number, campaigns: number, random: SeededRandom): Shares {
  const effects = input.treatments.map(() => 0);
  const rows = [...input.rows.keys()];
  const { table } = buildRunTable(input, rows);
  const moments = momentsOf(table);
  const parts = partsOf(table);
  const shares: Shares = { fixed: none(), random: none(), boundary: 0 };
  let critical: number | null = null;
  for (let c = 0; c < campaigns; c++) {
    const drawn = buildRunTable(drawReadings(input, effects, between, random), rows).table;
    const fixed = fitFixed(solveFixed(drawn, moments), parts, ALPHA, null);
    const solved = solveRandom(drawn, moments);
    const fit = solved.ok ? fitRandom(solved.value, ALPHA) : solved;
    if (!fit.ok) throw new Error(fit.error.tag);
    const { means, pairs, tests } = fit.value.kenwardRoger;
    if (fit.value.variance.boundary) shares.boundary += 1 / campaigns;
    // The F test with sessions fixed is exact: the control of all other shares.
    const f = fixed.anova.sources.find(({ source }) => source === 'treatment')!.adjusted.p!;
    const exact = f <= ALPHA ? 1 : 0;
    // With sessions fixed neither correlations nor degrees of freedom depend on the readings: one critical value serves all.
    critical ??= againstControl(fixed.means, fixed.pairs, false).critical;
    const furthest = Math.max(...controlPairs(fixed.pairs).map(({ t }) => Math.abs(t!)));
    count(shares.fixed, fixed.pairs, furthest > critical, f, exact);
    count(shares.random, pairs, differsFromControl(means, pairs), tests[0]!.p, exact);
  }
  return shares;
}

function count(into: ModelShares, pairs: readonly PairLine[], dunnett: boolean, f: number, exact: number): void {
  into.covered.add(pairs.filter((line) => line.lower! <= 0 && line.upper! >= 0).length / pairs.length, exact);
  into.tukey.add(pairs.some((line) => line.pTukey! <= ALPHA) ? 1 : 0, exact);
  into.dunnett.add(dunnett ? 1 : 0, exact);
  into.f.add(f <= ALPHA ? 1 : 0, exact);
}

/** Treatment 0 is the control. */
const controlPairs = (pairs: readonly PairLine[]): PairLine[] => pairs.filter((line) => line.a === 0);

function againstControl(means: readonly MeanLine[], pairs: readonly PairLine[], quick: boolean): ControlComparison {
  const compared = compareToControl(differenceSource(means.length, means, pairs), 0, ALPHA, 1, quick);
  if (!compared.ok) throw new Error(compared.error.tag);
  return compared.value;
}

/** Does any treatment differ from the control by Dunnett? Computed only where the cheap bounds of p leave it open. */
function differsFromControl(means: readonly MeanLine[], pairs: readonly PairLine[]): boolean {
  const control = controlPairs(pairs);
  const least = Math.min(...control.map((line) => line.p!));
  // Never below the unadjusted p, never above Bonferroni's.
  if (least > ALPHA) return false;
  if (least * control.length <= ALPHA) return true;
  return againstControl(means, pairs, true).lines.some((line) => line.pDunnett <= ALPHA);
}
