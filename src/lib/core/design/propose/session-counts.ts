import { criterionBound } from '../bounds.ts';
import { criticalT, detectableRatio } from '../detectable-difference.ts';
import type { DesignRequest } from '../propose-types.ts';
import { planFault, searchProblem, sessionPlan, sessionsPerReplicate } from './session-plan.ts';

/** Numbers of sessions a request is worth being answered for, and the least that can compare all treatments. */
export interface SessionCounts {
  /** In the order in which they matter. */
  counts: number[];
  /** Fewest sessions that can connect all treatments. */
  least: number;
}

/** Replications that are worth looking at when nothing else is said. */
const REPLICATIONS = [2, 3, 4, 5, 6, 8, 10, 12, 15, 20];
/** Replications shown at most, besides the budget and what finds the difference. */
const MOST_SHOWN = 4;
/** A designer without a budget is not offered more runs of a treatment than this. */
const MOST_REPLICATION = 60;

/** Whether b sessions have the runs to connect all treatments. */
function canConnect(request: DesignRequest, b: number): boolean {
  const { sizes } = sessionPlan(request, b);
  const controls = request.control?.treatments.length ?? 0;
  const gained = sizes.reduce((sum, size) => sum + size - Math.max(1, controls), 0);
  return gained >= request.treatments - Math.max(1, controls);
}

/**
 * Returns the fewest sessions whose detectable difference could be the one that matters, going by the bound of the
 * criterion (raised by half a percent, which a good design keeps to); null when it is not said or too far away.
 */
function countForDifference(request: DesignRequest, step: number, least: number, most: number): number | null {
  const { scatter, difference, alpha, treatments: t } = request;
  if (scatter === null || difference === null) return null;
  const finds = (b: number): boolean => {
    const plan = sessionPlan(request, b);
    const errorDf = plan.sizes.reduce((sum, size) => sum + size - 1, 0) - t + 1;
    if (errorDf < 1) return false;
    const adjustment = request.adjustment === 'unadjusted' ? ('unadjusted' as const) : ('tukey' as const);
    const critical = criticalT(
      alpha,
      errorDf,
      adjustment === 'tukey' ? { tag: 'tukey', means: t } : { tag: 'unadjusted' }
    );
    const { aValue } = criterionBound({ ...searchProblem(request, plan, true), weights: null });
    return scatter * Math.sqrt(1.005 * aValue) * detectableRatio(critical, errorDf, 0.8) <= difference;
  };
  let low = Math.floor((least - 1) / step);
  let high = Math.floor(most / step);
  if (high <= low || !finds(high * step)) return null;
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    if (finds(middle * step)) high = middle;
    else low = middle;
  }
  return high * step;
}

/**
 * Returns the numbers of sessions worth searching for a request: the whole budget, what finds the difference that matters,
 * and a few replications; each must be able to connect the treatments and be filled with the specimens at hand.
 *
 * **Checked by** test/core/design/propose/session-counts.test.ts
 */
export function sessionCounts(request: DesignRequest): SessionCounts {
  if (request.sessionSizes) {
    const b = request.sessionSizes.length;
    return { counts: canConnect(request, b) ? [b] : [], least: canConnect(request, b) ? b : b + 1 };
  }
  const { treatments: t, maxSessions, machines } = request;
  const controls = request.control?.treatments.length ?? 0;
  const step = request.resolvable ? sessionsPerReplicate(request) : 1;
  const slots = machines.reduce((sum, machine) => sum + Math.min(t, machine.slots), 0) / machines.length;
  const perReplication = request.resolvable ? step : (t - controls) / Math.max(1, slots - controls);
  const whole = slots >= t && machines.every((machine) => machine.slots >= t);

  let least = request.resolvable && !whole && controls === 0 ? 2 * step : step;
  while (!canConnect(request, least)) least += step;
  const limit = Math.floor((maxSessions ?? Math.ceil(perReplication * MOST_REPLICATION)) / step) * step;
  if (limit < least) return { counts: [], least };

  const wanted: number[] = [];
  const forDifference = countForDifference(request, step, least, Math.min(limit, 2000));
  if (maxSessions !== null) wanted.push(limit);
  if (forDifference !== null) wanted.push(forDifference);
  wanted.push(
    ...REPLICATIONS.map((r) => Math.ceil((r * perReplication) / step - 1e-9) * step).slice(0, MOST_SHOWN + 2)
  );
  const fits = (b: number): boolean => b >= least && b <= limit && planFault(request, sessionPlan(request, b)) === null;
  const counts = [...new Set(wanted)].filter(fits);
  const named = counts.filter((b) => b === limit || b === forDifference);
  const others = counts.filter((b) => !named.includes(b)).slice(0, MOST_SHOWN);
  // Few specimens may allow no wanted number but some smaller one.
  if (counts.length === 0) for (let b = limit; b >= least; b -= step) if (fits(b)) return { counts: [b], least };
  return { counts: [...(maxSessions === null ? named.filter((b) => b === forDifference) : named), ...others], least };
}
