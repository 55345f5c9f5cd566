import { describe, expect, it } from 'vitest';
import { findAnswer } from '#lib/core/analysis/answer/find-answer.ts';
import type { Verdicts } from '#lib/core/analysis/answer/verdicts.ts';

/** Means with one allowance for all pairs: two differ when their means are further apart than that. */
function verdicts(means: (number | [mean: number, part: number])[], allowance: number): Verdicts {
  const lines = means.map((mean, treatment) =>
    typeof mean === 'number' ? { treatment, estimate: mean, part: 0 } : { treatment, estimate: mean[0], part: mean[1] }
  );
  return {
    model: 'fixed',
    means: lines,
    overall: 0.2,
    pair: (a, b) => {
      const [x, y] = [lines[a]!, lines[b]!];
      if (x.part !== y.part) return null;
      const gap = x.estimate - y.estimate;
      return { p: Math.abs(gap) > allowance ? 0.01 : 0.5, lower: gap - allowance, upper: gap + allowance };
    }
  };
}

describe('findAnswer', () => {
  it('findAnswer names the one best, the next and the interval of the positive gap, lower better', () => {
    expect(findAnswer(verdicts([9, 5, 7], 1.5), 'lower', 0.05, null)).toEqual({
      tag: 'one-best',
      model: 'fixed',
      treatment: 1,
      mean: 5,
      next: 2,
      gap: 2,
      lower: 0.5,
      upper: 3.5,
      order: [1, 2, 0]
    });
  });

  it('findAnswer names the one best with the same positive gap, higher better', () => {
    expect(findAnswer(verdicts([9, 5, 7], 1.5), 'higher', 0.05, null)).toMatchObject({
      tag: 'one-best',
      treatment: 0,
      next: 2,
      gap: 2,
      lower: 0.5,
      upper: 3.5,
      order: [0, 2, 1]
    });
  });

  it('findAnswer names all that are not told apart from the leader, and the others as worse', () => {
    expect(findAnswer(verdicts([9, 5, 6, 7.2], 1.5), 'lower', 0.05, null)).toMatchObject({
      tag: 'several-best',
      leaders: [1, 2],
      leaderMean: 5,
      worse: [3, 0]
    });
  });

  it('findAnswer says that none differ, with the overall test', () => {
    expect(findAnswer(verdicts([5, 5.5, 6], 1.5), 'lower', 0.05, null)).toEqual({
      tag: 'none-differ',
      model: 'fixed',
      p: 0.2,
      order: [0, 1, 2],
      leader: 0,
      leaderMean: 5
    });
  });

  it('findAnswer answers part by part where the design is in parts', () => {
    const answer = findAnswer(
      verdicts(
        [
          [9, 0],
          [1, 1],
          [5, 0],
          [1.5, 1]
        ],
        1.5
      ),
      'lower',
      0.05,
      null
    );
    expect(answer).toMatchObject({
      tag: 'parts',
      parts: [
        { treatments: [0, 2], answer: { tag: 'one-best', treatment: 2 } },
        { treatments: [1, 3], answer: { tag: 'none-differ', p: null } }
      ]
    });
  });

  it('findAnswer has no answer without means or with one', () => {
    expect(findAnswer(verdicts([], 1), 'lower', 0.05, null)).toMatchObject({ tag: 'none' });
    expect(findAnswer(verdicts([3], 1), 'lower', 0.05, null)).toEqual({
      tag: 'none',
      reason: { tag: 'one-treatment', treatment: 0 }
    });
  });

  it('findAnswer with a target goes by the distances, and by the comparison with the best', () => {
    const line = (treatment: number, lower: number, upper: number, mayBeBest: boolean, isBest = false) => ({
      treatment,
      lower,
      upper,
      mayBeBest,
      isBest
    });
    const three = verdicts([9, 5, 7.5], 1);
    const sure = { critical: 2, lines: [line(0, 0, 4, false), line(1, 0, 6, false), line(2, -2.5, 0, true, true)] };
    expect(findAnswer(three, { target: 7 }, 0.05, sure)).toMatchObject({
      tag: 'one-best',
      treatment: 2,
      gap: 1.5,
      lower: 0,
      upper: 2.5,
      order: [2, 0, 1]
    });
    const unsure = { critical: 2, lines: [line(0, -1, 4, true), line(1, 0, 6, false), line(2, -2.5, 1, true)] };
    expect(findAnswer(three, { target: 7 }, 0.05, unsure)).toMatchObject({
      tag: 'several-best',
      leaders: [2, 0],
      worse: [1]
    });
  });
});
