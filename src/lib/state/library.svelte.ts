import type { CampaignEvent, DataOf, Kind, UnknownEvent } from '#lib/core/campaign/event.ts';
import { freshEvents } from '#lib/core/campaign/fresh-events.ts';
import { type BadData, type Head, makeEvent, type Sealed } from '#lib/core/campaign/make-event.ts';
import { replay } from '#lib/core/campaign/replay.ts';
import { noHash, sealOf } from '#lib/core/campaign/seal.ts';
import { type CampaignSummary, summaryOf } from '#lib/core/campaign/summary.ts';
import { type CampaignFile, type FileError, readCampaignFile } from '#lib/core/exchange/read-campaign-file.ts';
import { type ImportSummary, summariseImport } from '#lib/core/exchange/summarise-import.ts';
import { fail, ok, type Result } from '#lib/core/result.ts';
import { forget, remember } from '#lib/storage/canary.ts';
import { listCampaigns, removeDemoCampaign } from '#lib/storage/campaigns.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import { append, load, takeIn } from '#lib/storage/journal.ts';
import { alarm } from './alarm.svelte.ts';
import { tellOthers, whenOthersWrite } from './channel.ts';
import { connection } from './database.svelte.ts';
import type { Act } from './demo/demo-acts.ts';
import { device } from './device.svelte.ts';
import { newId, stampNow } from './surroundings.ts';

/** A file that was read and summed up; nothing of it is on this device until it is accepted. */
export interface ProposedImport {
  file: CampaignFile;
  name: string;
  summary: ImportSummary;
  /** The campaign is new on this device. */
  isNew: boolean;
}

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
    const written = await takeIn(connection, sealed.slice(0, -1), last, '', summary);
    if (!written.ok) return written;
    remember(device.id, summary, last.event.id, last.event.at, false);
    tellOthers(campaign);
    await this.refresh();
    return ok(campaign);
  }

  /** Reads a file and says what it would bring. Changes nothing. */
  async propose(bytes: Uint8Array, name: string): Promise<Result<ProposedImport, FileError | StorageFault>> {
    await device.start();
    const read = readCampaignFile(bytes);
    if (!read.ok) return read;
    const held = await load(connection, read.value.header.campaign);
    if (!held.ok) return held;
    const incoming = read.value.events.map(({ event }) => event);
    const summary = summariseImport(held.value.events, incoming);
    return ok({ file: read.value, name, summary, isNew: held.value.events.length === 0 });
  }

  /** Takes an accepted file in. One transaction: all of it is here afterwards, or nothing. Resolves to the campaign. */
  async accept(proposed: ProposedImport, attempt = 1): Promise<Result<string, StorageFault | BadData>> {
    const { file, name, summary } = proposed;
    const { campaign } = file.header;
    const held = await load(connection, campaign);
    if (!held.ok) return held;
    const fresh = freshEvents(
      held.value.events,
      file.events.map(({ event }) => event)
    );
    const merged = [...held.value.events, ...fresh];
    const data = { sha256: file.sha256, added: fresh.length, known: summary.known, name: name.slice(0, 300) };
    const made = makeEvent({ kind: 'imported', data, who: device.who }, headOf(merged, campaign), stampNow());
    if (!made.ok) return made;
    const after = summaryOf(replay([...merged, made.value.event], campaign), device.id);
    const written = await takeIn(connection, file.events, made.value, name, after);
    // Another tab recorded something in between.
    if (!written.ok && written.error.tag === 'stale' && attempt < 3) return this.accept(proposed, attempt + 1);
    if (!written.ok) return written;
    remember(device.id, after, made.value.event.id, made.value.event.at, false);
    await alarm.check();
    tellOthers(campaign);
    await this.refresh();
    return ok(campaign);
  }

  /** Takes the invented demo off this device; refuses anything else. */
  async removeDemo(id: string): Promise<Result<boolean, StorageFault>> {
    const removed = await removeDemoCampaign(connection, id);
    if (removed.ok && removed.value) forget(id);
    await this.refresh();
    return removed;
  }
}

/** Where this device's chain stands in a campaign, from all of its events. */
function headOf(events: readonly (CampaignEvent | UnknownEvent)[], campaign: string): Head {
  const last = events.reduce<CampaignEvent | UnknownEvent | null>(
    (best, event) => (event.device === device.id && event.seq > (best?.seq ?? 0) ? event : best),
    null
  );
  const tick = events.reduce((most, event) => Math.max(most, event.tick ?? 0), 0);
  return { campaign, device: device.id, seq: last?.seq ?? 0, hash: last ? sealOf(last) : noHash, tick };
}

type Made = { kind: Kind; data: DataOf<Kind>; who: string };

export const library = new Library();
