import { chiSquaredUpper } from '../../numerics/distributions/chi-squared.ts';
import { tTwoSided } from '../../numerics/distributions/student-t.ts';
import type { FactorTest, RandomFit, VarianceComponents } from '../fit-result.ts';
import type { Moments } from '../model/moments.ts';
import type { Parts } from '../model/parts.ts';
import { termOf, type RunTable, type Term, type TermName } from '../model/run-table.ts';
import { hasScatter } from '../fixed/fit-fixed.ts';
import { fail, ok } from '../../result.ts';
import type { Section } from '../reason.ts';
import { kenwardRogerTest, satterthwaiteTest } from './factor-tests.ts';
import { kenwardRogerCovariance, singleDf } from './kenward-roger.ts';
import { maximiseReml, type RemlMaximum } from './maximise-reml.ts';
import { dfThrough, randomMeans } from './random-means.ts';
import { remlProblem, type RemlProblem } from './reml-problem.ts';
import { varianceInformation, type VarianceInformation } from './variance-information.ts';

export interface RandomModel {
  problem: RemlProblem;
  maximum: RemlMaximum;
  info: VarianceInformation;
  /** Coefficients of the kept columns, offset put back. */
  beta: Float64Array;
}

/**
 * Solves the model with sessions random by restricted maximum likelihood.
 *
 * @returns the model, or why there is none: no error degrees of freedom inside sessions (the two variances cannot be told
 * apart), none between them, no scatter, or no maximum found
 */
export function solveRandom(table: RunTable, moments: Moments): Section<RandomModel> {
  const problem = remlProblem(table, moments);
  if (table.b < 2) return fail({ tag: 'one-session' });
  if (problem.errorDf < 1) {
    return fail({ tag: 'no-error-degrees-of-freedom', runs: table.n, parameters: table.n - problem.errorDf });
  }
  if (!hasScatter(table, problem.errorSs)) return fail({ tag: 'no-scatter' });
  // Degrees of freedom of the sessions after the treatments: without any, their variance leaves no trace.
  if (table.n - problem.q - problem.errorDf < 1) {
    return fail({ tag: 'confounded', factor: 'session', with: 'treatment' });
  }
  const maximum = maximiseReml(problem);
  if (!maximum.converged) return fail({ tag: 'did-not-converge', iterations: maximum.evaluations });
  const info = varianceInformation(problem, maximum.point);
  const beta = Float64Array.from(problem.columns, (c, i) => problem.offset[c]! + maximum.point.beta[i]!);
  dropped(problem, beta);
  return ok({ problem, maximum, info, beta });
}

/** The offset may have coefficients where a column was left out of X; move them onto the kept columns. */
function dropped(problem: RemlProblem, beta: Float64Array): void {
  const kept = new Set(problem.columns);
  let next = 0;
  for (let c = 0; c < problem.table.p; c++) {
    if (kept.has(c)) continue;
    // nulls[next] is 1 at c: subtracting offset[c] times it leaves the fit unchanged and c at zero.
    const v = problem.nulls[next++]!;
    const f = problem.offset[c]!;
    if (f !== 0) problem.columns.forEach((k, i) => (beta[i]! -= f * v[k]!));
  }
}

/**
 * Returns the whole result with sessions random: variance components, means, all pairs and F tests by Kenward & Roger and
 * by Satterthwaite, predicted session offsets.
 *
 * Checked by: test/reference-run (lme4, pbkrtest, lmerTest)
 */
