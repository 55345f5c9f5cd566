import { type SessionHead, unpackRuns } from './checkpoint.ts';
import type { PlannedSession } from './plan.ts';
import type { ReducedSession } from './reduce-session.ts';
import type { RunState, SessionState } from './state.ts';
import { rememberTally } from './summary.ts';

/** A session as a checkpoint has it. Its runs are read from their text when somebody looks at them. */
export interface ColdSession {
  reduced: ReducedSession;
  codes: readonly string[];
  head: SessionHead;
  /** As `packRuns` wrote them. */
  runs: string;
}

/** Most screens look at one session of many: the runs of the others stay text. */
export function coldSession(plan: PlannedSession, head: SessionHead, runs: string): ColdSession {
  const state = { ...head.state, plan } as SessionState;
  Object.defineProperty(state, 'runs', {
    enumerable: true,
    configurable: true,
    get(): RunState[] {
      const value = unpackRuns(runs);
      Object.defineProperty(state, 'runs', { value, enumerable: true, configurable: true });
      return value;
    }
  });
  rememberTally(state, head.tally);
  const { contradictions, strangers, codes } = head;
  return { reduced: { state, contradictions, claims: [], strangers }, codes, head, runs };
}
