import { chromium } from '@playwright/test';
import { findChromium } from '../../../src/cli/browsers.mjs';
import type { Driver } from './driver.ts';

/** Chromium through Playwright; null when none is installed. */
export async function startChromium(): Promise<Driver | null> {
  const executablePath = findChromium();
  if (!executablePath) return null;
  const browser = await chromium.launch({ executablePath, args: ['--no-sandbox', '--disable-gpu', '--no-first-run'] });
  const page = await browser.newPage({ viewport: { width: 1180, height: 820 } });
  page.setDefaultTimeout(20_000);
  return {
    engine: `Chromium ${browser.version()}`,
    goto: async (url) => void (await page.goto(url)),
    click: (selector) => page.locator(`${selector} >> visible=true`).first().click(),
    type: async (text) => {
      for (const key of text) await page.keyboard.press(key === '\n' ? 'Enter' : key);
    },
    fill: (selector, text) => page.locator(selector).first().fill(text),
    evaluate: (body) => page.evaluate(`(() => { ${body} })()`),
    close: () => browser.close()
  };
}
