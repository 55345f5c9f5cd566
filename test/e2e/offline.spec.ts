import { expect, test, waitUntilOffline } from './app.ts';

const routes = ['/', '/plan', '/bench', '/shift', '/desk', '/results', '/record', '/help', '/device', '/no/such/page'];

test('after one visit every route opens with the server dead, unknown deep links too', async ({ page, app }) => {
  await page.goto(app.origin);
  await waitUntilOffline(page);
  await app.stop();
  for (const route of routes) {
    await page.goto(app.origin + route);
    await expect(page.locator('#content h1'), route).toBeVisible();
  }
});

test('after one visit every route opens with the network off', async ({ page, app, context }) => {
  await page.goto(app.origin);
  await waitUntilOffline(page);
  await context.setOffline(true);
  for (const route of routes) {
    await page.goto(app.origin + route);
    await expect(page.locator('#content h1'), route).toBeVisible();
  }
});
