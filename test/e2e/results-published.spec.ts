import { readFileSync } from 'node:fs';
import { expect, test } from './app.ts';

interface Case {
  source: { citation: string };
  data: { treatment: string[]; block: string[]; y: (number | null)[] };
  published: { quantity: string; published: number; decimals: number }[];
}

/** Each case names its book or paper; the published figures are those of the file, data typed from memory as it says. */
const caseOf = (id: string): Case => JSON.parse(readFileSync(`test/reference/cases/${id}.json`, 'utf8')) as Case;

const csvOf = ({ data }: Case): string =>
  ['treatment,session,y', ...data.y.map((y, row) => `${data.treatment[row]},${data.block[row]},${y ?? ''}`)].join('\n');

function figure({ published }: Case, quantity: string): string {
  const found = published.find((one) => one.quantity === quantity);
  if (!found) throw new Error(`no published ${quantity}`);
  return found.published.toFixed(found.decimals);
}

const examples = [
  {
    id: 'pub_rabbit',
    layer: 'Scatter and efficiency',
    rows: [
      ['SS blocks (unadjusted)', /^Sessions, unadjusted/],
      ['SS treatments (adjusted)', /^Treatments, adjusted/],
      ['SS error', /^Error/]
    ]
  },
  {
    id: 'pub_vinylation',
    layer: 'Scatter and efficiency',
    rows: [
      ['MS blocks (unadjusted)', /^Sessions, unadjusted/],
      ['MS treatments (adjusted)', /^Treatments, adjusted/]
    ]
  }
] as const;

for (const { id, layer, rows } of examples)
  test(`${id}, brought in as CSV, shows the published figures`, async ({ page, app }) => {
    test.setTimeout(90_000);
    const one = caseOf(id);
    await page.goto(`${app.origin}/desk`);
    const file = { name: `${id}.csv`, mimeType: 'text/csv', buffer: Buffer.from(csvOf(one)) };
    await page.locator('input[type=file]').setInputFiles(file);
    await page.getByRole('button', { name: 'Make a campaign of it' }).click();
    await expect(page.getByRole('table', { name: /every treatment, best first/ })).toBeVisible({ timeout: 30_000 });
    await page.getByText(layer, { exact: true }).click();
    const anova = page.getByRole('table', { name: 'Analysis of variance' });
    for (const [quantity, row] of rows)
      await expect(anova.getByRole('row', { name: row }), quantity).toContainText(figure(one, quantity));
  });

test('pub_assembly, four cells empty, brought in as CSV, shows the published Skillings–Mack statistic', async ({
  page,
  app
}) => {
  test.setTimeout(90_000);
  const one = caseOf('pub_assembly');
  await page.goto(`${app.origin}/desk`);
  const file = { name: 'assembly.csv', mimeType: 'text/csv', buffer: Buffer.from(csvOf(one)) };
  await page.locator('input[type=file]').setInputFiles(file);
  await page.getByRole('button', { name: 'Make a campaign of it' }).click();
  const ranks = page.locator('#ranks');
  await expect(ranks).toContainText(figure(one, 'p'), { timeout: 30_000 });
  await ranks.locator('summary').first().click();
  await expect(ranks).toContainText(Number(figure(one, 'Skillings-Mack statistic')).toFixed(2));
});

test('pub_catalyst: a question typed on the screen is answered from the published means and error mean square', async ({
  page,
  app
}) => {
  test.setTimeout(90_000);
  const file = { name: 'catalyst.csv', mimeType: 'text/csv', buffer: Buffer.from(csvOf(caseOf('pub_catalyst'))) };
  await page.goto(`${app.origin}/desk`);
  await page.locator('input[type=file]').setInputFiles(file);
  await page.getByRole('button', { name: 'Make a campaign of it' }).click();
  const comparisons = page.locator('#comparisons');
  await comparisons.locator('summary').first().click({ timeout: 30_000 });
  const box = comparisons.getByLabel('Weighted sum of treatments');
  await box.fill('4 − ½·1');
  await box.press('Enter');
  await expect(comparisons.getByRole('alert')).toContainText('The weights add to 0.5');
  await expect(box).toHaveAttribute('aria-invalid', 'true');
  await box.fill('4 − ½·1 − ½·2');
  await box.press('Enter');
  const row = comparisons.getByRole('row', { name: /^4 − ½·1 − ½·2/ });
  // 75.000 − (71.375 + 71.625)/2; √(1.5 · kσ²/(λt)) with k = 3, λ = 2, t = 4, error mean square 0.65 on 5 df (Montgomery).
  await expect(row).toContainText('read as −0.5·1 + 4 − 0.5·2');
  for (const figure of ['+3.500', '0.605', '5', 'differs from zero']) await expect(row).toContainText(figure);
});
