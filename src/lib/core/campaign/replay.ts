import { isKnown } from './check-event.ts';
import { DeviceLog } from './device-log.ts';
import type { CampaignEvent, UnknownEvent } from './event.ts';
import { inOrder } from './in-order.ts';
import { isUndoable, markOf, type Of } from './marks.ts';
import { reducePlan, type ReducedPlan } from './reduce-plan.ts';
import { noteOf, type Surroundings } from './reduce-run.ts';
import { reduceSession, type ReducedSession } from './reduce-session.ts';
import { reduceShifts } from './reduce-shifts.ts';
import { resolve, type Decision } from './resolve.ts';
import { sessionOf } from './session-of.ts';
import type { CampaignState, Contradiction, RecordFlag, SessionState } from './state.ts';

type Any = CampaignEvent | UnknownEvent;
const none: readonly CampaignEvent[] = [];

/**
 * Replays events into the state they describe. The state is a pure function of the set of events: their order and
 * their repetition do not matter. `apply` costs one session's events, not the log's.
 * Checked by: test/core/campaign/replay.test.ts, test/core/campaign/replay.property.test.ts.
 */
export class Replay {
  #campaign: string;
  #ids = new Map<string, Any>();
  #devices = new Map<string, DeviceLog>();
  #sessions = new Map<string, CampaignEvent[]>();
  #overall: CampaignEvent[] = [];
  #planning: CampaignEvent[] = [];
  #unknown: UnknownEvent[] = [];
  /** Events that speak of another event, by the id they name. */
  #undoing = new Map<string, Of<'undone'>[]>();
  #reinstating = new Map<string, Of<'reinstated'>[]>();
  #decisions = new Map<string, Decision[]>();
  #plan: ReducedPlan = reducePlan(
    [],
    () => [],
    () => false
  );
  #reduced = new Map<string, ReducedSession>();
  /** Standing loads of each specimen code, by session. */
  #loads = new Map<string, Map<string, Of<'specimen-loaded'>[]>>();
  #twice = new Map<string, Contradiction>();
  #aside = new Set<string>();
  #doubtful = new Set<string>();
  #dirty = new Set<string>();
  #replan = true;
  #state: CampaignState | null = null;
  #tick = 0;

  constructor(campaign: string) {
    this.#campaign = campaign;
  }

  /** Takes an event in; an event whose id it holds already changes nothing. */
  apply(event: Any): void {
    if (this.#ids.has(event.id)) return;
    this.#ids.set(event.id, event);
    this.#state = null;
    this.#tick = Math.max(this.#tick, event.tick ?? 0);
    let log = this.#devices.get(event.device);
    if (!log) this.#devices.set(event.device, (log = new DeviceLog(event.device)));
    log.add(event);
    // Something may have spoken of this event before it came.
    if (!isKnown(event)) {
      this.#unknown.push(event);
      return;
    }
    const session = sessionOf(event);
    if (session !== null) {
      const list = this.#sessions.get(session);
      if (list) list.push(event);
      else this.#sessions.set(session, [event]);
      this.#dirty.add(session);
    } else this.#takeOverall(event);
  }

  #takeOverall(event: CampaignEvent): void {
    switch (event.kind) {
      case 'plan-issued':
      case 'plan-amended':
        this.#planning.push(event);
        this.#replan = true;
        break;
      case 'undone':
        add(this.#undoing, event.data.target, event);
        this.#touch(event.data.target);
        break;
      case 'reinstated':
        add(this.#reinstating, event.data.target, event);
        this.#touch(event.data.target);
        break;
      case 'contradiction-decided':
        add(this.#decisions, event.data.about, event);
        this.#touchDecided(event.data.about);
        break;
      default:
        this.#overall.push(event);
    }
  }

  /** Marks what depends on an event as to be reduced again; an event not yet here marks its session when it comes. */
  #touch(id: string): void {
    const target = this.#ids.get(id);
    if (!target || !isKnown(target)) return;
    const session = sessionOf(target);
    if (session !== null) this.#dirty.add(session);
    else if (target.kind === 'reinstated') this.#touch(target.data.target);
    else if (target.kind === 'contradiction-decided') this.#touchDecided(target.data.about);
  }

  #touchDecided(about: string): void {
    const [kind, place = ''] = about.split(':');
    if (kind === 'two-plans') this.#replan = true;
    else if (kind === 'specimen-twice')
      for (const session of this.#loads.get(place)?.keys() ?? []) this.#dirty.add(session);
    else this.#dirty.add(place.split('/')[0] ?? '');
  }

  #undone = (event: CampaignEvent): boolean => this.#undoing.has(event.id) && isUndoable(event);

  #decisionsOn = (key: string): readonly Decision[] =>
    inOrder((this.#decisions.get(key) ?? []).filter((event) => !this.#undone(event)));

  #before = (a: CampaignEvent, b: CampaignEvent): boolean => inOrder([a, b])[0] === a;

  #reinstatement = (ruin: string): Of<'reinstated'> | undefined =>
    inOrder((this.#reinstating.get(ruin) ?? []).filter((event) => !this.#undone(event)))[0];

  /** Highest tick of any event taken in. */
  get tick(): number {
    return this.#tick;
  }

  /** The state of everything taken in so far; parts that did not change are the same objects as before. */
  get state(): CampaignState {
    this.#state ??= this.#reduce();
    return this.#state;
  }

  #reduce(): CampaignState {
    if (this.#replan) {
      this.#plan = reducePlan(inOrder(this.#planning), this.#decisionsOn, this.#before);
      this.#reduced.clear();
      this.#loads.clear();
      this.#twice.clear();
      this.#aside.clear();
      this.#doubtful.clear();
      this.#dirty = new Set(this.#plan.issued?.sessions.map(({ id }) => id));
      this.#replan = false;
    }
    const codes = new Set<string>();
    for (const session of this.#dirty) this.#reduceOne(session, codes);
    const again = new Set<string>();
    for (const code of codes) this.#findTwice(code, again);
    for (const session of again) this.#reduceOne(session, codes);
    this.#dirty.clear();
    return this.#assemble();
  }

  #reduceOne(id: string, codes: Set<string>): void {
    const plan = this.#plan.issued?.sessions.find((one) => one.id === id);
    if (!plan || !this.#plan.issued) return;
    const machine = this.#plan.issued.plan.machines.find((one) => one.id === plan.machine);
    const around: Surroundings = {
      undone: this.#undone,
      decisionsOn: this.#decisionsOn,
      before: this.#before,
      reinstatement: this.#reinstatement,
      aside: this.#aside,
      doubtful: this.#doubtful,
      treatmentOf: this.#plan.treatmentOf,
      definitions: this.#plan.issued.plan.readings
    };
    const events = inOrder(this.#sessions.get(id) ?? none);
    const inService = (slot: number): boolean => machine?.slots[slot]?.inService ?? true;
    for (const claim of this.#reduced.get(id)?.claims ?? []) this.#loads.get(claim.data.specimen)?.delete(id);
    for (const claim of this.#reduced.get(id)?.claims ?? []) codes.add(claim.data.specimen);
    const reduced = reduceSession(plan, this.#plan.dropped.has(id), inService, events, around);
    this.#reduced.set(id, reduced);
    for (const claim of reduced.claims) {
      codes.add(claim.data.specimen);
      let places = this.#loads.get(claim.data.specimen);
      if (!places) this.#loads.set(claim.data.specimen, (places = new Map()));
      places.set(id, [...(places.get(id) ?? []), claim]);
    }
  }

  /** One specimen cannot be in two places: finds it, and which sessions must be reduced again for what was decided. */
  #findTwice(code: string, again: Set<string>): void {
    const loads = inOrder([...(this.#loads.get(code)?.values() ?? [])].flat());
    const key = `specimen-twice:${code}`;
    const samePlace = (a: Of<'specimen-loaded'>, b: Of<'specimen-loaded'>): boolean =>
      a.data.session === b.data.session && a.data.slot === b.data.slot;
    const { winner, contradiction } = resolve(
      { key, kind: 'specimen-twice', session: null, slot: null, reading: null },
      loads,
      samePlace,
      this.#decisionsOn,
      this.#before
    );
    if (contradiction) this.#twice.set(code, contradiction);
    else this.#twice.delete(code);
    for (const load of loads) {
      const aside = contradiction !== null && winner !== null && !samePlace(load, winner);
      const doubtful = contradiction !== null && winner === null;
      if (aside !== this.#aside.has(load.id) || doubtful !== this.#doubtful.has(load.id)) again.add(load.data.session);
      set(this.#aside, load.id, aside);
      set(this.#doubtful, load.id, doubtful);
    }
  }

  #assemble(): CampaignState {
    const { issued, issuedBy, amendments } = this.#plan;
    const overall = inOrder(this.#overall);
    const created = overall.find((event) => event.kind === 'campaign-created');
    const standing = overall.filter((event) => !this.#undone(event));
    const reduced = issued?.sessions.flatMap(({ id }) => this.#reduced.get(id) ?? []) ?? [];
    const sessions: SessionState[] = reduced.map(({ state }) => state);
    const devices = [...this.#devices.values()].sort((a, b) => (a.device < b.device ? -1 : 1));
    const twice = [...this.#twice].sort(([a], [b]) => (a < b ? -1 : 1)).map(([, one]) => one);
    return {
      id: this.#campaign,
      title: issued?.plan.title || created?.data.title || '',
      demo: created?.data.demo ?? false,
      created: created ? markOf(created) : null,
      issued,
      plan: issued?.plan ?? null,
      issuedBy,
      amendments,
      sessions,
      shifts: reduceShifts(standing),
      notes: standing.flatMap((event) => (event.kind === 'noted' ? [noteOf(event)] : [])),
      contradictions: [...this.#plan.contradictions, ...reduced.flatMap((one) => one.contradictions), ...twice],
      flags: [...devices.flatMap((log) => log.flags), ...this.#ownFlags(reduced)],
      notUnderstood: inOrder(this.#unknown),
      devices: devices.map((log) => log.state),
      events: this.#ids.size
    };
  }

  #ownFlags(reduced: readonly ReducedSession[]): RecordFlag[] {
    const flag = (kind: RecordFlag['kind'], event: Any, detail: string): RecordFlag => ({
      kind,
      device: event.device,
      event: event.id,
      detail
    });
    const unknown = inOrder(this.#unknown).map((event) => flag('not-understood', event, event.kind));
    const strangers = reduced.flatMap(({ strangers: list }) =>
      list.map((event) => flag('unknown-specimen', event, event.data.specimen))
    );
    const targets = [...this.#undoing, ...this.#reinstating].flatMap(([target, events]) =>
      this.#ids.has(target) ? [] : events.map((event) => flag('orphan', event, target))
    );
    const nowhere = [...this.#sessions].flatMap(([session, events]) =>
      this.#reduced.has(session) ? [] : events.map((event) => flag('orphan', event, session))
    );
    const byEvent = (a: RecordFlag, b: RecordFlag): number => ((a.event ?? '') < (b.event ?? '') ? -1 : 1);
    return [...unknown, ...strangers, ...[...targets, ...nowhere].sort(byEvent)];
  }
}

const add = <T>(map: Map<string, T[]>, key: string, value: T): void => {
  map.set(key, [...(map.get(key) ?? []), value]);
};

const set = (where: Set<string>, what: string, present: boolean): void => {
  if (present) where.add(what);
  else where.delete(what);
};

/** The state that a set of events describes. Cost n log n. */
export function replay(events: Iterable<Any>, campaign?: string): CampaignState {
  let replayed: Replay | null = null;
  for (const event of events) {
    replayed ??= new Replay(campaign ?? event.campaign);
    replayed.apply(event);
  }
  return (replayed ?? new Replay(campaign ?? '')).state;
}
