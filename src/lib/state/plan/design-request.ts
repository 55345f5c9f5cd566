import type { PlanDraft } from '#lib/core/campaign/draft/plan-draft.ts';
import type { Plan } from '#lib/core/campaign/plan.ts';
import type { ControlRequest, DesignRequest } from '#lib/core/design/propose-types.ts';

/**
 * Returns what the planner asks the design engine, or null while the draft cannot be asked about yet.
 *
 * Only what bears on the design is in it, so that typing elsewhere starts no new search.
 */
export function designRequest(
  draft: PlanDraft,
  plan: Plan,
  numbers: { maxSessions: number | null },
  effort: DesignRequest['effort']
): DesignRequest | null {
  const { treatments } = plan;
  const machines = plan.machines.map(({ slots }) => ({ slots: slots.filter(({ inService }) => inService).length }));
  if (treatments.length < 2 || treatments.length > 100 || machines.some(({ slots }) => slots < 1)) return null;
  const measurand = plan.measurands.find(({ id }) => id === plan.primary?.measurand) ?? plan.measurands[0];
  const place = new Map(treatments.map(({ id }, i) => [id, i]));
  const specimens = treatments.map((treatment) => treatment.specimens);
  return {
    treatments: treatments.length,
    machines,
    maxSessions: numbers.maxSessions,
    sessionSizes: null,
    specimens: specimens.every((count) => count === null) ? null : specimens,
    sessionsPerShift: plan.sessionsPerShift,
    resolvable: draft.design.resolvable && plan.sessionsPerShift !== null,
    control: controls(draft, plan),
    forbiddenPairs: draft.design.apart.flatMap(({ one, other }): [number, number][] => {
      const [a, b] = [place.get(one), place.get(other)];
      return a === undefined || b === undefined || a === b ? [] : [[Math.min(a, b), Math.max(a, b)]];
    }),
    scatter: measurand?.kind === 'rank' ? null : (measurand?.scatter ?? null),
    difference: measurand?.kind === 'rank' ? null : (measurand?.difference ?? null),
    alpha: plan.primary?.alpha ?? 0.05,
    adjustment: basisOf(plan),
    minutesPerSession: plan.minutesPerSession,
    seed: 'choices',
    effort
  };
}

/**
 * Which detectable difference a plan is judged by. Dunnett's and Hsu's lie between a pair by itself and Tukey's: taking
 * Tukey's errs to the side of more sessions.
 */
export const basisOf = (plan: Plan): 'tukey' | 'unadjusted' =>
  plan.primary?.adjustment === 'none' ? 'unadjusted' : 'tukey';

function controls(draft: PlanDraft, plan: Plan): ControlRequest | null {
  const treatments = plan.treatments.flatMap(({ control }, i) => (control ? [i] : []));
  if (treatments.length === 0 || !draft.design.controlInEverySession) return null;
  return { treatments, weigh: draft.design.controlWeigh };
}
