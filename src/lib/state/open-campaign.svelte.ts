import type { CampaignEvent, DataOf, Kind, UnknownEvent } from '#lib/core/campaign/event.ts';
import { lastUndoable } from '#lib/core/campaign/last-undoable.ts';
import { type BadData, makeEvent } from '#lib/core/campaign/make-event.ts';
import type { Plan } from '#lib/core/campaign/plan.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { summaryOf } from '#lib/core/campaign/summary.ts';
import { fail, ok, type Result } from '#lib/core/result.ts';
import { remember } from '#lib/storage/canary.ts';
import { draftsOf } from '#lib/storage/drafts.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import { append, type TakenDraft } from '#lib/storage/journal.ts';
import { tellOthers, whenOthersWrite } from './channel.ts';
import { connection } from './database.svelte.ts';
import { device } from './device.svelte.ts';
import type { ExportedFile, ExportFault } from './make-export.ts';
import { HoldWhileRunning } from './hold-while-running.ts';
import { idle } from './idle.ts';
import { OpenCampaignCheckpoint } from './open-campaign-checkpoint.ts';
import { OpenCampaignDrafts } from './open-campaign-drafts.svelte.ts';
import { OpenCampaignLog } from './open-campaign-log.ts';
import { OpenCampaignUnwritten } from './open-campaign-unwritten.svelte.ts';
import { newId, stampNow } from './surroundings.ts';
import { type Role, WriterLock } from './writer-lock.ts';

type Any = CampaignEvent | UnknownEvent;

/** Why something was not recorded. The value is still where it was typed; nothing was half written. */
export type WriteFault = StorageFault | BadData | { tag: 'following' } | { tag: 'nothing-to-undo' };
export type OpenFault = StorageFault | { tag: 'no-campaign'; id: string };

const planDraft = 'plan';

/** A campaign as it is open in this tab. State changes after the write has completed, never before. */
export class OpenCampaign {
  readonly id: string;
  /** Its word on the channel: what it wrote itself it need not read again. */
  #self = newId();
  #log: OpenCampaignLog;
  #checkpoint: OpenCampaignCheckpoint;
  #state: CampaignState = $state.raw() as CampaignState;
  #whole = $state(true);
  /** Copied only when somebody looks, again after every change. */
  #shownEvents: readonly Any[] = $derived.by(() => (this.#state && this.#whole ? this.#log.events.slice() : []));
  #role = $state<Role>('following');
  #writes = $state(0);
  #drafts: OpenCampaignDrafts;
  #unwritten = new OpenCampaignUnwritten();
  #queue: Promise<unknown> = Promise.resolve();
  #lock: WriterLock;
  #stopListening: () => void;
  #hold = new HoldWhileRunning();
  #closed = false;

  constructor(id: string, log: OpenCampaignLog, drafts: Readonly<Record<string, unknown>>) {
    this.id = id;
    this.#log = log;
    this.#checkpoint = new OpenCampaignCheckpoint(log, () => this.#role === 'writing' && this.#writes === 0);
    this.#drafts = new OpenCampaignDrafts(id, drafts);
    this.#state = log.state;
    this.#whole = log.whole;
    this.#lock = new WriterLock(id, (role) => void this.#becomes(role));
    this.#stopListening = whenOthersWrite(id, () => void this.#inTurn(() => this.#catchUp()), this.#self);
    this.#hold.look(this.#state);
  }

