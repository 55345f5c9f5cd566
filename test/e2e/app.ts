import type { Server } from 'node:http';
import AxeBuilder from '@axe-core/playwright';
import { expect, test as base, type BrowserContext, type Page } from '@playwright/test';
import { listen, serveFolder } from '../../src/cli/serve.mjs';

/** A server of the production build that a test may stop and start again on the same address. */
export interface AppServer {
  readonly origin: string;
  stop(): Promise<void>;
  start(): Promise<void>;
  /** From now on answers a path with another body, or with 404; null: with the file. */
  answerInstead(instead: (path: string) => string | 'missing' | null): void;
}

interface Fixtures {
  app: AppServer;
  /** Watches every page of the test: a policy violation, an uncaught error or a request elsewhere fails it. */
  watch: void;
}

const stopServer = (server: Server): Promise<void> =>
  new Promise((resolve) => {
    server.close(() => resolve());
    server.closeAllConnections();
  });

export const test = base.extend<Fixtures>({
  app: async ({ baseURL: _ }, use) => {
    const folder = `${process.cwd()}/${process.env.BUILD_DIR ?? 'build'}`;
    let instead: (path: string) => string | 'missing' | null = () => null;
    const make = () => serveFolder(folder, (path) => instead(path));
    let server = make();
    const port = await listen(server, 0);
    await use({
      origin: `http://localhost:${port}`,
      stop: () => stopServer(server),
      start: async () => {
        server = make();
        await listen(server, port);
      },
      answerInstead: (next) => {
        instead = next;
      }
    });
    await stopServer(server);
  },
  watch: [
    async ({ context, app }, use) => {
      const faults = await watchContext(context, app.origin);
      await use();
      expect(faults, 'policy violations, uncaught errors, requests elsewhere').toEqual([]);
    },
    { auto: true }
  ]
});

/** Collects what no page may do; for contexts a test makes itself. */
export async function watchContext(context: BrowserContext, origin: string): Promise<string[]> {
  const faults: string[] = [];
  await context.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', (event) => {
      console.error(`policy violation: ${event.violatedDirective} ${event.blockedURI} ${event.sample}`);
    });
  });
  context.on('console', (message) => {
    if (message.text().startsWith('policy violation') || /Content Security Policy/.test(message.text())) {
      faults.push(message.text());
    }
  });
  context.on('weberror', (error) => faults.push(`uncaught: ${error.error().message}`));
  context.on('request', (request) => {
    const url = request.url();
    if (!url.startsWith(origin) && !/^(data|blob|about|chrome-extension):/.test(url)) {
      faults.push(`request elsewhere: ${url}`);
    }
  });
  return faults;
}

/** Rules that another colour scheme, or less room, can break where the same page was clean before. */
const rules = {
  colours: ['color-contrast', 'link-in-text-block'],
  room: ['target-size', 'scrollable-region-focusable']
};

/** axe finds nothing serious or critical; `only` for a page that was looked at whole in another dress. */
export async function expectAccessible(page: Page, only?: keyof typeof rules): Promise<void> {
  const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];
  const axe = new AxeBuilder({ page });
  const { violations } = await (only ? axe.withRules(rules[only]) : axe.withTags(tags)).analyze();
  const grave = violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
  expect(grave.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(' ')).join(', ')}`)).toEqual([]);
}

/** The service worker has stored everything: the app now opens without network. */
export async function waitUntilOffline(page: Page): Promise<void> {
  await page.evaluate(async () => {
    await navigator.serviceWorker.ready;
    if (!navigator.serviceWorker.controller) {
      await new Promise((resolve) =>
        navigator.serviceWorker.addEventListener('controllerchange', resolve, { once: true })
      );
    }
  });
}

/** The four sizes every screen is looked at in. */
export const sizes = [
  { name: 'phone', width: 390, height: 844 },
  { name: 'portrait', width: 820, height: 1180 },
  { name: 'landscape', width: 1180, height: 820 },
  { name: 'desk', width: 1440, height: 900 }
] as const;

/** Keeps a picture of the page in test/output/screens. */
export async function keepPicture(page: Page, name: string): Promise<void> {
  await page.screenshot({ path: `test/output/screens/${name}.png`, fullPage: false });
}

export { expect };
