import { dot, multiplyVector, quadraticForm } from '../../numerics/symmetric-products.ts';
import type { MeanLine } from '../fit-result.ts';
import { equalWeights } from '../model/equal-weights.ts';
import type { Parts } from '../model/parts.ts';
import { plainMeans } from '../model/plain-means.ts';
import { sessionMeans } from '../model/run-vectors.ts';
import { estimable, type IntraModel, type IntraSolution } from './intra-projection.ts';

/**
 * Returns the adjusted means: the prediction for treatment i averaged with equal weight over the sessions (of its part) and
 * over the levels of every further factor, a covariate at its mean.
 *
 *     m_i = (1/b)Σ_j ȳ_j + l_iᵀβ̂,   l_i = e_i + g − (1/b)Σ_j x̄_j,   Var m_i = σ²(l_iᵀC⁻l_i + (1/b²)Σ_j 1/k_j)
 *
 * with g the equal weights of the further factors' levels. Session means and β̂ are uncorrelated.
 *
 * @param sigma standard deviation inside sessions, null without error degrees of freedom
 * @param t critical value of the interval, null likewise
 *
 * Checked by: test/core/analysis/fixed/fit-fixed.test.ts, test/reference-run
 */
export function fixedMeans(
  model: IntraModel,
  solution: IntraSolution,
  parts: Parts,
  sigma: number | null,
  t: number | null
): MeanLine[] {
  const { table, inverse, nulls, errorDf } = model;
  const plain = plainMeans(table);
  const response = sessionMeans(table, table.y);
  const perPart = Array.from({ length: parts.count }, (_, part) => {
    const shift = equalWeights(table);
    const sessions = [...parts.ofSession.keys()].filter((j) => parts.ofSession[j] === part);
    let mean = 0;
    let variance = 0;
    for (const j of sessions) {
      const k = table.start[j + 1]! - table.start[j]!;
      mean += response[j]! / sessions.length;
      variance += 1 / (k * sessions.length ** 2);
      for (let e = table.start[j]! * table.width; e < table.start[j + 1]! * table.width; e++) {
        shift[table.column[e]!]! -= table.value[e]! / (k * sessions.length);
      }
    }
    return {
      mean: mean + dot(shift, solution.beta),
      cross: multiplyVector(inverse, shift),
      variance: variance + quadraticForm(inverse, shift),
      shift
    };
  });
  return plain.map(({ treatment, n, mean }): MeanLine => {
    const part = parts.ofTreatment[treatment]!;
    const none = { treatment, n, plain: mean, estimate: null, se: null, df: null, lower: null, upper: null };
    if (part < 0) return { ...none, scope: 'none', part: null };
    const scope = parts.count === 1 ? 'all' : 'part';
    const common = perPart[part]!;
    const l = common.shift.slice();
    l[treatment]! += 1;
    if (!estimable(nulls, l)) return { ...none, scope, part };
    const estimate = table.centre + (common.mean + solution.beta[treatment]!);
    if (sigma === null || t === null) return { ...none, estimate, scope, part };
    const own = inverse[treatment * table.p + treatment]!;
    const se = sigma * Math.sqrt(Math.max(0, common.variance + 2 * common.cross[treatment]! + own));
    return {
      treatment,
      n,
      plain: mean,
      estimate,
      se,
      df: errorDf,
      lower: estimate - t * se,
      upper: estimate + t * se,
      scope,
      part
    };
  });
}
