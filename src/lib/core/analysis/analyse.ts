import { fail, ok, type Result } from '../result.ts';
import type { Analysis, Answer, Comparisons, FixedFit, RandomFit, RankAnalysis } from './analysis-result.ts';
import { collectWarnings } from './answer/collect-warnings.ts';
import { findAnswer } from './answer/find-answer.ts';
import { rankAnswer } from './answer/rank-answer.ts';
import { verdictsOfFit, verdictsOfLimits, type Verdicts } from './answer/verdicts.ts';
import { fitCensored } from './censored/fit-censored.ts';
import { checkObservations, type SortedRows } from './check-observations.ts';
import { designSummary } from './design-summary/design-summary.ts';
import { diagnose } from './diagnostics/diagnose.ts';
import { fitFixed, solveFixed, type FixedModel } from './fixed/fit-fixed.ts';
import { fixedContrast } from './fixed/fixed-contrast.ts';
import { compareTreatments } from './model-comparisons.ts';
import { buildRunTable } from './model/build-run-table.ts';
import { momentsOf } from './model/moments.ts';
import { partsOf, type Parts } from './model/parts.ts';
import { withoutBetween, type RunTable } from './model/run-table.ts';
import type { Observations } from './observations.ts';
import { fitRandom, solveRandom, type RandomModel } from './random/fit-random.ts';
import { randomContrast } from './random/random-contrast.ts';
import { durbinTest } from './ranks/durbin-test.ts';
import { friedmanTest } from './ranks/friedman-test.ts';
import { skillingsMackTest } from './ranks/skillings-mack-test.ts';
import type { InputFault, Reason, Section } from './reason.ts';
import { analyseRuined } from './ruined/analyse-ruined.ts';

/** Name and version of the computation, stored with every result; a change of any number is a new version. */
export const ALGORITHM = 'evenload-analysis/2';

export type AnalysisStage =
  'design' | 'fixed' | 'random' | 'comparisons' | 'diagnostics' | 'ruined' | 'limits' | 'ranks' | 'answer';

/**
 * Returns the whole analysis of a campaign's readings: each part is there or says why not; nothing in it is ever NaN.
 *
 * @param onStage called before each stage, so that a caller can show how far it is
 * @returns the analysis, or what makes the input unusable
 *
 * Checked by: test/core/analysis/analyse.test.ts, test/reference-run
 */
export function analyse(
  observations: Observations,
  onStage: (stage: AnalysisStage) => void = () => {}
): Result<Analysis, InputFault> {
  const checked = checkObservations(observations);
  if (!checked.ok) return checked;
  const sorted = checked.value;
  const { alpha, primary, rows } = observations;

  onStage('design');
  const { table, leftOut } = buildRunTable(observations, sorted.kept);
  const design = designSummary(observations, sorted.kept, table);

  onStage('fixed');
  const inside = withoutBetween(table);
  const parts = partsOf(inside);
  const impossible = whyNoFit(table, parts, design.kept.replication);
  const fixedModel = impossible === null ? solveFixed(inside, momentsOf(inside)) : null;
  const { balanced, lambda, treatments, replication, sessionSize } = design.kept;
  const handbook =
    balanced && lambda !== null ? { t: treatments, k: sessionSize[0]!, r: Math.max(...replication), lambda } : null;
  const fixed: Section<FixedFit> =
    fixedModel === null ? fail(impossible!) : ok(fitFixed(fixedModel, parts, alpha, handbook));

  onStage('random');
  const randomModel: Section<RandomModel> =
    impossible === null ? solveRandom(table, momentsOf(table)) : fail(impossible);
  const random: Section<RandomFit> = randomModel.ok ? fitRandom(randomModel.value, alpha) : randomModel;

  onStage('comparisons');
  const comparisons = {
    fixed: fixedComparisons(observations, fixed, fixedModel, parts),
    random: randomComparisons(observations, random, randomModel)
  };

  onStage('diagnostics');
  const diagnostics =
    fixedModel === null ? fail(impossible!) : ok(diagnose(observations, sorted.kept, fixedModel, parts));
  onStage('ruined');
  const ruined = analyseRuined(observations, sorted, fixed.ok ? fixed.value : null);
  onStage('limits');
  const censored = impossible === null ? fitCensored(observations, sorted.kept) : fail(impossible);
  onStage('ranks');
  const ranks = impossible === null ? ok(rankTests(observations, sorted.kept)) : fail(impossible);
  onStage('answer');
  const limited = sorted.kept.filter((r) => rows[r]!.limit !== 'none').length;
  const partial = {
    algorithm: ALGORITHM,
    primary,
    alpha,
    counts: countRows(sorted, limited, rows.length),
    design,
    fixed,
    random,
    comparisons,
    diagnostics,
    ruined,
    censored,
    ranks
  };
  const answer = answerOf(partial, observations);
  return ok({ ...partial, answer, warnings: collectWarnings({ ...partial, answer }, observations, leftOut) });
}

