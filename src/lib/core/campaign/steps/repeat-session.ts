import type { PlannedSession } from '../plan.ts';
import type { CampaignState } from '../state.ts';
import { unusedSpares } from './unused-spares.ts';

/**
 * Returns the session that tests treatments once more with unused spare specimens, at the end of the loading order; null when
 * fewer than two of them have a spare, because one run alone compares nothing.
 *
 * @param state the campaign as it stands
 * @param source id of the session that is repeated: machine, slots and shift come from it
 * @param treatments one for each slot of the machine, null for an empty slot
 * @param id name of the new session
 * Checked by: test/core/campaign/steps/repeat-session.test.ts
 */
export function repeatSession(
  state: CampaignState,
  source: string,
  treatments: readonly (string | null)[],
  id: string
): PlannedSession | null {
  const repeated = state.sessions.find((session) => session.id === source);
  if (!repeated) return null;
  const used = new Map<string, number>();
  const slots = treatments.map((treatment) => {
    if (treatment === null) return null;
    const nth = used.get(treatment) ?? 0;
    used.set(treatment, nth + 1);
    const specimen = unusedSpares(state, treatment)[nth];
    return specimen === undefined ? null : { treatment, specimen };
  });
  if (slots.filter((slot) => slot !== null).length < 2) return null;
  const last = state.sessions.reduce((most, { plan }) => Math.max(most, plan.number), 0);
  const shift = state.sessions.reduce((most, { plan }) => Math.max(most, plan.shift), 1);
  return { id, number: last + 1, shift, machine: repeated.plan.machine, slots, repeats: source };
}
