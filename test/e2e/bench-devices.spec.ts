import { readFile } from 'node:fs/promises';
import type { Page } from '@playwright/test';
import type { DataOf } from '#lib/core/campaign/event.ts';
import { readCampaignFile } from '#lib/core/exchange/read-campaign-file.ts';
import { expect, test } from './app.ts';
import { Desk, enter, eventsOf, issuedPlan, openBench } from './bench-campaign.ts';
import { recordSession } from './bench-record.ts';

const say = (page: Page) => page.locator('.bench h1');
const act = (page: Page) => page.locator('.bench .act button');
const readings = async (page: Page): Promise<DataOf<'reading-recorded'>[]> =>
  (await eventsOf(page)).flatMap((event) => (event.kind === 'reading-recorded' ? [event.data] : []));

test('without camera, detector, serial port, wake lock, vibration, share and file pickers a session is recorded and exported, and no dead button is shown', async ({
  page,
  app
}) => {
  await page.addInitScript(() => {
    for (const name of ['BarcodeDetector', 'showSaveFilePicker', 'showOpenFilePicker', 'showDirectoryPicker'])
      delete (globalThis as unknown as Record<string, unknown>)[name];
    for (const name of ['serial', 'wakeLock', 'vibrate', 'share', 'canShare', 'mediaDevices'])
      delete (Navigator.prototype as unknown as Record<string, unknown>)[name];
  });
  await openBench(page, app.origin, new Desk(issuedPlan({ conditions: [] })));
  expect(
    await page.evaluate(() =>
      [
        'BarcodeDetector' in globalThis,
        'showSaveFilePicker' in globalThis,
        'showDirectoryPicker' in globalThis,
        'serial' in navigator,
        'wakeLock' in navigator,
        'vibrate' in navigator,
        'share' in navigator,
        'mediaDevices' in navigator
      ].some(Boolean)
    ),
    'the device really has none of it'
  ).toBe(false);
  await act(page).click();
  await expect(say(page)).toContainText('Put specimen');
  await expect(page.getByRole('button', { name: 'Scan with the camera' })).toHaveCount(0);
  for (const slot of [0, 1, 2]) {
    await expect(say(page)).toContainText(`into Track ${slot + 1}`);
    await act(page).click();
  }
  await page.getByRole('button', { name: 'Settings' }).click();
  await expect(page.locator('dialog[open]')).toContainText('This browser cannot talk to serial ports.');
  await expect(page.getByRole('button', { name: 'Connect a gauge' })).toHaveCount(0);
  await page.keyboard.press('Escape');
  for (const mass of ['44.2131', '45.3001', '43.9002']) await enter(page, mass);
  await expect(say(page)).toContainText('All is loaded');
  await act(page).click();
  await expect(page.locator('.bench')).toContainText('This browser cannot keep the screen on.');
  await act(page).click();
  const early = page.locator('dialog[open]').getByRole('button', { name: 'Machine stopped by itself' });
  if (await early.isVisible()) await early.click();
  await expect(say(page)).toContainText('Track 1: enter panel mass after');
  for (const mass of ['44.1831', '45.2601', '43.8502']) await enter(page, mass);
  await expect(say(page)).toContainText('Look over the readings');
  await act(page).click();
  await page.locator('.strip .safe').click();
  await expect(page.getByRole('heading', { level: 1 })).toContainText('End of shift');
  await page.getByLabel('What should the next shift know?').fill('Track 1 runs a little warm.');
  await page.getByRole('button', { name: 'Close shift 1' }).click();
  await expect(page.getByText('Closed by Test person')).toBeVisible();
  for (const name of [/share/i, /save the file|save instead/i, 'Choose a folder'])
    await expect(page.getByRole('button', { name })).toHaveCount(0);
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    page.getByRole('button', { name: 'Export: download the file' }).click()
  ]);
  const file = readCampaignFile(new Uint8Array(await readFile(await download.path())));
  expect(file.ok && file.value.damage).toBeNull();
  expect(file.ok && file.value.events.filter(({ event }) => event.kind === 'reading-recorded')).toHaveLength(6);
  await expect(page.getByText('Everything on this device is exported.')).toBeVisible();
});

