import { existsSync } from 'node:fs';
import puppeteer from 'puppeteer-core';
import type { Driver } from './driver.ts';

const program = process.env.FIREFOX_PATH ?? '/usr/bin/firefox-esr';

/** Firefox through WebDriver BiDi; null when none is installed. */
export async function startFirefox(): Promise<Driver | null> {
  if (!existsSync(program)) return null;
  const browser = await puppeteer.launch({
    browser: 'firefox',
    executablePath: program,
    headless: true,
    defaultViewport: { width: 1180, height: 820 }
  });
  const page = await browser.newPage();
  return {
    engine: (await browser.version()).replace('/', ' '),
    goto: async (url) => void (await page.goto(url)),
    click: (selector) => page.locator(selector).setTimeout(20_000).click(),
    type: async (text) => {
      for (const key of text) await page.keyboard.press(key === '\n' ? 'Enter' : (key as never));
    },
    fill: (selector, text) => page.locator(selector).fill(text),
    evaluate: (body) => page.evaluate(`(() => { ${body} })()`) as never,
    close: () => browser.close()
  };
}
