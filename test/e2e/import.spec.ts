import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Page } from '@playwright/test';
import { writeCampaignFile } from '#lib/core/exchange/campaign-file.ts';
import { bigCampaign } from '../bench/big-campaign.ts';
import { campaign, deviceA } from '../core/campaign/story.ts';
import { expect, expectAccessible, test } from './app.ts';

/** An invented campaign of another device, as its file. */
function bigFile(sessions: number): string {
  const events = bigCampaign(deviceA, sessions);
  const maker = { campaign, title: 'Large', device: deviceA, at: '2026-03-02T08:00:00.000+01:00', app: '0.0.0' };
  const path = join(mkdtempSync(join(tmpdir(), 'evenload-')), 'large.jsonl');
  writeFileSync(path, writeCampaignFile(events, maker));
  return path;
}

// A path: handing bytes over would itself keep the page busy.
const drop = (page: Page, path: string): Promise<void> => page.locator('input[type=file]').setInputFiles(path);

/** How many records each store of the database holds. */
const held = (page: Page): Promise<Record<string, number>> =>
  page.evaluate(
    () =>
      new Promise((resolve, reject) => {
        const opening = indexedDB.open('evenload');
        opening.onerror = () => reject(new Error('not opened'));
        opening.onsuccess = () => {
          const names = ['events', 'campaigns', 'quarantine'];
          const tx = opening.result.transaction(names);
          const counts: Record<string, number> = {};
          for (const name of names) {
            const count = tx.objectStore(name).count();
            count.onsuccess = () => (counts[name] = count.result);
          }
          tx.oncomplete = () => (opening.result.close(), resolve(counts));
        };
      })
  );

const sessions = Number(process.env.IMPORT_SESSIONS ?? 100);
let file = '';
test.beforeAll(() => {
  file = bigFile(sessions);
});

test('a large file is read and taken in, all of it', async ({ page, app }) => {
  await page.goto(`${app.origin}/desk`);
  await expect(page.getByText('Choose files')).toBeVisible();
  await drop(page, file);
  await expect(page.getByText(`${sessions * 50} events are new`)).toBeVisible({ timeout: 60_000 });
  await page.getByRole('button', { name: 'Take it in', exact: true }).click();
  await expect(page.getByText(`Taken in: ${sessions * 50} new events`)).toBeVisible({ timeout: 60_000 });
  expect(await held(page)).toEqual({ events: sessions * 50 + 1, campaigns: 1, quarantine: 0 });
});

test('an import that is cancelled while it reads or writes leaves nothing behind', async ({ page, app }) => {
  await page.goto(`${app.origin}/desk`);
  await drop(page, file);
  await page.getByRole('button', { name: 'Cancel' }).click();
  await expect(page.getByText('Cancelled. Nothing of it was taken in')).toBeVisible();
  await page.getByRole('button', { name: 'Read it once more' }).click();
  await page.getByRole('button', { name: 'Take it in', exact: true }).click();
  await page.getByRole('button', { name: 'Cancel' }).click();
  await expect(page.getByText('Cancelled. Nothing of it was taken in')).toBeVisible();
  expect(await held(page)).toEqual({ events: 0, campaigns: 0, quarantine: 0 });
  await expectAccessible(page);
});
