import { isKnown } from './check-event.ts';
import type { CoreCheckpoint } from './checkpoint.ts';
import { DeviceLog } from './device-log.ts';
import type { CampaignEvent, UnknownEvent } from './event.ts';
import { sessionOf } from './session-of.ts';
import { isSpeaking, SpokenOf } from './spoken-of.ts';

type Any = CampaignEvent | UnknownEvent;

const isPlanning = (event: CampaignEvent): boolean => event.kind === 'plan-issued' || event.kind === 'plan-amended';

/** What an event changes: sessions, or the plan and with it all of them. */
export type Touched = 'plan' | string[];

/**
 * The events a replay has taken in, sorted by what they speak of. From a checkpoint on it holds the events of few
 * sessions only; of the others it knows how many there are.
 */
export class HeldEvents {
  readonly devices = new Map<string, DeviceLog>();
  readonly sessions = new Map<string, CampaignEvent[]>();
  readonly overall: CampaignEvent[] = [];
  readonly planning: CampaignEvent[] = [];
  readonly unknown: UnknownEvent[] = [];
  readonly spoken = new SpokenOf();
  #ids = new Map<string, Any>();
  /** Events that are spoken of, are in the log and not here. */
  #elsewhere = new Set<string>();
  /** Events that something speaks of and the log does not hold; null: to be found again. */
  #orphans: [string, CampaignEvent[]][] | null = null;
  #count = 0;
  #tick = 0;
  #last: { event: Any; tick: number } | null = null;

  static from(core: CoreCheckpoint): HeldEvents {
    const held = new HeldEvents();
    for (const event of core.unknown) held.#keep(event);
    const known = [core.overall, core.planning, core.speaking, core.nowhere];
    for (const event of known.flat()) {
      held.#keep(event);
      held.#sort(event);
    }
    held.unknown.push(...core.unknown);
    for (const one of core.devices) held.devices.set(one.state.device, DeviceLog.from(one));
    const absent = new Set(core.absent);
    for (const [id] of held.spoken.targets) if (!held.#ids.has(id) && !absent.has(id)) held.#elsewhere.add(id);
    held.#count = core.events;
    held.#tick = core.tick;
    return held;
  }

  get count(): number {
    return this.#count;
  }
  get tick(): number {
    return this.#tick;
  }
  get(id: string): Any | undefined {
    return this.#ids.get(id);
  }
  /** Is the event in the log, whether or not it is here? */
  has(id: string): boolean {
    return this.#ids.has(id) || this.#elsewhere.has(id);
  }

  /** Events that something speaks of and the log does not hold, with what speaks of them. */
  get orphans(): readonly [string, CampaignEvent[]][] {
    this.#orphans ??= this.spoken.targets.filter(([id]) => !this.has(id));
    return this.#orphans;
  }

  /** Takes an event in; false when its id is held already. */
  add(event: Any): boolean {
    if (this.#ids.has(event.id)) return false;
    this.#keep(event);
    this.#count++;
    this.#last = { event, tick: this.#tick };
    this.#tick = Math.max(this.#tick, event.tick ?? 0);
    let log = this.devices.get(event.device);
    if (!log) this.devices.set(event.device, (log = new DeviceLog(event.device)));
    log.add(event);
    if (isKnown(event)) this.#sort(event);
    else this.unknown.push(event);
    return true;
  }

  /** Takes the event added last out again and returns it; it must have continued its device's chain. */
  removeLast(): Any {
    if (!this.#last) throw new Error('removeLast: expected an event added before, got none');
    const { event, tick } = this.#last;
    this.#last = null;
    this.#ids.delete(event.id);
    this.#forgetOrphans(event);
    this.#count--;
    this.#tick = tick;
    if (!this.devices.get(event.device)?.removeLast()) this.devices.delete(event.device);
    if (isKnown(event)) this.#unsort(event);
    else this.unknown.pop();
    return event;
  }

  /** Holds events that were counted before: those of a session, or one that another speaks of. */
  putBack(events: readonly Any[], session: string | null): void {
    for (const event of events) this.#keep(event);
    if (session !== null) this.sessions.set(session, events.filter(isKnown));
  }

  #keep(event: Any): void {
    this.#ids.set(event.id, event);
    this.#forgetOrphans(event);
  }

  #forgetOrphans(event: Any): void {
    if ((isKnown(event) && isSpeaking(event)) || this.spoken.speaksOf(event.id)) this.#orphans = null;
  }

  #sort(event: CampaignEvent): void {
    const session = sessionOf(event);
    if (session !== null) {
      const list = this.sessions.get(session);
      if (list) list.push(event);
      else this.sessions.set(session, [event]);
    } else if (isSpeaking(event)) this.spoken.add(event);
    else (isPlanning(event) ? this.planning : this.overall).push(event);
  }

  #unsort(event: CampaignEvent): void {
    const session = sessionOf(event);
    if (session !== null) {
      const list = this.sessions.get(session);
      list?.pop();
      if (list?.length === 0) this.sessions.delete(session);
    } else if (isSpeaking(event)) this.spoken.remove(event);
    else (isPlanning(event) ? this.planning : this.overall).pop();
  }

  /**
   * What an event changes, as far as the events are here; what is spoken of and not here marks its session when it comes.
   * @param sessionsOf the sessions that name a specimen code
   */
  touchedBy(event: CampaignEvent, sessionsOf: (code: string) => string[]): Touched {
    const session = sessionOf(event);
    if (session !== null) return [session];
    if (isPlanning(event)) return 'plan';
    const subject = this.#subjectOf(event).event;
    if (subject === null) return [];
    const place = sessionOf(subject);
    if (place !== null) return [place];
    if (subject.kind !== 'contradiction-decided') return [];
    const [kind, where = ''] = subject.data.about.split(':');
    if (kind === 'two-plans') return 'plan';
    return kind === 'specimen-twice' ? sessionsOf(where) : [where.split('/')[0] ?? ''];
  }

  /** The id of an event that is spoken of here, at one remove or more, and is not here; null when there is none. */
  missingFor(event: CampaignEvent): string | null {
    return this.#subjectOf(event).missing;
  }

  /** What an event speaks of in the end: an act of a session or a decision. Ids that go in a ring lead nowhere. */
  #subjectOf(event: CampaignEvent): { event: CampaignEvent | null; missing: string | null } {
    const seen = new Set<string>();
    let at = event;
    while (at.kind === 'undone' || at.kind === 'reinstated') {
      if (seen.has(at.id)) return { event: null, missing: null };
      seen.add(at.id);
      const target = this.#ids.get(at.data.target);
      if (!target) return { event: null, missing: at.data.target };
      // To undo what undid something changes nothing.
      if (!isKnown(target) || target.kind === 'undone') return { event: null, missing: null };
      at = target;
    }
    return { event: at, missing: null };
  }
}
