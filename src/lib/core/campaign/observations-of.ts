import type { Measurand, ReadingDefinition } from './plan.ts';
import type { CampaignState, ReadingState, RunState } from './state.ts';

export type Limit = 'none' | 'at-least' | 'at-most';

/** One run as the analysis wants it. */
export interface ObservedRow {
  treatment: string;
  session: string;
  slot: number;
  specimen: string;
  /** The measurand; null when a reading it needs is missing, disputed, or the formula has no answer. */
  y: number | null;
  /** Ruined: must not count; its y is kept for the comparison with and without. */
  ruined: boolean;
  runId: string;
  limit: Limit;
  /** A contradiction about this run is undecided: y is null until it is. */
  undecided: boolean;
}

/**
 * Evaluates a measurand from the values of one run's readings by id; null stands for a missing value. Constants are the
 * evaluator's own matter. Returns null when there is no finite answer.
 */
export type Evaluate = (measurand: Measurand, values: Record<string, number | null>) => number | null;

interface Value {
  value: number;
  limit: Limit;
}

/**
 * One row for each planned run (ruined ones and those without readings too) and for each earlier run of a slot that a
 * spare has followed. A reading taken several times counts as its mean, once all repeats are there or said to be missing.
 * Where a reading stopped at a limit, so does y, on the side to which the formula carries it.
 * Checked by: test/core/campaign/observations-of.test.ts.
 */
export function observationsOf(state: CampaignState, measurandId: string, evaluate: Evaluate): ObservedRow[] {
  const { plan } = state;
  const measurand = plan?.measurands.find(({ id }) => id === measurandId);
  if (!plan || !measurand) return [];
  return state.sessions.flatMap((session) =>
    session.runs
      .flatMap((run) => [...run.earlier, run])
      .filter((run) => session.status !== 'dropped' || run.readings.some(({ current }) => current !== null))
      .map((run) => rowOf(run, measurand, plan.readings, evaluate))
  );
}

function rowOf(
  run: RunState,
  measurand: Measurand,
  definitions: readonly ReadingDefinition[],
  evaluate: Evaluate
): ObservedRow {
  const undecided = run.treatment === '' || run.readings.some(({ contradiction }) => contradiction !== null);
  const found = new Map<string, Value>();
  for (const { id } of definitions) {
    const value = meanOf(run.readings.filter(({ reading }) => reading === id));
    if (value) found.set(id, value);
  }
  const at = (changed?: { id: string; value: number }): number | null => {
    const values = Object.fromEntries(definitions.map(({ id }) => [id, found.get(id)?.value ?? null]));
    if (changed) values[changed.id] = changed.value;
    const y = measurand.formula === null ? (values[measurand.id] ?? null) : evaluate(measurand, values);
    return y !== null && Number.isFinite(y) ? y : null;
  };
  const y = undecided ? null : at();
  const limit = y === null ? 'none' : limitOf(y, found, at);
  return {
    treatment: run.treatment,
    session: run.session,
    slot: run.slot,
    specimen: run.specimen,
    y: limit === null ? null : y,
    ruined: run.ruined !== null,
    runId: run.id,
    limit: limit ?? 'none',
    undecided
  };
}

/** The mean of a reading's repeats, null while one is still to come; limited when one of them is. */
function meanOf(repeats: readonly ReadingState[]): Value | null {
  if (repeats.some(({ current, missing }) => current === null && missing === null)) return null;
  const there = repeats.flatMap(({ current }) => (current ? [current] : []));
  if (there.length === 0) return null;
  const limits = new Set(there.map(({ limit }) => limit).filter((limit) => limit !== 'none'));
  if (limits.size > 1) return null;
  const value = there.reduce((sum, { value: one }) => sum + one, 0) / there.length;
  return { value, limit: [...limits][0] ?? 'none' };
}

/**
 * On which side y is limited: a limited reading is nudged to the side where the truth lies, and y moves with it or
 * against it. Null when limited readings pull to both sides: then nothing is known.
 */
function limitOf(
  y: number,
  found: ReadonlyMap<string, Value>,
  at: (changed: { id: string; value: number }) => number | null
): Limit | null {
  const sides = new Set<Limit>();
  for (const [id, { value, limit }] of found) {
    if (limit === 'none') continue;
    const step = Math.max(Math.abs(value), 1e-6) * 1e-6 * (limit === 'at-least' ? 1 : -1);
    const moved = at({ id, value: value + step });
    if (moved === null) return null;
    if (moved !== y) sides.add(moved > y ? 'at-least' : 'at-most');
  }
  if (sides.size > 1) return null;
  return [...sides][0] ?? 'none';
}
