import type { CampaignEvent } from './event.ts';
import { markOf, type Of } from './marks.ts';
import { type Decision, resolve } from './resolve.ts';
import type { Contradiction, ReadingState, ReadingVersion } from './state.ts';

export type ReadingEvent = Of<'reading-recorded'> | Of<'reading-corrected'>;

export interface ReadingPlace {
  session: string;
  slot: number;
  specimen: string;
  reading: string;
  repeat: number;
}

/** A correction came the way of the reading it corrects, as far as the record says. */
const versionOf = (event: ReadingEvent, first: Of<'reading-recorded'> | undefined): ReadingVersion => ({
  ...markOf(event),
  raw: event.data.raw,
  value: event.data.value,
  limit: event.data.limit,
  source: event.kind === 'reading-recorded' ? event.data.source : (first?.data.source ?? 'keyboard'),
  readAt: event.kind === 'reading-recorded' ? event.data.readAt : null,
  raised: event.data.raised,
  because: event.kind === 'reading-recorded' ? event.data.because : event.data.reason
});

const agree = (a: ReadingEvent, b: ReadingEvent): boolean =>
  a.data.value === b.data.value && a.data.limit === b.data.limit;

/** What stands: recorded, not undone, not corrected by something that stands. Corrections in a ring all stand. */
function standing(events: readonly ReadingEvent[], undone: (id: string) => boolean): ReadingEvent[] {
  const valid = events.filter((event) => !undone(event.id));
  const corrected = new Set(valid.flatMap((e) => (e.kind === 'reading-corrected' ? [e.data.target] : [])));
  const heads = valid.filter((event) => !corrected.has(event.id));
  return heads.length > 0 ? heads : valid;
}

/**
 * One reading of one run from its events in order: every version is kept, the last correction counts, and two values
 * nobody corrected stay both until a person decides.
 */
export function reduceReading(
  place: ReadingPlace,
  events: readonly ReadingEvent[],
  missing: readonly Of<'reading-missing'>[],
  undone: (id: string) => boolean,
  decisionsOn: (key: string) => readonly Decision[],
  before: (a: CampaignEvent, b: CampaignEvent) => boolean
): { state: ReadingState; contradiction: Contradiction | null } {
  const { session, slot, reading, repeat, specimen } = place;
  const key = `two-values:${session}/${slot}/${reading}/${repeat}/${specimen}`;
  const { winner, contradiction } = resolve(
    { key, kind: 'two-values', session, slot, reading },
    standing(events, undone),
    agree,
    decisionsOn(key),
    before
  );
  const first = events.find((event) => event.kind === 'reading-recorded');
  const said = missing.filter((event) => !undone(event.id)).at(-1);
  const state: ReadingState = {
    reading,
    repeat,
    current: winner && versionOf(winner, first),
    versions: events.map((event) => ({ ...versionOf(event, first), undone: undone(event.id) })),
    missing: said && !winner && !contradiction ? { ...markOf(said), reason: said.data.reason } : null,
    contradiction: contradiction && !contradiction.decided ? key : null
  };
  return { state, contradiction };
}
