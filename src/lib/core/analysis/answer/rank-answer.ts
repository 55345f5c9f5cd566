import type { Answer, RankAnalysis } from '../analysis-result.ts';
import type { Direction } from '../observations.ts';

/**
 * Returns the finding of the rank tests: Durbin's F where the kept runs are balanced, else Skillings and Mack's statistic.
 *
 * Treatments are ordered by their standardised rank sum (Skillings and Mack); a target has no meaning for ranks, low is then
 * best.
 */
export function rankAnswer(ranks: RankAnalysis, direction: Direction, alpha: number): Answer {
  const { durbin, skillingsMack } = ranks;
  if (!skillingsMack.ok) return { tag: 'none', reason: skillingsMack.error };
  const { A, covarianceDiagonal } = skillingsMack.value;
  const sign = direction === 'higher' ? -1 : 1;
  const order = A.flatMap((a, treatment) => {
    const variance = covarianceDiagonal[treatment]!;
    return variance > 0 ? [{ treatment, score: (sign * a) / Math.sqrt(variance) }] : [];
  })
    .sort((x, y) => x.score - y.score || x.treatment - y.treatment)
    .map(({ treatment }) => treatment);
  const p = durbin.ok ? durbin.value.pF : skillingsMack.value.p;
  return { tag: p <= alpha ? 'ranks-differ' : 'ranks-do-not-differ', p, order };
}
