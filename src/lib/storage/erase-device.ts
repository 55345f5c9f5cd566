import { deleteDB } from 'idb';
import { fail, ok, type Result } from '#lib/core/result.ts';
import { forgetAll } from './canary.ts';
import type { Connection } from './connection.ts';
import { faultOf, type StorageFault } from './fault.ts';
import { databaseName } from './schema.ts';

/** The only code that deletes the database. Whoever calls it has seen a verified file of each campaign and a typed word. */
export async function eraseDatabase(connection: Connection): Promise<Result<void, StorageFault>> {
  connection.drop();
  try {
    let blocked = false;
    const deleted = deleteDB(databaseName, { blocked: () => (blocked = true) });
    const late = new Promise<'late'>((resolve) => setTimeout(() => resolve('late'), 5_000));
    if ((await Promise.race([deleted, late])) === 'late')
      return fail(blocked ? { tag: 'blocked' } : { tag: 'open-timeout', seconds: 5 });
    forgetAll();
    return ok(undefined);
  } catch (cause) {
    return fail(faultOf(cause));
  }
}
