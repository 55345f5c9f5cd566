import { aValue } from '../a-value.ts';
import type { DesignChoice, DesignRequest } from '../propose-types.ts';
import { SEARCH_ALGORITHM, searchDesign } from '../search/search-design.ts';
import type { SearchOutcome } from '../search/search-design.ts';
import { makeChoice } from './make-choice.ts';
import { searchProblem, sessionPlan } from './session-plan.ts';

/** Steps (thousands of operations) of one search of up to thirty treatments. */
const STEPS = { quick: 25_000, normal: 200_000, thorough: 1_200_000 };

/** Steps of one search: less for small designs, more for many treatments. */
export function searchSteps(t: number, sizes: readonly number[], effort: DesignRequest['effort']): number {
  const exchanges = sizes.reduce((sum, size) => sum + size * size, 0);
  return Math.round(STEPS[effort] * Math.max(0.1, Math.min(1, exchanges / 300)) * Math.max(1, Math.min(3, t / 30)));
}

/** A search for one number of sessions that can be carried on piece by piece. */
export interface OngoingSearch {
  sessions: number;
  allowed: number;
  spent: () => number;
  /** Carries on until so many steps are spent; yields now and then, about every ten million operations. */
  carryOn: (until: number) => Generator<void, void>;
  /** The best design so far as a choice; null when there is none yet. */
  choice: () => DesignChoice | null;
}

/** Part of the steps for the second search in which replications are free. */
const FREE_PART = 0.35;
/** Steps between two chances to stop. */
const PAUSE = 5_000;

/**
 * Returns the search for the best design of a request in b sessions. Replications are near-equal at first; where there is
 * little to spare (error degrees of freedom up to the number of treatments) a second search leaves them free, since there
 * a few treatments that are in many sessions can lower the A-value.
 *
 * **Checked by** test/core/design/propose/propose-designs.test.ts
 */
export function ongoingSearch(request: DesignRequest, b: number): OngoingSearch {
  const plan = sessionPlan(request, b);
  const sessions = plan.sizes.length;
  const t = request.treatments;
  const allowed = searchSteps(t, plan.sizes, request.effort);
  const errorDf = plan.sizes.reduce((sum, size) => sum + size - 1, 0) - t + 1;
  const bendable = !plan.groupOf && errorDf <= t && plan.sizes.some((size) => size < t);
  const nearAllowed = bendable ? Math.round((1 - FREE_PART) * allowed) : allowed;
  const seed = `${request.seed} ${sessions} ${plan.groupOf ? 'grouped' : ''}`;
  const near = searchDesign(searchProblem(request, plan, false), [], nearAllowed, seed);
  let free: ReturnType<typeof searchDesign> | null = null;
  let nearSpent = 0;
  let freeSpent = 0;
  let nearOver = false;
  let over = false;

  function* carryOn(until: number): Generator<void, void> {
    let paused = nearSpent + freeSpent;
    while (!over && nearSpent + freeSpent < until) {
      if (!nearOver) {
        const next = near.run.next();
        if (next.done) nearOver = true;
        else nearSpent = next.value.steps;
      } else if (!bendable) {
        over = true;
      } else {
        free ??= searchDesign(searchProblem(request, plan, true), startsFrom(request, near.best()), allowed - nearAllowed, `${seed} free`); // prettier-ignore
        const next = free.run.next();
        if (next.done) over = true;
        else freeSpent = next.value.steps;
      }
      if (nearSpent + freeSpent - paused >= PAUSE) {
        paused = nearSpent + freeSpent;
        yield;
      }
    }
  }

  const choice = (): DesignChoice | null => {
    const outcomes = [near.best(), free?.best() ?? null].filter((outcome) => outcome !== null);
    if (outcomes.length === 0) return null;
    const best = outcomes.reduce((a, c) => (c.value < a.value * (1 - 1e-9) ? c : a));
    if (aValue(best.blocks, t) === Infinity) return null;
    return makeChoice(request, `search-${sessions}`, best.blocks, plan.groupOf, {
      kind: 'search',
      id: SEARCH_ALGORITHM.name,
      text: 'Found by exchanging treatments between sessions while the average variance of a difference falls.',
      source: 'N.-K. Nguyen (1994), Construction of optimal block designs by computer, Technometrics 36, 300–307',
      search: { seed: request.seed, steps: nearSpent + freeSpent, allowed, version: SEARCH_ALGORITHM.version }
    });
  };
  return { sessions, allowed, spent: () => nearSpent + freeSpent, carryOn, choice };
}

/** A found design as a start: controls last in each session, as a search wants them. */
function startsFrom(request: DesignRequest, outcome: SearchOutcome | null): number[][] {
  if (!outcome) return [];
  const controls = request.control?.treatments ?? [];
  return [
    outcome.blocks.flatMap((block) => [
      ...block.filter((i) => !controls.includes(i)),
      ...block.filter((i) => controls.includes(i))
    ])
  ];
}
