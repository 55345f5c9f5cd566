/**
 * Prints how long the plan screen takes to stop a search, and the longest task of its main thread while the search runs, in
 * Chromium on the production build. Exit status 1 when a goal is missed: 100 ms, 50 ms.
 */
import { chromium, type Page } from '@playwright/test';
import { listen, serveFolder } from '../../src/cli/serve.mjs';
import { field, pasteTreatments, startCampaign } from '../e2e/plan-desk.ts';

interface Line {
  treatments: number;
  slots: number;
  firstChoice: number;
  longestTask: number;
  stop: number;
}

/** Searches on for a moment after the first choice is there, then stops. */
async function measure(page: Page, origin: string, treatments: number, slots: number): Promise<Line> {
  await startCampaign(page, origin, `Invented, ${treatments}`);
  await pasteTreatments(page, Array.from({ length: treatments }, (_, i) => `Sample ${i + 1}`).join('\n'));
  await page.evaluate(() => {
    const tasks: [number, number][] = [];
    Object.assign(globalThis, { tasks });
    new PerformanceObserver((list) => {
      for (const { startTime, duration } of list.getEntries()) tasks.push([startTime, duration]);
    }).observe({ type: 'longtask' });
  });
  await field(page, 'machines.0.slots').fill(String(slots));
  const asked = await page.evaluate(() => performance.now());
  await page.locator('blockquote', { hasText: `${treatments} treatments, ${slots} to a session` }).waitFor();
  const firstChoice = (await page.evaluate(() => performance.now())) - asked;
  await new Promise((resolve) => setTimeout(resolve, 300));
  const stop = await page.evaluate(async () => {
    const button = [...document.querySelectorAll('button')].find((one) => one.textContent.includes('Stop here'));
    if (!button) throw new Error('the search is over before it could be stopped');
    const began = performance.now();
    button.click();
    while (!document.body.textContent.includes('Stopped; these are the best found so far.'))
      await new Promise(requestAnimationFrame);
    await new Promise(requestAnimationFrame);
    return performance.now() - began;
  });
  const tasks = await page.evaluate(
    (since) => (globalThis as unknown as { tasks: [number, number][] }).tasks.filter(([start]) => start > since),
    asked
  );
  if (process.env.DETAIL) console.log(tasks.map(([start, ms]) => `${(start - asked).toFixed(0)}:${ms}`).join(' '));
  return { treatments, slots, firstChoice, longestTask: Math.max(0, ...tasks.map(([, ms]) => ms)), stop };
}

const server = serveFolder(`${process.cwd()}/build`);
const origin = `http://localhost:${await listen(server, 0)}`;
const browser = await chromium.launch({
  executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
  args: ['--no-sandbox', '--disable-gpu']
});
const page = await browser.newPage({ locale: 'en-GB', viewport: { width: 1440, height: 900 } });
let missed = 0;
console.log('plan screen               first choice   longest task   stop');
for (const [treatments, slots] of [
  [40, 6],
  [60, 7],
  [100, 10]
] as const) {
  const line = await measure(page, origin, treatments, slots);
  if (line.longestTask > 50 || line.stop > 100) missed++;
  const task = line.longestTask === 0 ? 'under 50 ms' : `${line.longestTask.toFixed(0)} ms`;
  console.log(
    `${`${treatments} treatments, ${slots} slots`.padEnd(26)}${`${line.firstChoice.toFixed(0)} ms`.padEnd(15)}${task.padEnd(15)}${line.stop.toFixed(0)} ms`
  );
}
await browser.close();
server.close();
server.closeAllConnections();
process.exit(missed > 0 ? 1 : 0);
