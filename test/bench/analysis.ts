/**
 * npm run bench:analysis: times of fixed with all pairs and random with Kenward–Roger and all pairs. With R and its packages on the
 * machine (see time-r.R) R's times and the ratios follow, on data of the same shape: RSCRIPT_SECONDS=12 a task.
 */
import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fitFixed, solveFixed } from '#lib/core/analysis/fixed/fit-fixed.ts';
import { buildRunTable } from '#lib/core/analysis/model/build-run-table.ts';
import { momentsOf } from '#lib/core/analysis/model/moments.ts';
import { partsOf } from '#lib/core/analysis/model/parts.ts';
import { fitRandom, solveRandom } from '#lib/core/analysis/random/fit-random.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { campaignOf, drawReadings, spreadDesign } from '../simulation/simulate-campaign.ts';

const SHAPES = [
  [7, 7, 3],
  [20, 60, 5],
  [60, 300, 6],
  [100, 1000, 8]
] as const;

function medianSeconds(work: () => void): number {
  work();
  const times: number[] = [];
  const until = performance.now() + 3000;
  while (times.length < 3 || (performance.now() < until && times.length < 200)) {
    const from = performance.now();
    work();
    times.push((performance.now() - from) / 1000);
  }
  return times.sort((a, b) => a - b)[times.length >> 1]!;
}

interface RTimes {
  shapes: Record<string, Record<string, { medianSeconds?: number[] | number }>>;
}

function timesOfR(): RTimes | null {
  const folder = mkdtempSync(join(tmpdir(), 'bench-'));
  try {
    const out = join(folder, 'r.json');
    const seconds = process.env['RSCRIPT_SECONDS'] ?? '12';
    const ran = spawnSync('Rscript', ['test/bench/time-r.R', out, seconds], {
      stdio: ['ignore', 'inherit', 'inherit']
    });
    return ran.status === 0 ? (JSON.parse(readFileSync(out, 'utf8')) as RTimes) : null;
  } finally {
    rmSync(folder, { recursive: true });
  }
}

const r = process.argv.includes('--no-r') ? null : timesOfR();
for (const [t, b, k] of SHAPES) {
  const random = seededRandom(`bench ${t}`);
  const effects = Array.from({ length: t }, () => 3 * random.next());
  const input = drawReadings(campaignOf(spreadDesign(t, b, k, random)), effects, 1.5, random);
  const rows = [...input.rows.keys()];
  const tasks: [string, string, () => void][] = [
    [
      'fixed, all pairs',
      'fixed_pairs',
      () => {
        const { table } = buildRunTable(input, rows);
        fitFixed(solveFixed(table, momentsOf(table)), partsOf(table), 0.05, null);
      }
    ],
    [
      'random, Kenward–Roger and Satterthwaite, all pairs',
      'random_kenward_roger_pairs',
      () => {
        const { table } = buildRunTable(input, rows);
        const solved = solveRandom(table, momentsOf(table));
        if (!solved.ok || !fitRandom(solved.value, 0.05).ok) throw new Error('no fit');
      }
    ]
  ];
  for (const [name, key, work] of tasks) {
    const own = medianSeconds(work);
    const theirs = Number(r?.shapes[`t${t}_b${b}_k${k}`]?.[key]?.medianSeconds);
    const beside = Number.isFinite(theirs) ? `R ${theirs.toFixed(3)} s, ${(theirs / own).toFixed(0)} times` : 'no R';
    console.log(`(${t}, ${b}, ${k}) ${name}: ${(own * 1000).toFixed(1)} ms; ${beside}`);
  }
}
