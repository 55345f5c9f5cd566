import { describe, expect, test } from 'vitest';
import { planFault, sessionPlan } from '#lib/core/design/propose/session-plan.ts';
import { sessionCounts } from '#lib/core/design/propose/session-counts.ts';
import { request } from './request.ts';

describe('sessionCounts', () => {
  test('sessionCounts(request) names the budget first and only what can connect', () => {
    // Nine treatments in threes: four sessions give eight links, the fewest that connect nine.
    const { counts, least } = sessionCounts(request({ maxSessions: 12 }));
    expect(least).toBe(4);
    expect(counts[0]).toBe(12);
    expect(new Set(counts)).toEqual(new Set([12, 6, 9]));
    expect(sessionCounts(request({ maxSessions: 3 })).counts).toEqual([]);
    expect(sessionCounts(request({ maxSessions: 4 })).counts).toEqual([4]);
  });

  test('sessionCounts(request) needs fewer sessions when every one holds a control', () => {
    const control = { treatments: [0], weigh: 'half' } as const;
    expect(sessionCounts(request({ control, maxSessions: 12 })).least).toBe(4); // eight others, two a session
  });

  test('sessionCounts(resolvable request) takes whole groups', () => {
    const { counts, least } = sessionCounts(request({ resolvable: true, maxSessions: 13 }));
    expect(least).toBe(6);
    for (const b of counts) expect(b % 3).toBe(0);
    expect(Math.max(...counts)).toBe(12);
  });

  test('sessionCounts(request) keeps to the sessions that specimens can fill', () => {
    // Two specimens of each of nine treatments fill six sessions of three.
    const { counts } = sessionCounts(request({ specimens: Array<number>(9).fill(2), maxSessions: 12 }));
    expect(Math.max(...counts)).toBe(6);
  });

  test('sessionCounts(request) of given sessions has that number alone', () => {
    expect(sessionCounts(request({ sessionSizes: [3, 3, 2, 3, 3] })).counts).toEqual([5]);
  });
});

describe('sessionPlan', () => {
  test('sessionPlan(request) fills the machines in turn, and deals a group out evenly', () => {
    expect(sessionPlan(request({ machines: [{ slots: 4 }, { slots: 3 }] }), 3).sizes).toEqual([4, 3, 4]);
    const grouped = sessionPlan(request({ treatments: 10, machines: [{ slots: 4 }], resolvable: true }), 6);
    expect(grouped).toEqual({ sizes: [4, 3, 3, 4, 3, 3], groupOf: [0, 0, 0, 1, 1, 1] });
  });

  test('planFault(request) names the treatment whose specimens run out', () => {
    const control = { treatments: [2], weigh: 'half' } as const;
    const specimens = [null, null, 4, null, null, null, null, null, null];
    expect(planFault(request({ control, specimens }), sessionPlan(request({ control }), 5))).toEqual({ treatment: 2 });
    expect(planFault(request({ control, specimens }), sessionPlan(request({ control }), 4))).toBeNull();
  });
});
