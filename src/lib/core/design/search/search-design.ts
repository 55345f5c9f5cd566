import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { blocksOf, designState, loadCells } from './design-state.ts';
import type { DesignState } from './design-state.ts';
import type { SearchProblem } from './search-problem.ts';
import { startDesign } from './start-design.ts';
import { visitPair } from './visit-pair.ts';
import { visitSession } from './visit-session.ts';

/** Name and version of the search: the same version, seed, starts and steps give the same design, on every device. */
export const SEARCH_ALGORITHM = { name: 'interchange-search', version: 1 } as const;

/** Where a search stands. */
export interface SearchProgress {
  /** Work spent and allowed, in thousands of elementary operations. */
  steps: number;
  allowed: number;
  /** Best value of the criterion so far; Infinity while there is none. */
  value: number;
}

export interface SearchOutcome {
  /** Treatments of each session, ascending. */
  blocks: number[][];
  value: number;
  steps: number;
}

/** Starting and final temperature in parts of value/(runs · mean session size): the size of a typical small change. */
const HOT = 0.15;
const COLD = HOT / 50;

/** Lengths of the annealing runs in parts of the work allowed, the last takes what is left. */
const RUNS = [0.15, 0.3, 1];

/** Visits between two looks at the work spent. */
const SLICE = 32;

/** Operations in a step. */
const STEP = 1000;

/**
 * Searches for the design with the least value of the problem's criterion: steepest descent from the given starts and
 * from random ones, then simulated annealing by heat-bath exchanges between two sessions drawn at random, in runs of
 * growing length, each followed by a descent.
 *
 * The effort is counted in steps of a thousand elementary operations, so nothing depends on the time. It is a generator:
 * it hands over its progress every 32 visits and can be left there; `best()` then tells the best design so far.
 *
 * @param starts cells of designs to begin with, of the problem's sizes, controls last in each session
 * @param allowed steps allowed
 * @param seed any text
 *
 * **Source**: Kirkpatrick, Gelatt & Vecchi (1983), Science 220, 671–680; John & Whitaker (1993), Construction of resolvable
 * row–column designs using simulated annealing, Austral. J. Statist. 35, 237–245; Nguyen (1994), Technometrics 36, 300–307.
 * **Checked by** test/core/design/search/search-design.test.ts
 */
export function searchDesign(
  problem: SearchProblem,
  starts: readonly ArrayLike<number>[],
  allowed: number,
  seed: string
): { run: Generator<SearchProgress, void>; best: () => SearchOutcome | null } {
  const random = seededRandom(`${SEARCH_ALGORITHM.name} ${SEARCH_ALGORITHM.version} ${seed}`);
  const state = designState(problem);
  const bestCells = new Int32Array(state.cells.length);
  let bestValue = Infinity;

  const keep = (): void => {
    if (state.value < bestValue * (1 - 1e-12)) {
      bestValue = state.value;
      bestCells.set(state.cells);
    }
  };
  const spent = (): number => state.work / STEP;
  const progress = (): SearchProgress => ({ steps: Math.floor(spent()), allowed, value: bestValue });
  const visit = visitor(problem, state, random);

  /** Until as many visits in a row as there are pairs changed nothing. */
  function* descend(visits: number): Generator<SearchProgress, void> {
    const patience = Math.min(visits, problem.groupOf ? 4 * state.b : Math.max(40, (state.b * (state.b - 1)) / 2));
    let idle = 0;
    for (let n = 1; n <= visits && idle < patience; n++) {
      idle = visit(0) ? 0 : idle + 1;
      if (n % SLICE !== 0) continue;
      keep();
      yield progress();
      if (spent() >= allowed) return;
    }
    keep();
  }

  function* anneal(length: number): Generator<SearchProgress, void> {
    const begin = spent();
    const end = Math.min(allowed, begin + length);
    const hot = (HOT * state.value) / (state.cells.length * (state.cells.length / state.b));
    while (spent() < end) {
      const temperature = hot * coolest((spent() - begin) / (end - begin));
      for (let n = 0; n < SLICE; n++) if (visit(temperature)) keep();
      yield progress();
    }
  }

  function* run(): Generator<SearchProgress, void> {
    const quick = 6 * state.b;
    for (const cells of starts) if (loadCells(state, cells)) yield* descend(quick);
    for (const part of RUNS) {
      if (spent() >= allowed && bestValue < Infinity) return;
      if (!loadRandom(problem, state, random)) {
        if (bestValue === Infinity) return;
        loadCells(state, bestCells);
      }
      keep();
      yield* descend(quick);
      yield* anneal(part * allowed);
      yield* descend(Infinity);
    }
  }

  const best = (): SearchOutcome | null => {
    if (bestValue === Infinity) return null;
    const final = designState(problem);
    loadCells(final, bestCells);
    return { blocks: blocksOf(final), value: final.value, steps: Math.floor(spent()) };
  };
  return { run: run(), best };
}

/** (COLD/HOT)^x for x in 0 … 1, by square roots alone, so that every engine gives the same bits. */
function coolest(x: number): number {
  let result = 1;
  let factor = COLD / HOT;
  for (let bit = 0, rest = x; bit < 20; bit++) {
    if (rest >= 1) {
      result *= factor;
      rest -= 1;
    }
    rest *= 2;
    factor = Math.sqrt(factor);
  }
  return result;
}

/** Fills the state with a random connected design; false when none was found. */
function loadRandom(problem: SearchProblem, state: DesignState, random: SeededRandom): boolean {
  for (let attempt = 0; attempt < 300; attempt++) {
    const cells = startDesign(problem, random);
    if (cells && loadCells(state, cells)) return true;
  }
  return false;
}

/** One visit: a pair of sessions that may exchange, or now and then one session where replications may change. */
function visitor(problem: SearchProblem, state: DesignState, random: SeededRandom): (temperature: number) => boolean {
  const { b } = state;
  const { least, most } = problem.replication;
  const flexible = least.some((low, i) => low < most[i]! && !problem.controls.includes(i)) && !problem.groupOf;
  const groups = new Map<number, number[]>();
  problem.groupOf?.forEach((group, j) => groups.set(group, [...(groups.get(group) ?? []), j]));
  const pools = problem.groupOf ? [...groups.values()].filter((pool) => pool.length > 1) : [[...Array(b).keys()]];
  const usable = pools.filter((pool) => pool.length > 1);
  return (temperature) => {
    if (flexible && (usable.length === 0 || random.bits() < 0x40000000)) {
      return visitSession(state, problem, random.below(b), temperature, random);
    }
    if (usable.length === 0) return false;
    const pool = usable[random.below(usable.length)]!;
    const p = random.below(pool.length);
    const q = random.below(pool.length - 1);
    return visitPair(state, problem.forbidden, pool[p]!, pool[q >= p ? q + 1 : q]!, temperature, random);
  };
}
