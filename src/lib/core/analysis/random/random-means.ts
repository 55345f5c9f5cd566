import { multiplyVector, quadraticForm, dot } from '../../numerics/symmetric-products.ts';
import { estimable } from '../fixed/intra-projection.ts';
import type { MeanLine, RandomMeans } from '../fit-result.ts';
import { criticalValues } from '../model/critical-values.ts';
import { equalWeights } from '../model/equal-weights.ts';
import { pairLines, summarisePairs } from '../model/pair-lines.ts';
import type { Parts } from '../model/parts.ts';
import { plainMeans } from '../model/plain-means.ts';
import { singleDf } from './kenward-roger.ts';
import type { Pair, VarianceInformation } from './variance-information.ts';

/** What tells the two small-sample methods apart. */
export interface SmallSample {
  /** Covariance of the coefficients / σ², q×q. */
  covariance: Float64Array;
  /** Degrees of freedom from lᵀH⁻¹l and lᵀGl. */
  df: (v: number, vG: number) => number;
}

/** Degrees of freedom through an inverse information matrix; `fallback` where that is missing. */
export function dfThrough(W: Pair | null, gamma: number, fallback: number): SmallSample['df'] {
  return W === null ? () => fallback : (v, vG) => singleDf(W, gamma, v, vG);
}

/**
 * Returns adjusted means (equal weights over the levels of further factors, covariate at its mean) and all pairs with sessions
 * random, with the given covariance and degrees of freedom.
 *
 * @param beta coefficients of the kept columns, offset put back
 * @param whole one part holding every treatment with readings (with sessions random all pairs can be compared)
 */
export function randomMeans(
  info: VarianceInformation,
  beta: Float64Array,
  method: SmallSample,
  whole: Parts,
  alpha: number
): Omit<RandomMeans, 'tests'> {
  const { problem, point, G } = info;
  const { table, q, columns, nulls } = problem;
  const { inverse, sigma2 } = point;
  const { covariance } = method;
  const place = new Int32Array(table.p).fill(-1);
  columns.forEach((c, i) => (place[c] = i));
  const weights = equalWeights(table);
  const g = Float64Array.from(columns, (c) => weights[c]!);
  const forms = [covariance, inverse, G].map((A) => ({ A, cross: multiplyVector(A, g), own: quadraticForm(A, g) }));
  const of = (form: number, at: number): number => {
    const { A, cross, own } = forms[form]!;
    return A[at * q + at]! + 2 * cross[at]! + own;
  };
  const common = table.centre + dot(g, beta);
  const lines = plainMeans(table).map(({ treatment, n, mean }): MeanLine => {
    const none = { treatment, n, plain: mean, estimate: null, se: null, df: null, lower: null, upper: null };
    const at = place[treatment]!;
    if (at < 0) return { ...none, scope: 'none', part: null };
    const l = weights.slice();
    l[treatment]! += 1;
    if (!estimable(nulls, l)) return { ...none, scope: 'all', part: 0 };
    const se = Math.sqrt(sigma2 * of(0, at));
    const df = method.df(of(1, at), of(2, at));
    const usable = se >= 0 && se < Infinity && df > 0 && df < Infinity;
    const estimate = common + beta[at]!;
    return { ...none, estimate, se: usable ? se : null, df: usable ? df : null, scope: 'all', part: 0 };
  });
  const dfs = lines.flatMap((line) => (line.df === null ? [] : [line.df]));
  const critical = criticalValues(alpha, dfs.length, Math.min(...dfs), Math.max(...dfs), dfs.length);
  for (const line of lines) {
    if (line.estimate === null || line.se === null || line.df === null) continue;
    const half = critical.t(line.df) * line.se;
    line.lower = line.estimate - half;
    line.upper = line.estimate + half;
  }
  const between = (A: Float64Array, a: number, b: number): number => {
    const i = place[a]!;
    const j = place[b]!;
    return A[i * q + i]! + A[j * q + j]! - 2 * A[i * q + j]!;
  };
  const pairs = pairLines({
    parts: whole,
    alpha,
    estimable: (a, b) => nulls.every((v) => Math.abs(v[a]! - v[b]!) <= 1e-7),
    estimate: (a, b) => beta[place[a]!]! - beta[place[b]!]!,
    se: (a, b) => Math.sqrt(sigma2 * between(covariance, a, b)),
    df: (a, b) => method.df(between(inverse, a, b), between(G, a, b))
  });
  return { means: lines, pairs, pairSummary: summarisePairs(pairs) };
}
