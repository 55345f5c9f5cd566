import { tQuantile, tTwoSided } from '../../numerics/distributions/student-t.ts';
import { tukeyUpperQuantile } from '../../numerics/distributions/tukey.ts';
import type { FixedFit, Workings } from '../fit-result.ts';
import type { Moments } from '../model/moments.ts';
import { pairLines, summarisePairs } from '../model/pair-lines.ts';
import type { Parts } from '../model/parts.ts';
import { termOf, type RunTable } from '../model/run-table.ts';
import { fittedBy, sessionMeans } from '../model/run-vectors.ts';
import { anovaOf } from './anova.ts';
import { fixedMeans } from './fixed-means.ts';
import { prepareIntra, solveIntra, type IntraModel, type IntraSolution } from './intra-projection.ts';
import { workingsOf } from './workings.ts';

export interface FixedModel {
  model: IntraModel;
  solution: IntraSolution;
  /** Residual standard deviation; null without error degrees of freedom or without scatter. */
  sigma: number | null;
}

/** Residual sums of squares at the level of rounding of the readings count as no scatter. */
export function hasScatter(table: RunTable, errorSs: number): boolean {
  return errorSs > table.n * (16 * Number.EPSILON * table.magnitude) ** 2;
}

/** Solves the model with sessions fixed for the readings of a table without terms constant inside sessions. */
export function solveFixed(table: RunTable, moments: Moments): FixedModel {
  const model = prepareIntra(table, moments);
  const solution = solveIntra(model, table.y);
  const usable = model.errorDf > 0 && hasScatter(table, solution.errorSs);
  return { model, solution, sigma: usable ? Math.sqrt(solution.errorSs / model.errorDf) : null };
}

/**
 * Returns the whole intra-block result: analysis of variance, adjusted means, all pairs, workings, session offsets.
 *
 * @param balanced the parameters of the kept runs if they are balanced, for the workings
 *
 * Cost: p³ for p columns (treatments and levels of further factors), n·k for the runs.
 * Checked by: test/core/analysis/fixed/fit-fixed.test.ts, test/reference-run
 */
export function fitFixed(
  { model, solution, sigma }: FixedModel,
  parts: Parts,
  alpha: number,
  balanced: Workings['balanced']
): FixedFit {
  const { table, inverse, nulls, errorDf } = model;
  const { p } = table;
  const t = sigma === null ? null : tQuantile(1 - alpha / 2, errorDf);
  const pairs = pairLines({
    parts,
    alpha,
    estimable: (a, b) => nulls.every((v) => Math.abs(v[a]! - v[b]!) <= 1e-7),
    estimate: (a, b) => solution.beta[a]! - solution.beta[b]!,
    se:
      sigma === null
        ? null
        : (a, b) => sigma * Math.sqrt(Math.max(0, inverse[a * p + a]! + inverse[b * p + b]! - 2 * inverse[a * p + b]!)),
    df: () => errorDf
  });
  const present = parts.ofTreatment.reduce((count, part) => count + (part >= 0 ? 1 : 0), 0);
  return {
    n: table.n,
    rank: model.rank,
    grandMean: table.centre + table.y.reduce((s, v) => s + v, 0) / table.n,
    sigma,
    errorSs: solution.errorSs,
    errorDf,
    anova: anovaOf(model, solution),
    means: fixedMeans(model, solution, parts, sigma, t),
    pairs,
    pairSummary: summarisePairs(pairs),
    workings: workingsOf(table, solution, parts, balanced),
    sessionEffects: sessionEffects(table, solution, parts),
    critical: {
      t,
      tukey: sigma === null || present < 2 ? null : tukeyUpperQuantile(alpha, present, errorDf) / Math.SQRT2
    },
    covariate: covariateLine(model, solution, sigma)
  };
}

function sessionEffects(table: RunTable, solution: IntraSolution, parts: Parts): FixedFit['sessionEffects'] {
  const fit = fittedBy(table, solution.beta);
  const offset = sessionMeans(
    table,
    table.y.map((v, i) => v - fit[i]!)
  );
  const sum = new Float64Array(parts.count);
  const count = new Int32Array(parts.count);
  parts.ofSession.forEach((part, j) => {
    sum[part]! += offset[j]!;
    count[part]!++;
  });
  return Array.from(offset, (effect, j) => {
    const part = parts.ofSession[j]!;
    return { session: table.sessionIndex[j]!, effect: effect - sum[part]! / count[part]! };
  });
}

function covariateLine(model: IntraModel, solution: IntraSolution, sigma: number | null): FixedFit['covariate'] {
  const { table, inverse, factor, errorDf } = model;
  const term = termOf(table, 'covariate');
  if (term === undefined || term.scaling === null || factor.kept[term.start] === 0) return null;
  const c = term.start;
  const slope = solution.beta[c]! / term.scaling.scale;
  if (sigma === null) return { slope, se: null, t: null, df: errorDf, p: null };
  const se = (sigma * Math.sqrt(inverse[c * table.p + c]!)) / term.scaling.scale;
  return { slope, se, t: slope / se, df: errorDf, p: tTwoSided(slope / se, errorDf) };
}
