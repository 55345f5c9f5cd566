import { describe, expect, test } from 'vitest';
import { planChoices as de } from '#lib/ui/texts/de/plan-choices.ts';
import { planChoices as en } from '#lib/ui/texts/en/plan-choices.ts';

const one = (n: number) => ({ min: n, max: n });

describe('planChoices.sentence(choice)', () => {
  const balanced = { treatments: 6, sessions: 10, size: one(3), replication: one(5), concurrence: one(2) };
  test('says a balanced design as a person would', () => {
    expect(en.sentence(balanced)).toBe(
      '6 treatments, 3 to a session, 10 sessions; each treatment 5 times, each pair together twice.'
    );
    expect(de.sentence(balanced)).toBe(
      '6 Behandlungen, 3 je Sitzung, 10 Sitzungen; jede Behandlung 5-mal, jedes Paar zweimal zusammen.'
    );
  });

  test.each([
    [
      { size: one(6), replication: one(1), sessions: 1, concurrence: one(1) },
      'all in every session, 1 session; each treatment once.'
    ],
    [
      { replication: { min: 3, max: 4 }, concurrence: { min: 1, max: 2 } },
      'each treatment 3 or 4 times, each pair together 1 or 2 times.'
    ],
    [
      { replication: { min: 2, max: 5 }, concurrence: { min: 1, max: 3 } },
      'each treatment 2 to 5 times, each pair together 1 to 3 times.'
    ],
    [{ concurrence: { min: 0, max: 1 } }, 'each pair together at most once.'],
    [{ concurrence: one(0) }, 'each pair never together.'],
    [{ size: { min: 2, max: 3 } }, '6 treatments, 2 or 3 to a session,']
  ])('says %j', (change, words) => {
    expect(en.sentence({ ...balanced, ...change })).toContain(words);
  });
});
