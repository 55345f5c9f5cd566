import {
  type CoreCheckpoint,
  replayVersion,
  type SessionCheckpoint,
  type SessionHead
} from '#lib/core/campaign/checkpoint.ts';
import type { CampaignEvent, UnknownEvent } from '#lib/core/campaign/event.ts';
import type { DeviceState } from '#lib/core/campaign/state.ts';
import type { Result } from '#lib/core/result.ts';
import type { Connection } from './connection.ts';
import type { StorageFault } from './fault.ts';
import { type LoadedLog, readStored } from './journal.ts';
import type { Database, StoredCheckpoint, StoredEvent } from './schema.ts';

type Any = CampaignEvent | UnknownEvent;
type Chain = Pick<DeviceState, 'device' | 'seq' | 'head'>;

/** The replay of another program may say otherwise: its checkpoints are not used. */
const program = `${__APP_VERSION__}/${replayVersion}`;

const core = 'core';
const stamp = 'stamp';
const headOf = (session: string): string => `s:${session}`;
const eventsOf = (session: string): string => `e:${session}`;
const parts = (campaign: string, kind: string): IDBKeyRange =>
  IDBKeyRange.bound([campaign, `${kind}:`], [campaign, `${kind}:\uffff`]);

/** A checkpoint that fits the log, and what the log holds beyond it. */
export interface LoadedCheckpoint {
  core: CoreCheckpoint;
  parts: Map<string, { head: SessionHead; runs: string }>;
  /** Which checkpoint it is. */
  stamp: string;
  /** Events after the checkpoint. */
  rest: Any[];
  /** The last events of one device up to the checkpoint. */
  tail: Any[];
}

/**
 * The checkpoint of a campaign; null when there is none that another reading of the log would confirm: it must be of
 * this program, the log must hold the events it ends with, to the hash, and as many events as it says.
 * @param device whose last `most` events before the checkpoint are wanted too
 */
export const loadCheckpoint = (
  connection: Connection,
  campaign: string,
  device: string,
  most = 60
): Promise<Result<LoadedCheckpoint | null, StorageFault>> =>
  connection.use(async (db) => {
    const tx = db.transaction(['checkpoints', 'events']);
    tx.done.catch(() => undefined);
    const kept = tx.objectStore('checkpoints');
    const stored = (await kept.get([campaign, core])) as StoredCheckpoint | undefined;
    const read = stored && readCore(stored.text);
    if (!read) return null;
    const chains = read.devices.map(({ state }) => state);
    const at = tx.objectStore('events').index('at');
    const [total, heads, which, ...ends] = await Promise.all([
      tx.objectStore('events').index('campaign').count(campaign),
      kept.getAll(parts(campaign, 's')) as Promise<StoredCheckpoint[]>,
      kept.get([campaign, stamp]),
      ...chains.map((one) =>
        at.getAll(
          IDBKeyRange.bound(
            [campaign, one.device, one.device === device ? one.seq - most : one.seq, ''],
            [campaign, one.device, Infinity, '']
          )
        )
      )
    ]);
    const found = beyond(chains, ends);
    if (!found || total !== read.events + found.rest.length) return null;
    const parsed = parse<SessionHead[]>(`[${heads.map(({ text }) => text).join(',')}]`);
    if (!parsed) return null;
    const byId = heads.map(({ runs = '' }, n) => {
      const head = parsed[n] as SessionHead;
      return [head.state.id, { head, runs }] as const;
    });
    return { core: read, parts: new Map(byId), stamp: which?.text ?? '', ...found };
  });

function readCore(text: string): CoreCheckpoint | null {
  const read = parse<{ program: string; core: CoreCheckpoint }>(text);
  return read?.program === program ? read.core : null;
}

function parse<T>(text: string): T | null {
  try {
    return JSON.parse(text) as T;
  } catch {
    return null;
  }
}

/** What the chains hold beyond their heads; null when a head is not there, or something cannot be read. */
function beyond(chains: readonly Chain[], ends: readonly StoredEvent[][]): { rest: Any[]; tail: Any[] } | null {
  const rest: Any[] = [];
  const tail: Any[] = [];
  for (const [n, { seq, head }] of chains.entries()) {
    const end = ends[n] ?? [];
    if (!end.some((one) => one.at[2] === seq && one.seal === head)) return null;
    const read: LoadedLog = { events: [], unreadable: [] };
    for (const one of end) readStored(one, read, false);
    if (read.unreadable.length > 0) return null;
    for (const event of read.events) (event.seq > seq ? rest : tail).push(event);
  }
  return { rest, tail };
}

