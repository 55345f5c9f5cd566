import type { DataOf } from '#lib/core/campaign/event.ts';
import type { PlannedSession } from '#lib/core/campaign/plan.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { unusedSpares } from '#lib/core/campaign/steps/unused-spares.ts';
import { drawSpecimenCodes } from '#lib/core/design/specimen-codes.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';

export type Change = DataOf<'plan-amended'>['change'];

interface Place {
  machine: string;
  /** A treatment for each slot of the machine; null where it stays empty. */
  treatments: readonly (string | null)[];
  /** The session that is run again. */
  repeats: string | null;
}

/**
 * Returns the session that runs another one again: the same treatments in the same slots, at the end of the loading
 * order, with specimens never used: spare ones where they are wanted and there, else new codes drawn from the seed.
 * Checked by: test/state/plan/amend.test.ts
 */
export function repeatOf(
  state: CampaignState,
  again: string,
  withSpares: boolean,
  seed: string
): PlannedSession | null {
  const session = state.sessions.find(({ id }) => id === again);
  if (!session) return null;
  const treatments = session.plan.slots.map((slot) => slot?.treatment ?? null);
  return addedSession(state, { machine: session.plan.machine, treatments, repeats: again }, withSpares, seed);
}

/**
 * Returns one more session over treatments, at the end of the loading order, their slots drawn by chance from the seed, spare
 * specimens used before new codes are drawn. Null where no machine has slots for all of them.
 * Checked by: test/state/plan/amend.test.ts
 */
export function extraSession(state: CampaignState, treatments: readonly string[], seed: string): PlannedSession | null {
  const openOf = (slots: readonly { inService: boolean }[]): number[] =>
    slots.flatMap(({ inService }, slot) => (inService ? [slot] : []));
  const machine = state.plan?.machines.find(({ slots }) => openOf(slots).length >= treatments.length);
  if (!machine || treatments.length === 0) return null;
  const open = openOf(machine.slots);
  const random = seededRandom(`slots ${seed}`);
  for (let i = open.length - 1; i > 0; i--) {
    const j = random.below(i + 1);
    [open[i], open[j]] = [open[j] ?? 0, open[i] ?? 0];
  }
  const placed = machine.slots.map((_, slot) => treatments[open.indexOf(slot)] ?? null);
  return addedSession(state, { machine: machine.id, treatments: placed, repeats: null }, true, seed);
}

function addedSession(
  state: CampaignState,
  { machine, treatments, repeats }: Place,
  withSpares: boolean,
  seed: string
): PlannedSession | null {
  if (!state.issued) return null;
  const fresh = freshCodes(state, treatments.length, seed);
  const taken = new Map<string, number>();
  const slots = treatments.map((treatment) => {
    if (treatment === null) return null;
    const nth = taken.get(treatment) ?? 0;
    const spare = withSpares ? unusedSpares(state, treatment)[nth] : undefined;
    if (spare !== undefined) taken.set(treatment, nth + 1);
    return { treatment, specimen: spare ?? fresh.next().value ?? '' };
  });
  const number = Math.max(0, ...state.sessions.map(({ plan }) => plan.number)) + 1;
  const shift = Math.max(1, ...state.sessions.map(({ plan }) => plan.shift));
  return { id: freeId(state, number), number, shift, machine, slots, repeats };
}

/** Codes that no specimen of the campaign bears. */
function* freshCodes(state: CampaignState, count: number, seed: string): Generator<string, undefined> {
  const used = new Set(state.issued?.spares.map(({ specimen }) => specimen));
  for (const { plan, runs } of state.sessions) {
    for (const slot of plan.slots) if (slot) used.add(slot.specimen);
    for (const run of runs.flatMap((one) => [one, ...one.earlier]))
      used.add(run.planned.specimen).add(run.loaded?.specimen ?? run.planned.specimen);
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
