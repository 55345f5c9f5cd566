import type { DesignRequest } from '#lib/core/design/propose-types.ts';

/** Nine wall paints (invented) on a three-track machine, quick effort. */
export const request = (change: Partial<DesignRequest> = {}): DesignRequest => ({
  treatments: 9,
  machines: [{ slots: 3 }],
  maxSessions: 12,
  sessionSizes: null,
  specimens: null,
  sessionsPerShift: 3,
  resolvable: false,
  control: null,
  forbiddenPairs: [],
  scatter: null,
  difference: null,
  alpha: 0.05,
  minutesPerSession: 40,
  seed: 'test',
  effort: 'quick',
  ...change
});
