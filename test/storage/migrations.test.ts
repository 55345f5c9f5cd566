import 'fake-indexeddb/auto';
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { Connection } from '#lib/storage/connection.ts';
import { load } from '#lib/storage/journal.ts';
import { migrations } from '#lib/storage/schema.ts';

/** Stores of a database as an earlier version of the program wrote them: JSON of key paths, indexes and records. */
interface Fixture {
  version: number;
  campaign: string;
  stores: Record<
    string,
    {
      keyPath: string | string[] | null;
      indexes: Record<string, { keyPath: string; unique: boolean }>;
      records: [IDBValidKey | null, unknown][];
    }
  >;
}

const fixtureOf = (version: number): Fixture =>
  JSON.parse(readFileSync(new URL(`fixtures/version-${version}.json`, import.meta.url), 'utf8')) as Fixture;

function restore(name: string, fixture: Fixture): Promise<void> {
  return new Promise((resolve, reject) => {
    const request = indexedDB.open(name, fixture.version);
    request.onupgradeneeded = () => {
      for (const [store, { keyPath, indexes, records }] of Object.entries(fixture.stores)) {
        const made = request.result.createObjectStore(store, keyPath === null ? {} : { keyPath });
        for (const [index, { keyPath: path, unique }] of Object.entries(indexes))
          made.createIndex(index, path, { unique });
        for (const [key, value] of records) made.add(value, key ?? undefined);
      }
    };
    request.onsuccess = () => {
      request.result.close();
      resolve();
    };
    request.onerror = () => reject(new Error(`cannot restore version ${fixture.version}`));
  });
}

describe('migrations', () => {
  const earlier = Array.from({ length: migrations.length - 1 }, (_, n) => n + 1);

  it.each(earlier)('migrations(data of version %i) keep every event, draft, setting and campaign', async (version) => {
    const fixture = fixtureOf(version);
    await restore(`from-${version}`, fixture);
    const connection = new Connection({}, `from-${version}`);
    const loaded = await load(connection, fixture.campaign, true);
    const texts = (fixture.stores.events?.records ?? []).map(([, value]) => (value as { text: string }).text);
    expect(texts.length).toBeGreaterThan(3);
    expect(loaded).toMatchObject({ ok: true, value: { unreadable: [] } });
    const held = await connection.use(async (db) => ({
      version: db.version,
      texts: (await db.getAll('events')).map(({ text }) => text),
      drafts: await db.getAll('drafts'),
      campaigns: await db.getAll('campaigns'),
      device: await db.get('settings', 'device')
    }));
    connection.drop();
    const records = (store: string) => (fixture.stores[store]?.records ?? []).map(([, value]) => value);
    expect(held).toEqual({
      ok: true,
      value: {
        version: migrations.length,
        texts,
        drafts: records('drafts'),
        campaigns: records('campaigns'),
        device: records('settings')[0]
      }
    });
  });
});
