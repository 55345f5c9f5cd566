import { fail, ok } from '../../result.ts';
import type { FixedFit, RuinedAnalysis } from '../analysis-result.ts';
import { fitFixed, solveFixed } from '../fixed/fit-fixed.ts';
import { buildRunTable } from '../model/build-run-table.ts';
import { momentsOf } from '../model/moments.ts';
import { partsOf } from '../model/parts.ts';
import { withoutBetween } from '../model/run-table.ts';
import type { Observations } from '../observations.ts';
import type { Section } from '../reason.ts';
import type { SortedRows } from '../check-observations.ts';
import { ruinAssociation } from './ruin-association.ts';

/**
 * Returns what the ruined runs cost and what they would have said: how they fall on the treatments, whether that is more than
 * chance, and the analysis with their readings taken at face value beside the one without.
 *
 * @param without the analysis of the kept runs, if there is one
 *
 * Checked by: test/core/analysis/ruined/analyse-ruined.test.ts
 */
export function analyseRuined(
  observations: Observations,
  sorted: SortedRows,
  without: FixedFit | null
): Section<RuinedAnalysis> {
  const { rows, treatments, alpha, seed } = observations;
  if (sorted.ruined.length === 0) return fail({ tag: 'no-ruined-runs' });
  const byTreatment = treatments.map((_, treatment) => ({ treatment, ruined: 0, kept: 0 }));
  for (const r of sorted.ruined) byTreatment[rows[r]!.treatment]!.ruined++;
  for (const r of sorted.kept) byTreatment[rows[r]!.treatment]!.kept++;
  const withReading = sorted.ruined.filter((r) => rows[r]!.y !== null);
  const faceValue = atFaceValue(
    observations,
    [...sorted.kept, ...withReading].sort((a, b) => a - b),
    withReading
  );
  const taken = faceValue.ok ? faceValue.value : null;
  return ok({
    runs: sorted.ruined.length,
    withReading: withReading.length,
    byTreatment,
    association: ruinAssociation(byTreatment, seed),
    faceValue,
    changes: treatments.map((_, treatment) => {
      const kept = without?.means[treatment]?.estimate ?? null;
      const all = taken?.means[treatment]?.estimate ?? null;
      return { treatment, without: kept, with: all, change: kept === null || all === null ? null : kept - all };
    }),
    turned: without === null || taken === null ? [] : turnedPairs(without, taken, alpha)
  });
}

function atFaceValue(
  observations: Observations,
  rows: readonly number[],
  ruined: readonly number[]
): Section<FixedFit> {
  if (ruined.length === 0) return fail({ tag: 'no-ruined-readings' });
  const table = withoutBetween(buildRunTable(observations, rows).table);
  return ok(fitFixed(solveFixed(table, momentsOf(table)), partsOf(table), observations.alpha, null));
}

function turnedPairs(without: FixedFit, taken: FixedFit, alpha: number): RuinedAnalysis['turned'] {
  const other = new Map(taken.pairs.map((line) => [`${line.a} ${line.b}`, line.pTukey]));
  return without.pairs.flatMap(({ a, b, pTukey }) => {
    const second = other.get(`${a} ${b}`) ?? null;
    if (pTukey === null || second === null || pTukey <= alpha === second <= alpha) return [];
    return [{ a, b, without: pTukey <= alpha, with: second <= alpha }];
  });
}
