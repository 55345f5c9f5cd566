import { createServer } from 'node:http';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { extname, join } from 'node:path';
import { chromium, type Page } from '@playwright/test';
import { closeFile, fileBody } from '#lib/core/exchange/campaign-file.ts';
import { bigCampaign } from './big-campaign.ts';

// npm run bench:record: appending, opening and importing through the app's own code in Chromium, against their aims.
// CHROMIUM_PATH names the browser. The profile is on disk: a database in memory knows no strict durability.
const folder = 'node_modules/.record-bench';
const maker = '01890000-0000-7000-8000-0000000000ff';
const pairs = 150;
const openings = 5;
/** Spread as at a bench: no session gets more events than a session has. */
const tenSessions = Array.from({ length: 10 }, (_, n) => `s${n * 100 + 1}`);

const events = bigCampaign(maker);
const id = events[0]?.campaign ?? '';
const at = '2026-03-02T08:00:00.000+01:00';
const body = fileBody(events, { campaign: id, title: 'Invented large campaign', device: maker, at, app: '0.0.0-test' });
const file = Buffer.from(closeFile(body, null));

const types: Record<string, string> = { '.html': 'text/html; charset=utf-8', '.js': 'text/javascript' };
const server = createServer((request, response) => {
  const path = join(folder, request.url === '/' ? 'index.html' : (request.url ?? ''));
  if (request.url === '/big.jsonl') response.writeHead(200, { 'Content-Type': 'text/plain' }).end(file);
  else if (!existsSync(path)) response.writeHead(404).end();
  else
    response
      .writeHead(200, { 'Content-Type': types[extname(path)] ?? 'application/octet-stream' })
      .end(readFileSync(path));
});
await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
const address = server.address();
const origin = `http://localhost:${typeof address === 'object' ? address?.port : 0}/`;

const median = (list: readonly number[]): number => [...list].sort((a, b) => a - b)[list.length >> 1] ?? NaN;
const rows: { what: string; figure: string; aim: string; met: boolean | null }[] = [];
const row = (what: string, figure: string, aim = '', met: boolean | null = null): void => {
  rows.push({ what, figure, aim, met });
};

const profile = mkdtempSync(join(tmpdir(), 'evenload-bench-'));
const context = await chromium.launchPersistentContext(profile, {
  executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
  args: ['--no-sandbox', '--disable-gpu', '--no-first-run', '--disable-background-networking', '--disable-sync']
});

async function newPage(throttle = 1): Promise<Page> {
  const page = await context.newPage();
  page.on('pageerror', (error) => console.error(`uncaught: ${error.message}`));
  await page.goto(origin);
  await page.waitForSelector('body[data-ready=yes]', { state: 'attached' });
  const devtools = await context.newCDPSession(page);
  await devtools.send('Emulation.setCPUThrottlingRate', { rate: throttle });
  return page;
}

async function append(page: Page, sessions: string[], size: string): Promise<void> {
  await page.evaluate((s) => window.bench.append(s, 20), sessions);
  const times = await page.evaluate(([s, n]) => window.bench.append(s, n), [sessions, pairs] as const);
  const [app, bare] = [median(times.app), median(times.bare)];
  row(`append at ${size} events`, `${app.toFixed(2)} ms`);
  row(`  bare strict put, turn about`, `${bare.toFixed(2)} ms`);
  row(`  ratio of medians (${pairs} pairs)`, (app / bare).toFixed(2), '≤ 1.5', app / bare <= 1.5);
}

try {
  let page = await newPage();
  await page.evaluate(() => window.bench.begin(60));
  await append(page, ['s1', 's2', 's3', 's4'], '100');
  await page.evaluate(() => window.bench.close());
  await page.close();

  page = await newPage();
  const taken = await page.evaluate(() => window.bench.import('big.jsonl'));
  const seconds = (taken.propose + taken.accept) / 1000;
  row(
    `import of ${events.length} events (${(file.length / 1e6).toFixed(1)} MB)`,
    `${seconds.toFixed(2)} s`,
    '≤ 3 s',
    seconds <= 3
  );
  row('  of this until summed up', `${(taken.propose / 1000).toFixed(2)} s`);
  const longest = Math.max(0, ...taken.tasks);
  row('  longest task on the screen’s thread', `${longest.toFixed(0)} ms`, '≤ 50 ms', longest <= 50);
  await page.close();

  page = await newPage();
  const first = await page.evaluate((one) => window.bench.open(one), id);
  row('first opening, no checkpoint', `${(first.ms / 1000).toFixed(2)} s`);
  await page.evaluate((one) => window.bench.kept(one), id);
  await page.evaluate(() => window.bench.close());
  await page.close();

  const times: number[] = [];
  for (let n = 0; n < openings; n++) {
    page = await newPage(4);
    const opening = await page.evaluate((one) => window.bench.open(one), id);
    if (opening.whole || opening.events !== events.length + 1) throw new Error(JSON.stringify(opening));
    times.push(opening.ms);
    if (n < openings - 1) await page.close();
  }
  row(
    `opening at 4× throttle (median of ${openings})`,
    `${(median(times) / 1000).toFixed(2)} s`,
    '≤ 1.0 s',
    median(times) <= 1000
  );
  const devtools = await context.newCDPSession(page);
  await devtools.send('Emulation.setCPUThrottlingRate', { rate: 1 });
  await page.waitForFunction(() => window.bench.whole, null, { timeout: 120_000 });
  await append(page, tenSessions, '50,000');
} finally {
  await context.close();
  server.close();
  rmSync(profile, { recursive: true, force: true, maxRetries: 5 });
}

for (const { what, figure, aim, met } of rows)
  console.log(
    `${what.padEnd(46)} ${figure.padStart(10)}  ${aim.padEnd(8)} ${met === null ? '' : met ? 'met' : 'MISSED'}`
  );
process.exitCode = rows.every(({ met }) => met !== false) ? 0 : 1;
