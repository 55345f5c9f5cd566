import { expect, sizes, test } from './app.ts';

/** The pictures of the README; `npm run pictures` renews those that are kept beside the tests. */
const folder = process.env.PICTURES ?? 'test/output/pictures';

test('the demo is pictured from plan to report', async ({ page, app }) => {
  test.setTimeout(90_000);
  const picture = async (name: string, size: (typeof sizes)[number]['name']) => {
    const { width, height } = sizes.find((one) => one.name === size) ?? sizes[0];
    await page.setViewportSize({ width, height });
    await page.evaluate(async () => {
      window.scrollTo(0, 0);
      await document.fonts.ready;
    });
    await page.screenshot({ path: `${folder}/${name}.png`, animations: 'disabled' });
  };
  await page.goto(app.origin);
  await page.getByRole('button', { name: 'Open the demo' }).click();
  await expect(page.getByRole('blockquote')).toContainText('9 treatments, 3 to a session');
  const { search } = new URL(page.url());
  await picture('plan', 'desk');

  await page.goto(`${app.origin}/bench${search}`);
  const sheet = page.locator('dialog[open]');
  await sheet.getByRole('textbox').fill('Test person');
  await sheet.getByRole('button', { name: 'Begin' }).click();
  const act = page.locator('div.act button');
  await act.click();
  for (const slot of [1, 2, 3]) {
    await expect(act).toContainText(`is in Track ${slot}`);
    if (slot === 2) await picture('bench-load', 'portrait');
    await act.click();
  }
  await expect(page.locator('.bench h1')).toContainText('Track 1: enter');
  await page.keyboard.type('44.10');
  await picture('bench-read', 'landscape');

  await page.goto(`${app.origin}/results${search}`);
  await expect(page.getByRole('table', { name: /every treatment, best first/ })).toBeVisible({ timeout: 30_000 });
  await picture('results', 'desk');
});
