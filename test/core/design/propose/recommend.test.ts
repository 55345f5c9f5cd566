import { describe, expect, test } from 'vitest';
import { recommend } from '#lib/core/design/propose/recommend.ts';
import type { DesignChoice } from '#lib/core/design/propose-types.ts';
import { request } from './request.ts';

/** A choice of which only what a recommendation looks at is filled in. */
const choice = (sessions: number, tukey: number | null, change: Partial<DesignChoice> = {}): DesignChoice =>
  ({
    id: `c${sessions}`,
    sessions,
    aValue: 1 / sessions,
    balanced: false,
    connected: true,
    concurrence: { min: 1, max: 2 },
    fits: { sessions: true, specimens: true },
    precision: {
      errorDf: tukey === null ? 0 : 10,
      power80: tukey === null ? null : { unadjusted: tukey / 2, tukey },
      power90: null
    },
    ...change
  }) as DesignChoice;

describe('recommend', () => {
  const told = request({ scatter: 1, difference: 3 });

  test('recommend(choices) takes the fewest sessions that find the difference', () => {
    expect(recommend([choice(6, 5), choice(9, 2.9), choice(12, 2)], told)).toEqual({
      id: 'c9',
      reason: { tag: 'finds-difference', sessions: 9, detectable: 2.9, difference: 3 }
    });
    const unadjusted = { ...told, adjustment: 'unadjusted' } as const;
    expect(recommend([choice(6, 5), choice(9, 2.9)], unadjusted)!.id).toBe('c6');
  });

  test('recommend(choices) takes the most precise one when none finds the difference', () => {
    expect(recommend([choice(6, 5), choice(9, 4)], told)).toEqual({
      id: 'c9',
      reason: { tag: 'most-precise-in-budget', sessions: 9, detectable: 4 }
    });
  });

  test('recommend(choices) takes the smallest balanced one when no difference is said', () => {
    const balanced = { balanced: true, concurrence: { min: 2, max: 2 } };
    expect(recommend([choice(6, 5), choice(10, 3, balanced), choice(20, 2, balanced)], request())).toEqual({
      id: 'c10',
      reason: { tag: 'balanced-in-budget', sessions: 10, meets: 2 }
    });
  });

  test('recommend(choices) leaves out what the laboratory does not have', () => {
    const unfit = choice(12, 1, { fits: { sessions: false, specimens: true } });
    expect(recommend([choice(6, 5), unfit], told)).toEqual({ id: 'c6', reason: { tag: 'only-choice', sessions: 6 } });
    expect(recommend([unfit], told)).toBeNull();
    expect(recommend([], told)).toBeNull();
  });

  test('recommend(choices) without error degrees of freedom promises no detectable difference', () => {
    expect(recommend([choice(4, null), choice(5, null)], request())!.reason.tag).toBe('only-choice');
  });
});
