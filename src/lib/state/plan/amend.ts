import type { DataOf } from '#lib/core/campaign/event.ts';
import type { PlannedSession } from '#lib/core/campaign/plan.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
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
  const used = new Set(state.sessions.flatMap(({ plan, runs }) => codesOf(plan, runs)));
  const spares = issued.spares.filter(({ specimen }) => !used.has(specimen));
  for (const { specimen } of issued.spares) used.add(specimen);
  const fresh = freshCodes(session.plan.slots.length, used, seed);
  const taken = new Set<string>();
  const slots = session.plan.slots.map((slot) => {
    if (slot === null) return null;
    const spare = withSpares
      ? spares.find(({ treatment, specimen }) => treatment === slot.treatment && !taken.has(specimen))
      : undefined;
    if (spare) taken.add(spare.specimen);
    return { treatment: slot.treatment, specimen: spare?.specimen ?? fresh.next().value ?? '' };
  });
  const number = Math.max(0, ...state.sessions.map(({ plan }) => plan.number)) + 1;
  const shift = Math.max(1, ...state.sessions.map(({ plan }) => plan.shift));
  return { id: freeId(state, number), number, shift, machine: session.plan.machine, slots, repeats: again };
}

const codesOf = (plan: PlannedSession, runs: CampaignState['sessions'][number]['runs']): string[] => [
  ...plan.slots.flatMap((slot) => (slot ? [slot.specimen] : [])),
  ...runs.map(({ specimen }) => specimen)
];

function* freshCodes(count: number, used: ReadonlySet<string>, seed: string): Generator<string, undefined> {
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
