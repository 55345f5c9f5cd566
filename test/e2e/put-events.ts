import type { Page } from '@playwright/test';
import type { Sealed } from '#lib/core/campaign/make-event.ts';

/** Puts sealed events on the device of the page as if they had been brought in, and says who works there. */
export async function putEvents(
  page: Page,
  sealed: readonly Pick<Sealed, 'event' | 'text' | 'seal'>[],
  who: string
): Promise<void> {
  const stored = sealed.map(({ event, text, seal }) => ({
    id: event.id,
    campaign: event.campaign,
    at: [event.campaign, event.device, event.seq, ''],
    text,
    seal
  }));
  await page.evaluate(
    async ({ events, name }) => {
      const db = await new Promise<IDBDatabase>((resolve, reject) => {
        const request = indexedDB.open('evenload');
        request.onsuccess = () => resolve(request.result);
        request.onerror = () => reject(request.error ?? new Error('open'));
      });
      const tx = db.transaction(['events', 'settings'], 'readwrite');
      for (const event of events) tx.objectStore('events').put(event);
      tx.objectStore('settings').put(name, 'who');
      await new Promise((resolve, reject) => {
        tx.oncomplete = resolve;
        tx.onabort = () => reject(tx.error ?? new Error('aborted'));
      });
      db.close();
    },
    { events: stored, name: who }
  );
}
