import type { CampaignEvent, UnknownEvent } from '../campaign/event.ts';
import { Replay } from '../campaign/replay.ts';
import { sealOf } from '../campaign/seal.ts';
import type { CampaignState, Contradiction, RecordFlag } from '../campaign/state.ts';

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

/** How many there are of a kind. */
export interface Counted<K extends string> {
  kind: K;
  count: number;
}

/** What a file would change, before anything is changed. Small however large the file is. */
export interface ImportSummary {
  campaign: string;
  title: string;
  added: number;
  known: number;
  /** Known ids with other bytes: never applied, kept aside. */
  quarantined: number;
  devices: DeviceShare[];
  /** What would contradict that does not now. */
  contradictions: Counted<Contradiction['kind']>[];
  /** Gaps, forks, edits, jumped clocks that would be new. */
  flags: Counted<RecordFlag['kind']>[];
  /** Kinds of event that this version of the program does not understand, by name. */
  notUnderstood: Counted<string>[];
}

/** A file's events weighed against those that are held. */
export interface WeighedImport<T extends Any = Any> {
  summary: ImportSummary;
  /** Events that are not held, in the file's order. */
  added: T[];
  /** Other bytes under an id that is held, or that came earlier in the file. */
  aside: T[];
  /** What the campaign would be with all of it. */
  replay: Replay;
}

/** The union of events by id. What is held stays; other bytes under a held id are handed back, not merged. */
export function mergeEvents<T extends Any>(
  existing: readonly Any[],
  incoming: readonly T[]
): { added: T[]; aside: T[]; known: number } {
  const held = new Map<string, Any>(existing.map((event) => [event.id, event]));
  const added: T[] = [];
  const aside: T[] = [];
  let known = 0;
  for (const event of incoming) {
    const same = held.get(event.id);
    if (!same) {
      held.set(event.id, event);
      added.push(event);
    } else if (sealOf(same) === sealOf(event)) known++;
    else aside.push(event);
  }
  return { added, aside, known };
}

/**
 * What taking in the events of a file would do: new, known, contradicting, set aside. Changes nothing.
 * @param existing events of the same campaign on this device; empty when the campaign is new here
 * Cost n log n in all events together, whatever their order.
 * Checked by: test/core/exchange/campaign-file.test.ts.
 */
export function weighImport<T extends Any>(
  campaign: string,
  existing: readonly Any[],
  incoming: readonly T[]
): WeighedImport<T> {
  const { added, aside, known } = mergeEvents(existing, incoming);
  let replay = replayed(campaign, existing);
  const before = replay.state;
  const heads = new Map(before.devices.map(({ device, seq }) => [device, seq]));
  // What continues a chain is cheap to add; what goes between its links is replayed anew, once.
  if (added.every((event) => event.seq > (heads.get(event.device) ?? 0))) replayed(campaign, added, replay);
  else replay = replayed(campaign, [...existing, ...added]);
  return { summary: summaryFrom(before, replay.state, { added, aside, known }), added, aside, replay };
}

/** A device's chain is read in its own order: an event out of turn makes the whole chain be read again. */
function replayed(campaign: string, events: readonly Any[], onto = new Replay(campaign)): Replay {
  for (const event of [...events].sort((a, b) => a.seq - b.seq)) onto.apply(event);
  return onto;
}

function summaryFrom(
  before: CampaignState,
  after: CampaignState,
  { added, aside, known }: { added: readonly Any[]; aside: readonly Any[]; known: number }
): ImportSummary {
  const open = (state: CampaignState): Contradiction[] =>
    state.contradictions.filter(({ decided }) => decided === null);
  const nameOf = (flag: RecordFlag): string => `${flag.kind} ${flag.device} ${flag.event} ${flag.detail}`;
  const had = new Map(open(before).map((one) => [one.key, one.events.length]));
  const flagged = new Set(before.flags.map(nameOf));
  const fresh = after.flags.filter((flag) => !flagged.has(nameOf(flag)));
  const strange = new Set(before.notUnderstood.map(({ id }) => id));
  return {
    campaign: after.id,
    title: after.title,
    added: added.length,
    known,
    quarantined: aside.length,
    devices: sharesOf(added),
    contradictions: countsOf(open(after).filter((one) => had.get(one.key) !== one.events.length)),
    flags: countsOf(fresh.filter(({ kind }) => kind !== 'not-understood')),
    notUnderstood: countsOf(after.notUnderstood.filter(({ id }) => !strange.has(id)))
  };
}

function countsOf<K extends string>(list: readonly { kind: K }[]): Counted<K>[] {
  const counts = new Map<K, number>();
  for (const { kind } of list) counts.set(kind, (counts.get(kind) ?? 0) + 1);
  return [...counts].map(([kind, count]) => ({ kind, count }));
}

function sharesOf(added: readonly Any[]): DeviceShare[] {
  const shares = new Map<string, { share: DeviceShare; from: number; to: number }>();
  for (const { device, who, at } of added) {
    const instant = Date.parse(at);
    const found = shares.get(device);
    if (!found) {
      const share: DeviceShare = { device, who: [who], added: 1, first: at, last: at };
      shares.set(device, { share, from: instant, to: instant });
      continue;
    }
    const { share } = found;
    share.added++;
    if (!share.who.includes(who)) share.who.push(who);
    if (instant < found.from) [share.first, found.from] = [at, instant];
    if (instant > found.to) [share.last, found.to] = [at, instant];
  }
  return [...shares.values()].map(({ share }) => share);
}
