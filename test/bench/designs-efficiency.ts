/**
 * Prints how near the search comes to the best known designs of efficiency.json, and at what time.
 *
 * DESIGNS_DIR names another folder with an efficiency.json of the same schema; default test/reference/designs. The effort is
 * the planner's normal effort; the exit status is 1 when a goal is missed: A-value within 0.3 %, 2 s up to 30 treatments,
 * 5 s up to 60, repair and certified slot counts exactly equal.
 */
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { aValue } from '../../src/lib/core/design/a-value.ts';
import { earlyStop, earlyStopOrder } from '../../src/lib/core/design/early-stop-order.ts';
import { layOutSlots } from '../../src/lib/core/design/slot-layout.ts';
import { searchSteps } from '../../src/lib/core/design/propose/searched-choice.ts';
import { bestExtraSession } from '../../src/lib/core/design/repair/extra-session.ts';
import { searchDesign } from '../../src/lib/core/design/search/search-design.ts';
import { addPairWeights, controlPairs, nearEqualReplication } from '../../src/lib/core/design/search/search-problem.ts';
import type { SearchProblem } from '../../src/lib/core/design/search/search-problem.ts';
import { seededRandom } from '../../src/lib/core/numerics/random/seeded-random.ts';

interface Case {
  id: string;
  key: string;
  category: string;
  t: number;
  b: number;
  k: number;
  s: number;
  r: number;
  v_tests: number;
  test_reps: [number, number];
  block_sizes?: number[];
  blocks: number[][];
  remaining_blocks: number[][];
  A_best_after_one_extra: number;
  n_optimal: number;
  near_equal: { A_value: number };
  free?: { A_value: number };
  best: { A_value: number };
  min_tc: { objective: number };
  min_tt: { objective: number };
  min_half_half: { objective: number };
  min_imbalance?: number;
  best_found?: number;
}

const folder = process.env.DESIGNS_DIR ?? 'test/reference/designs';
const { cases } = JSON.parse(readFileSync(join(folder, 'efficiency.json'), 'utf8')) as { cases: Case[] };
const all = (n: number): number[] => Array.from({ length: n }, (_, i) => i);
const fill = (n: number, value: number): number[] => new Array<number>(n).fill(value);

let missed = 0;
let beaten = 0;
const gaps: number[] = [];
const times: number[] = [];

function line(one: Case, what: string, best: number, found: number, ms: number, limit: number, t: number): void {
  const gap = found === best ? 0 : 100 * (found / best - 1);
  const late = ms > (t <= 30 ? 2000 : 5000);
  const verdict = gap > limit ? 'FAR' : late ? 'LATE' : gap < -1e-6 ? 'better' : 'ok';
  if (verdict === 'FAR' || verdict === 'LATE') missed++;
  if (verdict === 'better') beaten++;
  gaps.push(gap);
  times.push(ms);
  const number = (value: number): string => value.toFixed(8).padStart(12);
  console.log(
    `${one.id} ${one.key.padEnd(34)} ${what.padEnd(12)} ${number(best)} ${number(found)} ${gap.toFixed(4).padStart(9)} % ${ms.toFixed(0).padStart(6)} ms  ${verdict}`
  );
}

function search(one: Case, what: string, problem: SearchProblem, best: number): void {
  const began = performance.now();
  const { run, best: found } = searchDesign(problem, [], searchSteps(problem.t, problem.sizes, 'normal'), one.id);
  for (const _ of run);
  const outcome = found();
  const ms = performance.now() - began;
  const value = outcome === null ? Infinity : problem.weights ? outcome.value : aValue(outcome.blocks, problem.t);
  line(one, what, best, value, ms, 0.3, problem.t);
}

const plain = (t: number, sizes: number[]): SearchProblem => ({
  t,
  sizes,
  controls: [],
  groupOf: null,
  replication: nearEqualReplication(sizes.reduce((a, b) => a + b, 0), fill(t, sizes.length)), // prettier-ignore
  forbidden: null,
  weights: null
});

