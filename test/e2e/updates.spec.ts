import { readFileSync } from 'node:fs';
import type { Page } from '@playwright/test';
import { expect, test, waitUntilOffline, type AppServer } from './app.ts';

const worker = readFileSync('build/service-worker.js', 'utf8');
const { version } = JSON.parse(readFileSync('build/_app/version.json', 'utf8')) as { version: string };
const next = '9.9.9-next';

/** A worker of a later version, which asks for one more file. */
const nextWorker = (extra: string): string => worker.replaceAll(version, next).replace('/manifest.webmanifest', extra);

/** The deployment of a later version: its new file is there, or missing. */
function deploy(app: AppServer, piece: 'whole' | 'with a hole'): void {
  app.answerInstead((path) => {
    if (path === '/service-worker.js') return nextWorker('/new-piece.txt');
    if (path === '/new-piece.txt') return piece === 'whole' ? 'new' : 'missing';
    return null;
  });
}

const update = (page: Page): Promise<void> =>
  page.evaluate(async () => {
    await (await navigator.serviceWorker.ready).update();
  });

/** Name of the version whose worker controls the page. */
const controller = (page: Page): Promise<string> =>
  page.evaluate(
    () =>
      new Promise((resolve) => {
        const channel = new MessageChannel();
        channel.port1.onmessage = (event: MessageEvent<{ version: string }>) => resolve(event.data.version);
        navigator.serviceWorker.controller?.postMessage({ type: 'version' }, [channel.port2]);
      })
  );

test('a later version waits for a tap, then takes over', async ({ page, app }) => {
  await page.goto(app.origin);
  await waitUntilOffline(page);
  deploy(app, 'whole');
  await update(page);
  const notice = page.getByRole('status').filter({ hasText: next });
  await expect(notice).toBeVisible();
  await page.reload();
  expect(await controller(page)).toBe(version);
  await notice.getByRole('button').click();
  await expect.poll(() => controller(page).catch(() => 'reloading')).toBe(next);
  await expect(notice).toBeHidden();
});

test('a later version that was already waiting when the page starts is offered', async ({ page, app, context }) => {
  await page.goto(app.origin);
  await waitUntilOffline(page);
  deploy(app, 'whole');
  await update(page);
  await expect(page.getByRole('status').filter({ hasText: next })).toBeVisible();
  const second = await context.newPage();
  await second.goto(app.origin);
  await expect(second.getByRole('status').filter({ hasText: next })).toBeVisible();
});

test('a later version is refused while another tab is at work', async ({ page, app, context }) => {
  await page.goto(app.origin);
  await waitUntilOffline(page);
  const other = await context.newPage();
  await other.goto(app.origin);
  await other.evaluate(() => {
    void navigator.locks.request('evenload-busy', { mode: 'shared' }, () => new Promise(() => undefined));
  });
  deploy(app, 'whole');
  await update(page);
  const notice = page.getByRole('status').filter({ hasText: next });
  await notice.getByRole('button').click();
  await expect(notice).toContainText('Another tab');
  expect(await controller(page)).toBe(version);
  await other.close();
  await notice.getByRole('button').click();
  await expect.poll(() => controller(page).catch(() => 'reloading')).toBe(next);
});

test('a later version with one missing piece keeps the old one serving, whole and offline', async ({ page, app }) => {
  await page.goto(app.origin);
  await waitUntilOffline(page);
  deploy(app, 'with a hole');
  await update(page);
  await page.goto(`${app.origin}/device`);
  await app.stop();
  await page.reload();
  await expect(page.locator('#content h1')).toBeVisible();
  expect(await controller(page)).toBe(version);
  expect(await page.evaluate(() => caches.keys())).toEqual([`evenload-${version}`]);
});
