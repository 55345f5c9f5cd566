import type { DataOf, Kind } from '#lib/core/campaign/event.ts';
import { type BadData, type Head, makeEvent, type Sealed } from '#lib/core/campaign/make-event.ts';
import { replay } from '#lib/core/campaign/replay.ts';
import { noHash } from '#lib/core/campaign/seal.ts';
import { type CampaignSummary, summaryOf } from '#lib/core/campaign/summary.ts';
import { judgeOrigin, type Origin, type SignatureCheck } from '#lib/core/exchange/judge-origin.ts';
import { fail, ok, type Result } from '#lib/core/result.ts';
import { holdUpdates } from '#lib/pwa/busy.ts';
import { forget, remember } from '#lib/storage/canary.ts';
import { listCampaigns, removeDemoCampaign } from '#lib/storage/campaigns.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import { append } from '#lib/storage/journal.ts';
import { holdsEvent, takeIn } from '#lib/storage/take-in.ts';
import { type ImportProgress, ImportWorker, type WorkerEnd } from '#lib/workers/import-client.ts';
import type { ProposedFile, ReadFault, TakenFile, TakeFault } from '#lib/workers/import-messages.ts';
import { alarm } from './alarm.svelte.ts';
import { tellOthers, whenOthersWrite } from './channel.ts';
import { connection } from './database.svelte.ts';
import type { Act } from './demo/demo-acts.ts';
import { device } from './device.svelte.ts';
import { checkSignature } from './signing.ts';
import { tablets } from './tablets.svelte.ts';
import { newId, stampNow, timeNow } from './surroundings.ts';

/** A file that was read and summed up; nothing of it is on this device until it is accepted. */
export interface ProposedImport extends ProposedFile {
  name: string;
  signature: SignatureCheck;
  /** Holds the file's events. */
  worker: ImportWorker;
}

export interface ImportOptions {
  /** Ends the work at once; nothing of the file is here then, unless `accept` says that it had been written already. */
  signal?: AbortSignal | undefined;
  onProgress?: ((progress: ImportProgress) => void) | undefined;
}

export type ProposeFault = ReadFault | WorkerEnd;
export type AcceptFault = TakeFault | WorkerEnd;

/** The campaigns on this device. */
class Library {
  #campaigns = $state.raw<CampaignSummary[]>([]);
  #fault = $state.raw<StorageFault | null>(null);
  #loaded = $state(false);
  #listening = false;

  get campaigns(): CampaignSummary[] {
    return this.#campaigns;
  }
  get fault(): StorageFault | null {
    return this.#fault;
  }
  /** The list has been read once: an empty one is really empty. */
  get loaded(): boolean {
    return this.#loaded;
  }
  /** Events on this device that no verified file holds. */
  get notExported(): number {
    return this.#campaigns.filter(({ demo }) => !demo).reduce((sum, one) => sum + one.notExported, 0);
  }

  async refresh(): Promise<void> {
    await device.start();
    const listed = await listCampaigns(connection);
    if (listed.ok) this.#campaigns = listed.value;
    this.#fault = listed.ok ? device.fault : listed.error;
    this.#loaded = true;
    if (!this.#listening) {
      this.#listening = true;
      whenOthersWrite(null, () => void this.refresh());
    }
  }

  /** Begins a campaign; resolves to its id once its first event is written. */
  async createCampaign(title: string, { demo = false } = {}): Promise<Result<string, StorageFault | BadData>> {
    await device.start();
    if (device.fault) return fail(device.fault);
    const campaign = newId();
    const head: Head = { campaign, device: device.id, seq: 0, hash: noHash, tick: 0 };
    const made = makeEvent({ kind: 'campaign-created', data: { title, demo }, who: device.who }, head, stampNow());
    if (!made.ok) return made;
    const summary = summaryOf(replay([made.value.event]), device.id);
    const written = await append(connection, made.value, summary);
    if (!written.ok) return written;
    remember(device.id, summary, made.value.event.id, made.value.event.at, false);
    tellOthers(campaign);
    await this.refresh();
    return ok(campaign);
  }

