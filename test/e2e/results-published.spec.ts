import { readFileSync } from 'node:fs';
import { expect, expectAccessible, test } from './app.ts';
import { benchCampaign, Desk, issuedPlan, openBench } from './bench-campaign.ts';
import { recordSession } from './bench-record.ts';

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
  await expect(row).toContainText('read as −0.5·1 − 0.5·2 + 4');
  for (const figure of ['+3.500', '0.605', '5', 'differs from zero']) await expect(row).toContainText(figure);

  // A word beside the means says what it means, and goes away again.
  await page.getByRole('button', { name: 'What is: Adjusted mean' }).click();
  const note = page.locator('.note:popover-open');
  await expect(note).toContainText('freed of session differences');
  await expect(note.getByRole('link', { name: 'In the glossary' })).toHaveAttribute(
    'href',
    /\/help#term-adjusted-mean$/
  );
  await expectAccessible(page);
  await page.keyboard.press('Escape');
  await expect(note).toHaveCount(0);
});

test('two measurands stand side by side, each ranked by its own better end, and each leads to its full result', async ({
  page,
  app
}) => {
  test.setTimeout(90_000);
  const [first] = issuedPlan().plan.measurands;
  if (!first) throw new Error('the demo has a measurand');
  const mass = { ...first, id: 'after', label: 'Panel mass after', unit: 'g', formula: null, decimals: 4 };
  const issued = issuedPlan({
    conditions: [],
    measurands: [first, { ...mass, direction: { kind: 'higher' }, possible: { min: null, max: null } }]
  });
  const { treatments } = issued.plan;
  const desk = new Desk(issued);
  for (const session of issued.sessions)
    recordSession(desk, issued.plan.readings, session, 'closed', (slot, { id }) => {
      // Invented: the first treatment loses least and is the heaviest but one; sessions and runs differ a little.
      const i = treatments.findIndex((one) => one.id === session.slots[slot]?.treatment);
      const before = 42 + ((i * 5 + 7) % 9) / 10;
      const loss = 0.02 + 0.004 * i + 0.003 * (session.number % 3) + 0.0002 * ((session.number * 7 + slot * 5) % 4);
      return (id === 'before' ? before : before - loss).toFixed(4);
    });
  await openBench(page, app.origin, desk);
  await page.goto(`${app.origin}/results?c=${benchCampaign}`);
  const both = page.getByRole('table', { name: /Every treatment by every measurand/ });
  await expect(both).toBeVisible({ timeout: 30_000 });
  const rows = both.locator('tbody tr');
  await expect(rows).toHaveCount(9);
  await expect(rows.first().locator('th')).toContainText(treatments[0]?.name ?? '');
  expect(await rows.locator('td:nth-child(4)').allInnerTexts()).toEqual(['1', '2', '3', '4', '5', '6', '7', '8', '9']);
  expect(await rows.locator('td:nth-child(7)').allInnerTexts()).toEqual(['2', '6', '1', '5', '9', '4', '8', '3', '7']);
  await expect(both).toContainText('higher is better');
  await expectAccessible(page);

  await both.getByRole('button', { name: 'Full result: panel mass after' }).press('Enter');
  await expect(page.getByRole('table', { name: /Panel mass after, g: every treatment, best first/ })).toBeVisible();
  await expect(page.getByRole('button', { name: /^Panel mass after/ })).toBeFocused();
  await expect(both.getByRole('button', { name: /^Full result/ })).toHaveCount(1);
  await page.setViewportSize({ width: 390, height: 844 });
  expect(await page.evaluate(() => document.documentElement.scrollWidth <= innerWidth)).toBe(true);
});
