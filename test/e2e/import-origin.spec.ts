import { mkdtempSync, readFileSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Page } from '@playwright/test';
import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import { canonicalJson } from '#lib/core/campaign/seal.ts';
import { writeCampaignFile } from '#lib/core/exchange/campaign-file.ts';
import { campaign, deviceA, Recorder } from '../core/campaign/story.ts';
import { type AppServer, expect, expectAccessible, test, watchContext } from './app.ts';

/** The demo on a device of its own, at its shift end. */
async function tablet(page: Page, app: AppServer): Promise<void> {
  await page.goto(app.origin);
  await page.getByRole('button', { name: /demo/ }).click();
  await page.waitForURL(/plan\?c=/);
  await page.goto(page.url().replace('/plan', '/shift'));
}

async function exported(page: Page, name: string): Promise<string> {
  const download = page.waitForEvent('download');
  await page
    .getByRole('button', { name: /^(Save|Export|Download)/ })
    .first()
    .click();
  const path = join(mkdtempSync(join(tmpdir(), 'evenload-')), name);
  await (await download).saveAs(path);
  return path;
}

const drop = (page: Page, ...paths: string[]): Promise<void> => page.locator('input[type=file]').setInputFiles(paths);

test('a tablet’s file is new, then known once accepted; an edited one is altered', async ({ page, app, browser }) => {
  await page.addInitScript(() => Reflect.deleteProperty(globalThis, 'showSaveFilePicker'));
  await tablet(page, app);
  await expect(page.getByText('Signed with this device’s key.')).toBeVisible();
  const first = await exported(page, 'first.jsonl');

  const context = await browser.newContext();
  const faults = await watchContext(context, app.origin);
  const desk = await context.newPage();
  await desk.goto(`${app.origin}/desk`);
  await drop(desk, first);
  const card = (name: string) => desk.getByRole('article', { name });
  await expect(card('first.jsonl').getByText('New tablet', { exact: true })).toBeVisible();
  const shown = await card('first.jsonl').locator('.key').innerText();
  await expectAccessible(desk);
  await card('first.jsonl').getByLabel('Name of the tablet').fill('Tablet at the scrub machine');
  await card('first.jsonl').getByRole('button', { name: 'Accept this tablet' }).click();
  await expect(card('first.jsonl').getByText('Known tablet', { exact: true })).toBeVisible();
  await card('first.jsonl').getByRole('button', { name: 'Take it in', exact: true }).click();
  await expect(card('first.jsonl').getByText(/^first.jsonl Taken in/)).toBeVisible();

  const text = readFileSync(await exported(page, 'second.jsonl'), 'utf8');
  const second = join(tmpdir(), `${crypto.randomUUID()}-second.jsonl`);
  writeFileSync(second, text);
  const edited = second.replace('second', 'edited');
  writeFileSync(
    edited,
    text.replace(/"raw":"(\d)/, (_all, digit: string) => `"raw":"${(Number(digit) + 1) % 10}`)
  );
  await drop(desk, second, edited);
  await expect(card(second.split('/').at(-1) ?? '').getByText('Known tablet', { exact: true })).toBeVisible();
  await expect(card(second.split('/').at(-1) ?? '').getByText('Tablet at the scrub machine:')).toBeVisible();
  await expect(card(edited.split('/').at(-1) ?? '').getByText('Altered', { exact: true })).toBeVisible();
  await expectAccessible(desk);

  await page.goto(`${app.origin}/device`);
  await expect(page.getByText(shown.replace(/^Key\s*/, ''))).toBeVisible();
  await desk.goto(`${app.origin}/device`);
  await desk.getByRole('button', { name: 'Remove Tablet at the scrub machine' }).click();
  await expect(desk.getByText('None yet.')).toBeVisible();
  await expectAccessible(desk);
  expect(faults).toEqual([]);
  await context.close();
});

test('damaged, later and hostile files name line and cause, what is safe and what to do', async ({ page, app }) => {
  const { events } = new Recorder(deviceA).begin();
  const maker = { campaign, title: 'T', device: deviceA, at: '2026-03-02T08:00:00.000+01:00', app: '0.0.0' };
  const whole = writeCampaignFile(events, maker);
  const lines = whole.split('\n');
  const [head = '', created = '', issued = '', foot = ''] = lines;
  const strange = canonicalJson({ ...(JSON.parse(issued) as CampaignEvent), kind: 'of-the-future', data: {} });
  const folder = mkdtempSync(join(tmpdir(), 'evenload-'));
  const file = (name: string, text: string): string => {
    writeFileSync(join(folder, name), text);
    return join(folder, name);
  };
  await page.goto(`${app.origin}/desk`);
  await drop(
    page,
    file('cut.jsonl', `${head}\n${created}\n${issued.slice(0, 90)}`),
    file('edited.jsonl', whole.replace('Invented wall paints', 'Invented wall paint!')),
    file('later.jsonl', whole.replace('"version":1', '"version":9')),
    file(
      'hostile.jsonl',
      [head, created.replace('"data":{', '"data":{"__proto__":{"x":1},'), issued, foot, ''].join('\n')
    ),
    file('page.jsonl', '<!doctype html><script>alert(1)</script>'),
    file(
      'strange.jsonl',
      writeCampaignFile([JSON.parse(created) as CampaignEvent, JSON.parse(strange) as CampaignEvent], maker)
    )
  );
  for (const [name, ...said] of [
    ['cut.jsonl', 'This file is incomplete.', 'Line 3: cannot be read', 'Nothing here was changed', 'ask the tablet'],
    ['edited.jsonl', 'changed or damaged', 'check sum', 'Nothing here was changed', 'ask the tablet'],
    ['later.jsonl', 'later version of the program (format 9', 'Nothing here was changed', 'Update this device'],
    ['hostile.jsonl', 'Line 2: bears a forbidden name', 'Nothing here was changed', 'ask the tablet'],
    ['page.jsonl', 'This is a web page', 'Nothing here was changed', 'campaign file itself is needed'],
    ['strange.jsonl', '1 event comes from a later version', 'of-the-future', 'update this device']
  ] as const)
    for (const words of said) await expect(page.getByRole('article', { name }), name).toContainText(words);
  await expectAccessible(page);
});
