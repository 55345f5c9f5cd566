import type { CampaignEvent, UnknownEvent } from './event.ts';

type Any = CampaignEvent | UnknownEvent;

/** Those of the given events whose ids are not held yet, in their order. */
export function freshEvents<T extends Any>(held: readonly Any[], given: readonly T[]): T[] {
  const ids = new Set(held.map(({ id }) => id));
  return given.filter(({ id }) => !ids.has(id));
}
