import type { DataOf } from '#lib/core/campaign/event.ts';
import type { PlannedSession } from '#lib/core/campaign/plan.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { unusedSpares } from '#lib/core/campaign/steps/unused-spares.ts';
import { drawSpecimenCodes } from '#lib/core/design/specimen-codes.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';

export type Change = DataOf<'plan-amended'>['change'];

/**
 * Returns the session that runs another one again: the same treatments in the same slots, at the end of the loading
 * order, with specimens never used: spare ones where they are wanted and there, else new codes drawn from the seed.
 */
export function repeatOf(
  state: CampaignState,
  again: string,
  withSpares: boolean,
  seed: string
): PlannedSession | null {
  const session = state.sessions.find(({ id }) => id === again);
  const { issued } = state;
  if (!session || !issued) return null;
  const fresh = freshCodes(state, session.plan.slots.length, seed);
  const taken = new Map<string, number>();
  const slots = session.plan.slots.map((slot) => {
    if (slot === null) return null;
    const nth = taken.get(slot.treatment) ?? 0;
    const spare = withSpares ? unusedSpares(state, slot.treatment)[nth] : undefined;
    if (spare !== undefined) taken.set(slot.treatment, nth + 1);
    return { treatment: slot.treatment, specimen: spare ?? fresh.next().value ?? '' };
  });
  const number = Math.max(0, ...state.sessions.map(({ plan }) => plan.number)) + 1;
  const shift = Math.max(1, ...state.sessions.map(({ plan }) => plan.shift));
  return { id: freeId(state, number), number, shift, machine: session.plan.machine, slots, repeats: again };
}

/** Codes that no specimen of the campaign bears. */
function* freshCodes(state: CampaignState, count: number, seed: string): Generator<string, undefined> {
  const used = new Set(state.issued?.spares.map(({ specimen }) => specimen));
  for (const { plan, runs } of state.sessions) {
    for (const slot of plan.slots) if (slot) used.add(slot.specimen);
    for (const { planned, loaded } of runs) used.add(planned.specimen).add(loaded?.specimen ?? planned.specimen);
  }
  const drawn = drawSpecimenCodes(used.size + count, seededRandom(`repeat ${seed}`));
  for (const code of drawn) if (!used.has(code)) yield code;
  return undefined;
}

function freeId(state: CampaignState, number: number): string {
  const ids = new Set(state.sessions.map(({ id }) => id));
  let id = `s${number}`;
  while (ids.has(id)) id += 'r';
  return id;
}
