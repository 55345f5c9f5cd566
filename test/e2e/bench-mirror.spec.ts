import type { Page } from '@playwright/test';
import { expect, test } from './app.ts';
import { Desk, enter, issuedPlan, openBench } from './bench-campaign.ts';
import { recordSession } from './bench-record.ts';

/** The browser's private file system stands in for the folder that a person would choose. */
function standIn(): void {
  const handle = FileSystemHandle.prototype as unknown as Record<string, unknown>;
  handle.queryPermission = () => Promise.resolve(localStorage.getItem('test permission') ?? 'granted');
  handle.requestPermission = () => {
    localStorage.setItem('test asked', String(Number(localStorage.getItem('test asked')) + 1));
    localStorage.setItem('test permission', 'granted');
    return Promise.resolve('granted');
  };
  (globalThis as unknown as Record<string, unknown>).showDirectoryPicker = async () =>
    (await navigator.storage.getDirectory()).getDirectoryHandle('copies', { create: true });
}

/** Text of the files in the folder, the newer generation first. */
const files = (page: Page) =>
  page.evaluate(async () => {
    const folder = await (await navigator.storage.getDirectory()).getDirectoryHandle('copies', { create: true });
    const found: { name: string; text: string }[] = [];
    for await (const [name, handle] of (
      folder as unknown as { entries: () => AsyncIterable<[string, FileSystemFileHandle]> }
    ).entries())
      if (!name.endsWith('.crswap')) found.push({ name, text: await (await handle.getFile()).text() });
    return found.sort((a, b) => a.name.length - b.name.length);
  });
const newest = async (page: Page) => (await files(page))[0]?.text ?? '';

test('a copy in a folder follows the record in two generations, waits for permission, and harms no other file', async ({
  page,
  app
}) => {
  await page.addInitScript(standIn);
  const issued = issuedPlan({ conditions: [] });
  const desk = new Desk(issued);
  const [first] = issued.sessions;
  if (!first) throw new Error('twelve sessions are planned');
  recordSession(desk, issued.plan.readings, first, 'loaded', () => null);
  await openBench(page, app.origin, desk);
  const safe = page.locator('.strip .safe');

  await safe.click();
  await page.getByRole('button', { name: 'Choose a folder' }).click();
  await expect(page.getByText('Copies into “copies” on its own.')).toBeVisible();
  await expect(page.getByText(`${desk.events.length} entries.`)).toBeVisible();
  const [begun] = await files(page);
  expect(begun?.text.split('\n').length, 'header, events, footer, last line end').toBe(desk.events.length + 3);

  await page.getByRole('link', { name: 'Back to the bench' }).click();
  await expect(page.locator('.window input:focus')).toBeVisible();
  await enter(page, '44.2131');
  await expect.poll(() => newest(page)).toContain('44.2131');
  expect((await files(page)).map(({ name }) => name.replace(/^.*-\w{8}/u, ''))).toEqual(['.jsonl', '-before.jsonl']);
  expect((await files(page))[1]?.text, 'the generation before is the whole file that stood there').toBe(begun?.text);
  await expect(safe).toHaveAttribute('title', /Copied to copies at \d\d:\d\d/);

  // After a start the browser may want to be asked anew: it is said, and one tap goes on.
  await page.evaluate(() => localStorage.setItem('test permission', 'prompt'));
  await page.reload();
  await expect(safe).toContainText('copying paused');
  await expect(page.locator('.window input:focus')).toBeVisible();
  await enter(page, '45.3001');
  await expect(page.locator('[data-saved]')).toContainText('45.3001 g, Track 2');
  expect(await newest(page)).not.toContain('45.3001');
  expect(await page.evaluate(() => localStorage.getItem('test asked')), 'nobody is asked without a tap').toBeNull();
  await safe.click();
  await expect.poll(() => newest(page)).toContain('45.3001');
  await expect(safe).toContainText('not exported');
  expect(await page.evaluate(() => localStorage.getItem('test asked'))).toBe('1');

  // Somebody has put another file in the place: it is left alone, and that is said.
  await page.evaluate(async () => {
    const folder = await (await navigator.storage.getDirectory()).getDirectoryHandle('copies');
    const names: string[] = [];
    for await (const name of (folder as unknown as { keys: () => AsyncIterable<string> }).keys()) names.push(name);
    const [name = ''] = names.sort((a, b) => a.length - b.length);
    const stream = await (await folder.getFileHandle(name)).createWritable();
    await stream.write('shopping list\n');
    await stream.close();
  });
  await enter(page, '43.9002');
  await expect(safe).toContainText('copy is behind');
  expect(await newest(page)).toBe('shopping list\n');
  await safe.click();
  await expect(page.getByText('belongs to another campaign or cannot be read. It was left alone.')).toBeVisible();
  await page.getByRole('button', { name: 'Stop copying' }).click();
  await expect(page.getByText('This browser can keep a copy')).toBeVisible();
});
