import type { Result } from '#lib/core/result.ts';
import type { Connection } from './connection.ts';
import type { StorageFault } from './fault.ts';
import type { StoredDraft } from './schema.ts';

/**
 * Keeps something typed that is not an event yet. Relaxed durability: a draft is a comfort, an event is the record.
 * @param now what is typed at the moment of the write, which may come late; null: nothing
 */
export const putDraft = (
  connection: Connection,
  campaign: string,
  name: string,
  now: () => unknown
): Promise<Result<void, StorageFault>> =>
  connection.write(async (db) => {
    const value = now();
    if (value === null) await db.delete('drafts', [campaign, name]);
    else await db.put('drafts', storedDraft(campaign, name, value));
  });

export const storedDraft = (campaign: string, name: string, value: unknown): StoredDraft => ({
  campaign,
  name,
  value,
  at: new Date().toISOString()
});

/** Every draft of a campaign by name. */
export const draftsOf = (
  connection: Connection,
  campaign: string
): Promise<Result<Record<string, unknown>, StorageFault>> =>
  connection.use(async (db) => {
    const range = IDBKeyRange.bound([campaign, ''], [campaign, '\uffff']);
    return Object.fromEntries((await db.getAll('drafts', range)).map(({ name, value }) => [name, value]));
  });
