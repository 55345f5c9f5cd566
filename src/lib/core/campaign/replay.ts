import { isKnown } from './check-event.ts';
import { type CoreCheckpoint, packRuns, type SessionCheckpoint, type SessionHead } from './checkpoint.ts';
import { assembleState } from './assemble-state.ts';
import { type ColdSession, coldSession } from './cold-session.ts';
import type { CampaignEvent, UnknownEvent } from './event.ts';
import { HeldEvents } from './held-events.ts';
import { inOrder } from './in-order.ts';
import type { PlannedSession } from './plan.ts';
import { reducePlan, type ReducedPlan } from './reduce-plan.ts';
import type { Surroundings } from './reduce-run.ts';
import { reduceSession, type ReducedSession } from './reduce-session.ts';
import { SpecimenPlaces } from './specimen-places.ts';
import type { CampaignState } from './state.ts';
import { tallyOf } from './summary.ts';

type Any = CampaignEvent | UnknownEvent;
const none: readonly CampaignEvent[] = [];

/** What must be supplied before a replay that goes on from a checkpoint can take an event in. */
export type Needs = 'everything' | { sessions: string[]; event: string | null };

/**
 * Replays events into the state they describe. The state is a pure function of the set of events: their order and
 * their repetition do not matter. `apply` costs one session's events, not the log's.
 *
 * A replay can go on from a checkpoint. Its sessions are then cold, known by their state and not by their events, until
 * an event needs one of them: ask `needs` before each `apply`, and `supply` what it says.
 * Checked by: test/core/campaign/replay.test.ts, test/core/campaign/replay.property.test.ts,
 * test/core/campaign/checkpoint.property.test.ts.
 */
