import type { Answer, BestComparison } from '../analysis-result.ts';
import type { Direction } from '../observations.ts';
import type { Verdicts } from './verdicts.ts';

/**
 * Returns the finding in one tagged value: who is best and by how much, who shares the lead, or that nothing could be told
 * apart; part by part where the design is in parts.
 *
 * Two treatments differ when Tukey–Kramer says so at alpha. With a target the nearest is best, and differences are those of
 * the distances (see compareToTarget).
 *
 * @param best comparison with the best, needed for a target only
 *
 * Checked by: test/core/analysis/answer/find-answer.test.ts
 */
export function findAnswer(
  verdicts: Verdicts,
  direction: Direction,
  alpha: number,
  best: BestComparison | null
): Answer {
  const parts = [...new Set(verdicts.means.map((mean) => mean.part))];
  if (parts.length > 1) {
    return {
      tag: 'parts',
      model: verdicts.model,
      parts: parts.map((part) => {
        const means = verdicts.means.filter((mean) => mean.part === part);
        return {
          treatments: means.map((mean) => mean.treatment),
          answer: findAnswer({ ...verdicts, means, overall: null }, direction, alpha, null)
        };
      })
    };
  }
  const cost = (estimate: number): number =>
    direction === 'lower' ? estimate : direction === 'higher' ? -estimate : Math.abs(estimate - direction.target);
  const means = [...verdicts.means].sort((a, b) => cost(a.estimate) - cost(b.estimate) || a.treatment - b.treatment);
  const order = means.map((mean) => mean.treatment);
  const leader = means[0];
  if (leader === undefined) return { tag: 'none', reason: { tag: 'no-kept-readings' } };
  if (means.length === 1) return { tag: 'none', reason: { tag: 'one-treatment', treatment: leader.treatment } };
  const { model } = verdicts;
  const base = { model, order };
  if (typeof direction === 'object') return nearest(base, leader, means, cost, verdicts, alpha, best);

  const rest = means.slice(1);
  const differs = (a: number, b: number): boolean => (verdicts.pair(a, b)?.p ?? 1) <= alpha;
  const next = rest[0]!;
  if (rest.every((mean) => differs(leader.treatment, mean.treatment))) {
    const gap = Math.abs(next.estimate - leader.estimate);
    // The interval of the gap in the direction in which it is positive.
    const [from, to] = direction === 'lower' ? [next, leader] : [leader, next];
    const { lower, upper } = verdicts.pair(from.treatment, to.treatment)!;
    const { treatment, estimate: mean } = leader;
    return { tag: 'one-best', ...base, treatment, mean, next: next.treatment, gap, lower, upper };
  }
  return shared(base, leader, means, differs, verdicts.overall);
}

type Mean = Verdicts['means'][number];
type Base = { model: Verdicts['model']; order: number[] };

function shared(
  base: Base,
  leader: Mean,
  means: readonly Mean[],
  differs: (a: number, b: number) => boolean,
  overall: number | null
): Answer {
  const any = means.some((a, i) => means.slice(i + 1).some((b) => differs(a.treatment, b.treatment)));
  if (!any) {
    return { tag: 'none-differ', ...base, p: overall, leader: leader.treatment, leaderMean: leader.estimate };
  }
  const same = (mean: Mean): boolean => mean === leader || !differs(leader.treatment, mean.treatment);
  return {
    tag: 'several-best',
    ...base,
    leaders: means.filter(same).map((mean) => mean.treatment),
    leaderMean: leader.estimate,
    worse: means.filter((mean) => !same(mean)).map((mean) => mean.treatment)
  };
}

function nearest(
  base: Base,
  leader: Mean,
  means: readonly Mean[],
  cost: (estimate: number) => number,
  verdicts: Verdicts,
  alpha: number,
  best: BestComparison | null
): Answer {
  const lines = new Map(best?.lines.map((line) => [line.treatment, line]) ?? []);
  const own = lines.get(leader.treatment);
  if (own?.isBest) {
    const next = means[1]!;
    return {
      tag: 'one-best',
      ...base,
      treatment: leader.treatment,
      mean: leader.estimate,
      next: next.treatment,
      gap: cost(next.estimate) - cost(leader.estimate),
      lower: 0 - own.upper,
      upper: 0 - own.lower
    };
  }
  if (best !== null && lines.size > 0) {
    const may = (mean: Mean): boolean => mean === leader || (lines.get(mean.treatment)?.mayBeBest ?? false);
    const leaders = means.filter(may).map((mean) => mean.treatment);
    const worse = means.filter((mean) => !may(mean)).map((mean) => mean.treatment);
    if (worse.length > 0) return { tag: 'several-best', ...base, leaders, leaderMean: leader.estimate, worse };
  }
  // Nobody is shown to be further from the target than another; whether the means differ at all is another question.
  const differs = (a: number, b: number): boolean => (verdicts.pair(a, b)?.p ?? 1) <= alpha;
  const any = means.some((a, i) => means.slice(i + 1).some((b) => differs(a.treatment, b.treatment)));
  const { treatment, estimate: leaderMean } = leader;
  return any
    ? { tag: 'several-best', ...base, leaders: [...base.order], leaderMean, worse: [] }
    : { tag: 'none-differ', ...base, p: verdicts.overall, leader: treatment, leaderMean };
}
