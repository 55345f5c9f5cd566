import type { Result } from '#lib/core/result.ts';
import type { Connection } from './connection.ts';
import type { StorageFault } from './fault.ts';

/** How many events the database holds of each of the given campaigns. */
export const countEvents = (
  connection: Connection,
  campaigns: readonly string[]
): Promise<Result<Record<string, number>, StorageFault>> =>
  connection.use(async (db) => {
    const index = db.transaction('events').store.index('campaign');
    return Object.fromEntries(await Promise.all(campaigns.map(async (id) => [id, await index.count(id)] as const)));
  });
