import { type Limit, observationsOf } from '#lib/core/campaign/observations-of.ts';
import type { Measurand, Plan } from '#lib/core/campaign/plan.ts';
import type { CampaignState, RunState, SessionState } from '#lib/core/campaign/state.ts';
import { compileMeasurand } from '#lib/formula/compile-measurand.ts';
import type { EvaluationError, FormulaError } from '#lib/formula/formula-error.ts';

/** Why a run has no result yet, or never will. */
export type NoResult =
  | EvaluationError
  | { tag: 'undecided' }
  /** Readings that stopped at a limit pull to both sides. */
  | { tag: 'limits-disagree' }
  /** The plan's own formula cannot be used; its fault. */
  | { tag: 'formula-unusable'; fault: FormulaError }
  /** What computes is not here: the program could not load it. */
  | { tag: 'not-loaded' };

export interface RunResult {
  slot: number;
  measurand: string;
  value: number | null;
  limit: Limit;
  why: NoResult | null;
}

/** Measurands that say more than the readings themselves: computed, or the mean of repeats. */
export const computedMeasurands = ({ measurands, readings }: Plan): Measurand[] =>
  measurands.filter(
    ({ id, formula }) => formula !== null || readings.some((reading) => reading.id === id && reading.repeats > 1)
  );

/**
 * Returns what each run of a session comes to, for every computed measurand, or why it comes to nothing. Ruined runs are
 * computed too: their readings are kept.
 * Checked by: test/state/bench/run-results.test.ts
 */
export async function runResults(state: CampaignState, session: SessionState): Promise<RunResult[]> {
  const { plan } = state;
  if (!plan) return [];
  const found = await Promise.all(
    computedMeasurands(plan).map(async (measurand) => {
      const compiled = await compileMeasurand(measurand, plan).catch(() => null);
      return session.runs.map((run): RunResult => {
        const none = { slot: run.slot, measurand: measurand.id, value: null, limit: 'none' as const };
        if (compiled === null) return { ...none, why: { tag: 'not-loaded' } };
        if (!compiled.ok) return { ...none, why: { tag: 'formula-unusable', fault: compiled.error } };
        return { ...none, ...resultOf(state, session, run, measurand, compiled.value.evaluate) };
      });
    })
  );
  return found.flat();
}

type Answer = { ok: true; value: number } | { ok: false; error: EvaluationError };

function resultOf(
  state: CampaignState,
  session: SessionState,
  run: RunState,
  measurand: Measurand,
  evaluate: (values: Record<string, number | null>) => Answer
): Pick<RunResult, 'value' | 'limit' | 'why'> {
  const alone = { ...state, sessions: [{ ...session, runs: [{ ...run, earlier: [] }] }] };
  let why: EvaluationError | null = null;
  const [row] = observationsOf(alone, measurand.id, (_, values) => {
    const answer = evaluate(values);
    if (answer.ok) return answer.value;
    why ??= answer.error;
    return null;
  });
  if (!row || row.undecided) return { value: null, limit: 'none', why: { tag: 'undecided' } };
  if (row.y !== null) return { value: row.y, limit: row.limit, why: null };
  const limited = run.readings.some(({ current }) => current !== null && current.limit !== 'none');
  const otherwise: NoResult = limited ? { tag: 'limits-disagree' } : { tag: 'value-missing', name: measurand.id };
  return { value: null, limit: 'none', why: why ?? otherwise };
}
