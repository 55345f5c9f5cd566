import { expect, expectAccessible, test } from './app.ts';

const routes = [
  '/',
  '/plan',
  '/bench',
  '/shift',
  '/desk',
  '/results',
  '/report',
  '/record',
  '/recover',
  '/print',
  '/help',
  '/device'
];

for (const scheme of ['light', 'dark'] as const)
  test(`axe finds nothing grave on any route, ${scheme}`, async ({ page, app }) => {
    test.setTimeout(120_000);
    await page.emulateMedia({ colorScheme: scheme, reducedMotion: 'reduce' });
    await page.goto(app.origin);
    await page.getByRole('button', { name: 'Open the demo' }).click();
    await page.waitForURL(/c=/);
    const { search } = new URL(page.url());
    for (const route of routes) {
      await page.goto(app.origin + route + search);
      await expect(page.locator('h1').first(), route).toBeVisible();
      await expect(page.locator('[role=status]').getByText('…')).toHaveCount(0, { timeout: 20_000 });
      await test.step(route, () => expectAccessible(page, scheme === 'dark' ? 'colours' : undefined));
    }
    // Without a campaign all of them say why there is nothing to show, in one way.
    for (const route of scheme === 'light' ? ['/', '/plan', '/bench', '/desk'] : []) {
      await page.goto(app.origin + route);
      await expect(page.locator('h1').first(), route).toBeVisible();
      await test.step(`${route} alone`, () => expectAccessible(page));
    }
  });
