import type { CampaignEvent, UnknownEvent } from '../campaign/event.ts';
import { replay } from '../campaign/replay.ts';
import { sealOf } from '../campaign/seal.ts';
import type { Contradiction, RecordFlag } from '../campaign/state.ts';

type Any = CampaignEvent | UnknownEvent;

/** What one device brings. */
export interface DeviceShare {
  device: string;
  /** Names that its new events bear. */
  who: string[];
  added: number;
  first: string;
  last: string;
}

/** What a file would change, before anything is changed. */
export interface ImportSummary {
  campaign: string;
  title: string;
  added: Any[];
  known: number;
  /** Known ids with other bytes: never applied, kept aside, named. */
  quarantined: { id: string; kind: string; who: string; at: string }[];
  devices: DeviceShare[];
  /** What would contradict that does not now. */
  contradictions: Contradiction[];
  /** Gaps, forks, edits, jumped clocks that would be new. */
  flags: RecordFlag[];
  /** Kinds of event that this version of the program does not understand. */
  notUnderstood: number;
}

/** The union of events by id. What is held stays; other bytes under a held id are handed back, not merged. */
export function mergeEvents(
  existing: readonly Any[],
  incoming: readonly Any[]
): { merged: Any[]; added: Any[]; aside: Any[]; known: number } {
  const held = new Map(existing.map((event) => [event.id, event]));
  const added: Any[] = [];
  const aside: Any[] = [];
  let known = 0;
  for (const event of incoming) {
    const same = held.get(event.id);
    if (!same) {
      held.set(event.id, event);
      added.push(event);
    } else if (sealOf(same) === sealOf(event)) known++;
    else aside.push(event);
  }
  return { merged: [...held.values()], added, aside, known };
}

/**
 * What taking in the events of a file would do: new, known, contradicting, set aside. Changes nothing.
 * @param existing events of the same campaign on this device; empty when the campaign is new here
 * Checked by: test/core/exchange/summarise-import.test.ts.
 */
export function summariseImport(existing: readonly Any[], incoming: readonly Any[]): ImportSummary {
  const { merged, added, aside, known } = mergeEvents(existing, incoming);
  const before = replay(existing);
  const after = replay(merged);
  const open = (state: typeof after): Contradiction[] => state.contradictions.filter(({ decided }) => decided === null);
  const had = new Map(open(before).map((one) => [one.key, one.events.length]));
  const flagged = new Set(before.flags.map((flag) => `${flag.kind} ${flag.device} ${flag.event} ${flag.detail}`));
  return {
    campaign: after.id,
    title: after.title,
    added,
    known,
    quarantined: aside.map(({ id, kind, who, at }) => ({ id, kind, who, at })),
    devices: sharesOf(added),
    contradictions: open(after).filter((one) => had.get(one.key) !== one.events.length),
    flags: after.flags.filter(
      (flag) =>
        !flagged.has(`${flag.kind} ${flag.device} ${flag.event} ${flag.detail}`) && flag.kind !== 'not-understood'
    ),
    notUnderstood: after.notUnderstood.length - before.notUnderstood.length
  };
}

function sharesOf(added: readonly Any[]): DeviceShare[] {
  const shares = new Map<string, DeviceShare>();
  for (const { device, who, at } of added) {
    const share = shares.get(device);
    if (!share) shares.set(device, { device, who: [who], added: 1, first: at, last: at });
    else {
      share.added++;
      if (!share.who.includes(who)) share.who.push(who);
      if (Date.parse(at) < Date.parse(share.first)) share.first = at;
      if (Date.parse(at) > Date.parse(share.last)) share.last = at;
    }
  }
  return [...shares.values()];
}