test('a gauge on a serial port: stable lines become readings with the raw line kept, moving ones do not', async ({
  page,
  app
}) => {
  await page.addInitScript(() => {
    let send: ReadableStreamDefaultController<Uint8Array> | null = null;
    const port = {
      opened: null as unknown,
      readable: null as ReadableStream<Uint8Array> | null,
      open(options: unknown) {
        port.opened = options;
        port.readable = new ReadableStream({ start: (controller) => void (send = controller) });
        return Promise.resolve();
      },
      close: () => Promise.resolve()
    };
    Object.defineProperty(navigator, 'serial', { value: { requestPort: () => Promise.resolve(port) } });
    Object.assign(globalThis, {
      gaugeSends: (text: string) => send?.enqueue(new TextEncoder().encode(text)),
      gaugeIsLost: () => send?.error(new Error('unplugged')),
      gaugeOpened: () => port.opened
    });
  });
  const sends = (text: string) =>
    page.evaluate((line) => (globalThis as unknown as { gaugeSends: (t: string) => void }).gaugeSends(line), text);
  const issued = issuedPlan({ conditions: [] });
  const desk = new Desk(issued);
  const [first] = issued.sessions;
  if (!first) throw new Error('twelve sessions are planned');
  recordSession(desk, issued.plan.readings, first, 'loaded', () => null);
  await openBench(page, app.origin, desk);
  await page.getByRole('button', { name: 'Settings' }).click();
  await page.getByLabel('Speed (baud)').selectOption('2400');
  await page.getByRole('button', { name: 'Connect a gauge' }).click();
  const sheet = page.locator('dialog[open]');
  await expect(sheet).toContainText('waits for the first stable line');
  expect(await page.evaluate(() => (globalThis as unknown as { gaugeOpened: () => unknown }).gaugeOpened())).toEqual({
    baudRate: 2400
  });

  // Moving, over range, moving again, then still.
  await sends('US,GS,+0044.1998 g\r\nOL\r\n44.2130 g ?\r\n');
  await expect(sheet).toContainText('connected; last line: 44.2130 g ?');
  expect(await readings(page)).toEqual([]);
  await page.keyboard.press('Escape');
  await sends('ST,GS,+0044.2131 g\r\n');
  await expect(page.locator('[data-saved]')).toContainText('44.2131 g, Track 1');
  // A line that comes in pieces is one line; a piece without its end is none.
  await sends('S S     45.');
  await sends('3001 g\r\nS D     43.1');
  await expect(page.locator('[data-saved]')).toContainText('45.3001 g, Track 2');
  await expect(say(page)).toContainText('Track 3');
  // A value that a check doubts is asked about as if it had been typed, and not overrun by the next line.
  await sends('\r\nST,GS,+0439.002 g\r\nST,GS,+0043.9002 g\r\n');
  await expect(page.locator('.bench [role=alert]')).toContainText('439.002 g cannot be');
  expect(await readings(page)).toHaveLength(2);
  await page.getByRole('button', { name: '43.9002 g was meant' }).click();
  await expect(say(page)).toContainText('All is loaded');
  const all = await readings(page);
  expect(all.map(({ source, value }) => [source, value])).toEqual([
    ['serial', 44.2131],
    ['serial', 45.3001],
    ['serial', 43.9002]
  ]);
  expect(all.slice(0, 2).map(({ raw }) => raw)).toEqual(['ST,GS,+0044.2131 g', 'S S     45.3001 g']);
  expect(all[2]?.raised[0]?.said, 'what the gauge sent is kept with what was taken').toContain('439.002');

  await page.evaluate(() => (globalThis as unknown as { gaugeIsLost: () => void }).gaugeIsLost());
  await page.getByRole('button', { name: 'Settings' }).click();
  await expect(sheet).toContainText('The port could not be opened or was lost.');
  await expect(sheet.getByRole('button', { name: 'Connect a gauge' })).toBeVisible();
});
