/**
 * npm run test:simulation: coverage of 95 % intervals, family-wise error of Tukey and Dunnett, size of the F tests, over
 * seeded simulated campaigns without treatment differences. CAMPAIGNS=20000 and SEED=1 by default; `-- --write` keeps the
 * table in results.md beside this file.
 */
import { writeFileSync } from 'node:fs';
import { ALGORITHM } from '#lib/core/analysis/analyse.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { countErrors, QUANTITIES } from './count-errors.ts';
import { DESIGNS } from './designs.ts';

const campaigns = Number(process.env['CAMPAIGNS'] ?? 20_000);
const seed = process.env['SEED'] ?? '1';
/** Standard deviation of the sessions over that of the runs. */
const BETWEEN = 1.5;

const WANTED = {
  covered: { label: 'coverage of 95 % intervals', low: 94.5, high: 95.5 },
  tukey: { label: 'family-wise error, Tukey', low: 0, high: 5.3 },
  dunnett: { label: 'family-wise error, Dunnett', low: 0, high: 5.3 },
  f: { label: 'size of the F test', low: 4.6, high: 5.4 }
};

const table = [
  '| design | sessions | quantity | wanted, % | counted, % | less chance, % | ± | |',
  '| --- | --- | --- | --- | --- | --- | --- | --- |'
];
let failed = 0;
for (const { name, input } of DESIGNS) {
  const from = performance.now();
  const shares = countErrors(input, BETWEEN, campaigns, seededRandom(`simulation ${seed} ${name}`));
  for (const model of ['fixed', 'random'] as const) {
    for (const key of QUANTITIES) {
      const { label, low, high } = WANTED[key];
      const share = shares[model][key];
      // The exact test is the control itself: it is judged as counted.
      const control = key === 'f' && model === 'fixed';
      const counted = 100 * share.raw;
      const { share: adjusted, error } = share.adjusted;
      const judged = control ? counted : 100 * adjusted;
      const ok = judged >= low && judged <= high;
      if (!ok) failed++;
      const kind = key !== 'f' ? label : control ? `${label}, exact` : `${label}, Kenward–Roger`;
      const figures = control ? ['', ''] : [judged.toFixed(2), (100 * error).toFixed(2)];
      const line = [name, model, kind, `${low} to ${high}`, counted.toFixed(2), ...figures].join(' | ');
      table.push(`| ${line} | ${ok ? '' : 'outside'} |`);
      console.log(`${ok ? 'ok  ' : 'FAIL'} ${line}`);
    }
  }
  const zero = (100 * shares.boundary).toFixed(1);
  table.push(`| ${name} | random | session variance estimated at zero | | ${zero} | | | |`);
  console.log(`     session variance at zero ${zero} %; ${((performance.now() - from) / 1000).toFixed(0)} s`);
}
const summary = `${campaigns} campaigns a design, seed ${seed}, ${ALGORITHM}: ${failed} outside`;
console.log(summary);
if (process.argv.includes('--write')) {
  const error = (100 * Math.sqrt((0.05 * 0.95) / campaigns)).toFixed(2);
  const text = `# Simulated campaigns

Made by \`npm run test:simulation -- --write\`: ${summary}.

All treatments are equal; sessions have a standard deviation of ${BETWEEN} times that of the runs; errors are normal. A share of
5 % as counted has a standard error of ${error} points (coverage, counted over all pairs, somewhat less). The F test with sessions
fixed is exact, so that what its share differs from 5 % is chance; "less chance" takes off what goes along with that in the
other shares (a control variate, share.ts), and ± is the standard error that is left. That column is judged.

${table.join('\n')}
`;
  writeFileSync(new URL('results.md', import.meta.url), text);
}
process.exitCode = failed > 0 ? 1 : 0;
