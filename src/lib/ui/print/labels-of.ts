import type { CampaignState, SessionState } from '#lib/core/campaign/state.ts';
import type { print } from '../texts/en/print.ts';

export interface Label {
  code: string;
  /** Where it goes: "Session 3, slot 2", or "spare". */
  place: string;
  title: string;
}

/**
 * Returns a label for each specimen of the sessions and each spare one: by session and slot to lay them out for loading,
 * or by treatment to stick them on.
 */
export function labelsOf(
  { issued, title }: Pick<CampaignState, 'issued' | 'title'>,
  sessions: readonly SessionState[],
  sort: 'session' | 'treatment',
  words: Pick<typeof print, 'session' | 'slot' | 'spare'>
): Label[] {
  if (!issued) return [];
  const slotName = new Map(issued.plan.machines.map(({ id, slots }) => [id, slots.map(({ name }) => name)]));
  const planned = sessions.flatMap(({ plan }) =>
    plan.slots.flatMap((slot, i) =>
      slot === null
        ? []
        : [
            {
              treatment: slot.treatment,
              code: slot.specimen,
              place: `${words.session} ${plan.number}, ${words.slot} ${slotName.get(plan.machine)?.[i] ?? i + 1}`
            }
          ]
    )
  );
  const spares = issued.spares.map(({ treatment, specimen }) => ({ treatment, code: specimen, place: words.spare }));
  const order = new Map(issued.plan.treatments.map(({ id }, i) => [id, i]));
  const all = [...planned, ...spares];
  if (sort === 'treatment') all.sort((a, b) => (order.get(a.treatment) ?? 0) - (order.get(b.treatment) ?? 0));
  return all.map(({ code, place }) => ({ code, place, title }));
}