  get state(): CampaignState {
    return this.#state;
  }
  /** Every event, in the order they came to this device; none as long as not all have been read (`whole`). */
  get events(): readonly Any[] {
    return this.#shownEvents;
  }
  /** All events have been read: after opening from a checkpoint that comes a little later. */
  get whole(): boolean {
    return this.#whole;
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
    return this.#state && lastUndoable(this.#log.events, device.id);
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
    const make = () => makeEvent({ kind, data, who }, this.#log.headOf(device.id), stampNow());
    let made = make();
    if (!made.ok) return made;
    const prepared = await this.#log.prepare(made.value.event);
    if (!prepared.ok) return this.#failed(made.value.event, prepared.error);
    // Reading the whole log anew may have found more.
    if (made.value.event.seq !== this.#log.headOf(device.id).seq + 1) made = make();
    if (!made.ok) return made;
    const { event } = made.value;
    this.#log.apply(event);
    const summary = summaryOf(this.#log.state, device.id);
    const written = await append(connection, made.value, summary, draft);
    if (!written.ok) {
      this.#log.retract();
      if (written.error.tag !== 'stale' || attempt >= 3) return this.#failed(event, written.error);
      await this.#catchUp();
      return this.#write(kind, data, draft, who, attempt + 1);
    }
    this.#log.keep(event);
    this.#show();
    this.#checkpoint.after(kind === 'session-closed' || kind === 'shift-closed');
    remember(device.id, summary, event.id, event.at, kind === 'exported');
    tellOthers(this.id, this.#self);
    await this.#reportFaults();
    return ok(event);
  }

  #failed(event: CampaignEvent, fault: StorageFault): Result<never, WriteFault> {
    this.#unwritten.add(event, fault);
    return fail(fault);
  }

  async #reportFaults(): Promise<void> {
    for (const fault of this.#unwritten.clear()) await this.#write('device-fault', fault, null, device.who, 1);
  }

  /** Acts that could not be written, oldest first; empty again once a write has completed. */
  get unsaved(): readonly CampaignEvent[] {
    return this.#unwritten.acts;
  }

  /**
   * A file of everything this tab holds, unwritten acts too, made without the database: the way out when it writes no
   * more.
   */
  async rescueFile(): Promise<Result<ExportedFile, ExportFault>> {
    const { fileOf } = await import('./make-export.ts');
    // Reading may still work where writing does not; if not, there is what this tab holds.
    await this.#readRest(() => Promise.resolve(true));
    return fileOf([...this.#log.events, ...this.#unwritten.acts], this.id, this.#state.title);
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
    document.addEventListener('visibilitychange', this.#turned);
    void this.#settle();
    return this;
  }

  /** What can wait until the screen is there: the rest of the log, and a checkpoint for the next time. */
  async #settle(): Promise<void> {
    await this.#readRest(async () => {
      await idle();
      return !this.#closed;
    });
    await this.#checkpoint.save();
  }

  async #readRest(pause: () => Promise<boolean>): Promise<void> {
    await this.#log.readRest(pause);
    this.#whole = this.#log.whole;
  }

  close(): void {
    this.#closed = true;
    void this.#checkpoint.save();
    document.removeEventListener('visibilitychange', this.#turned);
    this.#stopListening();
    this.#lock.close();
    this.#hold.close();
  }

  /** A sleeping tab hears nothing: it reads again when it wakes. */
  #turned = (): void => {
    if (document.visibilityState === 'visible') void this.#inTurn(() => this.#catchUp());
    else void this.#checkpoint.save();
  };

  async #becomes(role: Role): Promise<void> {
    if (role === 'writing') await this.#inTurn(() => this.#catchUp());
    this.#role = role;
  }

  async #catchUp(): Promise<void> {
    const more = await this.#log.catchUp();
    if (!more.ok || !more.value) return;
    const drafts = await draftsOf(connection, this.id);
    if (drafts.ok) this.#drafts.adopt(drafts.value);
    this.#show();
  }

  #show(): void {
    this.#state = this.#log.state;
    this.#whole = this.#log.whole;
    this.#hold.look(this.#state);
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

/** Opens a campaign in this tab: reads its log, replays it, finds out whether this tab writes. */
export async function openCampaign(id: string): Promise<Result<OpenCampaign, OpenFault>> {
  await device.start();
  if (device.fault) return fail(device.fault);
  const [log, drafts] = await Promise.all([OpenCampaignLog.open(id, device.id), draftsOf(connection, id)]);
  if (!log.ok) return log;
  if (!drafts.ok) return drafts;
  if (log.value.state.events === 0) return fail({ tag: 'no-campaign', id });
  return ok(await new OpenCampaign(id, log.value, drafts.value).start());
}
