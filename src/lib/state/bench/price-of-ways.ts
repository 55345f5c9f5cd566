import type { CampaignState } from '#lib/core/campaign/state.ts';
import { unusedSpares } from '#lib/core/campaign/steps/unused-spares.ts';
import { aValue } from '#lib/core/design/a-value.ts';
import { combinationCount } from '#lib/core/design/catalogue/all-combinations.ts';
import { bestExtraSession } from '#lib/core/design/repair/extra-session.ts';

/** Root mean square standard error of a difference in units of σ, and how much that is more than planned; null: not estimable. */
export interface Price {
  standardError: number;
  more: number;
}

const MOST_SESSIONS = 20_000;

export interface PricedWays {
  leaveOut: Price | null;
  spareNow: Price | null;
  /** Treatments of the one more session, and its price; null when there are no specimens for one. */
  later: { treatments: string[]; price: Price | null } | null;
}

/**
 * Prices the three ways on after ruin, with every session that is still to come counted as it is planned: an honest look at
 * the end of the campaign, not at today. The session for later is the ruined one again when the whole session is ruined, else
 * the one more session over treatments with a spare that brings the A-value down most.
 *
 * Cost: t³ a way, and the search of the extra session.
 * Checked by: test/state/bench/price-of-ways.test.ts
 */
export function priceOfWays(state: CampaignState, session: string, slot: number | null): PricedWays {
  const treatments = state.plan?.treatments.map(({ id }) => id) ?? [];
  const t = treatments.length;
  const number = (id: string) => treatments.indexOf(id);
  const standing = state.sessions.filter(({ status }) => status !== 'dropped');
  const block = (kept: (ruined: boolean, at: { session: string; slot: number }) => boolean) =>
    standing
      .map((one) =>
        one.runs
          .filter((run) => run.treatment !== '' && kept(run.ruined !== null, { session: one.id, slot: run.slot }))
          .map((run) => number(run.treatment))
      )
      .filter((runs) => runs.length > 0);
  const planned = aValue(
    block(() => true),
    t
  );
  const price = (value: number): Price | null =>
    Number.isFinite(value) ? { standardError: Math.sqrt(value), more: Math.sqrt(value / planned) - 1 } : null;

  const now = block((ruined) => !ruined);
  const mended = block((ruined, at) => !ruined || (at.session === session && at.slot === slot));
  const again = laterTreatments(state, session, slot, now, treatments);
  return {
    leaveOut: price(aValue(now, t)),
    spareNow: slot === null ? null : price(aValue(mended, t)),
    later: again && { treatments: again.map((i) => treatments[i] ?? ''), price: price(aValue([...now, again], t)) }
  };
}

function laterTreatments(
  state: CampaignState,
  session: string,
  slot: number | null,
  now: number[][],
  treatments: string[]
): number[] | null {
  const ruined = state.sessions.find(({ id }) => id === session);
  if (!ruined) return null;
  const spares = treatments.map((id) => unusedSpares(state, id).length);
  const same = ruined.plan.slots.flatMap((planned) => (planned ? [treatments.indexOf(planned.treatment)] : []));
  if (slot === null) return same.filter((i) => (spares[i] ?? 0) > 0).length >= 2 ? same : null;
  const available = treatments.flatMap((_, i) => ((spares[i] ?? 0) > 0 ? [i] : []));
  const slots = Math.min(ruined.plan.slots.filter((planned) => planned !== null).length, available.length);
  if (slots < 2) return null;
  // Above this a search would keep the person waiting: the same treatments again are a fair answer.
  if (combinationCount(available.length, slots) > MOST_SESSIONS)
    return same.filter((i) => (spares[i] ?? 0) > 0).length >= 2 ? same : null;
  return bestExtraSession(now, treatments.length, available, slots)?.sessions[0] ?? null;
}
