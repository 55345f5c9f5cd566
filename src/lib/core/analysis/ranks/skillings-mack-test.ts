import { chiSquaredUpper } from '../../numerics/distributions/chi-squared.ts';
import { factorSemidefinite, forwardSemidefinite } from '../../numerics/semidefinite-cholesky.ts';
import { dot } from '../../numerics/symmetric-products.ts';
import { fail, ok } from '../../result.ts';
import type { RankAnalysis } from '../check-result.ts';
import { rankSessions, repeatsInSession, type RankRow } from './rank-sessions.ts';

/**
 * Skillings and Mack's test that the treatments do not differ, from ranks within sessions of any sizes.
 *
 *     A_i = Σ_j √(12/(k_j + 1)) (rank_ij − (k_j + 1)/2),  T = Aᵀ Σ⁻ A,  Σ_ii = Σ_l n_il,  Σ_il = −n_il,
 *
 * with n_il the sessions that hold both i and l; compared with χ² on the rank of Σ (t − 1 when connected). Sessions of one
 * reading say nothing and are dropped. Equal readings share their mean rank; the variance is not corrected for them.
 *
 * @param rows kept readings
 * @param treatments number of treatments
 * @returns the test, or repeated-in-session, or no-shared-session
 *
 * Cost: t³/3.
 * Source: J. H. Skillings & G. A. Mack (1981), On the use of a Friedman-type statistic in balanced and unbalanced block
 * designs, Technometrics 23, 171–177.
 * Checked by: test/core/analysis/ranks/rank-tests.test.ts
 */
export function skillingsMackTest(rows: readonly RankRow[], treatments: number): RankAnalysis['skillingsMack'] {
  const sessions = rankSessions(rows).filter((session) => session.treatments.length > 1);
  if (repeatsInSession(sessions)) return fail({ tag: 'repeated-in-session' });
  if (sessions.length === 0) return fail({ tag: 'no-shared-session' });
  const A = new Float64Array(treatments);
  const covariance = new Float64Array(treatments * treatments);
  for (const session of sessions) {
    const k = session.treatments.length;
    const weight = Math.sqrt(12 / (k + 1));
    session.treatments.forEach((i, at) => {
      A[i]! += weight * (session.ranks[at]! - (k + 1) / 2);
      covariance[i * treatments + i]! += k - 1;
      for (const l of session.treatments) if (l !== i) covariance[i * treatments + l]! -= 1;
    });
  }
  const factor = factorSemidefinite(covariance, treatments);
  const z = forwardSemidefinite(factor, A);
  const statistic = dot(z, z);
  return ok({
    A: [...A],
    covarianceDiagonal: Array.from({ length: treatments }, (_, i) => covariance[i * (treatments + 1)]!),
    statistic,
    df: factor.rank,
    p: chiSquaredUpper(statistic, factor.rank),
    sessionsUsed: sessions.length
  });
}
