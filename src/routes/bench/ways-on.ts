import type { PlannedSession } from '#lib/core/campaign/plan.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { repeatSession } from '#lib/core/campaign/steps/repeat-session.ts';
import { unusedSpares } from '#lib/core/campaign/steps/unused-spares.ts';
import type { WayOnView } from '#lib/ui/bench/view.ts';
import { benchPartTexts } from '#lib/ui/texts/bench-parts.ts';

/** The three ways on after ruin, and which of them there are specimens for. */
export function waysOn(state: CampaignState, session: string, slot: number | null): WayOnView[] {
  const t = benchPartTexts().ruin;
  const ruined = state.sessions.find(({ id }) => id === session);
  const run = ruined?.runs.find((one) => one.slot === slot);
  const spare = run ? unusedSpares(state, run.planned.treatment)[0] : undefined;
  const later = laterSession(state, session, 'r');
  return [
    {
      way: 'repeat-later',
      title: t.later,
      says: later ? t.laterSays : t.noSpare,
      price: '',
      possible: later !== null
    },
    ...(slot === null
      ? []
      : [
          {
            way: 'spare-now' as const,
            title: t.spare,
            says: spare ? t.spareSays(spare) : t.noSpare,
            price: '',
            possible: spare !== undefined
          }
        ]),
    { way: 'leave-out', title: t.leave, says: t.leaveSays, price: '', possible: true }
  ];
}

/** The session that would be added for a repeat; `unique` makes its name one that no other device gives. */
export function laterSession(state: CampaignState, session: string, unique: string): PlannedSession | null {
  const ruined = state.sessions.find(({ id }) => id === session);
  const treatments = ruined?.plan.slots.map((slot) => slot?.treatment ?? null) ?? [];
  return repeatSession(state, session, treatments, `r${unique.replace(/-/gu, '_')}`);
}
