import type { CampaignState } from '#lib/core/campaign/state.ts';
import { concurrence, concurrenceRange, replications } from '#lib/core/design/concurrence.ts';
import { earlyStop } from '#lib/core/design/early-stop-order.ts';
import { slotCounts } from '#lib/core/design/slot-counts.ts';

/** What can be counted about the sessions of a campaign as they are planned now. */
export interface PlanFacts {
  size: { min: number; max: number };
  replication: { min: number; max: number };
  concurrence: { min: number; max: number };
  /** How often treatments i and j meet. */
  meets: number[][];
  /** By machine: how often each treatment visits each slot. */
  visits: { machine: string; counts: number[][] }[];
  connectedAfter: number | null;
}

const rangeOf = (values: readonly number[]) => ({ min: Math.min(...values), max: Math.max(...values) });

/** Counts the planned sessions, left-out ones not among them; null before the issue. Cost: sessions × t³. */
export function planFacts(state: CampaignState): PlanFacts | null {
  const { plan } = state;
  const sessions = state.sessions.filter(({ status }) => status !== 'dropped');
  if (!plan || sessions.length === 0) return null;
  const t = plan.treatments.length;
  const place = new Map(plan.treatments.map(({ id }, i) => [id, i]));
  const rows = sessions.map(({ plan: { slots } }) =>
    slots.map((slot) => (slot ? (place.get(slot.treatment) ?? null) : null))
  );
  const blocks = rows.map((row) => row.filter((treatment) => treatment !== null));
  return {
    size: rangeOf(blocks.map(({ length }) => length)),
    replication: rangeOf(replications(blocks, t)),
    concurrence: concurrenceRange(blocks, t),
    meets: concurrence(blocks, t),
    visits: plan.machines.map(({ id, slots }) => ({
      machine: id,
      counts: slotCounts(
        rows.filter((_, j) => sessions[j]?.plan.machine === id),
        t,
        slots.length
      )
    })),
    connectedAfter: earlyStop(blocks, t).connectedAfter
  };
}
