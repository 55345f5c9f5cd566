import type { Result } from '#lib/core/result.ts';
import type { Connection } from './connection.ts';
import type { StorageFault } from './fault.ts';

/** What the database holds, for a person who looks for what went wrong. */
export interface Inspection {
  version: number;
  newer: number | null;
  counts: Record<string, number>;
}

export const inspect = (connection: Connection): Promise<Result<Inspection, StorageFault>> =>
  connection.use(async (db) => ({
    version: db.version,
    newer: connection.newer,
    counts: Object.fromEntries(
      await Promise.all([...db.objectStoreNames].map(async (name) => [name, await db.count(name)] as const))
    )
  }));

/** Every campaign id that has events, whether or not the list of campaigns knows it. */
export const campaignsWithEvents = (connection: Connection): Promise<Result<string[], StorageFault>> =>
  connection.use(async (db) => {
    const found: string[] = [];
    const index = db.transaction('events').store.index('campaign');
    for (let cursor = await index.openKeyCursor(null, 'nextunique'); cursor; cursor = await cursor.continue())
      found.push(String(cursor.key));
    return found;
  });
