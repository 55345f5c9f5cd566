import type { DesignRequest } from '../propose-types.ts';
import { addPairWeights, controlPairs, nearEqualReplication } from '../search/search-problem.ts';
import type { SearchProblem } from '../search/search-problem.ts';

/** How many sessions, of what size, in which shift groups. */
export interface SessionPlan {
  sizes: number[];
  groupOf: number[] | null;
}

/** Sizes of s sessions that hold n treatments (and c controls each), as equal as can be. */
function dealtSizes(n: number, s: number, controls: number): number[] {
  return Array.from({ length: s }, (_, j) => Math.floor(n / s) + (j < n % s ? 1 : 0) + controls);
}

/** Sessions that hold every test treatment once. */
export function sessionsPerReplicate(request: DesignRequest): number {
  const controls = request.control?.treatments.length ?? 0;
  const slots = Math.min(...request.machines.map((machine) => machine.slots));
  return Math.ceil((request.treatments - controls) / (slots - controls));
}

/**
 * Returns the sessions of a plan with b loadings: given one by one, or the machines in turn with all their slots; a
 * resolvable plan deals all treatments out in each group.
 */
export function sessionPlan(request: DesignRequest, b: number): SessionPlan {
  if (request.sessionSizes) return { sizes: [...request.sessionSizes], groupOf: null };
  const { treatments: t, machines } = request;
  if (request.resolvable) {
    const s = sessionsPerReplicate(request);
    const controls = request.control?.treatments.length ?? 0;
    const sizes = dealtSizes(t - controls, s, controls);
    return {
      sizes: Array.from({ length: b }, (_, j) => sizes[j % s]!),
      groupOf: Array.from({ length: b }, (_, j) => Math.floor(j / s))
    };
  }
  return {
    sizes: Array.from({ length: b }, (_, j) => Math.min(t, machines[j % machines.length]!.slots)),
    groupOf: null
  };
}

/** Most runs of each treatment in b sessions. */
const capsOf = (request: DesignRequest, b: number): number[] =>
  Array.from({ length: request.treatments }, (_, i) => Math.min(b, request.specimens?.[i] ?? b));

/** Why a plan of sessions cannot be filled; null when it can. */
export function planFault(request: DesignRequest, { sizes, groupOf }: SessionPlan): { treatment: number } | null {
  const b = sizes.length;
  const caps = capsOf(request, b);
  const controls = request.control?.treatments ?? [];
  const short = controls.find((i) => caps[i]! < b);
  if (short !== undefined) return { treatment: short };
  const tests = caps.map((_, i) => i).filter((i) => !controls.includes(i));
  const scarcest = tests.reduce((best, i) => (caps[i]! < caps[best]! ? i : best), tests[0]!);
  if (groupOf) return caps[scarcest]! < groupOf[b - 1]! + 1 ? { treatment: scarcest } : null;
  const runs = sizes.reduce((sum, size) => sum + size - controls.length, 0);
  return tests.reduce((sum, i) => sum + caps[i]!, 0) < runs ? { treatment: scarcest } : null;
}

/**
 * Returns the search problem of a plan of sessions.
 *
 * @param free whether replications may be as unequal as the A-value likes, instead of near-equal
 */
export function searchProblem(request: DesignRequest, plan: SessionPlan, free: boolean): SearchProblem {
  const { treatments: t, control } = request;
  const controls = control?.treatments ?? [];
  const b = plan.sizes.length;
  const caps = capsOf(request, b).map((cap, i) => (controls.includes(i) ? 0 : cap));
  const runs = plan.sizes.reduce((sum, size) => sum + size - controls.length, 0);
  const replication = free
    ? { least: caps.map((cap) => Math.min(cap, 1)), most: caps }
    : nearEqualReplication(runs, caps);
  for (const i of controls) replication.least[i] = replication.most[i] = b;
  const pairs = request.forbiddenPairs;
  const forbidden = pairs.length > 0 ? new Uint8Array(t * t) : null;
  for (const [i, l] of pairs) forbidden![i * t + l] = forbidden![l * t + i] = 1;
  return {
    t,
    sizes: plan.sizes,
    controls: [...controls],
    groupOf: plan.groupOf,
    replication,
    forbidden,
    weights: control ? controlWeights(t, control) : null
  };
}

function controlWeights(t: number, control: NonNullable<DesignRequest['control']>): Float64Array {
  const { testControl, testTest } = controlPairs(t, control.treatments);
  const share = { 'test-control': [1, 0], 'test-test': [0, 1], half: [0.5, 0.5] }[control.weigh];
  const weights = new Float64Array(t * t);
  if (share[0]!) addPairWeights(weights, t, testControl, share[0]!);
  if (share[1]!) addPairWeights(weights, t, testTest, share[1]!);
  return weights;
}

/**
 * Returns classes of treatments that chance may exchange: equal numbers mean alike. A control, a treatment with few
 * specimens and one of a forbidden pair are not like the others.
 */
export function labelClasses(request: DesignRequest): number[] {
  const keys = Array.from({ length: request.treatments }, (_, i) => {
    if (request.forbiddenPairs.some((pair) => pair.includes(i))) return `alone ${i}`;
    return `${request.control?.treatments.includes(i) ?? false} ${request.specimens?.[i] ?? 'enough'}`;
  });
  const names = [...new Set(keys)];
  return keys.map((key) => names.indexOf(key));
}
