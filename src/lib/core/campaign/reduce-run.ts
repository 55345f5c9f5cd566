import { markOf, type Of } from './marks.ts';
import type { Occupancy } from './occupancy.ts';
import type { ReadingDefinition } from './plan.ts';
import { reduceReading, type ReadingEvent, type ReadingSurroundings } from './reduce-reading.ts';
import { resolve } from './resolve.ts';
import type { Contradiction, NoteState, ReadingState, Ruin, RunState } from './state.ts';

type Missing = Of<'reading-missing'>;

/** What the rest of the record tells a session's reduction. */
export interface Surroundings extends ReadingSurroundings {
  /** The reinstatement that stands for a ruin. */
  reinstatement: (ruin: string) => Of<'reinstated'> | undefined;
  /** Loads that a decision on a specimen used twice has set aside. */
  aside: ReadonlySet<string>;
  /** Loads of a specimen that is said to be in two places, as long as nobody has decided. */
  doubtful: ReadonlySet<string>;
  /** Treatment of a specimen code; undefined when no plan gave it. */
  treatmentOf: (specimen: string) => string | undefined;
  definitions: readonly ReadingDefinition[];
}

export const noteOf = (event: Of<'noted'>): NoteState => ({ ...markOf(event), ...event.data });

const ruinOf = (event: Of<'ruined'>): Ruin => ({
  ...markOf(event),
  reason: event.data.reason,
  whole: event.data.slot === null,
  next: event.data.next
});

const sameRuin = (a: Of<'ruined'>, b: Of<'ruined'>): boolean =>
  a.data.reason === b.data.reason && a.data.next === b.data.next;

/** Is a run or session ruined, and everything that was ever said about it. Undecided, the first ruin is shown: it is ruined either way. */
export function reduceRuins(
  place: { session: string; slot: number | null; key: string },
  events: readonly Of<'ruined'>[],
  around: Surroundings
): { ruined: Ruin | null; history: RunState['ruinHistory']; contradiction: Contradiction | null } {
  const valid = events.filter((event) => !around.undone(event));
  const standing = valid.filter((event) => !around.reinstatement(event.id));
  const { winner, contradiction } = resolve(
    { key: place.key, kind: 'two-ruins', session: place.session, slot: place.slot, reading: null },
    standing,
    sameRuin,
    around.decisionsOn,
    around.before
  );
  const counts = winner ?? standing[0];
  return {
    ruined: counts ? ruinOf(counts) : null,
    history: valid.map((event) => {
      const back = around.reinstatement(event.id);
      return { ...ruinOf(event), reinstated: back ? { ...markOf(back), reason: back.data.reason } : null };
    }),
    contradiction
  };
}

/** The run of one specimen in a slot, from what was sorted to it. */
export function reduceRun(
  session: string,
  occupancy: Occupancy,
  planned: { treatment: string; specimen: string },
  id: string,
  around: Surroundings
): { run: RunState; contradictions: Contradiction[]; claims: Of<'specimen-loaded'>[] } {
  const { slot } = occupancy;
  const contradictions: Contradiction[] = [];
  const keep = (contradiction: Contradiction | null): void => {
    if (contradiction) contradictions.push(contradiction);
  };
  const claims = [...occupancy.loads.values()];
  const place = `${session}/${slot}/${planned.specimen}`;
  const key = `two-specimens:${place}`;
  const load = resolve(
    { key, kind: 'two-specimens', session, slot, reading: null },
    claims.filter((event) => !around.aside.has(event.id)),
    (a, b) => a.data.specimen === b.data.specimen,
    around.decisionsOn,
    around.before
  );
  keep(load.contradiction);
  const specimen = load.winner?.data.specimen ?? planned.specimen;
  const treatmentOf = (code: string): string =>
    around.treatmentOf(code) ?? (code === planned.specimen ? planned.treatment : '');
  const open = load.contradiction && !load.contradiction.decided ? load.contradiction.events : [];
  const possible = new Set(open.map((event) => treatmentOf((event as Of<'specimen-loaded'>).data.specimen)));
  const doubtful = possible.size > 1 || (load.winner !== null && around.doubtful.has(load.winner.id));
  const treatment = doubtful ? '' : ([...possible][0] ?? treatmentOf(specimen));
  const ruins = reduceRuins({ session, slot, key: `two-ruins:${place}` }, occupancy.ruins, around);
  keep(ruins.contradiction);
  const run: RunState = {
    id,
    session,
    slot,
    planned,
    loaded: load.winner && {
      ...markOf(load.winner),
      treatment,
      specimen,
      how: load.winner.data.how,
      because: load.winner.data.because
    },
    treatment,
    specimen,
    readings: readingsOf(session, occupancy, planned.specimen, around, keep),
    ruined: ruins.ruined,
    ruinHistory: ruins.history,
    notes: occupancy.notes.map(noteOf),
    earlier: []
  };
  return { run, contradictions, claims };
}

function readingsOf(
  session: string,
  occupancy: Occupancy,
  planned: string,
  around: Surroundings,
  keep: (contradiction: Contradiction | null) => void
): ReadingState[] {
  const groups = new Map<string, { reading: string; repeat: number; events: ReadingEvent[]; missing: Missing[] }>();
  const group = (reading: string, repeat: number): { events: ReadingEvent[]; missing: Missing[] } => {
    const name = `${reading}/${repeat}`;
    let found = groups.get(name);
    if (!found) groups.set(name, (found = { reading, repeat, events: [], missing: [] }));
    return found;
  };
  for (const { id, repeats } of around.definitions) for (let n = 1; n <= repeats; n++) group(id, n);
  for (const event of occupancy.readings) group(event.data.reading, event.data.repeat).events.push(event);
  for (const event of occupancy.missing) group(event.data.reading, event.data.repeat).missing.push(event);
  const readings: ReadingState[] = [];
  for (const { reading, repeat, events, missing } of groups.values()) {
    const place = { session, slot: occupancy.slot, specimen: planned, reading, repeat };
    const { state, contradiction } = reduceReading(place, events, missing, around);
    keep(contradiction);
    readings.push(state);
  }
  return readings;
}
