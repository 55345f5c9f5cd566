import type { CampaignSummary } from '#lib/core/campaign/summary.ts';
import type { Result } from '#lib/core/result.ts';
import type { Connection } from './connection.ts';
import type { StorageFault } from './fault.ts';

/** Every campaign on this device, newest first. */
export const listCampaigns = (connection: Connection): Promise<Result<CampaignSummary[], StorageFault>> =>
  connection.use(async (db) =>
    (await db.getAll('campaigns')).sort((a, b) => ((a.createdAt ?? '') < (b.createdAt ?? '') ? 1 : -1))
  );

/** Takes an invented demo off the device; anything that is not one is refused before a byte is touched. */
export const removeDemoCampaign = (connection: Connection, id: string): Promise<Result<boolean, StorageFault>> =>
  connection.write(async (db) => {
    const tx = db.transaction(['events', 'campaigns', 'drafts', 'quarantine', 'checkpoints'], 'readwrite');
    tx.done.catch(() => undefined);
    const summary = await tx.objectStore('campaigns').get(id);
    const isDemo = summary?.demo === true;
    if (isDemo) {
      const keys = await tx.objectStore('events').index('campaign').getAllKeys(id);
      const range = IDBKeyRange.bound([id, ''], [id, '\uffff']);
      const asides = IDBKeyRange.bound([id, '', ''], [id, '\uffff', '']);
      await Promise.all([
        ...keys.map((key) => tx.objectStore('events').delete(key)),
        tx.objectStore('drafts').delete(range),
        tx.objectStore('checkpoints').delete(range),
        tx.objectStore('quarantine').delete(asides),
        tx.objectStore('campaigns').delete(id)
      ]);
    }
    await tx.done;
    return isDemo;
  });
