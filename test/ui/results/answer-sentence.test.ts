import { describe, expect, test } from 'vitest';
import type { Analysis, Answer } from '#lib/core/analysis/analysis-result.ts';
import type { Direction, Observations } from '#lib/core/analysis/observations.ts';
import { numberWriter } from '#lib/ui/format/number-writer.ts';
import { answerSentence } from '#lib/ui/results/answer-sentence.ts';
import type { ResultView } from '#lib/ui/results/view.ts';
import { answer as answerDe } from '#lib/ui/texts/de/answer.ts';
import { reasons as reasonsDe } from '#lib/ui/texts/de/reasons.ts';
import { answer as answerEn } from '#lib/ui/texts/en/answer.ts';
import { reasons as reasonsEn } from '#lib/ui/texts/en/reasons.ts';

/** Invented: only what the sentence reads. Standard error 0.42, so two digits of it are two decimals. */
function invented(answer: Answer, direction: Direction = 'lower'): ResultView {
  const mean = {
    treatment: 0,
    n: 4,
    plain: 4,
    estimate: 4,
    se: 0.42,
    df: 16,
    lower: 3,
    upper: 5,
    scope: 'all',
    part: null
  };
  return {
    measured: { id: 'loss', label: 'film loss', unit: 'µm', decimals: 1, difference: null },
    input: {
      treatments: ['Aster', 'Birch', 'Cedar'].map((name, i) => ({ id: `t${i}`, name })),
      sessions: [],
      rows: [],
      direction
    } as unknown as Observations,
    analysis: {
      alpha: 0.05,
      primary: 'fixed',
      fixed: { ok: true, value: { means: [mean], pairs: [], pairSummary: null } },
      answer
    } as unknown as Analysis
  };
}

const say = (answer: Answer, direction?: Direction, german = false) =>
  answerSentence(
    invented(answer, direction),
    german ? { answer: answerDe, reasons: reasonsDe } : { answer: answerEn, reasons: reasonsEn },
    numberWriter(german ? 'de-DE' : 'en-GB')
  );

const best: Answer = {
  tag: 'one-best',
  model: 'fixed',
  treatment: 2,
  mean: 4.1,
  next: 0,
  gap: 1.3,
  lower: 0.4,
  upper: 2.2,
  order: [2, 0, 1]
};

describe('answerSentence(view, words, write)', () => {
  test('says the lowest, its mean, the gap to the next and the interval when lower is better', () => {
    const { headline, rest } = say(best);
    expect(headline).toBe('Cedar has the lowest film loss: 4.10\u00a0µm.');
    expect(rest).toEqual(['That is 1.30\u00a0µm (95% interval 0.40 to 2.20) less than the next, Aster.']);
  });

  test('turns its words round when higher is better', () => {
    const { headline, rest } = say(best, 'higher');
    expect(headline).toContain('highest');
    expect(rest[0]).toContain('more than the next');
  });

  test('speaks of the target when there is one', () => {
    expect(say(best, { target: 5 }).headline).toBe(
      'Cedar comes nearest to the target of 5.00\u00a0µm in film loss: 4.10\u00a0µm.'
    );
  });

  test('writes German with decimal comma', () => {
    const { headline, rest } = say(best, 'lower', true);
    expect(headline).toBe('Cedar hat bei „film loss“ den kleinsten Wert: 4,10\u00a0µm.');
    expect(rest[0]).toContain('0,40 bis 2,20');
  });

  test('does not name one best when several cannot be told apart', () => {
    const { headline, rest } = say({
      tag: 'several-best',
      model: 'fixed',
      leaders: [2, 0],
      leaderMean: 4.1,
      worse: [1],
      order: [2, 0, 1]
    });
    expect(headline).toBe('Cedar has the lowest film loss, 4.10\u00a0µm, but Aster cannot be told from it.');
    expect(rest).toEqual(['Clearly higher: Birch.']);
  });

  test('does not call treatments equal when no difference is shown', () => {
    const { headline, rest } = say({
      tag: 'none-differ',
      model: 'fixed',
      p: 0.23,
      order: [0, 1, 2],
      leader: 0,
      leaderMean: 4
    });
    expect(headline).toBe('No difference in film loss between the treatments is shown (p = 0.230).');
    expect(rest[0]).toContain('no proof that all are equal');
  });

  test('answers each group apart when the design is in parts', () => {
    const { headline, rest } = say({
      tag: 'parts',
      model: 'fixed',
      parts: [
        { treatments: [0, 2], answer: { ...best, next: 0 } },
        { treatments: [1], answer: { tag: 'none', reason: { tag: 'one-treatment', treatment: 1 } } }
      ]
    });
    expect(headline).toContain('2 groups');
    expect(rest).toHaveLength(2);
    expect(rest[0]).toMatch(/^Among Aster and Cedar: Cedar has the lowest/);
    expect(rest[1]).toContain('Only Birch has readings');
  });

  test('says why there is no answer', () => {
    expect(say({ tag: 'none', reason: { tag: 'no-kept-readings' } }).rest[0]).toContain('no reading that counts');
  });
});
