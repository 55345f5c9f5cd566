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
  steps: number;
  allowed: number;
  /** Best value of the criterion so far. */
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

/** Lengths of the annealing runs in parts of the allowed steps; the rest goes to the first descents. */
const RUNS = [0.15, 0.3, 0.5];

/** Visits between two reports of progress. */
const SLICE = 64;

/**
 * Searches for the design with the least value of the problem's criterion: steepest descent from the given starts and
 * from random ones, then simulated annealing by heat-bath exchanges between two sessions drawn at random, in runs of
 * growing length, each followed by a descent. A step is one visit of a pair of sessions (or of one session, where
 * replications may change).
 *
 * It is a generator: it hands over its progress every 64 steps and can be stopped there; `best()` of the handle then
 * tells the best design so far. Nothing depends on the time.
 *
 * @param starts cells of designs to begin with, of the problem's sizes, controls last in each session
 * @param steps steps allowed
 * @param seed any text
 *
 * **Source**: Kirkpatrick, Gelatt & Vecchi (1983), Science 220, 671–680; John & Whitaker (1993), Construction of resolvable
 * row–column designs using simulated annealing, Austral. J. Statist. 35, 237–245; Nguyen (1994), Technometrics 36, 300–307.
 * **Checked by** test/core/design/search/search-design.test.ts
 */
export function searchDesign(
  problem: SearchProblem,
  starts: readonly ArrayLike<number>[],
  steps: number,
  seed: string
): { run: Generator<SearchProgress, void>; best: () => SearchOutcome | null } {
  const random = seededRandom(`${SEARCH_ALGORITHM.name} ${SEARCH_ALGORITHM.version} ${seed}`);
  const state = designState(problem);
  const bestCells = new Int32Array(state.cells.length);
  let bestValue = Infinity;
  let done = 0;

  const keep = (): void => {
    if (state.value < bestValue * (1 - 1e-12)) {
      bestValue = state.value;
      bestCells.set(state.cells);
    }
  };
  const visit = visitor(problem, state, random);

  function* descend(limit: number): Generator<SearchProgress, void> {
    // Still when as many visits in a row as there are pairs changed nothing.
    const patience = Math.min(limit, problem.groupOf ? 4 * state.b : Math.max(40, (state.b * (state.b - 1)) / 2));
    let idle = 0;
    for (let n = 0; n < limit && idle < patience; n++) {
      idle = visit(0) ? 0 : idle + 1;
      if (++done % SLICE === 0) {
        keep();
        yield { steps: done, allowed: steps, value: bestValue };
      }
    }
    keep();
  }

  function* anneal(length: number): Generator<SearchProgress, void> {
    const scale = state.value / (state.cells.length * (state.cells.length / state.b));
    const fall = (COLD / HOT) ** (1 / Math.max(1, length / SLICE));
    let temperature = HOT * scale;
    for (let n = 0; n < length; n++) {
      if (visit(temperature)) keep();
      if (++done % SLICE === 0) {
        temperature *= fall;
        yield { steps: done, allowed: steps, value: bestValue };
      }
    }
  }

  function* run(): Generator<SearchProgress, void> {
    const quick = Math.ceil(6 * state.b);
    for (const cells of starts) if (loadCells(state, cells)) yield* descend(Math.min(quick, steps - done));
    for (const part of RUNS) {
      if (done > 0 && done >= steps) return;
      if (!loadRandom(problem, state, random)) {
        if (bestValue === Infinity) return;
        loadCells(state, bestCells);
      }
      keep();
      yield* descend(Math.min(quick, steps - done));
      yield* anneal(Math.min(Math.floor(part * steps), steps - done));
      yield* descend(steps - done);
    }
    if (bestValue < Infinity) loadCells(state, bestCells);
    yield* anneal(Math.max(0, steps - done));
  }

  const best = (): SearchOutcome | null => {
    if (bestValue === Infinity) return null;
    const final = designState(problem);
    loadCells(final, bestCells);
    return { blocks: blocksOf(final), value: final.value, steps: done };
  };
  return { run: run(), best };
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
