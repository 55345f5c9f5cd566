import type { Direction, ObservationRow, Observations } from '#lib/core/analysis/observations.ts';
import { type ObservedRow, observationsOf } from '#lib/core/campaign/observations-of.ts';
import type { Measurand } from '#lib/core/campaign/plan.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { ok, type Result } from '#lib/core/result.ts';
import { compileMeasurand } from '#lib/formula/compile-measurand.ts';
import type { FormulaError } from '#lib/formula/formula-error.ts';

const directionOf = ({ direction }: Measurand): Direction =>
  direction.kind === 'target' ? { target: direction.value } : direction.kind;

/** A whole number that stays the same for one campaign: FNV-1a over its id. */
function seedOf(id: string): number {
  let hash = 0x811c9dc5;
  for (const c of id) hash = Math.imul(hash ^ (c.codePointAt(0) ?? 0), 0x01000193) >>> 0;
  return hash;
}

/**
 * Returns what the analysis of a measurand reads: the runs of the record with their values, and what the plan fixed.
 * A run whose treatment is not known (a contradiction waits for a decision) is left out until it is.
 * Checked by: test/core/exchange/package/make-package.test.ts (through a whole package)
 */
export function analysisInput(
  state: CampaignState,
  measurand: Measurand,
  observed: readonly ObservedRow[]
): Observations {
  const { plan } = state;
  const treatments = plan?.treatments ?? [];
  const sessions = state.sessions;
  const treatmentAt = new Map(treatments.map((t, i) => [t.id, i]));
  const sessionAt = new Map(sessions.map((s, j) => [s.id, j]));
  const machines = plan?.machines ?? [];
  const rows = observed.flatMap((row): ObservationRow[] => {
    const treatment = treatmentAt.get(row.treatment);
    const session = sessionAt.get(row.session);
    if (treatment === undefined || session === undefined) return [];
    const { slot, y, ruined, limit, runId } = row;
    return [{ treatment, session, slot, y, ruined, limit, runId }];
  });
  const control = treatments.findIndex((t) => t.control);
  return {
    treatments: treatments.map(({ id, name }) => ({ id, name })),
    sessions: sessions.map(({ id, plan: planned }) => ({
      id,
      name: String(planned.number),
      shift: String(planned.shift),
      machine: planned.machine
    })),
    rows,
    direction: directionOf(measurand),
    control: control < 0 ? null : control,
    alpha: Math.min(0.499, plan?.primary?.alpha ?? 0.05),
    equivalenceMargin: measurand.equivalenceMargin,
    primary: plan?.primary?.sessions ?? 'fixed',
    factors: { slot: plan?.primary?.slotInModel ?? false, machine: machines.length > 1, shift: false },
    kind: measurand.kind,
    seed: seedOf(state.id)
  };
}

/** The runs of a campaign with the value of a measurand, computed by its formula where it has one. */
export async function observedRows(
  state: CampaignState,
  measurand: Measurand
): Promise<Result<ObservedRow[], FormulaError>> {
  const compiled = await compileMeasurand(measurand, {
    readings: state.plan?.readings ?? [],
    constants: state.plan?.constants ?? []
  });
  if (!compiled.ok) return compiled;
  const rows = observationsOf(state, measurand.id, (_, values) => {
    const value = compiled.value.evaluate(values);
    return value.ok ? value.value : null;
  });
  return ok(rows);
}
