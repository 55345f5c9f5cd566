import { type IDBPTransaction, unwrap } from 'idb';
import type { CampaignEvent, UnknownEvent } from '#lib/core/campaign/event.ts';
import type { Sealed } from '#lib/core/campaign/make-event.ts';
import type { CampaignSummary } from '#lib/core/campaign/summary.ts';
import type { Result } from '#lib/core/result.ts';
import type { Connection } from './connection.ts';
import type { StorageFault } from './fault.ts';
import { type LoadedLog, storedOf, strict } from './journal.ts';
import type { EvenloadSchema, StoredEvent } from './schema.ts';

/** An event of a file, with its exact text. */
export interface Incoming {
  event: CampaignEvent | UnknownEvent;
  text: string;
  seal: string;
}

export interface Taking {
  /** What the campaign's log held when the file was weighed against it. */
  held: LoadedLog;
  /** Events whose ids are not held, each id once. */
  added: readonly Incoming[];
  /** Other bytes under a held id. */
  aside: readonly Incoming[];
  /** This device's event that says so. */
  note: Sealed;
  /** Name of the file. */
  from: string;
  summary: CampaignSummary;
}

/** So many requests are on their way at once: enough to keep the database busy, few enough to say how far it is. */
const batch = 1_000;

/**
 * Takes accepted events of other devices in, all or none, in one transaction with the event that says so; a tab, a worker
 * or a browser that ends on the way leaves nothing of it. Events held already are left alone; the same id with other bytes
 * goes to quarantine; a number taken twice (a fork) is kept beside the first. Refused (`stale`) when the log has grown
 * since it was weighed.
 * @param progress called with the share written, 0 to 1
 * Checked by: test/storage/take-in.test.ts.
 */
export function takeIn(
  connection: Connection,
  taking: Taking,
  progress: (done: number) => void = () => {}
): Promise<Result<void, StorageFault>> {
  return connection.write(async (db, attempt) => {
    const tx = db.transaction(['events', 'campaigns', 'quarantine'], 'readwrite', strict);
    tx.done.catch(() => undefined);
    try {
      await write(tx, taking, attempt, progress);
      await tx.done;
    } catch (cause) {
      // A transaction that is merely left commits what it was asked for so far.
      abort(tx);
      throw cause;
    }
  });
}

type Stores = ('events' | 'campaigns' | 'quarantine')[];
type Transaction = IDBPTransaction<EvenloadSchema, Stores, 'readwrite'>;

function abort(tx: Transaction): void {
  try {
    tx.abort();
  } catch {
    // It had ended by itself.
  }
}

async function write(tx: Transaction, taking: Taking, attempt: number, progress: (done: number) => void) {
  const { held, added, aside, note, from, summary } = taking;
  const { campaign } = note.event;
  const events = tx.objectStore('events');
  if (attempt > 1 && (await events.get(note.event.id))?.text === note.text) return;
  const [ids, count] = await Promise.all([events.getAllKeys(), events.index('campaign').count(campaign)]);
  if (count !== held.events.length + held.unreadable.length)
    throw new DOMException('the log has grown since the file was weighed', 'ConstraintError');
  const known = new Set(ids);
  const places = new Set(held.events.map(nameOf));
  const [store, kept] = [unwrap(events) as IDBObjectStore, unwrap(tx.objectStore('quarantine')) as IDBObjectStore];
  const quarantine = ({ id, text, seal }: StoredEvent): IDBRequest =>
    kept.put({ campaign, id, text, seal, from, at: note.event.at });
  const add = (one: Incoming): IDBRequest => {
    const stored = storedOf(one);
    // The id is another campaign's, or that of a record which can no longer be read.
    if (known.has(stored.id)) return quarantine(stored);
    const place = nameOf(one.event);
    const [, device, seq] = stored.at;
    if (places.has(place)) return store.add({ ...stored, at: [campaign, device, seq, stored.id] });
    places.add(place);
    return store.add(stored);
  };
  for (let start = 0; start < added.length; start += batch) {
    await allOf(added.slice(start, start + batch).map(add));
    progress(start / added.length);
  }
  await allOf(aside.map((one) => quarantine(storedOf(one))));
  await Promise.all([events.add(storedOf(note)), tx.objectStore('campaigns').put(summary)]);
}

/**
 * Resolves when requests of one transaction have all been answered: they are answered in their order, so the last one
 * says so without a promise for each. Rejects with the error of the first that failed; what fails after it only says that
 * the transaction was aborted.
 */
function allOf(requests: readonly IDBRequest[]): Promise<void> {
  return new Promise((resolve, reject) => {
    const last = requests.at(-1);
    if (!last) return resolve();
    for (const one of requests) one.onerror = () => reject(one.error);
    last.onsuccess = () => resolve();
  });
}

const nameOf = ({ device, seq }: { device: string; seq: number }): string => `${device}/${seq}`;

/** Is an event of this id held? Waits for a transaction that is writing. */
export const holdsEvent = (connection: Connection, id: string): Promise<Result<boolean, StorageFault>> =>
  connection.use(async (db) => (await db.count('events', id)) > 0);
