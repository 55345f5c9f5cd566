import type { CampaignEvent, DataOf } from './event.ts';
import { markOf, type Of } from './marks.ts';
import type { IssuedPlan, PlannedSession } from './plan.ts';
import { type Decision, resolve } from './resolve.ts';
import { canonicalJson } from './seal.ts';
import type { Contradiction, Mark } from './state.ts';

export interface ReducedPlan {
  issued: IssuedPlan | null;
  issuedBy: Mark | null;
  amendments: (Mark & DataOf<'plan-amended'>)[];
  dropped: ReadonlySet<string>;
  contradictions: Contradiction[];
  treatmentOf: (specimen: string) => string | undefined;
}

/**
 * The plan as it stands: the one issue that counts, with its amendments in order. Two different issues contradict; until
 * somebody decides, the first is shown. The same holds for two different sessions added under one name.
 * @param events plan-issued and plan-amended events, in order
 */
export function reducePlan(
  events: readonly CampaignEvent[],
  decisionsOn: (key: string) => readonly Decision[],
  before: (a: CampaignEvent, b: CampaignEvent) => boolean
): ReducedPlan {
  const contradictions: Contradiction[] = [];
  const pick = <T extends CampaignEvent>(key: string, session: string | null, list: readonly T[]): T | undefined => {
    const same = (a: T, b: T): boolean => canonicalJson(contentOf(a)) === canonicalJson(contentOf(b));
    const place = { key, kind: 'two-plans', session, slot: null, reading: null } as const;
    const { winner, contradiction } = resolve(place, list, same, decisionsOn, before);
    if (contradiction) contradictions.push(contradiction);
    return winner ?? list[0];
  };
  const issue = pick(
    'two-plans',
    null,
    events.filter((event) => event.kind === 'plan-issued')
  );
  const amending = events.filter((event) => event.kind === 'plan-amended');
  const amendments = amending.map((event) => ({ ...markOf(event), ...event.data }));
  const dropped = new Set<string>();
  const none: ReducedPlan = {
    issued: null,
    issuedBy: null,
    amendments,
    dropped,
    contradictions,
    treatmentOf: () => undefined
  };
  if (!issue) return none;

  let plan = issue.data.plan;
  const sessions = new Map(issue.data.sessions.map((session) => [session.id, session]));
  const adding = new Map<string, Of<'plan-amended'>[]>();
  for (const event of amending) {
    const { change } = event.data;
    if (change.kind === 'add-session') adding.set(change.session.id, [...(adding.get(change.session.id) ?? []), event]);
    else if (change.kind === 'drop-session') dropped.add(change.session);
    else if (change.kind === 'replace-plan') plan = change.plan;
    else {
      const { machine, slot, inService } = change;
      const machines = plan.machines.map((one) =>
        one.id === machine
          ? { ...one, slots: one.slots.map((s, index) => (index === slot ? { ...s, inService } : s)) }
          : one
      );
      plan = { ...plan, machines };
    }
  }
  for (const [id, list] of adding) {
    const change = pick(`two-plans:${id}`, id, list)?.data.change;
    if (change?.kind === 'add-session' && !sessions.has(id)) sessions.set(id, change.session);
  }
  const issued: IssuedPlan = { ...issue.data, plan, sessions: [...sessions.values()].sort(byNumber) };
  const treatments = new Map<string, string>();
  for (const session of issued.sessions)
    for (const slot of session.slots) if (slot) treatments.set(slot.specimen, slot.treatment);
  for (const { treatment, specimen } of issued.spares) treatments.set(specimen, treatment);
  return {
    ...none,
    issued,
    issuedBy: markOf(issue),
    treatmentOf: (specimen) => treatments.get(specimen)
  };
}

const byNumber = (a: PlannedSession, b: PlannedSession): number =>
  a.number - b.number || (a.id < b.id ? -1 : a.id > b.id ? 1 : 0);

/** What two plan events are compared by: a reason told differently is no other plan. */
const contentOf = (event: CampaignEvent): unknown => (event.kind === 'plan-amended' ? event.data.change : event.data);
