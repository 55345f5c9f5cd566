import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { prepareZXingModule, readBarcodes } from 'zxing-wasm/reader';
import { expect, expectAccessible, keepPicture, sizes, test } from './app.ts';
import { codesOf, issuePlan, startCampaign, typeSmallPlan } from './plan-desk.ts';

const wasm = createRequire(import.meta.url).resolve('zxing-wasm/reader/zxing_reader.wasm');
prepareZXingModule({ overrides: { wasmBinary: readFileSync(wasm).buffer as ArrayBuffer } });

/** Pages of a PDF and the size of the first in points. */
function pdfPages(bytes: Buffer): { pages: number; width: number; height: number } {
  const text = bytes.toString('latin1');
  const [, width, height] = /\/MediaBox\s*\[\s*0\s+0\s+([\d.]+)\s+([\d.]+)/.exec(text) ?? [];
  return { pages: [...text.matchAll(/\/Type\s*\/Page\b(?!s)/g)].length, width: Number(width), height: Number(height) };
}

test('labels carry the code as text and as QR that another decoder reads', async ({ page, app }) => {
  await startCampaign(page, app.origin, 'Invented paints');
  await typeSmallPlan(page);
  await issuePlan(page);
  const codes = new Set(await codesOf(page));
  await page.getByRole('link', { name: 'Print: Labels' }).click();
  await page.getByLabel('Label sheet').selectOption('a4-21');
  await expectAccessible(page);
  const labels = page.locator('.label');
  await expect(labels.first()).toBeVisible();
  const printed = await labels.locator('.code').allInnerTexts();
  expect(new Set(printed)).toEqual(codes);
  const picture = await labels.nth(2).screenshot();
  const read = await readBarcodes(new Blob([new Uint8Array(picture)]), { formats: ['QRCode'] });
  expect(read.map(({ text }) => text)).toEqual([printed[2]]);
});

test('load sheets print one session a page on A4 and Letter, labels on their sheet', async ({ page, app }) => {
  await startCampaign(page, app.origin, 'Invented paints');
  await typeSmallPlan(page);
  await issuePlan(page);
  const sessions = await page.locator('tbody th[scope="row"].session').count();
  await page.getByRole('link', { name: 'Print: Load sheets' }).click();
  await expect(page.locator('.paper')).toHaveCount(sessions);
  for (const { name, width, height } of sizes) {
    await page.setViewportSize({ width, height });
    await keepPicture(page, `print-${name}`);
  }
  await expectAccessible(page);
  const pdf = async () => pdfPages(await page.pdf({ preferCSSPageSize: true, printBackground: true }));
  await page.getByLabel('Paper').selectOption('a4');
  const a4 = await pdf();
  expect(a4.pages).toBe(sessions);
  // ISO 216: 210 × 297 mm are 595.3 × 841.9 points; Letter is 612 × 792.
  expect(Math.round(a4.width)).toBe(595);
  expect(Math.round(a4.height)).toBe(842);
  await page.getByLabel('Paper').selectOption('letter');
  const letter = await pdf();
  expect(letter).toEqual({ pages: sessions, width: 612, height: 792 });
  await page.getByLabel('Labels').check();
  await page.getByLabel('Label sheet').selectOption('letter-30');
  await expect(page.locator('.label').first()).toBeVisible();
  expect(await pdf()).toEqual({ pages: 2, width: 612, height: 792 });
  await page.getByLabel('The plan', { exact: true }).check();
  await expect(page.getByText('Plan of the comparison')).toBeVisible();
  await expectAccessible(page);
});
