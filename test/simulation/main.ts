/**
 * npm run test:simulation: coverage of 95 % intervals, family-wise error of Tukey, size of the Kenward–Roger F, over simulated
 * campaigns. CAMPAIGNS=20000 by default; SEED=1.
 */
import { fitFixed, solveFixed } from '#lib/core/analysis/fixed/fit-fixed.ts';
import { buildRunTable } from '#lib/core/analysis/model/build-run-table.ts';
import { momentsOf } from '#lib/core/analysis/model/moments.ts';
import { partsOf } from '#lib/core/analysis/model/parts.ts';
import { fitRandom, solveRandom } from '#lib/core/analysis/random/fit-random.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { campaignOf, drawReadings, spreadDesign } from './simulate-campaign.ts';

const campaigns = Number(process.env['CAMPAIGNS'] ?? 20_000);
const random = seededRandom(`simulation ${process.env['SEED'] ?? 1}`);
const cyclic = Array.from({ length: 7 }, (_, j) => [0, 1, 3].map((d) => (d + j) % 7));
const designs = [
  { name: 'balanced 7 in 3', input: campaignOf(cyclic) },
  { name: 'unbalanced 8 in 3, 12 sessions', input: campaignOf(spreadDesign(8, 12, 3, seededRandom('design'))) },
  { name: '7 in 3 twice, three missing', input: campaignOf([...cyclic, ...cyclic], [0, 7, 20]) }
];
let failed = 0;
const judge = (label: string, share: number, low: number, high: number): void => {
  const ok = share >= low && share <= high;
  if (!ok) failed++;
  console.log(`${ok ? 'ok  ' : 'FAIL'} ${label}: ${(100 * share).toFixed(2)} % (wanted ${100 * low} to ${100 * high})`);
};

for (const { name, input } of designs) {
  const effects = input.treatments.map(() => 0);
  const rows = [...input.rows.keys()];
  const { table } = buildRunTable(input, rows);
  const moments = momentsOf(table);
  const parts = partsOf(table);
  const count = { fixed: 0, random: 0, pairs: 0, tukey: 0, tukeyRandom: 0, size: 0 };
  for (let c = 0; c < campaigns; c++) {
    const drawn = buildRunTable(drawReadings(input, effects, 1.5, random), rows).table;
    const fixed = fitFixed(solveFixed(drawn, moments), parts, 0.05, null);
    const solved = solveRandom(drawn, moments);
    if (!solved.ok) throw new Error(solved.error.tag);
    const fit = fitRandom(solved.value, 0.05);
    if (!fit.ok) throw new Error(fit.error.tag);
    const kr = fit.value.kenwardRoger;
    const pair = c % fixed.pairs.length;
    const covers = ({ lower, upper }: { lower: number | null; upper: number | null }): number =>
      lower! <= 0 && upper! >= 0 ? 1 : 0;
    count.pairs++;
    count.fixed += covers(fixed.pairs[pair]!);
    count.random += covers(kr.pairs[pair]!);
    count.tukey += fixed.pairs.some((line) => line.pTukey! <= 0.05) ? 1 : 0;
    count.tukeyRandom += kr.pairs.some((line) => line.pTukey! <= 0.05) ? 1 : 0;
    count.size += kr.tests[0]!.p <= 0.05 ? 1 : 0;
  }
  judge(`${name}: coverage, sessions fixed`, count.fixed / campaigns, 0.945, 0.955);
  judge(`${name}: coverage, sessions random`, count.random / campaigns, 0.945, 0.955);
  judge(`${name}: family-wise error of Tukey, fixed`, count.tukey / campaigns, 0, 0.053);
  judge(`${name}: family-wise error of Tukey, random`, count.tukeyRandom / campaigns, 0, 0.053);
  judge(`${name}: size of the Kenward–Roger F`, count.size / campaigns, 0.046, 0.054);
}
console.log(`${campaigns} campaigns a design, ${failed} outside`);
process.exitCode = failed > 0 ? 1 : 0;
