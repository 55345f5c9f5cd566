/**
 * npm run bench:analysis: times of fixed with all pairs, and random with Kenward–Roger, Satterthwaite and all pairs; with R and
 * its packages on the machine (see time-r.R) beside R's on the same readings, R without Satterthwaite.
 *
 *     npm run bench:analysis -- t100          only the shapes whose name holds t100
 *     npm run bench:analysis -- --no-r        without R
 *
 * R_SECONDS=2: how long R repeats a task. R_LIMIT=100: R is stopped after so many seconds a shape; what it has not done by then
 * took longer than what was left, and the ratio is a lower bound.
 */
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fitFixed, solveFixed } from '#lib/core/analysis/fixed/fit-fixed.ts';
import { buildRunTable } from '#lib/core/analysis/model/build-run-table.ts';
import { momentsOf } from '#lib/core/analysis/model/moments.ts';
import { partsOf } from '#lib/core/analysis/model/parts.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import { fitRandom, solveRandom } from '#lib/core/analysis/random/fit-random.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { campaignOf, drawReadings, spreadDesign } from '../simulation/simulate-campaign.ts';

const SHAPES = [
  [7, 7, 3],
  [20, 60, 5],
  [60, 300, 6],
  [100, 1000, 8]
] as const;

const fixedTask = (input: Observations): void => {
  const { table } = buildRunTable(input, [...input.rows.keys()]);
  fitFixed(solveFixed(table, momentsOf(table)), partsOf(table), 0.05, null);
};
const randomTask = (input: Observations): void => {
  const { table } = buildRunTable(input, [...input.rows.keys()]);
  const solved = solveRandom(table, momentsOf(table));
  if (!solved.ok || !fitRandom(solved.value, 0.05).ok) throw new Error('no fit');
};
const TASKS = [
  ['fixed, all pairs', 'fixed_pairs', fixedTask],
  ['random, Kenward–Roger, all pairs', 'random_kenward_roger_pairs', randomTask]
] as const;

function medianSeconds(work: () => void): number {
  work();
  const times: number[] = [];
  const until = performance.now() + 2000;
  while (times.length < 3 || (performance.now() < until && times.length < 200)) {
    const from = performance.now();
    work();
    times.push((performance.now() - from) / 1000);
  }
  return times.sort((a, b) => a - b)[times.length >> 1]!;
}

interface OfR {
  /** Median seconds of each task that R finished. */
  seconds: Record<string, number>;
  /** How long R worked on the task that it did not finish; null when it finished all. */
  stoppedAfter: number | null;
  data: { treatment: string[]; block: string[]; y: number[] };
}

function timesOfR(shape: string): OfR | null {
  const folder = mkdtempSync(join(tmpdir(), 'bench-'));
  try {
    const out = join(folder, 'r.json');
    const limit = Number(process.env['R_LIMIT'] ?? 100);
    const from = performance.now();
    spawnSync('Rscript', ['test/bench/time-r.R', out, process.env['R_SECONDS'] ?? '2', `^${shape}$`], {
      stdio: ['ignore', 'ignore', 'inherit'],
      timeout: limit * 1000
    });
    const took = (performance.now() - from) / 1000;
    const data = join(folder, `data-${shape}.json`);
    if (!existsSync(data)) return null;
    type Written = { shapes: Record<string, Record<string, { medianSeconds?: number; repetitions?: number }>> };
    const written = existsSync(out) ? (JSON.parse(readFileSync(out, 'utf8')) as Written).shapes[shape] : undefined;
    const seconds: Record<string, number> = {};
    let spent = 0;
    for (const [, key] of TASKS) {
      const { medianSeconds: median, repetitions } = written?.[key] ?? {};
      if (median === undefined) continue;
      seconds[key] = median;
      // One run more than the repetitions, to warm up.
      spent += median * ((repetitions ?? 1) + 1);
    }
    const finished = TASKS.every(([, key]) => key in seconds);
    return {
      seconds,
      stoppedAfter: finished ? null : Math.max(0, took - spent - 10),
      data: JSON.parse(readFileSync(data, 'utf8')) as OfR['data']
    };
  } finally {
    rmSync(folder, { recursive: true });
  }
}

/** R's own readings as observations. */
function observationsOf({ treatment, block, y }: OfR['data']): Observations {
  const place = (names: string[]): ((name: string) => number) => {
    const index = new Map([...new Set(names)].sort().map((name, i) => [name, i]));
    return (name) => index.get(name)!;
  };
  const treatmentAt = place(treatment);
  const sessionAt = place(block);
  const blocks: number[][] = [];
  const readings: number[][] = [];
  y.forEach((value, i) => {
    (blocks[sessionAt(block[i]!)] ??= []).push(treatmentAt(treatment[i]!));
    (readings[sessionAt(block[i]!)] ??= []).push(value);
  });
  const empty = campaignOf(blocks);
  return { ...empty, rows: empty.rows.map((row) => ({ ...row, y: readings[row.session]![row.slot!]! })) };
}

function drawn(t: number, b: number, k: number): Observations {
  const random = seededRandom(`bench ${t}`);
  const effects = Array.from({ length: t }, () => 3 * random.next());
  return drawReadings(campaignOf(spreadDesign(t, b, k, random)), effects, 1.5, random);
}

const asked = process.argv.slice(2).filter((word) => !word.startsWith('--'));
for (const [t, b, k] of SHAPES) {
  const shape = `t${t}_b${b}_k${k}`;
  if (asked.length > 0 && !asked.some((part) => shape.includes(part))) continue;
  const r = process.argv.includes('--no-r') ? null : timesOfR(shape);
  const input = r === null ? drawn(t, b, k) : observationsOf(r.data);
  for (const [name, key, work] of TASKS) {
    const own = medianSeconds(() => work(input));
    const theirs = r?.seconds[key];
    let beside = 'no R';
    if (theirs !== undefined) beside = `R ${theirs.toFixed(3)} s, ${(theirs / own).toFixed(0)} times`;
    else if (typeof r?.stoppedAfter === 'number') {
      beside = `R stopped after ${r.stoppedAfter.toFixed(0)} s, more than ${(r.stoppedAfter / own).toFixed(0)} times`;
    }
    console.log(`(${t}, ${b}, ${k}) ${name}: ${(own * 1000).toFixed(1)} ms; ${beside}`);
  }
}
