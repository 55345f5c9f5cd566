import type { CampaignEvent } from './event.ts';
import { markOf, type Of } from './marks.ts';
import { occupanciesOf } from './occupancy.ts';
import type { PlannedSession } from './plan.ts';
import { noteOf, reduceRuins, reduceRun, type Surroundings } from './reduce-run.ts';
import type { ConditionValue, Contradiction, RunState, SessionState } from './state.ts';

export interface ReducedSession {
  state: SessionState;
  contradictions: Contradiction[];
  /** Loads that stand in this session, for the search of specimens used twice. */
  claims: Of<'specimen-loaded'>[];
  /** Codes in the slots that no plan gave, with the event that says so. */
  strangers: Of<'specimen-loaded'>[];
}

/**
 * One session from its own events: a pure function of their set, so that appending an event costs one session and never
 * the whole record.
 * @param events of this session, in order, undone ones included
 * @param inService is the machine's slot in service now?
 */
export function reduceSession(
  plan: PlannedSession,
  dropped: boolean,
  inService: (slot: number) => boolean,
  events: readonly CampaignEvent[],
  around: Surroundings
): ReducedSession {
  const counts = (event: CampaignEvent): boolean => !around.undone(event);
  const valid = events.filter(counts);
  const of = <K extends CampaignEvent['kind']>(kind: K): Of<K>[] =>
    valid.filter((event): event is Of<K> => event.kind === kind);
  const codes = plan.slots.map((slot) => slot?.specimen ?? null);
  const slots = occupanciesOf(events, codes, counts, (ruin, load) => {
    const back = around.reinstatement(ruin.id);
    return counts(ruin) && !(back && around.before(back, load));
  });
  const contradictions: Contradiction[] = [];
  const claims: Of<'specimen-loaded'>[] = [];
  const whole = reduceRuins(
    { session: plan.id, slot: null, key: `two-ruins:${plan.id}` },
    events.filter((event): event is Of<'ruined'> => event.kind === 'ruined' && event.data.slot === null),
    around
  );
  if (whole.contradiction) contradictions.push(whole.contradiction);

  const runs: RunState[] = [];
  for (const [slot, list] of [...slots].sort(([a], [b]) => a - b)) {
    const made: RunState[] = list.map((occupancy, index) => {
      const first = [...occupancy.specimens][0] ?? '';
      const planned = (index === 0 ? plan.slots[slot] : null) ?? {
        treatment: around.treatmentOf(first) ?? '',
        specimen: first
      };
      const id = index === list.length - 1 ? `${plan.id}/${slot}` : `${plan.id}/${slot}/${first}`;
      const reduced = reduceRun(plan.id, occupancy, planned, id, around);
      contradictions.push(...reduced.contradictions);
      claims.push(...reduced.claims);
      return { ...reduced.run, ruined: reduced.run.ruined ?? whole.ruined };
    });
    const last = made.pop();
    if (!last) continue;
    const run = { ...last, earlier: made };
    if (inService(slot) || run.loaded || run.readings.some((r) => r.versions.length > 0)) runs.push(run);
  }

  const precautions = of('precautions-acknowledged')[0];
  const started = of('session-started').at(-1);
  const stopped = of('session-stopped').at(-1);
  const stands = stopped && (!started || valid.indexOf(stopped) > valid.indexOf(started)) ? stopped : undefined;
  const ending = valid.filter(({ kind }) => kind === 'session-closed' || kind === 'session-reopened').at(-1);
  const closed = ending?.kind === 'session-closed' ? ending : undefined;
  const after = new Set(around.definitions.filter((d) => d.when.kind !== 'before').map((d) => d.id));
  const read = runs.some((run) => run.readings.some((r) => after.has(r.reading) && r.current !== null));
  const begun = precautions || of('specimen-loaded').length > 0 || of('reading-recorded').length > 0;

  const state: SessionState = {
    id: plan.id,
    plan,
    status: dropped
      ? 'dropped'
      : closed
        ? 'closed'
        : stands
          ? 'reading'
          : started
            ? 'running'
            : read
              ? 'reading'
              : begun
                ? 'loading'
                : 'waiting',
    precautions: precautions ? markOf(precautions) : null,
    started: started ? { ...markOf(started), seconds: started.data.seconds } : null,
    stopped: stands ? { ...markOf(stands), early: stands.data.early } : null,
    closed: closed ? markOf(closed) : null,
    runs,
    ruined: whole.ruined,
    conditions: conditionsOf(of('conditions-recorded')),
    notes: of('noted').flatMap((event) => (event.data.slot === null ? [noteOf(event)] : []))
  };
  const strangers = claims.filter((event) => around.treatmentOf(event.data.specimen) === undefined);
  return { state, contradictions, claims, strangers };
}

/** The last value said of each condition, in the order first said. */
function conditionsOf(events: readonly Of<'conditions-recorded'>[]): ConditionValue[] {
  const last = new Map<string, ConditionValue>();
  for (const event of events)
    for (const one of event.data.values) last.set(one.condition, { ...markOf(event), ...one });
  return [...last.values()];
}
