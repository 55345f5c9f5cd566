import { createServer } from 'node:http';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { extname, join } from 'node:path';
import { closeTabRounds, killRounds } from './break-off.ts';
import { closeConnectionRounds } from './close-connection.ts';
import { fillQuotaRounds } from './fill-quota.ts';
import { corruptRounds, wipeRounds } from './lose-storage.ts';
import { isClean, tallyLine, type Tally } from './tally.ts';

// npm run test:faults: real browsers, real processes killed. `--short` is the form that npm test runs.
const short = process.argv.includes('--short');
const only = process.argv.find((arg) => arg.startsWith('--only='))?.slice('--only='.length);
const folder = 'node_modules/.fault-harness';
if (!existsSync(folder)) throw new Error(`${folder} is not there: build the harness first`);

const types: Record<string, string> = { '.html': 'text/html; charset=utf-8', '.js': 'text/javascript' };
const server = createServer((request, response) => {
  const path = join(folder, request.url === '/' ? 'index.html' : (request.url ?? ''));
  if (!existsSync(path)) return void response.writeHead(404).end();
  response.writeHead(200, { 'Content-Type': types[extname(path)] ?? 'application/octet-stream' });
  response.end(readFileSync(path));
});
await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
const address = server.address();
const origin = `http://localhost:${typeof address === 'object' ? address?.port : 0}/`;

const faults: [name: string, long: number, brief: number, run: (origin: string, rounds: number) => Promise<Tally>][] = [
  ['kill', 200, 4, killRounds],
  ['tab', 50, 4, closeTabRounds],
  ['connection', 50, 4, closeConnectionRounds],
  ['quota', 50, 3, fillQuotaRounds],
  ['wipe', 50, 1, wipeRounds],
  ['corrupt', 50, 2, corruptRounds]
];

const tallies: Tally[] = [];
for (const [name, long, brief, run] of faults) {
  if (only !== undefined && only !== name) continue;
  const rounds = Number(process.env.FAULT_ROUNDS ?? (short ? brief : long));
  const started = Date.now();
  const tally = await run(origin, rounds);
  tallies.push(tally);
  console.log(`${tallyLine(tally)} (${((Date.now() - started) / 1000).toFixed(0)} s)`);
  for (const words of tally.wrong.slice(0, 5)) console.log(`     ${words}`);
}
server.close();
mkdirSync('test/output', { recursive: true });
writeFileSync(
  'test/output/faults.json',
  `${JSON.stringify(
    tallies.map((tally) => ({ ...tally, clean: isClean(tally) })),
    null,
    1
  )}\n`
);
const sum = (of: (tally: Tally) => number): number => tallies.reduce((total, tally) => total + of(tally), 0);
console.log(
  `faults: ${sum((t) => t.trials)} trials, ${sum((t) => t.saved)} saved, lost ${sum((t) => t.lost)}, ` +
    `false saved ${sum((t) => t.falseSaved)}`
);
process.exitCode = tallies.every(isClean) ? 0 : 1;
