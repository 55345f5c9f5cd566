import { defineConfig } from '@playwright/test';

/** Browser tests run the production build under the production headers, in an installed Chromium. */
export default defineConfig({
  testDir: 'test/e2e',
  outputDir: 'test-results',
  fullyParallel: true,
  workers: 2,
  // A test that fails and then holds is reported as flaky, by name.
  retries: 1,
  forbidOnly: true,
  timeout: 60_000,
  expect: { timeout: 10_000 },
  reporter: [['list'], ['json', { outputFile: 'test/output/browser.json' }]],
  use: {
    browserName: 'chromium',
    viewport: { width: 1180, height: 820 },
    locale: 'en-GB',
    launchOptions: {
      executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
      args: [
        '--no-sandbox',
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync'
      ]
    }
  }
});
