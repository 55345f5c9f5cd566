import type { CampaignState } from '#lib/core/campaign/state.ts';
import type { RepairState } from '#lib/state/repair.svelte.ts';
import type { NumberWriter } from '#lib/ui/format/number-writer.ts';
import type { Finding } from '#lib/ui/results/findings.ts';
import { choiceName, type RepairView } from '#lib/ui/results/repair-choice.ts';
import type { ResultWords } from '#lib/ui/texts/result-words.ts';

/** The ways on after ruin in the names that a person gave. */
export function repairView(
  state: RepairState,
  campaign: CampaignState,
  words: ResultWords,
  write: NumberWriter
): RepairView {
  if (state.tag === 'nothing') return state;
  const lost = words.layers.ruined.runs(write.whole(state.tag === 'done' ? state.facts.lostRuns : state.lostRuns));
  if (state.tag === 'computing') return { tag: 'computing', lost };
  if (state.tag === 'failed') return { tag: 'failed', lost, detail: state.detail };
  const { facts } = state;
  const nameOf = (id: string): string => campaign.plan?.treatments.find((one) => one.id === id)?.name ?? id;
  const numberOf = (id: string): string => String(campaign.sessions.find((one) => one.id === id)?.plan.number ?? '');
  return {
    tag: 'choices',
    lost,
    now: facts.now,
    planned: facts.planned,
    choices: facts.ways.map((way) => ({
      key: way.key,
      kind: way.kind,
      session: way.session === null ? null : numberOf(way.session),
      treatments: way.treatments.map(nameOf),
      sessions: way.kind === 'leave' ? 0 : 1,
      specimens: way.runs,
      seAfter: way.seAfter,
      connects: way.connects
    })),
    hit: facts.hit.map(({ a, b, now, planned }) => ({
      pair: words.layers.comparisons.versus(nameOf(a), nameOf(b)),
      now,
      planned
    }))
  };
}

/** One line about the loss, for the closed layer. */
export function repairFinding(view: RepairView, words: ResultWords): Finding {
  const t = words.layers.repair;
  if (view.tag === 'nothing') return { text: t.nothing, look: false };
  if (view.tag === 'computing') return { text: t.lost(view.lost, t.computing), look: false };
  if (view.tag === 'failed') return { text: t.lost(view.lost, t.notComputed), look: true };
  const [best] = view.choices;
  return { text: t.finding(view.lost, best ? `${choiceName(best, words)}.` : ''), look: view.now === null };
}
