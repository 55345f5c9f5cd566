import type { Page } from '@playwright/test';
import { expect } from './app.ts';

/** Nine invented paints, as copied from a spreadsheet. */
export const nine = ['Chalk', 'Flint', 'Linen', 'Moss', 'Pearl', 'Reed', 'Slate', 'Thyme', 'Wheat'];

export const field = (page: Page, path: string) => page.locator(`[id="f-${path.replaceAll('.', '-')}"]`);

/** Begins a campaign from the first page. */
export async function startCampaign(page: Page, origin: string, title: string): Promise<void> {
  await page.goto(origin);
  await page.getByLabel('Title').fill(title);
  await page.keyboard.press('Enter');
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Plan the comparison');
}

/** Pastes a text into the first name, the way a spreadsheet's cells come. */
export async function pasteTreatments(page: Page, text: string, at = 0): Promise<void> {
  await field(page, `treatments.${at}.name`).focus();
  await page.evaluate((copied) => {
    const clipboardData = new DataTransfer();
    clipboardData.setData('text/plain', copied);
    const event = new ClipboardEvent('paste', { clipboardData, bubbles: true, cancelable: true });
    document.activeElement?.dispatchEvent(event);
  }, text);
}

/** The film-loss measurand of ISO 11998: two masses, an area and a density. */
export async function typeFilmLoss(page: Page): Promise<void> {
  await field(page, 'measurands.0.label').fill('Loss of film thickness');
  await field(page, 'measurands.0.unit').fill('µm');
  await field(page, 'measurands.0.source').selectOption('formula');
  for (const [at, id] of ['before', 'after'].entries()) {
    await page.getByRole('button', { name: 'Add a reading' }).click();
    await field(page, `readings.${at}.id`).fill(id);
    await field(page, `readings.${at}.unit`).fill('g');
    await field(page, `readings.${at}.decimals`).fill('4');
  }
  for (const [at, [id, value, unit]] of [
    ['area', '0.0040', 'm²'],
    ['density', '1,5', 'g/cm³']
  ].entries()) {
    await page.getByRole('button', { name: 'Add a constant' }).click();
    await field(page, `constants.${at}.id`).fill(id ?? '');
    await field(page, `constants.${at}.value`).fill(value ?? '');
    await field(page, `constants.${at}.unit`).fill(unit ?? '');
  }
  await field(page, 'measurands.0.formula').fill('(before - after) / (area * density)');
}

/** Waits until the search has given its answer. */
export async function waitForChoices(page: Page): Promise<void> {
  await expect(page.getByRole('button', { name: 'Look longer' })).toBeVisible({ timeout: 30_000 });
}

/** A small plan that can be issued at once: four treatments, two slots, one reading. */
export async function typeSmallPlan(page: Page): Promise<void> {
  await pasteTreatments(page, 'Chalk\nFlint\nLinen\nMoss');
  await field(page, 'machines.0.slots').fill('2');
  await field(page, 'measurands.0.label').fill('Gloss');
  await waitForChoices(page);
}

export async function issuePlan(page: Page, seed = ''): Promise<void> {
  await field(page, 'who').fill('E. Planner (invented)');
  await field(page, 'design.seed').fill(seed);
  await page.getByRole('button', { name: 'Issue the plan' }).click();
  await expect(page.getByRole('heading', { name: 'Loading order' })).toBeVisible({ timeout: 20_000 });
}

/** Specimen codes in loading order, session by session. */
export const codesOf = (page: Page): Promise<string[]> => page.locator('table .code').allInnerTexts();
