import type { CampaignEvent } from './event.ts';
import { markOf, type Of } from './marks.ts';
import { type Decision, resolve } from './resolve.ts';
import type { Contradiction, ReadingState, ReadingVersion } from './state.ts';

export type ReadingEvent = Of<'reading-recorded'> | Of<'reading-corrected'>;

/** What the rest of the record tells a reading's reduction. */
export interface ReadingSurroundings {
  undone: (event: CampaignEvent) => boolean;
  /** Standing decisions about a contradiction, in order. */
  decisionsOn: (key: string) => readonly Decision[];
  before: (a: CampaignEvent, b: CampaignEvent) => boolean;
}

export interface ReadingPlace {
  session: string;
  slot: number;
  specimen: string;
  reading: string;
  repeat: number;
}

type KeptVersion = ReadingVersion & { undone: boolean };

/** A correction came the way of the reading it corrects, as far as the record says. */
function versionOf(event: ReadingEvent, first: Of<'reading-recorded'> | undefined, undone: boolean): KeptVersion {
  const { raw, value, limit, raised } = event.data;
  const recorded = event.kind === 'reading-recorded' ? event.data : null;
  // Spelled out: a campaign has tens of thousands of these, and spreading objects is slow.
  return {
    event: event.id,
    at: event.at,
    who: event.who,
    device: event.device,
    raw,
    value,
    limit,
    source: recorded?.source ?? first?.data.source ?? 'keyboard',
    readAt: recorded?.readAt ?? null,
    raised,
    because: event.kind === 'reading-recorded' ? event.data.because : event.data.reason,
    undone
  };
}

const agree = (a: ReadingEvent, b: ReadingEvent): boolean =>
  a.data.value === b.data.value && a.data.limit === b.data.limit;

/** What stands: recorded, not undone, not corrected by something that stands. Corrections in a ring all stand. */
function standing(events: readonly ReadingEvent[], undone: (event: CampaignEvent) => boolean): ReadingEvent[] {
  const valid = events.filter((event) => !undone(event));
  if (valid.length < 2) return valid;
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
  around: ReadingSurroundings
): { state: ReadingState; contradiction: Contradiction | null } {
  const { session, slot, reading, repeat, specimen } = place;
  const { undone } = around;
  const key = `two-values:${session}/${slot}/${reading}/${repeat}/${specimen}`;
  const { winner, contradiction } = resolve(
    { key, kind: 'two-values', session, slot, reading },
    standing(events, undone),
    agree,
    around.decisionsOn,
    around.before
  );
  const first = events.find((event) => event.kind === 'reading-recorded');
  const said = missing.filter((event) => !undone(event)).at(-1);
  const versions = events.map((event) => versionOf(event, first, undone(event)));
  const state: ReadingState = {
    reading,
    repeat,
    current: (winner && versions.find(({ event }) => event === winner.id)) ?? null,
    versions,
    missing: said && !winner && !contradiction ? { ...markOf(said), reason: said.data.reason } : null,
    contradiction: contradiction && !contradiction.decided ? key : null
  };
  return { state, contradiction };
}