  /** Makes a whole campaign of given acts in one go, all or none; the demo comes this way. */
  async createFrom(acts: readonly Act[]): Promise<Result<string, StorageFault | BadData | { tag: 'no-acts' }>> {
    await device.start();
    if (device.fault) return fail(device.fault);
    const campaign = newId();
    let head: Head = { campaign, device: device.id, seq: 0, hash: noHash, tick: 0 };
    const sealed: Sealed[] = [];
    const began = acts[0]?.at ?? 0;
    for (const act of acts) {
      const stamp = { ...stampNow(), now: act.at, mono: act.at - began };
      const made = makeEvent({ kind: act.kind, data: act.data, who: act.who } as Made, head, stamp);
      if (!made.ok) return made;
      sealed.push(made.value);
      head = made.value.head;
    }
    const last = sealed.at(-1);
    if (!last) return fail({ tag: 'no-acts' });
    const summary = summaryOf(replay(sealed.map(({ event }) => event)), device.id);
    const written = await takeIn(connection, {
      held: { events: [], unreadable: [] },
      added: sealed.slice(0, -1),
      aside: [],
      note: last,
      from: '',
      summary
    });
    if (!written.ok) return written;
    remember(device.id, summary, last.event.id, last.event.at, false);
    tellOthers(campaign);
    await this.refresh();
    return ok(campaign);
  }

  /** Reads a file off the screen's thread and says what it would bring. Changes nothing. */
  async propose(file: File, options: ImportOptions = {}): Promise<Result<ProposedImport, ProposeFault>> {
    await device.start();
    const worker = new ImportWorker();
    const read = await watched(worker, options, () => worker.propose(file));
    if (read.ok) {
      const { header, footer } = read.value;
      await tablets.start();
      return ok({ ...read.value, name: file.name, worker, signature: await checkSignature(header, footer) });
    }
    worker.stop();
    return read;
  }

  /** Weighs a proposed file anew, after another one was taken in. */
  async weighAgain(proposed: ProposedImport): Promise<Result<ProposedImport, ProposeFault>> {
    const read = await proposed.worker.weigh();
    return read.ok ? ok({ ...proposed, ...read.value }) : read;
  }

  /** Where a proposed file comes from, as far as is known now. */
  originOf({ signature, ...file }: ProposedImport): Origin {
    return judgeOrigin(file, signature, tablets.accepted, tablets.fingerprint);
  }

  /** Takes an accepted file in. One transaction: all of it is here afterwards, or nothing. */
  async accept(proposed: ProposedImport, options: ImportOptions = {}): Promise<Result<TakenFile, AcceptFault>> {
    const { name, worker } = proposed;
    const origin = this.originOf(proposed);
    const key = 'fingerprint' in origin ? origin.fingerprint : null;
    const order = { device: device.id, who: device.who, name, stamp: stampNow(), origin: origin.tag, key };
    let taken = await watched(worker, options, () => worker.take(order));
    if (!taken.ok && 'note' in taken.error) taken = await this.#wasTaken(proposed, taken.error);
    if (!taken.ok) return taken;
    worker.stop();
    const { campaign, note, summary } = taken.value;
    remember(device.id, summary, note.id, note.at, false);
    await alarm.check();
    tellOthers(campaign);
    await this.refresh();
    return taken;
  }

  /** A worker that ended while it wrote has written all or nothing: the database says which. */
  async #wasTaken(proposed: ProposedImport, end: WorkerEnd): Promise<Result<TakenFile, AcceptFault>> {
    if (end.note === null) return fail(end);
    const held = await holdsEvent(connection, end.note);
    const listed = await listCampaigns(connection);
    if (!held.ok) return held;
    if (!listed.ok) return listed;
    const campaign = proposed.header.campaign;
    const summary = listed.value.find(({ id }) => id === campaign);
    if (!held.value || !summary) return fail(end);
    return ok({ campaign, added: proposed.summary.added, note: { id: end.note, at: timeNow() }, summary });
  }

  /** Takes the invented demo off this device; refuses anything else. */
  async removeDemo(id: string): Promise<Result<boolean, StorageFault>> {
    const removed = await removeDemoCampaign(connection, id);
    if (removed.ok && removed.value) forget(id);
    await this.refresh();
    return removed;
  }
}

/** Runs a worker's request under a signal; its progress is told while it runs. */
async function watched<T>(worker: ImportWorker, options: ImportOptions, run: () => Promise<T>): Promise<T> {
  const { signal, onProgress } = options;
  const stop = (): void => worker.stop();
  const letUpdate = holdUpdates();
  worker.onProgress = onProgress ?? (() => {});
  if (signal?.aborted) stop();
  signal?.addEventListener('abort', stop);
  try {
    return await run();
  } finally {
    letUpdate();
    signal?.removeEventListener('abort', stop);
  }
}

type Made = { kind: Kind; data: DataOf<Kind>; who: string };

export const library = new Library();
