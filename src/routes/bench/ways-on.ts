import type { PlannedSession } from '#lib/core/campaign/plan.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { repeatSession } from '#lib/core/campaign/steps/repeat-session.ts';
import { unusedSpares } from '#lib/core/campaign/steps/unused-spares.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { priceOfWays, type Price, type PricedWays } from '#lib/state/bench/price-of-ways.ts';
import type { WayOnView } from '#lib/ui/bench/view.ts';
import { unitText } from '#lib/ui/format/unit-text.ts';
import { writer } from '#lib/ui/format/writer.svelte.ts';
import { benchPartTexts } from '#lib/ui/texts/bench-parts.ts';

/** The three ways on after ruin, which of them there are specimens for, and what each costs in precision. */
export function waysOn(state: CampaignState, session: string, slot: number | null): WayOnView[] {
  const t = benchPartTexts().ruin;
  const run = state.sessions.find(({ id }) => id === session)?.runs.find((one) => one.slot === slot);
  const spare = run ? unusedSpares(state, run.planned.treatment)[0] : undefined;
  const priced = priceOfWays(state, session, slot);
  const later = laterSession(state, session, priced, 'r');
  const none = t.noSpare;
  return [
    {
      way: 'repeat-later',
      title: t.later,
      says: later ? t.laterSays : none,
      price: later && priced.later ? priceText(state, priced.later.price) : '',
      possible: later !== null
    },
    ...(slot === null
      ? []
      : [
          {
            way: 'spare-now' as const,
            title: t.spare,
            says: spare ? t.spareSays(spare) : none,
            price: spare ? priceText(state, priced.spareNow) : '',
            possible: spare !== undefined
          }
        ]),
    {
      way: 'leave-out',
      title: t.leave,
      says: t.leaveSays,
      price: priceText(state, priced.leaveOut),
      possible: true
    }
  ];
}

/** Standard error of a difference in the measurand's unit where its scatter is known, and against the plan. */
function priceText(state: CampaignState, price: Price | null): string {
  const t = benchPartTexts().ruin;
  if (!price) return t.lost;
  const percent = `${price.more >= 0.0005 ? '+' : ''}${writer().percent(price.more, 1)}`;
  const measurand = state.plan?.measurands[0];
  const { scatter = null } = measurand ?? {};
  const size =
    scatter === null
      ? `${writer().significant(price.standardError, 3)} σ`
      : `${writer().significant(price.standardError * scatter, 3)} ${unitText(measurand?.unit ?? '')}`;
  return t.price(size, percent);
}

/**
 * The session that would be added for a repeat; `unique` makes its name one that no other device gives. Another choice of
 * treatments than before gets its slots by chance, drawn from that name.
 */
export function laterSession(
  state: CampaignState,
  session: string,
  priced: PricedWays,
  unique: string
): PlannedSession | null {
  const ruined = state.sessions.find(({ id }) => id === session);
  if (!ruined || !priced.later) return null;
  const id = `r${unique.replace(/-/gu, '_')}`;
  const planned = ruined.plan.slots.map((slot) => slot?.treatment ?? null);
  const { treatments } = priced.later;
  const same =
    [...treatments].sort().join() ===
    planned
      .filter((one) => one !== null)
      .sort()
      .join();
  if (same) return repeatSession(state, session, planned, id);
  const drawn = seededRandom(id).shuffle([...treatments]);
  return repeatSession(
    state,
    session,
    planned.map((one) => (one === null ? null : (drawn.shift() ?? null))),
    id
  );
}
