import type { DeviceCheckpoint } from './checkpoint.ts';
import type { CampaignEvent, UnknownEvent } from './event.ts';
import { markOf } from './marks.ts';
import { instantOf } from './rfc3339.ts';
import { noHash, sealOf } from './seal.ts';
import type { DeviceState, RecordFlag } from './state.ts';

type Any = CampaignEvent | UnknownEvent;

/** A wall clock may drift this far from the forward-only clock between two events before it counts as jumped. */
const jump = 2_000;

/**
 * One device's chain in a campaign: its head, what is not exported, and what is wrong with the chain. An event that
 * continues the chain costs the same however long the chain is; after any other the chain is read anew when asked for.
 * Checked by: test/core/campaign/replay.test.ts.
 */
export class DeviceLog {
  readonly device: string;
  #events: Any[] = [];
  #flags: RecordFlag[] = [];
  #state: DeviceState;
  /** How it stood before the event that came last, when that one continued the chain. */
  #before: { flags: RecordFlag[]; state: DeviceState } | null = null;
  /** An event came out of turn since the chain was last read. */
  #disordered = false;

  constructor(device: string) {
    this.device = device;
    this.#state = { device, seq: 0, head: noHash, sinceExport: 0, lastExport: null };
  }

  /** A chain read up to a checkpoint: it takes what continues it, and nothing else. */
  static from({ state, flags, tail }: DeviceCheckpoint): DeviceLog {
    const log = new DeviceLog(state.device);
    log.#events = [...tail];
    log.#flags = [...flags];
    log.#state = state;
    return log;
  }

  get checkpoint(): DeviceCheckpoint {
    this.#readAnew();
    const from = this.#events.findLastIndex(({ seq }) => seq < this.#state.seq) + 1;
    return { state: this.#state, flags: this.#flags, tail: this.#events.slice(from) };
  }

  get state(): DeviceState {
    this.#readAnew();
    return this.#state;
  }

  get flags(): readonly RecordFlag[] {
    this.#readAnew();
    return this.#flags;
  }

  /** Does an event with this number continue the chain, with or without a gap? */
  continues(seq: number): boolean {
    return seq > this.state.seq;
  }

  add(event: Any): void {
    this.#disordered ||= event.seq <= this.#state.seq;
    this.#before = this.#disordered ? null : { flags: this.#flags, state: this.#state };
    this.#events.push(event);
    if (!this.#disordered) this.#follow(this.#events.length - 1, event);
  }

  /** Once for any number of events out of turn: a file in no order must not cost the square of its length. */
  #readAnew(): void {
    if (!this.#disordered) return;
    this.#disordered = false;
    this.#events.sort((a, b) => a.seq - b.seq || (a.id < b.id ? -1 : 1));
    this.#flags = [];
    this.#state = { device: this.device, seq: 0, head: noHash, sinceExport: 0, lastExport: null };
    this.#events.forEach((one, index) => this.#follow(index, one));
  }

  /** Takes the event that came last out again; returns whether any is left. Throws when it did not continue the chain. */
  removeLast(): boolean {
    if (!this.#before) throw new Error('removeLast: expected an event that continued the chain, got another');
    this.#events.pop();
    this.#flags = this.#before.flags;
    this.#state = this.#before.state;
    this.#before = null;
    return this.#events.length > 0;
  }

  #follow(index: number, event: Any): void {
    const before = this.#events[index - 1];
    const flag = (kind: RecordFlag['kind'], detail: string): void => {
      this.#flags = [...this.#flags, { kind, device: this.device, event: event.id, detail }];
    };
    const seqBefore = before?.seq ?? 0;
    if (event.seq === seqBefore) flag('fork', `${event.seq}`);
    else if (event.seq > seqBefore + 1) flag('gap', `${seqBefore + 1}-${event.seq - 1}`);
    else if (event.prev !== (before ? sealOf(before) : noHash) && !this.#afterFork(index, event))
      flag('altered', `${seqBefore}`);
    if (before && clockJumped(before, event)) flag('clock-jumped', `${before.at} ${event.at}`);
    if (event.kind === 'device-fault') {
      const { what, detail } = (event as Extract<CampaignEvent, { kind: 'device-fault' }>).data;
      flag('device-fault', `${what}: ${detail}`);
    }
    const { sinceExport, lastExport } = this.#state;
    this.#state = {
      device: this.device,
      seq: event.seq,
      head: sealOf(event),
      ...(event.kind === 'exported'
        ? exported(event as Extract<CampaignEvent, { kind: 'exported' }>, sinceExport)
        : { sinceExport: sinceExport + 1, lastExport })
    };
  }

  /** After a fork the next event follows one of its ends. */
  #afterFork(index: number, event: Any): boolean {
    for (let at = index - 1; this.#events[at]?.seq === event.seq - 1; at--)
      if (sealOf(this.#events[at] as Any) === event.prev) return true;
    return false;
  }
}

/** Events recorded after the file was written are not in it. */
function exported(
  event: Extract<CampaignEvent, { kind: 'exported' }>,
  since: number
): Pick<DeviceState, 'sinceExport' | 'lastExport'> {
  const { upTo, events, sha256, how } = event.data;
  const left = upTo === undefined ? 0 : Math.max(0, Math.min(since, event.seq - 1 - upTo));
  return { sinceExport: left, lastExport: { ...markOf(event), events, sha256, how } };
}

function clockJumped(before: Any, event: Any): boolean {
  const wall = instantOf(event.at) - instantOf(before.at);
  return event.run === before.run ? Math.abs(wall - (event.mono - before.mono)) > jump : wall < 0;
}