function judge(one: Case): void {
  const { t, b, k } = one;
  if (one.category === 'equal' || one.category === 'unequal') {
    const sizes = one.block_sizes ?? fill(b, k);
    const problem = plain(t, sizes);
    search(one, 'near-equal', problem, one.near_equal.A_value);
    const free = { least: fill(t, 1), most: fill(t, sizes.length) };
    if (one.free) search(one, 'free', { ...problem, replication: free }, one.free.A_value);
  } else if (one.category === 'resolvable') {
    const groupOf = all(b).map((j) => Math.floor(j / one.s));
    search(one, 'resolvable', { ...plain(t, fill(b, k)), groupOf }, one.best.A_value);
  } else if (one.category === 'augmented') {
    const n = one.v_tests + 1;
    const { testControl, testTest } = controlPairs(n, [0]);
    const weights = (tc: number, tt: number): Float64Array =>
      addPairWeights(addPairWeights(new Float64Array(n * n), n, testControl, tc), n, testTest, tt);
    const [low, high] = one.test_reps;
    const replication = { least: [b, ...fill(one.v_tests, low)], most: [b, ...fill(one.v_tests, high)] };
    const problem = { ...plain(n, fill(b, k)), controls: [0], replication };
    search(one, 'test-control', { ...problem, weights: weights(1, 0) }, one.min_tc.objective);
    search(one, 'test-test', { ...problem, weights: weights(0, 1) }, one.min_tt.objective);
    search(one, 'half', { ...problem, weights: weights(0.5, 0.5) }, one.min_half_half.objective);
  } else if (one.category === 'repair') {
    const began = performance.now();
    const extra = bestExtraSession(one.remaining_blocks, t, all(t), k);
    const exact = extra?.sessions.length === one.n_optimal;
    line(
      one,
      'repair',
      one.A_best_after_one_extra,
      exact ? extra.aValue : Infinity,
      performance.now() - began,
      1e-6,
      t
    );
  } else if (one.category === 'position') {
    const slots = Math.max(...one.blocks.map((block) => block.length));
    const inService = one.blocks.map((block) => all(slots).map((slot) => slot < block.length));
    const began = performance.now();
    const { imbalance } = layOutSlots(one.blocks, inService, t, seededRandom(one.id));
    line(one, 'slots', one.min_imbalance ?? one.best_found ?? NaN, imbalance, performance.now() - began, 1e-6, t);
  } else {
    console.log(`${one.id} ${one.key}: category ${one.category} is not known`);
    missed++;
  }
}

console.log(`designs of ${folder}: case, what, best known, found, gap, time`);
cases.forEach(judge);
const sorted = (list: number[]): number[] => [...list].sort((a, b) => a - b);
const middle = (list: number[]): number => sorted(list)[Math.floor(list.length / 2)]!;
console.log(
  `${gaps.length} lines: ${missed} missed, ${beaten} better than known; gap median ${middle(gaps).toFixed(4)} %, worst ${Math.max(...gaps).toFixed(4)} %; ` +
    `time median ${middle(times).toFixed(0)} ms, worst ${Math.max(...times).toFixed(0)} ms`
);

orders();
await hundred();

/** Orders of sessions of order.json: sum of the efficiencies of the first m sessions, best known and found. */
function orders(): void {
  const file = join(folder, 'order.json');
  if (!existsSync(file)) return;
  interface Order {
    v: number;
    blocks: number[][];
    earliest_connected_prefix: number;
    max_sum?: { sum: number };
  }
  const known = (JSON.parse(readFileSync(file, 'utf8')) as { cases: Order[] }).cases;
  for (const { v, blocks, earliest_connected_prefix: earliest, max_sum: most } of known) {
    if (!most) continue;
    const began = performance.now();
    const order = earlyStopOrder(blocks, v, null, seededRandom('order'));
    const ms = performance.now() - began;
    const { connectedAfter, sum } = earlyStop(order.map((at) => blocks[at]!), v); // prettier-ignore
    const gap = 100 * (1 - sum / most.sum);
    if (connectedAfter !== earliest) missed++;
    console.log(`order of ${v} in ${blocks.length}: connected after ${connectedAfter} (earliest ${earliest}), sum ${sum.toFixed(4)} (best known ${most.sum.toFixed(4)}), ${gap.toFixed(2)} % below, ${ms.toFixed(0)} ms`); // prettier-ignore
  }
}

/** t = 100, k = 10, b = 200: first proposal, improvement to the end, memory. */
async function hundred(): Promise<void> {
  const { proposeDesigns } = await import('../../src/lib/core/design/propose/propose-designs.ts');
  const began = performance.now();
  const seen: { ms: number; aValue: number; of: number }[] = [];
  let memory = 0;
  await proposeDesigns(
    { treatments: 100, machines: [{ slots: 10 }], maxSessions: 200, sessionSizes: null, specimens: null, sessionsPerShift: null, resolvable: false, control: null, forbiddenPairs: [], scatter: null, difference: null, alpha: 0.05, minutesPerSession: null, seed: 'hundred', effort: 'normal' }, // prettier-ignore
    {
      onProgress: ({ choices }) => {
        memory = Math.max(memory, process.memoryUsage().rss);
        const choice = choices.find(({ sessions }) => sessions === 200);
        if (!choice || choice.aValue === seen.at(-1)?.aValue) return;
        seen.push({ ms: performance.now() - began, aValue: choice.aValue, of: choice.ofBound });
      }
    }
  );
  const megabytes = memory / 1e6;
  for (const { ms, aValue: a, of } of seen) console.log(`t=100 k=10 b=200: ${ms.toFixed(0)} ms  A ${a.toFixed(8)}  ${of.toFixed(5)} of the bound`); // prettier-ignore
  console.log(`t=100 k=10 b=200: whole answer ${(performance.now() - began).toFixed(0)} ms, resident memory at most ${megabytes.toFixed(0)} MB`); // prettier-ignore
  if (seen.length === 0 || seen[0]!.ms > 1000 || megabytes > 200) missed++;
  process.exitCode = missed > 0 ? 1 : 0;
}
