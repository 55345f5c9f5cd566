import { readFileSync } from 'node:fs';
import { unzipSync } from 'fflate';
import { expect, expectAccessible, test } from './app.ts';

/** Published: D.C. Montgomery, Design and Analysis of Experiments, catalysts and batches: 4 catalysts, 4 batches, 3 a batch. */
const catalyst = `catalyst;batch;time
1;batch1;73
3;batch1;73
4;batch1;75
1;batch2;74
2;batch2;75
3;batch2;75
2;batch3;67
3;batch3;68
4;batch3;72
1;batch4;71
2;batch4;72
4;batch4;75
`;

test('the published catalyst example, brought in as CSV, shows the published figures', async ({ page, app }) => {
  test.setTimeout(120_000);
  await page.goto(`${app.origin}/desk`);
  await page
    .locator('input[type=file]')
    .setInputFiles({ name: 'catalyst.csv', mimeType: 'text/csv', buffer: Buffer.from(catalyst) });
  await expect(page.getByText('4 treatments, 4 sessions, 12 readings.')).toBeVisible();
  await page.getByRole('button', { name: 'Make a campaign of it' }).click();

  const means = page.getByRole('table', { name: /every treatment, best first/ });
  for (const [catalystName, mean] of [
    ['1', '71.375'],
    ['2', '71.625'],
    ['3', '72.000'],
    ['4', '75.000']
  ] as const)
    await expect(means.getByRole('row', { name: new RegExp(`^${catalystName} ${mean}`) })).toBeVisible();

  await page.getByText('Scatter and efficiency').click();
  const anova = page.getByRole('table', { name: 'Analysis of variance' });
  await expect(anova.getByRole('row', { name: /Treatments, adjusted/ })).toContainText('22.750');
  await expect(anova.getByRole('row', { name: /Treatments, adjusted/ })).toContainText('11.67');
  await expect(anova.getByRole('row', { name: /^Error/ })).toContainText('3.2500');

  await page.getByText('Workings', { exact: true }).click();
  await expect(
    page.getByText(/Balanced: t = 4 treatments, k = 3 a session, r = 3 runs each, each pair together λ = 2/)
  ).toBeVisible();
  await expectAccessible(page);

  await page.getByRole('link', { name: /Report/ }).click();
  const saveReport = page.getByRole('button', { name: 'Save the report' });
  await expect(saveReport).toBeVisible();
  const [report] = await Promise.all([page.waitForEvent('download'), saveReport.click()]);
  const html = readFileSync(await report.path(), 'utf8');
  expect(html).toContain('71.375');
  expect(html).not.toMatch(/<script|<link|src=/);
  const [zip] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'Save the data package' }).click()
  ]);
  const files = unzipSync(new Uint8Array(readFileSync(await zip.path())));
  expect(Object.keys(files)).toContain('datapackage.json');
  const csv = new TextDecoder().decode(files['results/means.csv']);
  expect(csv.split('\r\n')).toHaveLength(1 + 8 + 1);
  await expectAccessible(page);
});
