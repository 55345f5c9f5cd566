import type { CampaignEvent } from './event.ts';
import { inOrder } from './in-order.ts';
import type { Of } from './marks.ts';
import { type Decision, resolve } from './resolve.ts';
import type { Contradiction } from './state.ts';

type Load = Of<'specimen-loaded'>;

const samePlace = (a: Load, b: Load): boolean => a.data.session === b.data.session && a.data.slot === b.data.slot;

/**
 * Where each specimen is said to be, over all sessions: one specimen cannot be in two places.
 * Checked by: test/core/campaign/replay.property.test.ts.
 */
export class SpecimenPlaces {
  /** Standing loads of each specimen code, by session. */
  #loads = new Map<string, Map<string, Load[]>>();
  #twice = new Map<string, Contradiction>();
  /** Loads that a decision has set aside. */
  readonly aside = new Set<string>();
  /** Loads of a specimen said to be in two places, as long as nobody has decided. */
  readonly doubtful = new Set<string>();

  get contradictions(): [string, Contradiction][] {
    return [...this.#twice].sort(([a], [b]) => (a < b ? -1 : 1));
  }

  clear(): void {
    this.#loads.clear();
    this.#twice.clear();
    this.aside.clear();
    this.doubtful.clear();
  }

  /** Puts back what was found before, for sessions whose loads are not at hand. */
  restore(twice: readonly [string, Contradiction][], aside: readonly string[], doubtful: readonly string[]): void {
    this.#twice = new Map(twice);
    for (const id of aside) this.aside.add(id);
    for (const id of doubtful) this.doubtful.add(id);
  }

  sessionsOf(code: string): string[] {
    return [...(this.#loads.get(code)?.keys() ?? [])];
  }

  /** The loads that stand in a session are others than before. */
  replace(session: string, before: readonly Load[], now: readonly Load[]): void {
    for (const load of before) this.#loads.get(load.data.specimen)?.delete(session);
    for (const load of now) {
      let places = this.#loads.get(load.data.specimen);
      if (!places) this.#loads.set(load.data.specimen, (places = new Map()));
      places.set(session, [...(places.get(session) ?? []), load]);
    }
  }

  /** Is a specimen in two places? Adds the sessions that must be reduced again for what was decided. */
  find(
    code: string,
    again: Set<string>,
    decisionsOn: (key: string) => readonly Decision[],
    before: (a: CampaignEvent, b: CampaignEvent) => boolean
  ): void {
    const loads = inOrder([...(this.#loads.get(code)?.values() ?? [])].flat());
    const place = { key: `specimen-twice:${code}`, kind: 'specimen-twice', session: null, slot: null } as const;
    const { winner, contradiction } = resolve({ ...place, reading: null }, loads, samePlace, decisionsOn, before);
    if (contradiction) this.#twice.set(code, contradiction);
    else this.#twice.delete(code);
    for (const load of loads) {
      const aside = contradiction !== null && winner !== null && !samePlace(load, winner);
      const doubtful = contradiction !== null && winner === null;
      if (aside !== this.aside.has(load.id) || doubtful !== this.doubtful.has(load.id)) again.add(load.data.session);
      set(this.aside, load.id, aside);
      set(this.doubtful, load.id, doubtful);
    }
  }
}

const set = (where: Set<string>, what: string, present: boolean): void => {
  if (present) where.add(what);
  else where.delete(what);
};
