import { expect, expectAccessible, keepPicture, sizes, test } from './app.ts';
import { issuePlan, startCampaign, typeSmallPlan } from './plan-desk.ts';

test('the first start shows three doors', async ({ page, app }) => {
  await page.goto(app.origin);
  for (const door of ['Start a campaign', 'Open a campaign file', 'Look around with the demo']) {
    await expect(page.getByRole('heading', { name: door })).toBeVisible();
  }
  await expectAccessible(page);
  for (const { name, width, height } of sizes) {
    await page.setViewportSize({ width, height });
    await keepPicture(page, `home-${name}`);
  }
});

test('the demo opens with one tap, bears its mark, and can be taken off', async ({ page, app }) => {
  await page.goto(app.origin);
  await page.getByRole('button', { name: 'Open the demo' }).click();
  await expect(page.getByText('invented demo data').first()).toBeVisible({ timeout: 20_000 });
  await expect(page.getByRole('blockquote')).toContainText('9 treatments, 3 to a session, 12 sessions');
  await page.goto(app.origin);
  await expect(page.getByText('8 of 12 sessions closed')).toBeVisible();
  await expectAccessible(page);
  for (const { name, width, height } of sizes) {
    await page.setViewportSize({ width, height });
    await keepPicture(page, `home-campaigns-${name}`);
  }
  await page.getByRole('button', { name: 'Take the demo off this device' }).click();
  await expect(page.getByText('8 of 12 sessions closed')).toBeHidden();
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Compare more than the machine can hold.');
});

test('a campaign says how far it is, what is not exported and whether it is safe', async ({ page, app }) => {
  await startCampaign(page, app.origin, 'Invented paints');
  await page.goto(app.origin);
  await expect(page.getByText('being planned')).toBeVisible();
  await expect(page.getByRole('link', { name: 'Go on planning' })).toBeVisible();
  await expect(page.getByText('1 entry not yet exported')).toBeVisible();
  await expect(page.getByRole('heading', { name: 'Is it safe here?' })).toBeVisible();
  await page.getByRole('link', { name: 'Go on planning' }).click();
  await typeSmallPlan(page);
  await issuePlan(page);
  await page.goto(app.origin);
  await expect(page.getByText('2 entries not yet exported')).toBeVisible();
  await expect(page.getByText(/^0 of \d+ sessions closed/)).toBeVisible();
});

test('a file that is none, and one that was cut off, are told in words and change nothing', async ({ page, app }) => {
  await page.goto(app.origin);
  const open = page.getByLabel('Choose a file');
  await open.setInputFiles({
    name: 'holiday.png',
    mimeType: 'image/png',
    buffer: Buffer.from('\x89PNG\r\n\x1a\n', 'latin1')
  });
  await expect(page.getByText('This is no campaign file; it looks like a picture. Nothing was changed.')).toBeVisible();
  await open.setInputFiles({ name: 'empty', mimeType: '', buffer: Buffer.alloc(0) });
  await expect(page.getByText('The file is empty. Nothing was changed.')).toBeVisible();
});
