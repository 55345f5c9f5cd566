import type { CampaignEvent, DataOf, Kind, UnknownEvent } from '#lib/core/campaign/event.ts';
import { lastUndoable } from '#lib/core/campaign/last-undoable.ts';
import { freshEvents } from '#lib/core/campaign/fresh-events.ts';
import { type BadData, type Head, makeEvent } from '#lib/core/campaign/make-event.ts';
import type { Plan } from '#lib/core/campaign/plan.ts';
import { Replay } from '#lib/core/campaign/replay.ts';
import { noHash } from '#lib/core/campaign/seal.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { summaryOf } from '#lib/core/campaign/summary.ts';
import { fail, ok, type Result } from '#lib/core/result.ts';
import { holdUpdates } from '#lib/pwa/busy.ts';
import { remember } from '#lib/storage/canary.ts';
import { draftsOf } from '#lib/storage/drafts.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import { append, load, type TakenDraft } from '#lib/storage/journal.ts';
import { tellOthers, whenOthersWrite } from './channel.ts';
import { connection } from './database.svelte.ts';
import { device } from './device.svelte.ts';
import type { ExportedFile, ExportFault } from './make-export.ts';
import { OpenCampaignDrafts } from './open-campaign-drafts.svelte.ts';
import { stampNow } from './surroundings.ts';
import { type Role, WriterLock } from './writer-lock.ts';

type Any = CampaignEvent | UnknownEvent;

/** Why something was not recorded. The value is still where it was typed; nothing was half written. */
export type WriteFault = StorageFault | BadData | { tag: 'following' } | { tag: 'nothing-to-undo' };
export type OpenFault = StorageFault | { tag: 'no-campaign'; id: string };

const planDraft = 'plan';

/** A campaign as it is open in this tab. State changes after the write has completed, never before. */
export class OpenCampaign {
  readonly id: string;
  #events: Any[] = [];
  #replay: Replay;
  #state: CampaignState = $state.raw() as CampaignState;
  /** Copied only when somebody looks. */
  #shownEvents: readonly Any[] = $derived(this.#events.slice(0, this.#state.events));
  #role = $state<Role>('following');
  #writes = $state(0);
  #drafts: OpenCampaignDrafts;
  #unsaved = $state.raw<readonly CampaignEvent[]>([]);
  #faults: readonly { what: string; detail: string }[] = [];
  #queue: Promise<unknown> = Promise.resolve();
  #lock: WriterLock;
  #stopListening: () => void;
  #letUpdate: (() => void) | null = null;

  constructor(id: string, events: Any[], drafts: Readonly<Record<string, unknown>>) {
    this.id = id;
    this.#events = events;
    this.#drafts = new OpenCampaignDrafts(id, drafts);
    this.#replay = replayOf(id, events);
    this.#state = this.#replay.state;
    this.#lock = new WriterLock(id, (role) => void this.#becomes(role));
    this.#stopListening = whenOthersWrite(id, () => void this.#inTurn(() => this.#catchUp()));
    this.#holdWhileRunning();
  }

  get state(): CampaignState {
    return this.#state;
  }
  /** Every event this tab holds, in the order they came to this device. */
  get events(): readonly Any[] {
    return this.#shownEvents;
  }
  get role(): Role {
    return this.#role;
  }
  /** A write is on its way. */
  get busy(): boolean {
    return this.#writes > 0;
  }
  /** Events of this device that no verified file holds. */
  get notExported(): number {
    return this.#state.devices.find((one) => one.device === device.id)?.sinceExport ?? 0;
  }
  get lastUndoable(): CampaignEvent | null {
    return lastUndoable(this.#shownEvents, device.id);
  }

  /** Records one act for good: resolves after the device has durably written it. Clears the draft named, with it. */
  record<K extends Kind>(
    kind: K,
    data: DataOf<K>,
    { draft = null, who = device.who }: { draft?: string | null; who?: string } = {}
  ): Promise<Result<CampaignEvent, WriteFault>> {
    const plain = $state.snapshot(data) as DataOf<K>;
    const weighed = kind === 'contradiction-decided' ? this.#weighed(plain as DataOf<'contradiction-decided'>) : plain;
    return this.#writing(
      this.#drafts.recording(draft, (taken) => this.#write(kind, weighed as DataOf<K>, taken, who, 1))
    );
  }

