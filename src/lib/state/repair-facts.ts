import type { Observations } from '#lib/core/analysis/observations.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import type { RepairOption, RepairReport, RepairRequest } from '#lib/core/design/repair/plan-repair.ts';

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

/** A difference with its standard error, as it is and as it was planned; null where it cannot be estimated. */
export interface HitPair {
  a: string;
  b: string;
  now: number | null;
  planned: number | null;
}

export interface RepairFacts {
  /** Runs of closed sessions without a value that counts. */
  lostRuns: number;
  now: number | null;
  planned: number | null;
  ways: RepairWay[];
  /** The pairs whose standard error grew most, worst first. */
  hit: HitPair[];
}

export interface RepairQuestion {
  lostRuns: number;
  request: RepairRequest;
  /** Ids of the sessions in the request's order. */
  sessions: string[];
}

const MOST_PAIRS = 5;

/**
 * Returns what to ask about the loss: closed sessions count with what is left of them, sessions still to come as planned. Null
 * when nothing is lost.
 * Checked by: test/state/repair-facts.test.ts
 */
export function repairQuestion(state: CampaignState, input: Observations): RepairQuestion | null {
  const t = input.treatments.length;
  if (t < 2) return null;
  const at = new Map(input.sessions.map((session, j) => [session.id, j]));
  const kept = input.sessions.map((): number[] => []);
  for (const row of input.rows) if (row.y !== null && !row.ruined) kept[row.session]?.push(row.treatment);
  const place = new Map(input.treatments.map((treatment, i) => [treatment.id, i]));
  const sessions = state.sessions.filter((session) => session.status !== 'dropped');
  const planned = sessions.map((session) =>
    session.plan.slots.flatMap((run) => (run === null ? [] : [place.get(run.treatment) ?? 0]))
  );
  const left = sessions.map((session, k) =>
    session.status === 'closed' ? (kept[at.get(session.id) ?? -1] ?? []) : (planned[k] ?? [])
  );
  const lostRuns = planned.reduce((sum, block, k) => sum + Math.max(0, block.length - (left[k]?.length ?? 0)), 0);
  if (lostRuns === 0) return null;
  const used = new Map<string, number>();
  for (const session of sessions)
    for (const run of session.plan.slots) if (run !== null) used.set(run.treatment, (used.get(run.treatment) ?? 0) + 1);
  const specimens = input.treatments.map(({ id }) => {
    const given = state.plan?.treatments.find((treatment) => treatment.id === id)?.specimens ?? null;
    return given === null ? null : Math.max(0, given - (used.get(id) ?? 0));
  });
  const room = (state.plan?.machines ?? []).map(({ slots }) => slots.filter(({ inService }) => inService).length);
  const widest = Math.max(2, ...planned.map((block) => block.length));
  const slots = Math.max(2, Math.min(widest, Math.max(2, ...room)));
  return {
    lostRuns,
    request: { treatments: t, planned, kept: left, slots, specimens },
    sessions: sessions.map(({ id }) => id)
  };
}

/**
 * Returns the answer in the terms of the campaign.
 *
 * @param sigma scatter between runs of one session, in units of the measurand; null without an estimate
 * @param treatments ids in the order of the request
 * Checked by: test/state/repair-facts.test.ts
 */
export function repairFacts(
  { lostRuns, sessions }: RepairQuestion,
  report: Omit<RepairReport, 'parts'>,
  sigma: number | null,
  treatments: readonly string[]
): RepairFacts {
  const se = (variance: number | null): number | null =>
    sigma === null || variance === null || !Number.isFinite(variance) ? null : sigma * Math.sqrt(variance);
  const id = (i: number): string => treatments[i] ?? '';
  return {
    lostRuns,
    now: se(report.aValue),
    planned: se(report.plannedAValue),
    ways: report.options
      .filter((option) => option.kind !== 'rerun' || option.possible)
      .map((option): RepairWay => ({
        key: option.kind === 'rerun' ? `rerun-${option.session}` : option.kind,
        kind: option.kind,
        session: option.kind === 'rerun' ? (sessions[option.session] ?? null) : null,
        treatments: option.kind === 'leave' ? [] : option.treatments.map(id),
        runs: option.runs,
        seAfter: se(option.aValue),
        connects: report.aValue === null && option.aValue !== null
      })),
    hit: hardest(report.pairs).map(({ a, b, now, planned }) => ({
      a: id(a),
      b: id(b),
      now: se(now),
      planned: se(planned)
    }))
  };
}

/** Pairs in the order of what they lost; those that lost nothing are left out. */
function hardest(pairs: RepairReport['pairs']): RepairReport['pairs'] {
  const loss = ({ now, planned }: RepairReport['pairs'][number]): number => (now ?? Infinity) / planned;
  return pairs
    .filter((pair) => loss(pair) > 1 + 1e-9)
    .sort((x, y) => (loss(y) > loss(x) ? 1 : loss(y) < loss(x) ? -1 : 0))
    .slice(0, MOST_PAIRS);
}
