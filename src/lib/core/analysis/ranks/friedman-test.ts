import { chiSquaredUpper } from '../../numerics/distributions/chi-squared.ts';
import { fail, ok } from '../../result.ts';
import type { RankAnalysis } from '../check-result.ts';
import { rankSessions, repeatsInSession, tieSum, type RankRow } from './rank-sessions.ts';

/**
 * Friedman's test that the treatments do not differ, for sessions that each hold every treatment once.
 *
 *     12 Σ (R_i − b(t + 1)/2)² / (b t (t + 1) − Σ(ties³ − ties)/(t − 1)), compared with χ²_(t−1)
 *
 * @param rows kept readings
 * @param treatments number of treatments
 * @returns the test, or not-complete, repeated-in-session, no-scatter (all ranks equal)
 *
 * Source: M. Hollander & D. A. Wolfe (1999), Nonparametric Statistical Methods, 2nd ed., section 7.1 (with ties).
 * Checked by: test/core/analysis/ranks/rank-tests.test.ts
 */
export function friedmanTest(rows: readonly RankRow[], treatments: number): RankAnalysis['friedman'] {
  const sessions = rankSessions(rows);
  if (repeatsInSession(sessions)) return fail({ tag: 'repeated-in-session' });
  const complete = sessions.length > 0 && sessions.every((session) => session.treatments.length === treatments);
  if (!complete || treatments < 2) return fail({ tag: 'not-complete' });
  const b = sessions.length;
  const rankSum = new Float64Array(treatments);
  for (const session of sessions) session.ranks.forEach((rank, i) => (rankSum[session.treatments[i]!]! += rank));
  const scale = b * treatments * (treatments + 1) - tieSum(sessions) / (treatments - 1);
  if (!(scale > 0)) return fail({ tag: 'no-scatter' });
  const squares = rankSum.reduce((sum, R) => sum + (R - (b * (treatments + 1)) / 2) ** 2, 0);
  const statistic = (12 * squares) / scale;
  const df = treatments - 1;
  return ok({ statistic, df, p: chiSquaredUpper(statistic, df) });
}
