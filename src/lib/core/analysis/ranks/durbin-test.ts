import { chiSquaredUpper } from '../../numerics/distributions/chi-squared.ts';
import { fUpper } from '../../numerics/distributions/f.ts';
import { tTwoSided } from '../../numerics/distributions/student-t.ts';
import { fail, ok } from '../../result.ts';
import type { RankAnalysis } from '../check-result.ts';
import { rankSessions, repeatsInSession, tieSum, type RankedSession, type RankRow } from './rank-sessions.ts';

type Durbin = Extract<RankAnalysis['durbin'], { ok: true }>['value'];

/**
 * Durbin's test that the treatments do not differ, from ranks within the sessions of a balanced design, and the
 * comparisons of pairs that go with it.
 *
 *     A = Σ rank²,  C = b k (k + 1)²/4,  T1 = (t − 1)(Σ R_i² − r C)/(A − C), compared with χ²_(t−1),
 *     T2 = (T1/(t − 1)) / ((b(k − 1) − T1)/(bk − b − t + 1)), compared with F; T2 is the better approximation,
 *     standard error of R_i − R_j: √(2 r (A − C)/(bk − b − t + 1) · (1 − T1/(b(k − 1)))).
 *
 * @param rows kept readings
 * @param treatments number of treatments; all must occur
 * @returns `pairs` in the order (1,2), (1,3), …, unadjusted; or not-balanced, repeated-in-session, no-scatter (all ranks
 *   equal)
 *
 * Source: W. J. Conover (1999), Practical Nonparametric Statistics, 3rd ed., section 5.9 (ties by way of A and C).
 * Checked by: test/core/analysis/ranks/rank-tests.test.ts
 */
export function durbinTest(rows: readonly RankRow[], treatments: number): RankAnalysis['durbin'] {
  const sessions = rankSessions(rows);
  if (repeatsInSession(sessions)) return fail({ tag: 'repeated-in-session' });
  const sizes = balancedSizes(sessions, treatments);
  if (!sizes) return fail({ tag: 'not-balanced' });
  const { k, r } = sizes;
  const b = sessions.length;
  const rankSum = new Array<number>(treatments).fill(0);
  let A = 0;
  for (const session of sessions) {
    session.ranks.forEach((rank, i) => {
      rankSum[session.treatments[i]!]! += rank;
      A += rank * rank;
    });
  }
  const C = (b * k * (k + 1) ** 2) / 4;
  if (A === C) return fail({ tag: 'no-scatter' });
  // The rank sums have mean r (k + 1)/2; their squares about it are Σ R² − r C.
  const between = rankSum.reduce((sum, R) => sum + (R - (r * (k + 1)) / 2) ** 2, 0);
  const T1 = ((treatments - 1) * between) / (A - C);
  const df1 = treatments - 1;
  const df2 = b * k - b - treatments + 1;
  const left = Math.max(0, b * (k - 1) - T1);
  const T2 = T1 / df1 / (left / df2);
  const pairSe = Math.sqrt((((A - C) * 2 * r) / df2) * (left / (b * (k - 1))));
  return ok({
    rankSum,
    A,
    C,
    T1,
    df: df1,
    p: chiSquaredUpper(T1, df1),
    T2,
    df1,
    df2,
    pF: T2 === Infinity ? 0 : fUpper(T2, df1, df2),
    ties: tieSum(sessions) > 0,
    pairSe,
    pairs: pairsOf(rankSum, pairSe, df2)
  });
}

function pairsOf(rankSum: readonly number[], pairSe: number, df: number): Durbin['pairs'] {
  const pairs: Durbin['pairs'] = [];
  for (let a = 0; a < rankSum.length; a++) {
    for (let b = a + 1; b < rankSum.length; b++) {
      const difference = rankSum[a]! - rankSum[b]!;
      const t = difference === 0 ? 0 : difference / pairSe;
      pairs.push({ a, b, difference, t, p: Number.isFinite(t) ? tTwoSided(t, df) : 0 });
    }
  }
  return pairs;
}

/** Session size and replication where the runs are balanced, else null. */
function balancedSizes(sessions: readonly RankedSession[], treatments: number): { k: number; r: number } | null {
  const k = sessions[0]?.treatments.length ?? 0;
  if (k < 2 || treatments < 2 || sessions.some((session) => session.treatments.length !== k)) return null;
  const together = new Float64Array(treatments * treatments);
  for (const session of sessions) {
    for (const a of session.treatments) for (const b of session.treatments) together[a * treatments + b]!++;
  }
  const r = together[0]!;
  const lambda = together[1]!;
  const balanced = together.every((count, at) => count === (at % (treatments + 1) === 0 ? r : lambda));
  return balanced && lambda > 0 ? { k, r } : null;
}
