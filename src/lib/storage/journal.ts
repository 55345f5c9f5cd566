import { checkEvent } from '#lib/core/campaign/check-event.ts';
import type { CampaignEvent, UnknownEvent } from '#lib/core/campaign/event.ts';
import type { Sealed } from '#lib/core/campaign/make-event.ts';
import { rememberSeal, sha256OfText } from '#lib/core/campaign/seal.ts';
import type { CampaignSummary } from '#lib/core/campaign/summary.ts';
import type { Result } from '#lib/core/result.ts';
import type { Connection } from './connection.ts';
import { storedDraft } from './drafts.ts';
import type { StorageFault } from './fault.ts';
import type { Place, StoredEvent } from './schema.ts';

type Any = CampaignEvent | UnknownEvent;

const placeOf = (event: Any): Place => [event.campaign, event.device, event.seq, ''];

/** An event as it is kept. */
export const storedOf = ({ event, text, seal }: Pick<Sealed, 'text' | 'seal'> & { event: Any }): StoredEvent => ({
  id: event.id,
  campaign: event.campaign,
  at: placeOf(event),
  text,
  seal
});

/** Written to the disk before the transaction says that it is complete. */
export const strict = { durability: 'strict' } as const;

/** The draft of an act on its way into the record. */
export interface TakenDraft {
  name: string;
  /** What is typed there by now besides the act itself, asked inside the transaction; null: nothing. */
  now: () => unknown;
}

/**
 * Writes one event for good. It returns after the transaction has completed with strict durability, and only then may
 * anybody say *saved*. The draft it came from goes in the same transaction, and what was typed in its place meanwhile
 * stays. Safe to run again: after a lost connection the event is looked for first, and a number another tab has taken
 * meanwhile is refused (`stale`).
 */
export function append(
  connection: Connection,
  sealed: Sealed,
  summary: CampaignSummary,
  draft: TakenDraft | null = null
): Promise<Result<void, StorageFault>> {
  const { campaign } = sealed.event;
  return connection.write(async (db, attempt) => {
    const tx = db.transaction(['events', 'campaigns', 'drafts'], 'readwrite', strict);
    // A transaction that aborts rejects `done` and the request; the request's error is the one that is told.
    tx.done.catch(() => undefined);
    const events = tx.objectStore('events');
    if (attempt > 1 && (await events.get(sealed.event.id))?.text === sealed.text) return await tx.done;
    const writes: Promise<unknown>[] = [events.add(storedOf(sealed)), tx.objectStore('campaigns').put(summary)];
    if (draft !== null) {
      const drafts = tx.objectStore('drafts');
      const left = draft.now();
      writes.push(
        left === null ? drafts.delete([campaign, draft.name]) : drafts.put(storedDraft(campaign, draft.name, left))
      );
    }
    await Promise.all([...writes, tx.done]);
  });
}

/** What a campaign's log holds, read back and checked. */
export interface LoadedLog {
  events: Any[];
  /** Records that could not be read as events: kept in the database, not replayed. */
  unreadable: { id: string; path: string; cause: string }[];
}

/** Every event of a campaign. `verify` hashes each text anew and reports the ones whose seal does not fit. */
export function load(
  connection: Connection,
  campaign: string,
  verify = false
): Promise<Result<LoadedLog, StorageFault>> {
  return connection.use(async (db) => {
    const stored = await db.getAllFromIndex('events', 'campaign', campaign);
    const loaded: LoadedLog = { events: [], unreadable: [] };
    for (const one of stored) readStored(one, loaded, verify);
    return loaded;
  });
}

/** One event by its id; null when it is not there or cannot be read. */
export const loadEvent = (connection: Connection, id: string): Promise<Result<Any | null, StorageFault>> =>
  connection.use(async (db) => {
    const stored = await db.get('events', id);
    const loaded: LoadedLog = { events: [], unreadable: [] };
    if (stored) readStored(stored, loaded, false);
    return loaded.events[0] ?? null;
  });

/** Some events of a campaign, device by device; `last` is where to go on, null at the end. */
export const loadSome = (
  connection: Connection,
  campaign: string,
  after: Place | null,
  most: number
): Promise<Result<LoadedLog & { last: Place | null }, StorageFault>> =>
  connection.use(async (db) => {
    const range = IDBKeyRange.bound(after ?? [campaign], [campaign, []], after !== null);
    const stored = await db.getAllFromIndex('events', 'at', range, most);
    const loaded: LoadedLog = { events: [], unreadable: [] };
    for (const one of stored) readStored(one, loaded, false);
    return { ...loaded, last: stored.length < most ? null : (stored.at(-1)?.at ?? null) };
  });

/** Reads a kept event; what it finds goes to one list or the other. */
export function readStored(stored: StoredEvent, loaded: LoadedLog, verify: boolean): void {
  const refuse = (path: string, cause: string): void => void loaded.unreadable.push({ id: stored.id, path, cause });
  let value: unknown;
  try {
    value = JSON.parse(stored.text);
  } catch {
    refuse('', 'not JSON');
    return;
  }
  const checked = checkEvent(value);
  if (!checked.ok) refuse(checked.error.path, checked.error.cause);
  else if (verify && sha256OfText(stored.text) !== stored.seal) refuse('', 'seal does not fit');
  else {
    rememberSeal(checked.value, stored.seal);
    loaded.events.push(checked.value);
  }
}
