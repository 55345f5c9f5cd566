import { combinationCount } from '../catalogue/all-combinations.ts';
import { balancedDesign } from '../catalogue/balanced-design.ts';
import type { BalancedDesign } from '../catalogue/balanced-design.ts';
import { balancedSets } from '../catalogue/balanced-sets.ts';
import type { DesignChoice, DesignRequest, Proposal } from '../propose-types.ts';
import { makeChoice } from './make-choice.ts';

/** Balanced designs shown at most. */
const MOST_SHOWN = 4;
/** Sessions of a balanced design that is shown to a planner without a budget. */
const WITHOUT_BUDGET = 120;
/** Replications looked through for the smallest balanced design. */
const MOST_REPLICATION = 60;
/** Sessions of a balanced design that is worth constructing at all. */
const MOST_SESSIONS = 2000;

/** Slots of every session when a balanced design can be an answer at all, else null. */
function commonSlots(request: DesignRequest): number | null {
  if (request.control || request.forbiddenPairs.length > 0) return null;
  const sizes = request.sessionSizes ?? request.machines.map((machine) => Math.min(machine.slots, request.treatments));
  return sizes.every((size) => size === sizes[0]) ? sizes[0]! : null;
}

/** Parameter sets worth trying, fewest sessions first. */
function candidates(request: DesignRequest, k: number, counts: readonly number[]): { r: number; b: number }[] {
  const t = request.treatments;
  if (k === t) return [...counts].sort((a, b) => a - b).map((b) => ({ r: b, b }));
  return balancedSets({ t, k, maxReplication: MOST_REPLICATION }).filter((set) => set.status === 'admissible');
}

function choiceOf(request: DesignRequest, design: BalancedDesign): DesignChoice {
  const { constructionId: id, construction: text, source } = design;
  const groupOf = new Array<number>(design.b).fill(0);
  design.resolution?.forEach((sessions, group) => sessions.forEach((j) => (groupOf[j] = group)));
  const order = [...groupOf.keys()].sort((a, b) => groupOf[a]! - groupOf[b]! || a - b);
  const blocks = (request.resolvable ? order : [...groupOf.keys()]).map((j) =>
    [...design.blocks[j]!].sort((a, b) => a - b)
  );
  const groups = request.resolvable ? order.map((j) => groupOf[j]!) : null;
  const kind =
    id === 'complete-blocks' ? 'complete' : id.startsWith('all-combinations') ? 'all-combinations' : 'catalogue';
  return makeChoice(request, `balanced-${design.b}`, blocks, groups, { kind, id, text, source, search: null });
}

/**
 * Yields the balanced designs that answer a request, fewest sessions first, one after the other since a construction may
 * take a while: within the budget (or within 120 sessions when none is said), filled with the specimens at hand, in shift
 * groups where the request wants them.
 *
 * @param counts numbers of sessions that are looked at anyway; complete sessions are offered for these alone
 *
 * **Checked by** test/core/design/propose/propose-designs.test.ts
 */
export function* balancedChoices(
  request: DesignRequest,
  counts: readonly number[]
): Generator<DesignChoice | null, void> {
  const k = commonSlots(request);
  if (k === null) return;
  const given = request.sessionSizes?.length ?? null;
  const limit = given ?? request.maxSessions ?? WITHOUT_BUDGET;
  const scarcest = Math.min(...(request.specimens ?? []).map((count) => count ?? Infinity), Infinity);
  let shown = 0;
  for (const { r, b } of candidates(request, k, counts)) {
    if (b > limit || r > scarcest || (shown >= MOST_SHOWN && k < request.treatments)) return;
    if (given !== null && b !== given) continue;
    const answer = balancedDesign(request.treatments, k, r, { resolvable: request.resolvable });
    const found = answer.status === 'exists' && (!request.resolvable || answer.design.resolution !== undefined);
    if (found) shown++;
    yield found ? choiceOf(request, answer.design) : null;
  }
}

/**
 * Returns the smallest balanced design for these treatments and slots, whatever it costs: the first parameter set for
 * which a construction is known here, else all combinations. Null when sessions differ in size, when a control or a
 * forbidden pair rules balance out, or when it would take more than a million sessions.
 */
export function smallestBalanced(request: DesignRequest): Proposal['smallestBalanced'] {
  const k = commonSlots(request);
  const t = request.treatments;
  if (k === null || k === t) return null;
  for (const set of balancedSets({ t, k, maxReplication: MOST_REPLICATION })) {
    if (set.status !== 'admissible' || set.b > MOST_SESSIONS) continue;
    if (balancedDesign(t, k, set.r).status !== 'exists') continue;
    return { sessions: set.b, replication: set.r, meets: set.lambda };
  }
  const all = combinationCount(t, k);
  if (all > 1e6) return null;
  return { sessions: all, replication: (all * k) / t, meets: (all * k * (k - 1)) / (t * (t - 1)) };
}