const countRows = (sorted: SortedRows, limited: number, runs: number): Analysis['counts'] => ({
  runs,
  kept: sorted.kept.length,
  ruined: sorted.ruined.length,
  unread: sorted.unread.length,
  limited
});

/** Why no model can be fitted at all, or null. */
function whyNoFit(table: RunTable, parts: Parts, replication: readonly number[]): Reason | null {
  const present = replication.flatMap((r, i) => (r > 0 ? [i] : []));
  if (present.length === 1) return { tag: 'one-treatment', treatment: present[0]! };
  if (parts.count === present.length) return table.b === 1 ? { tag: 'one-session' } : { tag: 'no-shared-session' };
  return null;
}

function rankTests({ rows, treatments }: Observations, kept: readonly number[]): RankAnalysis {
  const ranked = kept.map((r) => ({ treatment: rows[r]!.treatment, session: rows[r]!.session, y: rows[r]!.y! }));
  const t = treatments.length;
  return {
    durbin: durbinTest(ranked, t),
    skillingsMack: skillingsMackTest(ranked, t),
    friedman: friedmanTest(ranked, t)
  };
}

function fixedComparisons(
  observations: Observations,
  fixed: Section<FixedFit>,
  model: FixedModel | null,
  parts: Parts
): Section<Comparisons> {
  if (!fixed.ok) return fixed;
  const { sigma, errorDf, n, rank, means, pairs } = fixed.value;
  if (model === null || sigma === null) {
    return fail(
      errorDf < 1 ? { tag: 'no-error-degrees-of-freedom', runs: n, parameters: rank } : { tag: 'no-scatter' }
    );
  }
  const secondary = observations.primary !== 'fixed';
  return ok(compareTreatments(observations, means, pairs, fixedContrast(model, parts), secondary));
}

function randomComparisons(
  observations: Observations,
  random: Section<RandomFit>,
  model: Section<RandomModel>
): Section<Comparisons> {
  if (!random.ok) return random;
  if (!model.ok) return model;
  const { means, pairs } = random.value.kenwardRoger;
  const secondary = observations.primary !== 'random';
  return ok(compareTreatments(observations, means, pairs, randomContrast(model.value), secondary));
}

type Partial = Omit<Analysis, 'answer' | 'warnings'>;

/** The answer of the primary model; of the other where that one could not be fitted; with limits, of the model for limits. */
function answerOf(analysis: Partial, observations: Observations): Answer {
  const { fixed, random, censored, comparisons, ranks, primary, alpha, counts } = analysis;
  const { direction } = observations;
  if (observations.kind === 'rank' && ranks.ok) return rankAnswer(ranks.value, direction, alpha);
  if (counts.limited > 0 && censored.ok) {
    return findAnswer(verdictsOfLimits(censored.value, alpha), direction, alpha, null);
  }
  if (primary === 'random' && random.ok) {
    const { means, pairs, tests } = random.value.kenwardRoger;
    const overall = tests.find((test) => test.source === 'treatment')?.p ?? null;
    return withBest(verdictsOfFit('random', means, pairs, overall), comparisons.random, direction, alpha);
  }
  if (!fixed.ok) return { tag: 'none', reason: fixed.error };
  const { means, pairs, anova, sigma } = fixed.value;
  if (sigma === null) {
    const reason = comparisons.fixed.ok ? ({ tag: 'no-scatter' } as const) : comparisons.fixed.error;
    return { tag: 'means-only', order: orderOf(means, direction), reason };
  }
  const overall = anova.sources.find((line) => line.source === 'treatment')?.adjusted.p ?? null;
  return withBest(verdictsOfFit('fixed', means, pairs, overall), comparisons.fixed, direction, alpha);
}

function withBest(
  verdicts: Verdicts,
  comparisons: Section<Comparisons>,
  direction: Observations['direction'],
  alpha: number
): Answer {
  const best = comparisons.ok && comparisons.value.best.ok ? comparisons.value.best.value : null;
  return findAnswer(verdicts, direction, alpha, best);
}

function orderOf(means: FixedFit['means'], direction: Observations['direction']): number[] {
  const cost = (m: number): number =>
    direction === 'lower' ? m : direction === 'higher' ? -m : Math.abs(m - direction.target);
  return means
    .flatMap(({ treatment, estimate }) => (estimate === null ? [] : [{ treatment, estimate }]))
    .sort((a, b) => cost(a.estimate) - cost(b.estimate))
    .map(({ treatment }) => treatment);
}
