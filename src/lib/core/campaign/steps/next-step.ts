import type { Plan } from '../plan.ts';
import type { CampaignState, SessionState } from '../state.ts';
import { dueReadings, type ReadingPlace } from './due-readings.ts';

/** What is to be done next in a session; one at a time, in this order. */
export type Step =
  | { kind: 'prepare' }
  | { kind: 'load'; slot: number; spare: boolean }
  | { kind: 'read-before'; place: ReadingPlace }
  | { kind: 'start' }
  | { kind: 'running'; place: ReadingPlace | null }
  | { kind: 'read-after'; place: ReadingPlace }
  | { kind: 'close' }
  | { kind: 'closed' };

/**
 * Returns the next step of a session: precautions and conditions, load slot by slot, read before, start, run (with its readings
 * at points), read after, close. A ruined session goes straight to its close; a ruined run is passed over, unless a spare
 * specimen is to take its slot now: then that is loaded, and the machine is started again for it.
 *
 * Checked by: test/core/campaign/steps/next-step.test.ts
 */
export function nextStep(plan: Plan, session: SessionState): Step {
  if (session.status === 'closed' || session.status === 'dropped') return { kind: 'closed' };
  if (session.ruined) return { kind: 'close' };
  if (!session.precautions && !session.started) return { kind: 'prepare' };
  const spare = session.runs.find((run) => run.ruined?.next === 'spare-now');
  if (spare && (!session.started || session.stopped)) return { kind: 'load', slot: spare.slot, spare: true };
  if (!session.started || spareAfter(session, session.started.at)) {
    const empty = session.runs.find((run) => !run.loaded && !run.ruined);
    if (empty) return { kind: 'load', slot: empty.slot, spare: false };
    const [before] = dueReadings(plan, session, ['before']);
    if (before) return { kind: 'read-before', place: before };
    return session.runs.some((run) => !run.ruined) ? { kind: 'start' } : { kind: 'close' };
  }
  if (!session.stopped) return { kind: 'running', place: dueReadings(plan, session, ['before', 'at'])[0] ?? null };
  const [due] = dueReadings(plan, session, ['before', 'at', 'after']);
  return due ? { kind: 'read-after', place: due } : { kind: 'close' };
}

/**
 * Returns the session to be worked on: one that was begun and not closed first, else the first that waits, in loading order; null
 * when all are closed.
 */
export function currentSession(state: CampaignState): SessionState | null {
  const open = state.sessions.filter(({ status }) => status !== 'closed' && status !== 'dropped');
  return open.find(({ status }) => status !== 'waiting') ?? open[0] ?? null;
}

/** A spare specimen came into a slot after the machine was last started. */
function spareAfter(session: SessionState, started: string): boolean {
  return session.runs.some(
    ({ earlier, loaded, ruined }) =>
      earlier.length > 0 && loaded !== null && ruined === null && Date.parse(loaded.at) > Date.parse(started)
  );
}
