import type { CampaignEvent, UnknownEvent } from '#lib/core/campaign/event.ts';
import { type BadData, makeEvent, type Sealed } from '#lib/core/campaign/make-event.ts';
import { noHash } from '#lib/core/campaign/seal.ts';
import { summaryOf } from '#lib/core/campaign/summary.ts';
import { type CampaignFile, readCampaignFile, type ReadEvent } from '#lib/core/exchange/read-campaign-file.ts';
import { type WeighedImport, weighImport } from '#lib/core/exchange/summarise-import.ts';
import { fail, ok, type Result } from '#lib/core/result.ts';
import type { Connection } from '#lib/storage/connection.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import { load, type LoadedLog } from '#lib/storage/journal.ts';
import { takeIn } from '#lib/storage/take-in.ts';
import { sumsOf } from './sums-of.ts';
import type { ImportReply, ProposedFile, ReadFault, TakenFile, TakeFault, TakeOrder } from './import-messages.ts';

type Any = CampaignEvent | UnknownEvent;

/** How often a file is weighed anew because a tab of this device wrote in between. */
const tries = 3;

/** One file on its way in: read, weighed against what is held, taken in when a person says so. Nothing is written before. */
export class ImportJob {
  #connection: Connection;
  #say: (reply: ImportReply) => void;
  #file: CampaignFile | null = null;
  #lines = new Map<Any, ReadEvent>();
  #weighed: { import: WeighedImport; held: LoadedLog } | null = null;

  constructor(connection: Connection, say: (reply: ImportReply) => void) {
    this.#connection = connection;
    this.#say = say;
  }

  async read(blob: Blob): Promise<Result<ProposedFile, ReadFault>> {
    let bytes: Uint8Array<ArrayBuffer>;
    try {
      bytes = new Uint8Array(await blob.arrayBuffer());
    } catch (cause) {
      return fail({ tag: 'unreadable-file', detail: String(cause) });
    }
    const sums = await sumsOf(bytes);
    const read = readCampaignFile(bytes, (done) => this.#say({ tag: 'progress', phase: 'reading', done }), sums);
    if (!read.ok) return read;
    this.#file = read.value;
    this.#lines = new Map(read.value.events.map((one) => [one.event, one]));
    return this.weigh();
  }

  /** Weighs the file that was read against what is held now. */
  async weigh(): Promise<Result<ProposedFile, StorageFault>> {
    const { header, footer, damage, sha256, events } = this.#read();
    this.#say({ tag: 'progress', phase: 'weighing', done: 0 });
    const held = await load(this.#connection, header.campaign);
    if (!held.ok) return held;
    const incoming = events.map(({ event }) => event);
    const weighed = weighImport(header.campaign, held.value.events, incoming);
    this.#weighed = { import: weighed, held: held.value };
    return ok({ header, footer, damage, sha256, summary: weighed.summary, isNew: held.value.events.length === 0 });
  }

  /** Takes the file in: all of it is here afterwards, or nothing. */
  async take(order: TakeOrder): Promise<Result<TakenFile, TakeFault>> {
    let fault: TakeFault = { tag: 'stale' };
    for (let attempt = 1; fault.tag === 'stale' && attempt <= tries; attempt++) {
      if (!this.#weighed) {
        const again = await this.weigh();
        if (!again.ok) return again;
      }
      const taken = await this.#takeWeighed(order);
      if (taken.ok) return taken;
      fault = taken.error;
    }
    return fail(fault);
  }

  async #takeWeighed(order: TakeOrder): Promise<Result<TakenFile, TakeFault>> {
    if (!this.#weighed) throw new Error('ImportJob: expected a weighed file');
    const { held, import: weighed } = this.#weighed;
    // The replay is about to hold an event that may come to nothing.
    this.#weighed = null;
    const note = this.#noteOf(order, weighed);
    if (!note.ok) return note;
    const { event } = note.value;
    weighed.replay.apply(event);
    const summary = summaryOf(weighed.replay.state, order.device);
    const [added, aside] = [this.#linesOf(weighed.added), this.#linesOf(weighed.aside)];
    this.#say({ tag: 'writing', note: event.id });
    const written = await takeIn(
      this.#connection,
      { held, added, aside, note: note.value, from: order.name, summary },
      (done) => this.#say({ tag: 'progress', phase: 'writing', done })
    );
    if (!written.ok) return written;
    return ok({ campaign: event.campaign, added: added.length, note: { id: event.id, at: event.at }, summary });
  }

  /** This device's event that says what was taken in. */
  #noteOf(order: TakeOrder, { replay, summary }: WeighedImport): Result<Sealed, BadData> {
    const { header, sha256 } = this.#read();
    const own = replay.state.devices.find(({ device }) => device === order.device);
    const head = {
      campaign: header.campaign,
      device: order.device,
      seq: own?.seq ?? 0,
      hash: own?.head ?? noHash,
      tick: replay.tick
    };
    const { origin, key, name } = order;
    const counts = { added: summary.added, known: summary.known };
    const data = { sha256, ...counts, name: name.slice(0, 300), origin, ...(key === null ? {} : { key }) };
    return makeEvent({ kind: 'imported', data, who: order.who }, head, order.stamp);
  }

  #linesOf(events: readonly Any[]): ReadEvent[] {
    return events.flatMap((event) => this.#lines.get(event) ?? []);
  }

  #read(): CampaignFile {
    if (!this.#file) throw new Error('ImportJob: expected a file that was read');
    return this.#file;
  }
}
