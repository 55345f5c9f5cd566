import { readFileSync } from 'node:fs';
import type { Page } from '@playwright/test';
import { replay } from '#lib/core/campaign/replay.ts';
import { stateHash } from '#lib/core/campaign/state-hash.ts';
import { expect, test, waitUntilOffline, watchContext } from './app.ts';
import { enter, eventsOf } from './bench-campaign.ts';

const hashOf = async (page: Page): Promise<string> => stateHash(replay(await eventsOf(page)));

/** Everything that the results say of the treatments: the answer, the means and every pair. */
async function resultsOf(page: Page, origin: string, campaign: string): Promise<string[]> {
  await page.goto(`${origin}/results?c=${campaign}`);
  await expect(page.getByRole('table', { name: /every treatment, best first/ })).toBeVisible({ timeout: 30_000 });
  return page.locator('#content table').allInnerTexts();
}

test('the whole job with the server dead: load, read, ruin, reload, close, hand over; another device sees the same', async ({
  page,
  app,
  browser
}) => {
  test.setTimeout(120_000);
  await page.goto(app.origin);
  await waitUntilOffline(page);
  await app.stop();

  await page.getByRole('button', { name: 'Open the demo' }).click();
  await page.waitForURL(/c=/);
  const campaign = new URL(page.url()).searchParams.get('c') ?? '';
  await page.goto(`${app.origin}/bench?c=${campaign}`);
  const act = page.locator('div.act button');
  const say = page.locator('.bench h1');
  const sheet = page.locator('dialog[open]');
  await sheet.getByRole('textbox').fill('Test person');
  await sheet.getByRole('button', { name: 'Begin' }).click();
  await expect(page.locator('.precautions')).toBeVisible();
  await act.click();
  for (const slot of [1, 2, 3]) {
    await expect(act).toContainText(`is in Track ${slot}`);
    await act.click();
  }
  const due = (slot: number, when: string) => expect(say).toContainText(`Track ${slot}: enter panel mass ${when}`);
  await due(1, 'before');
  await enter(page, '44.1000');
  await due(2, 'before');
  await enter(page, '61,5000');
  await expect(page.getByRole('alert')).toContainText('61.5');
  await page.getByRole('button', { name: 'The specimen looks different' }).click();
  await due(3, 'before');
  await page.keyboard.type('45.0');
  await page.reload();
  await due(3, 'before');
  await expect(page.locator('.window input')).toHaveValue('45.0');
  await enter(page, '000');
  await expect(act).toContainText('Start');
  await act.click();
  await page.getByRole('button', { name: /Stop early/ }).click();
  await sheet.getByRole('button', { name: 'Machine stopped by itself' }).click();
  await due(1, 'after');
  await page.getByRole('button', { name: 'Ruined …' }).click();
  await sheet.getByRole('button', { name: 'Pad came loose' }).click();
  await sheet.getByRole('button', { name: 'Leave it out' }).click();
  await due(2, 'after');
  await enter(page, '61.4640');
  await page.getByRole('button', { name: 'The specimen looks different' }).click();
  await due(3, 'after');
  await page.getByRole('button', { name: 'Note …' }).click();
  await sheet.locator('textarea').fill('Track 1 lost its pad.');
  await sheet.getByRole('button', { name: 'Save the note' }).click();
  await enter(page, '44.9640');
  await expect(say).toContainText('Look over the readings');
  await act.click();
  await expect(page.locator('.bench')).toContainText('Session 9 is closed and saved');

  await page.goto(`${app.origin}/shift?c=${campaign}`);
  await page.getByLabel('What should the next shift know?').fill('Track 1: new pads before the next session.');
  await page.getByRole('button', { name: /^Close shift/ }).click();
  await expect(page.getByText('Closed by Test person')).toBeVisible();
  const [table] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'Readings as a table (CSV)' }).click()
  ]);
  const lines = readFileSync(await table.path(), 'utf8').split('\r\n');
  expect(lines.filter((line) => /,61\.5,.*,false,,/.test(line))).toHaveLength(1);
  expect(lines.filter((line) => /,44\.1,.*,true,Pad came loose/.test(line))).toHaveLength(1);
  const [file] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: /[Dd]ownload/ }).click()
  ]);
  await expect(page.getByText('Everything on this device is exported.')).toBeVisible();
  const own = await hashOf(page);
  const results = await resultsOf(page, app.origin, campaign);
  expect(results.join()).toContain('Recipe 9');

  // A second profile, which never held anything.
  await app.start();
  const other = await browser.newContext({ locale: 'en-GB' });
  const faults = await watchContext(other, app.origin);
  const desk = await other.newPage();
  await desk.goto(`${app.origin}/desk`);
  await desk.locator('input[type=file]').setInputFiles(await file.path());
  await desk.getByRole('button', { name: 'Take it in' }).click();
  await expect(desk.getByRole('link', { name: /Open/ }).first()).toBeVisible();
  expect(await hashOf(desk)).toBe(own);
  expect(await resultsOf(desk, app.origin, campaign)).toEqual(results);
  expect(faults).toEqual([]);
  await other.close();
});
