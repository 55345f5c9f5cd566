import type { DBSchema, IDBPDatabase, IDBPTransaction, StoreNames } from 'idb';
import type { CampaignSummary } from '#lib/core/campaign/summary.ts';

/** An event as it is kept: its exact text, what that text hashes to, and where it belongs. */
export interface StoredEvent {
  id: string;
  campaign: string;
  /** Campaign, device, sequence number, and '' (the id, for an event that takes a number already taken); unique. */
  at: Place;
  text: string;
  seal: string;
}

export type Place = [campaign: string, device: string, seq: number, fork: string];

/** A part of a campaign's checkpoint; it can always be made again from the events. */
export interface StoredCheckpoint {
  campaign: string;
  /** `core`, `stamp`, `s:` and a session's id (what is needed at once), `e:` and a session's id (its events). */
  part: string;
  text: string;
  /** Of a session: its runs. */
  runs?: string;
}

/** Something typed that is not an event yet. */
export interface StoredDraft {
  campaign: string;
  name: string;
  value: unknown;
  at: string;
}

/** An event that came with a known id and other bytes; never applied, never thrown away. */
export interface StoredQuarantine {
  campaign: string;
  id: string;
  text: string;
  seal: string;
  from: string;
  at: string;
}

export interface EvenloadSchema extends DBSchema {
  events: { key: string; value: StoredEvent; indexes: { at: Place; campaign: string } };
  campaigns: { key: string; value: CampaignSummary };
  drafts: { key: [string, string]; value: StoredDraft };
  quarantine: { key: [string, string, string]; value: StoredQuarantine };
  checkpoints: { key: [string, string]; value: StoredCheckpoint };
  settings: { key: string; value: unknown };
}

export type Database = IDBPDatabase<EvenloadSchema>;
export type StoreName = StoreNames<EvenloadSchema>;
type Upgrade = IDBPTransaction<EvenloadSchema, StoreName[], 'versionchange'>;

/**
 * Numbered steps from one schema to the next; step i leads from version i to i + 1. Steps are only ever appended, and each
 * has a fixture of the data it starts from in test/storage/fixtures.
 */
export const migrations: ((db: Database, tx: Upgrade) => void | Promise<void>)[] = [
  (db) => {
    const events = db.createObjectStore('events', { keyPath: 'id' });
    createIndex(events, 'place', true);
    events.createIndex('campaign', 'campaign');
    db.createObjectStore('campaigns', { keyPath: 'id' });
    db.createObjectStore('drafts', { keyPath: ['campaign', 'name'] });
    db.createObjectStore('quarantine', { keyPath: ['campaign', 'id', 'seal'] });
    db.createObjectStore('settings');
  },
  // 2: places become keys that sort by number, so that the events after a checkpoint can be asked for.
  async (db, tx) => {
    db.createObjectStore('checkpoints', { keyPath: ['campaign', 'part'] });
    const events = tx.objectStore('events');
    for (let cursor = await events.openCursor(); cursor; cursor = await cursor.continue()) {
      const { place, ...rest } = cursor.value as StoredEvent & { place: string };
      const [campaign = '', device = '', seq = '0', fork = ''] = place.split('/');
      await cursor.update({ ...rest, at: [campaign, device, Number(seq), fork] });
    }
    (events as unknown as IDBObjectStore).deleteIndex('place');
    createIndex(events, 'at', true);
  }
];

/** For indexes that only an older schema knows by its types. */
function createIndex(store: unknown, name: string, unique: boolean): void {
  (store as IDBObjectStore).createIndex(name, name, { unique });
}

export const databaseName = 'evenload';
