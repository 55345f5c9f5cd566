import { expect, test } from '@playwright/test';
import { listen, serveFolder } from '../../../src/cli/serve.mjs';
import { startChromium } from './chromium.ts';
import { textOf, waitFor, type Driver } from './driver.ts';
import { startFirefox } from './firefox.ts';
import { startWebKit } from './webkit.ts';

const engines: [string, () => Promise<Driver | null>][] = [
  ['Chromium', startChromium],
  ['Firefox', startFirefox],
  ['WebKitGTK', startWebKit]
];

for (const [name, start] of engines) {
  test(`the main job in ${name}: offline after the first visit`, async () => {
    test.setTimeout(120_000);
    const driver = await start();
    test.skip(driver === null, `${name} is not installed on this machine`);
    if (!driver) return;
    const server = serveFolder(`${process.cwd()}/build`);
    const origin = `http://localhost:${await listen(server, 0)}`;
    try {
      await driver.goto(origin);
      await waitFor(driver, 'the app', `return document.querySelector('h1') !== null`);
      await waitFor(driver, 'the service worker', `return navigator.serviceWorker.controller !== null`);
      server.close();
      server.closeAllConnections();
      await driver.goto(`${origin}/help`);
      await waitFor(driver, 'a page without server', `return document.querySelector('#content h1') !== null`);
      expect(await textOf(driver, '#content h1')).not.toBe('');
    } finally {
      await driver.close();
      server.close();
    }
  });
}
