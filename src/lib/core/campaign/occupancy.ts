import type { CampaignEvent } from './event.ts';
import type { Of } from './marks.ts';
import type { ReadingEvent } from './reduce-reading.ts';

/** What one specimen after the other did in one slot of one session, in order; the last is in the slot now. */
export interface Occupancy {
  slot: number;
  /** The codes it has gone by: planned, then whatever was said to be loaded. */
  specimens: Set<string>;
  /** The last load that each device stands by. */
  loads: Map<string, Of<'specimen-loaded'>>;
  readings: ReadingEvent[];
  missing: Of<'reading-missing'>[];
  ruins: Of<'ruined'>[];
  notes: Of<'noted'>[];
}

const empty = (slot: number, specimens: string[]): Occupancy => ({
  slot,
  specimens: new Set(specimens),
  loads: new Map(),
  readings: [],
  missing: [],
  ruins: [],
  notes: []
});

/**
 * Sorts a session's events into the specimens they speak of, slot by slot. A spare loaded after a ruined run begins a new
 * run in the slot; any other load says anew what the present run's specimen is. A specimen that its device loads
 * into another slot of the session has moved.
 * @param events of one session, in order
 * @param planned code planned for each slot; null where none is
 * @param counts does the event stand (is it not undone)?
 * @param standingAt did the ruin stand (neither undone nor reinstated) when the specimen was loaded? A run that is
 *   reinstated after its spare was tested stays a run of its own.
 */
export function occupanciesOf(
  events: readonly CampaignEvent[],
  planned: readonly (string | null)[],
  counts: (event: CampaignEvent) => boolean,
  standingAt: (ruin: Of<'ruined'>, load: Of<'specimen-loaded'>) => boolean
): Map<number, Occupancy[]> {
  const slots = new Map<number, Occupancy[]>();
  const all = (slot: number): Occupancy[] => {
    let list = slots.get(slot);
    if (!list) {
      const code = planned[slot] ?? null;
      list = [empty(slot, code === null ? [] : [code])];
      slots.set(slot, list);
    }
    return list;
  };
  const now = (slot: number): Occupancy => {
    const list = all(slot);
    return list[list.length - 1] as Occupancy;
  };
  const about = (slot: number, specimen: string): Occupancy =>
    [...all(slot)].reverse().find((one) => one.specimens.has(specimen)) ?? now(slot);

  planned.forEach((code, slot) => code !== null && all(slot));
  for (const event of events) {
    switch (event.kind) {
      case 'specimen-loaded':
        if (counts(event)) load(event);
        break;
      case 'reading-corrected': {
        // A correction belongs where the reading is that it corrects, whatever code it bears.
        const { target, slot } = event.data;
        const holder = all(slot).find(({ readings }) => readings.some(({ id }) => id === target));
        (holder ?? about(slot, event.data.specimen)).readings.push(event);
        break;
      }
      case 'reading-recorded':
        about(event.data.slot, event.data.specimen).readings.push(event);
        break;
      case 'reading-missing':
        now(event.data.slot).missing.push(event);
        break;
      case 'ruined':
        if (event.data.slot !== null) now(event.data.slot).ruins.push(event);
        break;
      case 'noted':
        if (event.data.slot !== null && counts(event)) now(event.data.slot).notes.push(event);
        break;
      default:
    }
  }
  return slots;

  function load(event: Of<'specimen-loaded'>): void {
    const { slot, specimen } = event.data;
    let here = now(slot);
    const ruined = (one: Occupancy): boolean => one.ruins.some((ruin) => standingAt(ruin, event));
    if (ruined(here) && !here.specimens.has(specimen)) {
      here = empty(slot, [specimen]);
      all(slot).push(here);
    }
    for (const list of slots.values())
      for (const other of list)
        if (other !== here && other.slot !== slot && other.loads.get(event.device)?.data.specimen === specimen)
          if (!ruined(other)) other.loads.delete(event.device);
    here.specimens.add(specimen);
    here.loads.set(event.device, event);
  }
}