export function fitRandom(model: RandomModel, alpha: number): Section<RandomFit> {
  const { problem, maximum, info, beta } = model;
  const { table, n, q } = problem;
  const { point, boundary } = maximum;
  const { gamma, inverse } = point;
  const W = info.expected;
  if (W === null) return fail({ tag: 'no-shared-session' });
  const whole = wholePart(problem);
  const adjusted = kenwardRogerCovariance(info, W);
  const terms = testable(table);
  const tests = (test: (term: Term) => FactorTest | null): FactorTest[] => terms.flatMap((term) => test(term) ?? []);
  // On the boundary the derivative by the session's standard deviation vanishes: only σ² is left to be uncertain.
  const fixedDf = boundary ? n - q : null;
  const satterthwaiteDf = fixedDf === null ? dfThrough(info.observed ?? W, gamma, n - q) : (): number => fixedDf;
  return ok({
    n,
    variance: components(maximum),
    kenwardRoger: {
      ...randomMeans(info, beta, { covariance: adjusted, df: dfThrough(W, gamma, n - q) }, whole, alpha),
      tests: tests((term) => kenwardRogerTest(info, term, beta, adjusted, W))
    },
    satterthwaite: {
      ...randomMeans(info, beta, { covariance: inverse, df: satterthwaiteDf }, whole, alpha),
      tests: tests((term) => satterthwaiteTest(info, term, beta, info.observed ?? W, fixedDf))
    },
    sessions: predictedSessions(info),
    factors: terms.slice(1).map((term) => term.name),
    covariate: quantityLine(model, 'covariate', adjusted)
  });
}

const testable = (table: RunTable): Term[] => [table.terms[0]!, ...table.terms.slice(1)];

function wholePart({ table, moments }: RemlProblem): Parts {
  const t = table.terms[0]!.size;
  return {
    count: 1,
    ofTreatment: Int32Array.from({ length: t }, (_, i) => (moments.diagonal[i]! > 0 ? 0 : -1)),
    ofSession: new Int32Array(table.b)
  };
}

function components({ point, zero, boundary, unconstrained, evaluations, converged }: RemlMaximum): VarianceComponents {
  const { gamma, sigma2 } = point;
  const statistic = Math.max(0, 2 * (point.logLik - zero.logLik));
  return {
    ratio: gamma,
    session: gamma * sigma2,
    run: sigma2,
    intraclass: gamma / (1 + gamma),
    boundary,
    unconstrained: unconstrained === null ? null : { ratio: unconstrained.gamma, run: unconstrained.sigma2 },
    scoreAtZero: zero.score,
    logLik: point.logLik,
    logLikZero: zero.logLik,
    test: { statistic, p: statistic === 0 ? 1 : chiSquaredUpper(statistic, 1) / 2 },
    iterations: evaluations,
    converged
  };
}

/** Best linear unbiased predictions γ·s_j/(1 + γk_j), s_j the session sum of the residuals; spread given the means. */
function predictedSessions({ problem, point, sessionSums }: VarianceInformation): RandomFit['sessions'] {
  const { table, moments, sizes } = problem;
  const { gamma, sigma2 } = point;
  return Array.from(sessionSums, (sum, j) => {
    const k = sizes[moments.sizeOf[j]!]!.k;
    const shrink = gamma / (1 + gamma * k);
    return { session: table.sessionIndex[j]!, estimate: shrink * sum, sd: Math.sqrt(sigma2 * shrink) };
  });
}

/** Slope of a quantity with Kenward & Roger's error; null where the model does not hold it. */
export function quantityLine(model: RandomModel, name: TermName, adjusted: Float64Array): RandomFit['covariate'] {
  const { problem, info, beta } = model;
  const { table, q, columns } = problem;
  const term = termOf(table, name);
  const at = term === undefined ? -1 : columns.indexOf(term.start);
  if (at < 0 || !term?.scaling || info.expected === null) return null;
  const d = at * q + at;
  const df = singleDf(info.expected, info.point.gamma, info.point.inverse[d]!, info.G[d]!);
  const slope = beta[at]! / term.scaling.scale;
  const se = Math.sqrt(info.point.sigma2 * adjusted[d]!) / term.scaling.scale;
  return { slope, se, df, t: slope / se, p: tTwoSided(slope / se, df) };
}
