import { expect, expectAccessible, test } from './app.ts';

test('record: the demo opens as a list of events with who, when, what, and says that its chains are whole', async ({
  page,
  app
}) => {
  await page.goto(app.origin);
  await page.getByRole('button', { name: /demo/i }).first().click();
  await page.waitForURL(/c=/);
  const id = new URL(page.url()).searchParams.get('c') ?? '';
  await page.goto(`${app.origin}/record?c=${id}`);
  await expect(page.getByRole('heading', { name: 'Record', exact: true })).toBeVisible();
  await expect(page.getByText('Reading recorded').first()).toBeVisible();
  await page.getByLabel('Show').selectOption('changes');
  await expect(page.getByRole('cell', { name: /^Ruined/ }).first()).toBeVisible();
  await expectAccessible(page);
});

test('record: a campaign that is not here says so', async ({ page, app }) => {
  await page.goto(`${app.origin}/record?c=01890000-0000-7000-8000-0000000000c0`);
  await expect(page.getByText('This device holds no such campaign')).toBeVisible();
});

test('recover: a wiped database raises the alarm on every page, and erasing needs a saved file and a typed word', async ({
  page,
  app
}) => {
  await page.goto(app.origin);
  await page.getByRole('button', { name: /demo/i }).first().click();
  await page.waitForURL(/c=/);
  const devtools = await page.context().newCDPSession(page);
  await page.goto('about:blank');
  await devtools.send('Storage.clearDataForOrigin', { origin: app.origin, storageTypes: 'indexeddb' });
  await page.goto(app.origin);
  await page.getByRole('link', { name: 'Look now' }).click();
  await expect(page.getByText('Something is missing')).toBeVisible();
  await expect(page.getByText(/finds 0 now/)).toBeVisible();
  await expectAccessible(page);
  await page.getByRole('button', { name: 'I know' }).click();
  await expect(page.getByText('Everything that this device remembers is there')).toBeVisible();
  const erase = page.getByRole('button', { name: 'Erase this device' });
  await expect(erase).toBeDisabled();
  await page.getByLabel(/Type/).fill('erase');
  await erase.click();
  await expect(page.getByText('This device is empty')).toBeVisible();
});