export class Replay {
  #campaign: string;
  #held = new HeldEvents();
  #plan: ReducedPlan = reducePlan(
    [],
    () => [],
    () => false
  );
  #planned = new Map<string, PlannedSession>();
  #reduced = new Map<string, ReducedSession>();
  #places = new SpecimenPlaces();
  #cold = new Map<string, ColdSession>();
  /** Cold sessions by the specimen codes they name; made when first asked for. */
  #coldByCode: Map<string, string[]> | null = null;
  /** Events asked for that the log does not have. */
  #absent = new Set<string>();
  #dirty = new Set<string>();
  #changed = new Set<string>();
  #replan = true;
  #state: CampaignState | null = null;

  constructor(campaign: string) {
    this.#campaign = campaign;
  }

  /** Goes on where a checkpoint was taken; null when a session's part is not there. */
  static from(core: CoreCheckpoint, parts: ReadonlyMap<string, { head: SessionHead; runs: string }>): Replay | null {
    const replay = new Replay(core.campaign);
    replay.#held = HeldEvents.from(core);
    replay.#places.restore(core.twice, core.aside, core.doubtful);
    replay.#makePlan();
    replay.#replan = false;
    for (const plan of replay.#planned.values()) {
      const part = parts.get(plan.id);
      if (!part) return null;
      const cold = coldSession(plan, part.head, part.runs);
      replay.#cold.set(plan.id, cold);
      replay.#reduced.set(plan.id, cold.reduced);
    }
    return replay;
  }

  /** Takes an event in; an event whose id it holds already changes nothing. */
  apply(event: Any): void {
    if (this.#held.add(event)) this.#touch(event);
  }

  /** Takes the event applied last out again: it could not be written. It must have continued its device's chain. */
  retract(): void {
    this.#touch(this.#held.removeLast());
  }

  #touch(event: Any): void {
    this.#state = null;
    if (!isKnown(event)) return;
    const touched = this.#held.touchedBy(event, this.#sessionsOf);
    if (touched === 'plan') this.#replan = true;
    else for (const session of touched) this.#dirty.add(session);
  }

  /** Highest tick of any event taken in. */
  get tick(): number {
    return this.#held.tick;
  }

  /** How many events it has taken in. */
  get count(): number {
    return this.#held.count;
  }

  /** Are there sessions whose events it does not hold? */
  get cold(): boolean {
    return this.#cold.size > 0;
  }

  /** The state of everything taken in so far; parts that did not change are the same objects as before. */
  get state(): CampaignState {
    this.#state ??= this.#reduce();
    return this.#state;
  }

  /** What must be supplied before an event can be applied; to be asked again after each supply. */
  needs(event: Any): Needs {
    const nothing = { sessions: [], event: null };
    if (this.#cold.size === 0) return nothing;
    if (!(this.#held.devices.get(event.device)?.continues(event.seq) ?? true)) return 'everything';
    if (!isKnown(event)) return nothing;
    const missing = this.#held.missingFor(event);
    if (missing !== null && !this.#absent.has(missing)) return { sessions: [], event: missing };
    const touched = this.#held.touchedBy(event, this.#sessionsOf);
    if (touched === 'plan') return 'everything';
    const codes = touched.flatMap((session) => this.#cold.get(session)?.codes ?? this.#codesIn(session));
    if (event.kind === 'specimen-loaded') codes.push(event.data.specimen);
    const wanted = new Set([...touched, ...codes.flatMap(this.#sessionsOf)]);
    return { sessions: [...wanted].filter((session) => this.#cold.has(session)), event: null };
  }

  /** The events of a cold session. False: they say otherwise than the checkpoint, which must then not be used. */
  supply(session: string, events: readonly CampaignEvent[]): boolean {
    const cold = this.#cold.get(session);
    if (!cold) return true;
    this.#cold.delete(session);
    this.#held.putBack(events, session);
    this.#reduceOne(session, new Set());
    this.#state = null;
    const { head, runs } = this.part(session);
    return runs === cold.runs && JSON.stringify(head) === JSON.stringify(cold.head);
  }

  /** An event that another one speaks of; null when the log does not have it. */
  supplyEvent(id: string, event: Any | null): void {
    if (event) this.#held.putBack([event], null);
    else this.#absent.add(id);
  }

  #sessionsOf = (code: string): string[] => {
    if (!this.#coldByCode) {
      this.#coldByCode = new Map();
      for (const [session, { codes }] of this.#cold)
        for (const one of codes) this.#coldByCode.set(one, [...(this.#coldByCode.get(one) ?? []), session]);
    }
    const cold = (this.#coldByCode.get(code) ?? []).filter((session) => this.#cold.has(session));
    return [...this.#places.sessionsOf(code), ...cold];
  };

  #codesIn(session: string): string[] {
    const events = this.#held.sessions.get(session) ?? none;
    return [...new Set(events.flatMap((event) => (event.kind === 'specimen-loaded' ? [event.data.specimen] : [])))];
  }

  #before = (a: CampaignEvent, b: CampaignEvent): boolean => inOrder([a, b])[0] === a;

  #makePlan(): void {
    this.#plan = reducePlan(inOrder(this.#held.planning), this.#held.spoken.decisionsOn, this.#before);
    this.#planned = new Map(this.#plan.issued?.sessions.map((session) => [session.id, session]));
  }

  #reduce(): CampaignState {
    if (this.#replan) {
      if (this.#cold.size > 0) throw new Error(`replay: expected all sessions' events, ${this.#cold.size} are cold`);
      this.#makePlan();
      this.#reduced.clear();
      this.#places.clear();
      this.#dirty = new Set(this.#planned.keys());
      this.#replan = false;
    }
    const codes = new Set<string>();
    for (const session of this.#dirty) this.#reduceOne(session, codes);
    const again = new Set<string>();
    for (const code of codes) this.#places.find(code, again, this.#held.spoken.decisionsOn, this.#before);
    for (const session of again) this.#reduceOne(session, codes);
    for (const session of [...this.#dirty, ...again]) if (this.#reduced.has(session)) this.#changed.add(session);
    this.#dirty.clear();
    return assembleState({
      campaign: this.#campaign,
      held: this.#held,
      plan: this.#plan,
      sessions: this.#reduced,
      places: this.#places
    });
  }

  #reduceOne(id: string, codes: Set<string>): void {
    const plan = this.#planned.get(id);
    const { issued, treatmentOf, dropped } = this.#plan;
    if (!plan || !issued) return;
    if (this.#cold.has(id)) throw new Error(`replay: expected the events of session ${id}, it is cold`);
    const machine = issued.plan.machines.find((one) => one.id === plan.machine);
    const { undone, decisionsOn, reinstatement } = this.#held.spoken;
    const around: Surroundings = {
      undone,
      decisionsOn,
      reinstatement,
      before: this.#before,
      aside: this.#places.aside,
      doubtful: this.#places.doubtful,
      treatmentOf,
      definitions: issued.plan.readings
    };
    const events = inOrder(this.#held.sessions.get(id) ?? none);
    const inService = (slot: number): boolean => machine?.slots[slot]?.inService ?? true;
    const before = this.#reduced.get(id)?.claims ?? [];
    const reduced = reduceSession(plan, dropped.has(id), inService, events, around);
    this.#reduced.set(id, reduced);
    this.#places.replace(id, before, reduced.claims);
    for (const claim of [...before, ...reduced.claims]) codes.add(claim.data.specimen);
  }

  /** Sessions that have changed since `settle` was last called; their parts of the last checkpoint are out of date. */
  get changed(): ReadonlySet<string> {
    void this.state;
    return this.#changed;
  }

  /** The part of a session that has changed is kept. */
  settle(session: string): void {
    this.#changed.delete(session);
  }

  /** One session's part of a checkpoint. */
  part(id: string): SessionCheckpoint {
    const reduced = this.#reduced.get(id);
    if (!reduced) throw new Error(`part: expected a planned session, got ${id}`);
    const { runs, plan: _plan, ...state } = reduced.state;
    const { contradictions, strangers } = reduced;
    const head = { state, tally: tallyOf(reduced.state), contradictions, strangers, codes: this.#codesIn(id) };
    return { head, runs: packRuns(runs), events: this.#held.sessions.get(id) ?? none };
  }

  /** The rest of a checkpoint, as plain values. */
  core(): CoreCheckpoint {
    void this.state;
    const { devices, overall, planning, unknown, spoken, sessions, count, tick } = this.#held;
    return {
      campaign: this.#campaign,
      events: count,
      tick,
      devices: [...devices.values()].map((log) => log.checkpoint),
      overall,
      planning,
      unknown,
      speaking: spoken.all,
      absent: this.#held.orphans.map(([id]) => id),
      nowhere: [...sessions].flatMap(([session, events]) => (this.#planned.has(session) ? [] : events)),
      twice: this.#places.contradictions,
      aside: [...this.#places.aside],
      doubtful: [...this.#places.doubtful]
    };
  }
}

/** The state that a set of events describes. Cost n log n. */
export function replay(events: Iterable<Any>, campaign?: string): CampaignState {
  let replayed: Replay | null = null;
  for (const event of events) {
    replayed ??= new Replay(campaign ?? event.campaign);
    replayed.apply(event);
  }
  return (replayed ?? new Replay(campaign ?? '')).state;
}
