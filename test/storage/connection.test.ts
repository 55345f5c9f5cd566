import 'fake-indexeddb/auto';
import { describe, expect, it, vi } from 'vitest';
import { Connection } from '#lib/storage/connection.ts';

let name = 0;
const openRaw = (database: string, version: number): Promise<IDBDatabase> =>
  new Promise((resolve, reject) => {
    const request = indexedDB.open(database, version);
    request.onupgradeneeded = (event) => {
      if (event.oldVersion > 0) return;
      const events = request.result.createObjectStore('events', { keyPath: 'id' });
      events.createIndex('place', 'place', { unique: true });
      events.createIndex('campaign', 'campaign');
      for (const store of ['campaigns', 'drafts', 'quarantine', 'settings']) request.result.createObjectStore(store);
    };
    request.onsuccess = () => resolve(request.result);
    request.onerror = () => reject(new Error('open failed'));
  });

describe('Connection', () => {
  it('use() behind a tab with an older version tells that it is blocked, and goes on once that tab is gone', async () => {
    const database = `connection-${name++}`;
    const old = await openRaw(database, 1);
    const onBlocked = vi.fn(() => old.close());
    const connection = new Connection({ onBlocked }, database);
    expect(await connection.use((db) => db.count('events'))).toEqual({ ok: true, value: 0 });
    expect(onBlocked).toHaveBeenCalledOnce();
    connection.drop();
  });

  it('use() behind a tab with an older version that stays says blocked instead of waiting for ever', async () => {
    try {
      const database = `connection-${name++}`;
      const old = await openRaw(database, 1);
      vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout'] });
      const onBlocked = vi.fn();
      const connection = new Connection({ onBlocked }, database);
      const used = connection.use((db) => db.count('events'));
      await vi.waitFor(() => expect(onBlocked).toHaveBeenCalled());
      await vi.advanceTimersByTimeAsync(30_000);
      expect(await used).toEqual({ ok: false, error: { tag: 'blocked' } });
      old.close();
    } finally {
      vi.useRealTimers();
    }
  });

  it('a later version of the program closes this connection and says so; this one then only reads', async () => {
    const database = `connection-${name++}`;
    const onSuperseded = vi.fn();
    const connection = new Connection({ onSuperseded }, database);
    await connection.use((db) => db.put('settings', 'en', 'locale'));
    const later = await openRaw(database, 99);
    expect(onSuperseded).toHaveBeenCalledOnce();
    later.close();
    expect(await connection.use((db) => db.get('settings', 'locale'))).toEqual({ ok: true, value: 'en' });
    expect(await connection.write((db) => db.put('settings', 'de', 'locale'))).toEqual({
      ok: false,
      error: { tag: 'newer-schema', version: 99 }
    });
    connection.drop();
  });
});
