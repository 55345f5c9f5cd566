import type { CampaignEvent } from './event.ts';
import { markOf, type Of } from './marks.ts';
import type { Contradiction } from './state.ts';

export type Decision = Of<'contradiction-decided'>;

export interface Resolved<T extends CampaignEvent> {
  /** What counts; null when there is nothing, or when it must be decided first. */
  winner: T | null;
  contradiction: Contradiction | null;
}

/**
 * Which of several statements about one thing counts: the first if they agree; the chosen one if a person decided among
 * all of them; else none. A statement that was not weighed opens the question again.
 * @param candidates statements that stand, in order
 * @param agree do two of them say the same?
 * @param decisionsOn decisions about a key that stand, in order
 * @param before was an event known when a decision that does not list its events was taken? (its order)
 */
export function resolve<T extends CampaignEvent>(
  place: Pick<Contradiction, 'key' | 'kind' | 'session' | 'slot' | 'reading'>,
  candidates: readonly T[],
  agree: (a: T, b: T) => boolean,
  decisionsOn: (key: string) => readonly Decision[],
  before: (event: T, decision: Decision) => boolean
): Resolved<T> {
  if (candidates.length < 2) return { winner: candidates[0] ?? null, contradiction: null };
  const decisions = decisionsOn(place.key);
  const lost = new Set<string>();
  for (const decision of decisions) {
    const { chosen, among } = decision.data;
    const weighed = among ?? candidates.filter((event) => before(event, decision)).map((event) => event.id);
    for (const id of weighed) if (id !== chosen) lost.add(id);
    lost.delete(chosen);
  }
  const left = candidates.filter((event) => !lost.has(event.id));
  const first = left[0] ?? null;
  const agreed = first === null || left.every((event) => agree(first, event));
  const all = candidates[0];
  const disputed = all !== undefined && !candidates.every((event) => agree(all, event));
  if (!disputed) return { winner: first ?? all ?? null, contradiction: null };
  const last = decisions.at(-1);
  const taken = decisions.map((d) => ({ ...markOf(d), chosen: d.data.chosen, reason: d.data.reason }));
  const decided = agreed && first !== null && last ? (taken.at(-1) ?? null) : null;
  return {
    winner: decided ? first : null,
    contradiction: { ...place, events: [...candidates], decided, decisions: taken }
  };
}
