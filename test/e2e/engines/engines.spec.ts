import { expect, test } from '@playwright/test';
import { listen, serveFolder } from '../../../src/cli/serve.mjs';
import { startChromium } from './chromium.ts';
import { textOf, visible, waitFor, type Driver } from './driver.ts';
import { startFirefox } from './firefox.ts';
import { startWebKit } from './webkit.ts';

const engines: [string, () => Promise<Driver | null>][] = [
  ['Chromium', startChromium],
  ['Firefox', startFirefox],
  ['WebKitGTK', startWebKit]
];

/** Clicks the visible button whose text holds `text`, once it is there and may be pressed. */
async function press(driver: Driver, text: string, within = ''): Promise<void> {
  const found = `[...document.querySelectorAll(${JSON.stringify(`${within} button`)})].find(
    (e) => e.getClientRects().length > 0 && !e.disabled && e.textContent.includes(${JSON.stringify(text)}))`;
  await waitFor(
    driver,
    `the button “${text}”`,
    `document.querySelector('[data-pressed]')?.removeAttribute('data-pressed');
     const button = ${found}; button?.setAttribute('data-pressed', ''); return button !== undefined;`
  );
  await driver.click('[data-pressed]');
}

/** Waits until the one sentence at the top says so; tells what it said instead. */
async function says(driver: Driver, sentence: string): Promise<void> {
  const heading = '#content h1';
  try {
    await waitFor(
      driver,
      sentence,
      `return document.querySelector('${heading}')?.textContent.includes(${JSON.stringify(sentence)})`
    );
  } catch (cause) {
    throw new Error(`${driver.engine}: the screen says “${await textOf(driver, heading)}”, not “${sentence}”`, {
      cause
    });
  }
}

/** Types one reading and Enter, and waits until it is said to be saved: the next reading is due. */
async function enter(driver: Driver, value: string, next: string): Promise<void> {
  await waitFor(driver, 'a field with the focus', `return document.activeElement?.tagName === 'INPUT'`);
  await driver.type(`${value}\n`);
  await says(driver, next);
}

/** What the device holds, read from its database: kinds of events, newest last. */
const kindsOf = (driver: Driver): Promise<string[]> =>
  driver
    .evaluate<string>(`return sessionStorage.getItem('kinds') ?? ''`)
    .then((text) => text.split(',').filter(Boolean));

const readKinds = `
  sessionStorage.removeItem('kinds');
  const request = indexedDB.open('evenload');
  request.onsuccess = () => {
    const all = request.result.transaction('events').objectStore('events').getAll();
    all.onsuccess = () => {
      const events = all.result.map((row) => JSON.parse(row.text)).sort((a, b) => a.seq - b.seq);
      sessionStorage.setItem('kinds', events.map((event) => event.kind).join(','));
      request.result.close();
    };
  };
  return true;`;

for (const [name, start] of engines) {
  test(`the main job in ${name}, offline after the first visit: load, read, reload, close`, async () => {
    test.setTimeout(180_000);
    const driver = await start();
    test.skip(driver === null, `${name} is not installed on this machine`);
    if (!driver) return;
    const server = serveFolder(`${process.cwd()}/build`);
    const origin = `http://localhost:${await listen(server, 0)}`;
    try {
      await driver.goto(origin);
      await waitFor(driver, 'the service worker', `return navigator.serviceWorker.controller !== null`);
      server.close();
      server.closeAllConnections();

      await press(driver, 'Open the demo');
      await waitFor(driver, 'the demo', `return location.search.startsWith('?c=')`);
      const campaign = await driver.evaluate<string>(`return new URL(location.href).searchParams.get('c')`);
      await driver.goto(`${origin}/bench?c=${campaign}`);
      await says(driver, 'Before loading');
      await waitFor(driver, 'who is there', `return ${visible('dialog input')} !== undefined`);
      await driver.fill('dialog input', 'Smoke test');
      await driver.click('dialog button[type=submit]');

      await press(driver, 'Precautions read', 'div.act');
      for (let slot = 1; slot <= 3; slot++) await press(driver, `is in Track ${slot}`, 'div.act');
      await says(driver, 'Track 1: enter panel mass before');
      await enter(driver, '44.1000', 'Track 2: enter');
      await enter(driver, '43,2000', 'Track 3: enter');
      // In the middle of the job the program starts again.
      await driver.goto(`${origin}/bench?c=${campaign}`);
      await says(driver, 'Track 3: enter panel mass before');
      await enter(driver, '45.0000', 'All is loaded');
      await press(driver, 'Start', 'div.act');
      await press(driver, 'Stop early', 'div.act');
      await press(driver, 'Machine stopped by itself');
      await says(driver, 'Track 1: enter panel mass after');
      await enter(driver, '44.0640', 'Track 2: enter');
      await enter(driver, '43.1640', 'Track 3: enter');
      await enter(driver, '44.9640', 'Look over');
      await press(driver, 'Close session', 'div.act');

      await driver.evaluate(readKinds);
      await waitFor(driver, 'the record', `return sessionStorage.getItem('kinds') !== null`);
      const mine = (await kindsOf(driver)).slice(-12);
      expect(mine.filter((kind) => kind === 'reading-recorded')).toHaveLength(6);
      expect(mine.at(-1)).toBe('session-closed');
    } finally {
      await driver.close();
      server.close();
    }
  });
}
