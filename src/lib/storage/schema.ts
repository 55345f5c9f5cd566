import type { DBSchema, IDBPDatabase, IDBPTransaction, StoreNames } from 'idb';
import type { CampaignSummary } from '#lib/core/campaign/summary.ts';

/** An event as it is kept: its exact text, what that text hashes to, and where it belongs. */
export interface StoredEvent {
  id: string;
  campaign: string;
  /** `campaign/device/seq`, unique; an event that takes a number already taken (a fork) adds its id. */
  place: string;
  text: string;
  seal: string;
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
  events: { key: string; value: StoredEvent; indexes: { place: string; campaign: string } };
  campaigns: { key: string; value: CampaignSummary };
  drafts: { key: [string, string]; value: StoredDraft };
  quarantine: { key: [string, string, string]; value: StoredQuarantine };
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
    events.createIndex('place', 'place', { unique: true });
    events.createIndex('campaign', 'campaign');
    db.createObjectStore('campaigns', { keyPath: 'id' });
    db.createObjectStore('drafts', { keyPath: ['campaign', 'name'] });
    db.createObjectStore('quarantine', { keyPath: ['campaign', 'id', 'seal'] });
    db.createObjectStore('settings');
  }
];

export const databaseName = 'evenload';
