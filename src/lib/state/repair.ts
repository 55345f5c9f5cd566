import type { Analysis } from '#lib/core/analysis/analysis-result.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import type { PlannedSession } from '#lib/core/campaign/plan.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { planRepair, type RepairOption } from '#lib/core/design/repair/plan-repair.ts';
import { drawSpecimenCodes } from '#lib/core/design/specimen-codes.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';

/** A way on with its price, in the terms of the campaign. */
export interface RepairWay {
  key: string;
  kind: RepairOption['kind'];
  /** The session that would be run again. */
  session: string | null;
  /** Ids of the treatments that would be loaded. */
  treatments: string[];
  runs: number;
  /** Average standard error of a difference afterwards; null without an estimate of scatter or while in parts. */
  seAfter: number | null;
  connects: boolean;
}

export interface RepairFacts {
  /** Runs of closed sessions without a value that counts. */
  lostRuns: number;
  now: number | null;
  planned: number | null;
  ways: RepairWay[];
}

/** Largest campaign for which repair is worked out at once; beyond it the search would hold the screen. */
const MOST_TREATMENTS = 120;

/**
 * Returns what ruin has cost and the ways on: closed sessions count with what is left of them, sessions still to come as planned.
 * Null when nothing is lost, or where the campaign is too large to work it out at once.
 */
export function repairFacts(state: CampaignState, input: Observations, analysis: Analysis): RepairFacts | null {
  const t = input.treatments.length;
  if (t < 2 || t > MOST_TREATMENTS) return null;
  const at = new Map(input.sessions.map((session, j) => [session.id, j]));
  const kept = new Map<number, number[]>();
  for (const row of input.rows)
    if (row.y !== null && !row.ruined) kept.set(row.session, [...(kept.get(row.session) ?? []), row.treatment]);
  const place = new Map(input.treatments.map((treatment, i) => [treatment.id, i]));
  const sessions = state.sessions.filter((session) => session.status !== 'dropped');
  const planned = sessions.map((session) =>
    session.plan.slots.flatMap((run) => (run === null ? [] : [place.get(run.treatment) ?? 0]))
  );
  const left = sessions.map((session, k) =>
    session.status === 'closed' ? (kept.get(at.get(session.id) ?? -1) ?? []) : (planned[k] ?? [])
  );
  const lostRuns = planned.reduce((sum, block, k) => sum + Math.max(0, block.length - (left[k]?.length ?? 0)), 0);
  if (lostRuns === 0) return null;
  const used = new Map<string, number>();
  for (const session of sessions)
    for (const run of session.plan.slots) if (run !== null) used.set(run.treatment, (used.get(run.treatment) ?? 0) + 1);
  const specimens = (state.plan?.treatments ?? []).map((treatment) =>
    treatment.specimens === null ? null : Math.max(0, treatment.specimens - (used.get(treatment.id) ?? 0))
  );
  const slots = Math.max(2, ...planned.map((block) => block.length));
  const report = planRepair({ treatments: t, planned, kept: left, slots, specimens });
  const sigma = analysis.fixed.ok ? analysis.fixed.value.sigma : null;
  const se = (aValue: number | null): number | null =>
    sigma === null || aValue === null || !Number.isFinite(aValue) ? null : sigma * Math.sqrt(aValue);
  const ids = (list: readonly number[]): string[] => list.map((i) => input.treatments[i]?.id ?? '');
  return {
    lostRuns,
    now: se(report.aValue),
    planned: se(report.plannedAValue),
    ways: report.options
      .filter((option) => option.kind !== 'rerun' || option.possible)
      .map((option): RepairWay => ({
        key: option.kind === 'rerun' ? `rerun-${option.session}` : option.kind,
        kind: option.kind,
        session: option.kind === 'rerun' ? (sessions[option.session]?.id ?? null) : null,
        treatments: option.kind === 'leave' ? [] : ids(option.treatments),
        runs: option.runs,
        seAfter: se(option.aValue),
        connects: report.aValue === null && option.aValue !== null
      }))
  };
}

/**
 * Returns the session of an amendment: at the end of the loading order, slots drawn by chance, spare codes used before new ones
 * are drawn.
 */
export function sessionOfWay(state: CampaignState, way: RepairWay, seed: string): PlannedSession | null {
  const { issued, plan } = state;
  if (issued === null || plan === null || way.treatments.length === 0) return null;
  const like = state.sessions.find((session) => session.id === way.session) ?? state.sessions.at(-1);
  const machine = plan.machines.find((one) => one.id === like?.plan.machine) ?? plan.machines[0];
  if (machine === undefined) return null;
  const random = seededRandom(seed);
  const taken = new Set<string>([
    ...state.sessions.flatMap((session) => session.plan.slots.flatMap((run) => (run === null ? [] : [run.specimen]))),
    ...state.sessions.flatMap((session) => session.runs.map((run) => run.specimen))
  ]);
  const spares = issued.spares.filter((spare) => !taken.has(spare.specimen));
  for (const spare of issued.spares) taken.add(spare.specimen);
  const fresh = drawSpecimenCodes(taken.size + way.treatments.length, random).filter((code) => !taken.has(code));
  const codeOf = (treatment: string): string => {
    const spare = spares.findIndex((one) => one.treatment === treatment);
    return (spare >= 0 ? spares.splice(spare, 1)[0]?.specimen : fresh.shift()) ?? '';
  };
  const open = machine.slots.flatMap((slot, i) => (slot.inService ? [i] : []));
  for (let i = open.length - 1; i > 0; i -= 1) {
    const j = random.below(i + 1);
    [open[i], open[j]] = [open[j] ?? 0, open[i] ?? 0];
  }
  const slots: PlannedSession['slots'] = machine.slots.map(() => null);
  way.treatments.slice(0, open.length).forEach((treatment, k) => {
    slots[open[k] ?? 0] = { treatment, specimen: codeOf(treatment) };
  });
  const ids = new Set(state.sessions.map((session) => session.id));
  const number = Math.max(0, ...state.sessions.map((session) => session.plan.number)) + 1;
  let id = `s${number}`;
  while (ids.has(id)) id = `${id}x`;
  const shift = Math.max(1, ...state.sessions.map((session) => session.plan.shift));
  return { id, number, shift, machine: machine.id, slots, repeats: way.kind === 'rerun' ? way.session : null };
}