/** What a log holds beyond what is known of it; null when that is not all that is new. */
export const loadBeyond = (
  connection: Connection,
  campaign: string,
  known: { devices: readonly Chain[]; events: number }
): Promise<Result<Any[] | null, StorageFault>> =>
  connection.use(async (db) => {
    const store = db.transaction('events').store;
    const [total, ...ends] = await Promise.all([
      store.index('campaign').count(campaign),
      ...known.devices.map(({ device, seq }) =>
        store.index('at').getAll(IDBKeyRange.bound([campaign, device, seq, ''], [campaign, device, Infinity, '']))
      )
    ]);
    const found = beyond(known.devices, ends);
    return found && total === known.events + found.rest.length ? found.rest : null;
  });

/** The events of sessions, from their parts of the checkpoint; null when one is not there or cannot be read. */
export const loadSessions = (
  connection: Connection,
  campaign: string,
  sessions: readonly string[]
): Promise<Result<Map<string, CampaignEvent[]> | null, StorageFault>> =>
  connection.use(async (db) => {
    const store = db.transaction('checkpoints').store;
    const stored = await Promise.all(sessions.map((id) => store.get([campaign, eventsOf(id)])));
    const read = new Map<string, CampaignEvent[]>();
    for (const [n, one] of stored.entries()) {
      const events = parse<CampaignEvent[]>(one?.text ?? '');
      if (!events) return null;
      read.set(sessions[n] ?? '', events);
    }
    return read;
  });

/** A part of a checkpoint as it is kept: made into text before the write, which then takes no time. */
export interface WrittenPart {
  session: string;
  head: string;
  runs: string;
  events: string;
}

export const writtenPart = (session: string, { head, runs, events }: SessionCheckpoint): WrittenPart => ({
  session,
  head: JSON.stringify(head),
  runs,
  events: JSON.stringify(events)
});

export const writtenCore = (checkpoint: CoreCheckpoint): string => JSON.stringify({ program, core: checkpoint });

/** So many parts go into one transaction. */
const batch = 25;

/** A checkpoint on its way into the database. */
export interface MadeCheckpoint {
  core: string;
  /** The sessions that have changed since the checkpoint that it goes over. */
  parts: readonly WrittenPart[];
  stamp: string;
  /** Stamp of the checkpoint that it goes over; null: it has every session and goes over any. */
  over: string | null;
}

/**
 * Keeps a checkpoint over the one before. A small one is one transaction; while a large one is written there is none.
 * Relaxed durability, and no store that a reading needs.
 * @param pause what to wait for between two transactions
 * @returns false when another tab has kept one meanwhile, which stands
 */
export const saveCheckpoint = (
  connection: Connection,
  campaign: string,
  made: MadeCheckpoint,
  pause: () => Promise<unknown>
): Promise<Result<boolean, StorageFault>> =>
  connection.write(async (db) => {
    let { over } = made;
    let from = 0;
    for (; made.parts.length - from > batch; from += batch) {
      if (!(await put(db, campaign, made, over, made.parts.slice(from, from + batch), null))) return false;
      over = made.stamp;
      await pause();
    }
    return put(db, campaign, made, over, made.parts.slice(from), made.core);
  });

async function put(
  db: Database,
  campaign: string,
  made: MadeCheckpoint,
  over: string | null,
  list: readonly WrittenPart[],
  last: string | null
): Promise<boolean> {
  const tx = db.transaction('checkpoints', 'readwrite');
  tx.done.catch(() => undefined);
  const held = (await tx.store.get([campaign, stamp]))?.text;
  // Tried again after a lost connection, its own stamp may be there already.
  if (over !== null && held !== over && held !== made.stamp) return false;
  const writes: Promise<unknown>[] = [tx.done, tx.store.put({ campaign, part: stamp, text: made.stamp })];
  for (const { session, head, runs, events } of list) {
    writes.push(tx.store.put({ campaign, part: headOf(session), text: head, runs }));
    writes.push(tx.store.put({ campaign, part: eventsOf(session), text: events }));
  }
  if (last === null) writes.push(tx.store.delete([campaign, core]));
  else writes.push(tx.store.put({ campaign, part: core, text: last }));
  await Promise.all(writes);
  return true;
}