  /** Takes back the last act of this device, as a new event. */
  undoLast(reason = ''): Promise<Result<CampaignEvent, WriteFault>> {
    return this.#writing(async () => {
      const target = this.lastUndoable;
      return target
        ? this.#write('undone', { target: target.id, reason }, null, device.who, 1)
        : fail<WriteFault>({ tag: 'nothing-to-undo' });
    });
  }

  async #write<K extends Kind>(
    kind: K,
    data: DataOf<K>,
    draft: TakenDraft | null,
    who: string,
    attempt: number
  ): Promise<Result<CampaignEvent, WriteFault>> {
    if (this.#role === 'following') return fail({ tag: 'following' });
    const made = makeEvent({ kind, data, who }, this.#head(), stampNow());
    if (!made.ok) return made;
    const { event } = made.value;
    this.#replay.apply(event);
    const summary = summaryOf(this.#replay.state, device.id);
    const written = await append(connection, made.value, summary, draft);
    if (!written.ok) {
      this.#replay = replayOf(this.id, this.#events);
      if (written.error.tag !== 'stale' || attempt >= 3) {
        this.#failed(event, written.error);
        return written;
      }
      await this.#catchUp();
      return this.#write(kind, data, draft, who, attempt + 1);
    }
    this.#events.push(event);
    this.#show();
    remember(device.id, summary, event.id, event.at, kind === 'exported');
    tellOthers(this.id);
    await this.#reportFaults();
    return ok(event);
  }

  #failed(event: CampaignEvent, fault: StorageFault): void {
    this.#unsaved = [...this.#unsaved, event];
    const detail = 'detail' in fault ? fault.detail : '';
    this.#faults = [...this.#faults, { what: fault.tag, detail: `${event.at} ${event.kind} ${detail}`.trim() }];
  }

  /** A failure of the system is part of the record: it is written down as soon as writing works again. */
  async #reportFaults(): Promise<void> {
    this.#unsaved = [];
    const faults = this.#faults;
    this.#faults = [];
    for (const { what, detail } of faults)
      await this.#write(
        'device-fault',
        { what: what.slice(0, 80), detail: detail.slice(0, 2000) },
        null,
        device.who,
        1
      );
  }

  /** Acts that could not be written, oldest first; empty again once a write has completed. */
  get unsaved(): readonly CampaignEvent[] {
    return this.#unsaved;
  }

  /**
   * A file of everything this tab holds, unwritten acts too, made without the database: the way out when it writes no
   * more.
   */
  async rescueFile(): Promise<Result<ExportedFile, ExportFault>> {
    const { fileOf } = await import('./make-export.ts');
    return fileOf([...this.#events, ...this.#unsaved], this.id, this.#state.title);
  }

  #head(): Head {
    const own = this.#replay.state.devices.find((one) => one.device === device.id);
    return {
      campaign: this.id,
      device: device.id,
      seq: own?.seq ?? 0,
      hash: own?.head ?? noHash,
      tick: this.#replay.tick
    };
  }

  #weighed(data: DataOf<'contradiction-decided'>): DataOf<'contradiction-decided'> {
    const found = this.#state.contradictions.find(({ key }) => key === data.about);
    return found && !data.among ? { ...data, among: found.events.map(({ id }) => id) } : data;
  }

  /** What the engineer has filled in so far; the issued plan once there is one. */
  get draft(): Plan | null {
    return (this.#drafts.get(planDraft) as Plan | undefined) ?? this.#state.plan;
  }
  setDraft(plan: Plan | null): Promise<Result<void, StorageFault>> {
    return this.setEntryDraft(planDraft, plan);
  }
  /** Something typed and not yet recorded, by the name of its field. */
  entryDraft(name: string): unknown {
    return this.#drafts.get(name);
  }
  setEntryDraft(name: string, value: unknown): Promise<Result<void, StorageFault>> {
    return this.#drafts.set(name, $state.snapshot(value));
  }
  /** Why the last draft could not be kept; it is still on the screen. */
  get draftFault(): StorageFault | null {
    return this.#drafts.fault;
  }

  /** Makes the campaign file and reads it back; nothing is called exported before that holds. */
  exportFile(): Promise<Result<ExportedFile, ExportFault>> {
    return this.#inTurn(async () => {
      const { makeExport } = await import('./make-export.ts');
      return makeExport(this.id, this.#state.title);
    });
  }

  /** Says that a file made by `exportFile` has left the device: shared, saved or downloaded. */
  markExported(file: ExportedFile, how: string): Promise<Result<CampaignEvent, WriteFault>> {
    const { events, sha256, upTo } = file;
    return this.record('exported', { events, sha256, how: how.slice(0, 40), upTo });
  }

  /** Makes this tab the one that writes; the other goes on read-only. */
  takeOver(): Promise<void> {
    return this.#lock.takeOver();
  }

  /** Finds the first role of this tab. */
  async start(): Promise<this> {
    // Held in memory before anything goes wrong: a rescue must not need to load its own program.
    void import('./make-export.ts').catch(() => undefined);
    this.#role = await this.#lock.start();
    document.addEventListener('visibilitychange', this.#woken);
    return this;
  }

  close(): void {
    document.removeEventListener('visibilitychange', this.#woken);
    this.#stopListening();
    this.#lock.close();
    this.#letUpdate?.();
  }

  /** A sleeping tab hears nothing: it reads again when it wakes. */
  #woken = (): void => {
    if (document.visibilityState === 'visible') void this.#inTurn(() => this.#catchUp());
  };

  async #becomes(role: Role): Promise<void> {
    if (role === 'writing') await this.#inTurn(() => this.#catchUp());
    this.#role = role;
  }

  async #catchUp(): Promise<void> {
    const loaded = await load(connection, this.id);
    if (!loaded.ok) return;
    const fresh = freshEvents(this.#events, loaded.value.events);
    if (fresh.length === 0) return;
    for (const event of fresh) this.#replay.apply(event);
    this.#events.push(...fresh);
    const drafts = await draftsOf(connection, this.id);
    if (drafts.ok) this.#drafts.adopt(drafts.value);
    this.#show();
  }

  #show(): void {
    this.#state = this.#replay.state;
    this.#holdWhileRunning();
  }

  /** No new version of the program takes over while a session runs. */
  #holdWhileRunning(): void {
    const running = this.#state.sessions.some(({ status }) => status === 'running' || status === 'reading');
    if (running && !this.#letUpdate) this.#letUpdate = holdUpdates();
    else if (!running && this.#letUpdate) {
      this.#letUpdate();
      this.#letUpdate = null;
    }
  }

  #writing<T>(task: () => Promise<T>): Promise<T> {
    this.#writes++;
    return this.#inTurn(task).finally(() => this.#writes--);
  }

  /** One task after the other, in the order asked for. */
  #inTurn<T>(task: () => Promise<T>): Promise<T> {
    const turn = this.#queue.then(task, task);
    this.#queue = turn.catch(() => undefined);
    return turn;
  }
}

function replayOf(id: string, events: readonly Any[]): Replay {
  const replayed = new Replay(id);
  for (const event of events) replayed.apply(event);
  return replayed;
}

/** Opens a campaign in this tab: reads its log, replays it, finds out whether this tab writes. */
export async function openCampaign(id: string): Promise<Result<OpenCampaign, OpenFault>> {
  await device.start();
  if (device.fault) return fail(device.fault);
  const [loaded, drafts] = [await load(connection, id), await draftsOf(connection, id)];
  if (!loaded.ok) return loaded;
  if (!drafts.ok) return drafts;
  if (loaded.value.events.length === 0) return fail({ tag: 'no-campaign', id });
  return ok(await new OpenCampaign(id, loaded.value.events, drafts.value).start());
}
