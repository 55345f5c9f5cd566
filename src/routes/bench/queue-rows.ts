import type { CampaignState } from '#lib/core/campaign/state.ts';
import type { QueueRowView } from '#lib/ui/bench/view.ts';

/** The sessions in loading order, with what was amended and what was ruined. */
export function queueRows(state: CampaignState, current: string | null): QueueRowView[] {
  const added = new Set(
    state.amendments.flatMap(({ change }) => (change.kind === 'add-session' ? [change.session.id] : []))
  );
  return state.sessions.map((session) => ({
    id: session.id,
    number: session.plan.number,
    shift: session.plan.shift,
    status: session.status,
    ruined: session.runs.filter(({ ruined }) => ruined).length,
    whole: session.ruined !== null,
    runs: session.runs.length,
    repeats: state.sessions.find(({ id }) => id === session.plan.repeats)?.plan.number ?? null,
    added: added.has(session.id),
    current: session.id === current
  }));
}
