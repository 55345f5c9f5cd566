import type { CampaignEvent, UnknownEvent } from './event.ts';
import type { HeldEvents } from './held-events.ts';
import { inOrder } from './in-order.ts';
import { markOf } from './marks.ts';
import type { ReducedPlan } from './reduce-plan.ts';
import { noteOf } from './reduce-run.ts';
import type { ReducedSession } from './reduce-session.ts';
import { reduceShifts } from './reduce-shifts.ts';
import type { SpecimenPlaces } from './specimen-places.ts';
import type { CampaignState, RecordFlag } from './state.ts';

/** Everything a campaign's state is put together from. */
export interface StateParts {
  campaign: string;
  held: HeldEvents;
  plan: ReducedPlan;
  sessions: ReadonlyMap<string, ReducedSession>;
  places: SpecimenPlaces;
}

/** The state of a campaign from its parts. Cost: the number of sessions, not of readings. */
export function assembleState({ campaign, held, plan, sessions, places }: StateParts): CampaignState {
  const { issued, issuedBy, amendments } = plan;
  const overall = inOrder(held.overall);
  const created = overall.find((event) => event.kind === 'campaign-created');
  const standing = overall.filter((event) => !held.spoken.undone(event));
  const reduced: ReducedSession[] = [];
  for (const { id } of issued?.sessions ?? []) {
    const one = sessions.get(id);
    if (one) reduced.push(one);
  }
  const devices = [...held.devices.values()].sort((a, b) => (a.device < b.device ? -1 : 1));
  const twice = places.contradictions.map(([, one]) => one);
  return {
    id: campaign,
    title: issued?.plan.title || created?.data.title || '',
    demo: created?.data.demo ?? false,
    created: created ? markOf(created) : null,
    issued,
    plan: issued?.plan ?? null,
    issuedBy,
    amendments,
    sessions: reduced.map(({ state }) => state),
    shifts: reduceShifts(standing),
    notes: standing.flatMap((event) => (event.kind === 'noted' ? [noteOf(event)] : [])),
    contradictions: [...plan.contradictions, ...gathered(reduced, (one) => one.contradictions), ...twice],
    flags: [...devices.flatMap((log) => log.flags), ...ownFlags(held, sessions, reduced)],
    notUnderstood: inOrder(held.unknown),
    devices: devices.map((log) => log.state),
    events: held.count
  };
}

function ownFlags(
  held: HeldEvents,
  sessions: ReadonlyMap<string, ReducedSession>,
  reduced: readonly ReducedSession[]
): RecordFlag[] {
  const flag = (kind: RecordFlag['kind'], event: CampaignEvent | UnknownEvent, detail: string): RecordFlag => ({
    kind,
    device: event.device,
    event: event.id,
    detail
  });
  const unknown = inOrder(held.unknown).map((event) => flag('not-understood', event, event.kind));
  const strangers = gathered(reduced, (one) => one.strangers).map((event) =>
    flag('unknown-specimen', event, event.data.specimen)
  );
  const targets = held.orphans.flatMap(([target, events]) => events.map((event) => flag('orphan', event, target)));
  const nowhere: RecordFlag[] = [];
  for (const [session, events] of held.sessions)
    if (!sessions.has(session)) for (const event of events) nowhere.push(flag('orphan', event, session));
  const byEvent = (a: RecordFlag, b: RecordFlag): number => ((a.event ?? '') < (b.event ?? '') ? -1 : 1);
  return [...unknown, ...strangers, ...[...targets, ...nowhere].sort(byEvent)];
}

/** What few sessions of many have, without a list for each: this runs at every event. */
function gathered<T>(sessions: readonly ReducedSession[], of: (one: ReducedSession) => readonly T[]): T[] {
  const found: T[] = [];
  for (const one of sessions) for (const each of of(one)) found.push(each);
  return found;
}
