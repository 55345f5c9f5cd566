import type { CampaignEvent, UnknownEvent } from '#lib/core/campaign/event.ts';
import { freshEvents } from '#lib/core/campaign/fresh-events.ts';
import type { Head } from '#lib/core/campaign/make-event.ts';
import { Replay } from '#lib/core/campaign/replay.ts';
import { noHash } from '#lib/core/campaign/seal.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { ok, type Result } from '#lib/core/result.ts';
import { type LoadedCheckpoint, loadBeyond, loadCheckpoint, loadSessions } from '#lib/storage/checkpoints.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import { load, loadEvent, loadSome } from '#lib/storage/journal.ts';
import type { Place } from '#lib/storage/schema.ts';
import { connection } from './database.svelte.ts';

type Any = CampaignEvent | UnknownEvent;

/** So many events are read at once while the whole log is read in the background. */
const slice = 150;

/**
 * A campaign's log as this tab knows it: replayed whole, or from a checkpoint on. What a checkpoint has left out is read
 * when an event needs it; if anything does not fit, the whole log is read and replayed.
 */
export class OpenCampaignLog {
  readonly campaign: string;
  #replay: Replay;
  #events: Any[];
  #whole: boolean;
  #stamp: string | null = null;

  private constructor(campaign: string, replay: Replay, events: Any[], whole: boolean) {
    this.campaign = campaign;
    this.#replay = replay;
    this.#events = events;
    this.#whole = whole;
  }

  static async open(campaign: string, device: string): Promise<Result<OpenCampaignLog, StorageFault>> {
    const kept = await loadCheckpoint(connection, campaign, device);
    if (!kept.ok) return kept;
    const resumed = kept.value && resume(kept.value);
    if (kept.value && resumed) {
      const log = new OpenCampaignLog(campaign, resumed, kept.value.tail, false);
      log.#stamp = kept.value.stamp;
      const taken = await log.take(kept.value.rest);
      return taken.ok ? ok(log) : taken;
    }
    const log = new OpenCampaignLog(campaign, new Replay(campaign), [], true);
    const read = await log.#readAll();
    return read.ok ? ok(log) : read;
  }

  /** The replay; another object once the log had to be read anew. */
  get replay(): Replay {
    return this.#replay;
  }
  /** The checkpoint that the replay goes on from; null when it began with the first event. */
  get stamp(): string | null {
    return this.#stamp;
  }
  get state(): CampaignState {
    return this.#replay.state;
  }
  /** The events this tab holds, in the order they came; the last ones only, as long as it is not whole. */
  get events(): readonly Any[] {
    return this.#events;
  }
  get whole(): boolean {
    return this.#whole;
  }

  /** Where a device's chain stands. */
  headOf(device: string): Head {
    const own = this.state.devices.find((one) => one.device === device);
    const { campaign } = this;
    return { campaign, device, seq: own?.seq ?? 0, hash: own?.head ?? noHash, tick: this.#replay.tick };
  }

  /** Reads what must be known before an event is replayed. Afterwards the log may hold more than before. */
  async prepare(event: Any): Promise<Result<void, StorageFault>> {
    for (let needs = this.#replay.needs(event); ; needs = this.#replay.needs(event)) {
      if (needs === 'everything') return this.#readAll();
      if (needs.event !== null) {
        const found = await loadEvent(connection, needs.event);
        if (!found.ok) return found;
        const here = found.value?.campaign === this.campaign ? found.value : null;
        this.#replay.supplyEvent(needs.event, here);
      } else if (needs.sessions.length === 0) return ok(undefined);
      else {
        const found = await loadSessions(connection, this.campaign, needs.sessions);
        if (!found.ok) return found;
        const fits = [...(found.value ?? [])].every(([id, events]) => this.#replay.supply(id, events));
        if (!found.value || !fits) return this.#readAll();
      }
    }
  }

  /** Replays an event that is about to be written. */
  apply(event: Any): void {
    this.#replay.apply(event);
  }
  /** It could not be written. */
  retract(): void {
    this.#replay.retract();
  }
  /** It has been written. */
  keep(event: Any): void {
    this.#events.push(event);
  }

  /** Takes in events that were written elsewhere. */
  async take(events: readonly Any[]): Promise<Result<void, StorageFault>> {
    for (const event of events) {
      const prepared = await this.prepare(event);
      if (!prepared.ok) return prepared;
      const before = this.#replay.count;
      this.#replay.apply(event);
      if (this.#replay.count > before) this.#events.push(event);
    }
    return ok(undefined);
  }

  /** Takes in what other tabs have written; true when there was anything. */
  async catchUp(): Promise<Result<boolean, StorageFault>> {
    const { devices, events } = this.state;
    const found = await loadBeyond(connection, this.campaign, { devices, events });
    if (!found.ok) return found;
    if (found.value === null) {
      const read = await this.#readAll();
      return read.ok ? ok(this.state.events !== events) : read;
    }
    const taken = await this.take(found.value);
    return taken.ok ? ok(found.value.length > 0) : taken;
  }

  async #readAll(): Promise<Result<void, StorageFault>> {
    const loaded = await load(connection, this.campaign);
    if (!loaded.ok) return loaded;
    const all = loaded.value.events;
    const fresh = this.#whole ? freshEvents(this.#events, all) : all;
    if (this.#replay.cold) {
      this.#replay = new Replay(this.campaign);
      this.#stamp = null;
      for (const event of all) this.#replay.apply(event);
    } else for (const event of fresh) this.#replay.apply(event);
    this.#events = this.#whole ? [...this.#events, ...fresh] : all;
    this.#whole = true;
    return ok(undefined);
  }

  /**
   * Reads the rest of the log piece by piece, so that this tab holds all of it: for the list of events, and for a file
   * when the database fails. The replay goes on as it is.
   * @param pause what to wait for between two pieces; false: leave it
   */
  async readRest(pause: () => Promise<boolean>): Promise<Result<void, StorageFault>> {
    const read: Any[] = [];
    let after: Place | null = null;
    while (!this.#whole) {
      const piece = await loadSome(connection, this.campaign, after, slice);
      if (!piece.ok) return piece;
      read.push(...piece.value.events);
      after = piece.value.last;
      if (after === null) break;
      if (!(await pause())) return ok(undefined);
    }
    if (this.#whole) return ok(undefined);
    const fresh = freshEvents(read, this.#events);
    this.#events = [...read.sort((a, b) => (a.id < b.id ? -1 : 1)), ...fresh];
    this.#whole = true;
    return ok(undefined);
  }
}

/** What cannot be used is no reason not to open: the log says the same. */
function resume({ core, parts }: LoadedCheckpoint): Replay | null {
  try {
    return Replay.from(core, parts);
  } catch {
    return null;
  }
}
