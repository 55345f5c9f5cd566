import type { Page } from '@playwright/test';
import { replay } from '#lib/core/campaign/replay.ts';
import { expect, expectAccessible, test } from './app.ts';
import { Desk, eventsOf, issuedPlan, openBench } from './bench-campaign.ts';

test('record: the demo opens as a list of events with who, when, what, and says that its chains are whole', async ({
  page,
  app
}) => {
  await page.goto(app.origin);
  await page.getByRole('button', { name: /demo/i }).first().click();
  await page.waitForURL(/c=/);
  const id = new URL(page.url()).searchParams.get('c') ?? '';
  await page.goto(`${app.origin}/record?c=${id}`);
  await expect(page.getByRole('heading', { name: 'Record', exact: true })).toBeVisible();
  await expect(page.getByText('Reading recorded').first()).toBeVisible();
  await page.getByLabel('Show').selectOption('changes');
  await expect(page.getByRole('cell', { name: /^Ruined/ }).first()).toBeVisible();
  await expectAccessible(page);
});

test('record: a campaign that is not here says so', async ({ page, app }) => {
  await page.goto(`${app.origin}/record?c=01890000-0000-7000-8000-0000000000c0`);
  await expect(page.getByText('This device holds no such campaign')).toBeVisible();
});

test('recover: a wiped database raises the alarm on every page, and erasing needs a saved file and a typed word', async ({
  page,
  app
}) => {
  await page.goto(app.origin);
  await page.getByRole('button', { name: /demo/i }).first().click();
  await page.waitForURL(/c=/);
  const devtools = await page.context().newCDPSession(page);
  await page.goto('about:blank');
  await devtools.send('Storage.clearDataForOrigin', { origin: app.origin, storageTypes: 'indexeddb' });
  await page.goto(app.origin);
  await page.getByRole('link', { name: 'Look now' }).click();
  await expect(page.getByText('Something is missing')).toBeVisible();
  await expect(page.getByText(/finds 0 now/)).toBeVisible();
  await expectAccessible(page);
  await page.getByRole('button', { name: 'I know' }).click();
  await expect(page.getByText('Everything that this device remembers is there')).toBeVisible();
  const erase = page.getByRole('button', { name: 'Erase this device' });
  await expect(erase).toBeDisabled();
  await page.getByLabel(/Type/).fill('erase');
  await erase.click();
  await expect(page.getByText('This device is empty')).toBeVisible();
});

test('two tabs: one writes, the other follows live and read-only until it takes over; no reading is lost', async ({
  page,
  context,
  app
}) => {
  const reading = async (tab: Page, text: string): Promise<void> => {
    await tab.bringToFront();
    const field = tab.locator('.window input');
    await field.fill(text);
    await field.press('Enter');
  };
  const follows = async (tab: Page): Promise<void> => {
    await tab.bringToFront();
    await expect(tab.getByRole('button', { name: 'Work here instead' })).toBeVisible();
    await expect(tab.locator('.window input')).toHaveCount(0);
    await tab.keyboard.type('99.9999');
  };
  await openBench(page, app.origin, new Desk(issuedPlan({ conditions: [], runSeconds: null })));
  const say = page.locator('.bench h1');
  for (const next of ['into Track 1', 'into Track 2', 'into Track 3', 'Track 1: enter']) {
    await page.keyboard.press('Enter');
    await expect(say).toContainText(next);
  }

  const other = await context.newPage();
  await other.goto(page.url());
  const alsoSay = other.locator('.bench h1');
  await follows(other);
  await reading(page, '44.2131');
  await expect(page.locator('[data-saved]')).toContainText('44.2131 g');
  await expect(other.locator('.plate').first()).toContainText('44.2131');

  await other.bringToFront();
  await other.getByRole('button', { name: 'Work here instead' }).click();
  await expect(alsoSay).toContainText('Track 2: enter');
  await follows(page);
  await reading(other, '45.3001');
  await expect(other.locator('[data-saved]')).toContainText('45.3001 g');
  await expect(page.locator('.plate').nth(1)).toContainText('45.3001');

  await other.close();
  await expect(page.getByRole('button', { name: 'Work here instead' })).toBeHidden();
  await reading(page, '43.1870');
  await expect(say).toContainText('All is loaded');

  const events = await eventsOf(page);
  const raw = events.flatMap((event) => (event.kind === 'reading-recorded' ? [event.data.raw] : []));
  expect(raw).toEqual(['44.2131', '45.3001', '43.1870']);
  expect(replay(events).flags.filter(({ kind }) => ['gap', 'fork', 'altered'].includes(kind))).toEqual([]);
});
