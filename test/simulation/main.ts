/**
 * npm run test:simulation: coverage of 95 % intervals, family-wise error of Tukey and Dunnett, size of the F tests, over
 * seeded simulated campaigns without treatment differences. CAMPAIGNS=20000 and SEED=1 by default; `-- --write` keeps the
 * table in results.md beside this file.
 */
import { writeFileSync } from 'node:fs';
import { ALGORITHM } from '#lib/core/analysis/analyse.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { countErrors, type ModelCount } from './count-errors.ts';
import { DESIGNS } from './designs.ts';

const campaigns = Number(process.env['CAMPAIGNS'] ?? 20_000);
const seed = process.env['SEED'] ?? '1';
/** Standard deviation of the sessions over that of the runs. */
const BETWEEN = 1.5;

const WANTED: readonly [keyof ModelCount, label: string, low: number, high: number][] = [
  ['covered', 'coverage of 95 % intervals', 94.5, 95.5],
  ['tukey', 'family-wise error, Tukey', 0, 5.3],
  ['dunnett', 'family-wise error, Dunnett', 0, 5.3],
  ['f', 'size of the F test', 4.6, 5.4]
];

const table = ['| design | sessions | quantity | wanted, % | found, % | |', '| --- | --- | --- | --- | --- | --- |'];
let failed = 0;
for (const { name, input } of DESIGNS) {
  const from = performance.now();
  const counts = countErrors(input, BETWEEN, campaigns, seededRandom(`simulation ${seed} ${name}`));
  for (const model of ['fixed', 'random'] as const) {
    for (const [key, label, low, high] of WANTED) {
      const found = 100 * counts[model][key];
      const ok = found >= low && found <= high;
      if (!ok) failed++;
      const kind = key === 'f' && model === 'random' ? `${label}, Kenward–Roger` : label;
      const line = `${name} | ${model} | ${kind} | ${low} to ${high} | ${found.toFixed(2)}`;
      table.push(`| ${line} | ${ok ? '' : 'outside'} |`);
      console.log(`${ok ? 'ok  ' : 'FAIL'} ${line}`);
    }
  }
  const zero = ((100 * counts.boundary) / campaigns).toFixed(1);
  table.push(`| ${name} | random | session variance estimated at zero | | ${zero} | |`);
  console.log(`     session variance at zero ${zero} %; ${((performance.now() - from) / 1000).toFixed(0)} s`);
}
const summary = `${campaigns} campaigns a design, seed ${seed}, ${ALGORITHM}: ${failed} outside`;
console.log(summary);
if (process.argv.includes('--write')) {
  const error = (100 * Math.sqrt((0.05 * 0.95) / campaigns)).toFixed(2);
  const text = `# Simulated campaigns

Made by \`npm run test:simulation -- --write\`: ${summary}.

All treatments are equal; sessions have a standard deviation of ${BETWEEN} times that of the runs; errors are normal. A share of
5 % has a simulation error (one standard error) of ${error} points; coverage, counted over all pairs, somewhat less.

${table.join('\n')}
`;
  writeFileSync(new URL('results.md', import.meta.url), text);
}
process.exitCode = failed > 0 ? 1 : 0;
