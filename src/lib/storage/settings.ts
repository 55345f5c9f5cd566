import type { Result } from '#lib/core/result.ts';
import type { Connection } from './connection.ts';
import type { StorageFault } from './fault.ts';

/** A value this device keeps by name, undefined when there is none; whoever asks checks its shape. */
export const getSetting = (connection: Connection, name: string): Promise<Result<unknown, StorageFault>> =>
  connection.use(async (db): Promise<unknown> => db.get('settings', name));

export const putSetting = (connection: Connection, name: string, value: unknown): Promise<Result<void, StorageFault>> =>
  connection.write(async (db) => {
    await db.put('settings', value, name);
  });

/** Puts a value only where there is none yet, and returns the one that stands; two tabs starting together agree. */
export const settleSetting = (
  connection: Connection,
  name: string,
  value: unknown
): Promise<Result<unknown, StorageFault>> =>
  connection.write(async (db): Promise<unknown> => {
    const tx = db.transaction('settings', 'readwrite', { durability: 'strict' });
    const held: unknown = await tx.store.get(name);
    if (held === undefined) await tx.store.put(value, name);
    await tx.done;
    return held ?? value;
  });

/** Changes a value in one transaction, so that two tabs do not undo each other, and returns the new one. */
export const changeSetting = <T>(
  connection: Connection,
  name: string,
  change: (held: unknown) => T
): Promise<Result<T, StorageFault>> =>
  connection.write(async (db) => {
    const tx = db.transaction('settings', 'readwrite', { durability: 'strict' });
    const changed = change(await tx.store.get(name));
    await Promise.all([tx.store.put(changed, name), tx.done]);
    return changed;
  });
