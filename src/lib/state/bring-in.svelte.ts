import { actsFromTable } from '#lib/core/exchange/readings-table/acts-from-table.ts';
import type { TableCampaign } from '#lib/core/exchange/readings-table/plan-from-table.ts';
import {
  type DelimitedFault,
  type DelimitedTable,
  readDelimited
} from '#lib/core/exchange/readings-table/read-delimited.ts';
import type { BadData } from '#lib/core/campaign/make-event.ts';
import type { Result } from '#lib/core/result.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import type { ImportProgress } from '#lib/workers/import-client.ts';
import { device } from './device.svelte.ts';
import { type AcceptFault, library, type ProposedImport, type ProposeFault } from './library.svelte.ts';

type Act = Parameters<typeof library.createFrom>[0][number];

/** A file on the desk: what it is and what has become of it. `progress` is null while it waits for its turn. */
export type FileState =
  | { tag: 'reading'; progress: ImportProgress | null }
  | { tag: 'proposed'; proposed: ProposedImport; fault: AcceptFault | null; taking: ImportProgress | null }
  | { tag: 'taken'; campaign: string; added: number }
  /** Stopped by a person; nothing of the file was taken in. */
  | { tag: 'cancelled' }
  | { tag: 'table'; table: DelimitedTable }
  | { tag: 'not-a-table'; fault: DelimitedFault }
  | { tag: 'refused'; error: ProposeFault };

export interface DroppedFile {
  key: number;
  name: string;
  file: File;
  state: FileState;
}

/** Text of bytes that may be UTF-8, UTF-16 with a mark, or an old Western code page. */
export function decodeText(bytes: Uint8Array): string {
  if (bytes[0] === 0xff && bytes[1] === 0xfe) return new TextDecoder('utf-16le').decode(bytes);
  if (bytes[0] === 0xfe && bytes[1] === 0xff) return new TextDecoder('utf-16be').decode(bytes);
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder('windows-1252').decode(bytes);
  }
}

/** The files that lie on the desk. Nothing of them is taken in before it is accepted. */
export class BringIn {
  #files = $state.raw<DroppedFile[]>([]);
  #next = 1;
  #running: Record<number, AbortController> = {};
  #turn: Promise<void> = Promise.resolve();

  get files(): readonly DroppedFile[] {
    return this.#files;
  }

  /** Reads files one after the other and says what each would bring. */
  add(files: Iterable<File>): Promise<void> {
    const added = [...files].map((file) => ({ file, key: this.#next++ }));
    const waiting = { tag: 'reading', progress: null } as const;
    this.#files = [...this.#files, ...added.map(({ file, key }) => ({ key, name: file.name, file, state: waiting }))];
    return this.#readInTurn(added.map(({ key }) => key));
  }

  /** Reads a file once more that was cancelled. */
  again(key: number): Promise<void> {
    this.#set(key, { tag: 'reading', progress: null });
    return this.#readInTurn([key]);
  }

  #readInTurn(keys: readonly number[]): Promise<void> {
    this.#turn = this.#turn.then(async () => {
      for (const key of keys) {
        const found = this.#find(key);
        if (found?.state.tag === 'reading') this.#set(key, await this.#read(key, found.file));
      }
    });
    return this.#turn;
  }

  async #read(key: number, file: File): Promise<FileState> {
    const onProgress = (progress: ImportProgress): void => this.#set(key, { tag: 'reading', progress });
    const proposed = await this.#abortable(key, (signal) => library.propose(file, { signal, onProgress }));
    if (proposed.ok) {
      // It was put off the desk while its last lines were read.
      if (!this.#find(key)) proposed.value.worker.stop();
      return { tag: 'proposed', proposed: proposed.value, fault: null, taking: null };
    }
    const { error } = proposed;
    if (error.tag === 'aborted') return { tag: 'cancelled' };
    if (error.tag === 'not-a-campaign-file' && (error.looksLike === 'csv' || error.looksLike === 'text')) {
      const table = readDelimited(decodeText(new Uint8Array(await file.arrayBuffer())));
      return table.ok ? { tag: 'table', table: table.value } : { tag: 'not-a-table', fault: table.error };
    }
    return { tag: 'refused', error };
  }

  /** Takes a proposed file in, whole or not at all; resolves to the campaign's id, or null when it was not. */
  async accept(key: number): Promise<string | null> {
    const state = this.#find(key)?.state;
    if (state?.tag !== 'proposed' || state.taking !== null) return null;
    const onProgress = (taking: ImportProgress): void => this.#set(key, { ...state, taking, fault: null });
    onProgress({ phase: 'writing', done: 0 });
    const taken = await this.#abortable(key, (signal) => library.accept(state.proposed, { signal, onProgress }));
    if (!taken.ok) {
      const cancelled = taken.error.tag === 'aborted';
      this.#set(key, cancelled ? { tag: 'cancelled' } : { ...state, taking: null, fault: taken.error });
      return null;
    }
    const { campaign, added } = taken.value;
    this.#set(key, { tag: 'taken', campaign, added });
    await this.#weighOthers(campaign);
    return campaign;
  }

  /** What was new in the other files of the campaign may be known now. */
  async #weighOthers(campaign: string): Promise<void> {
    for (const { key, state } of this.#files) {
      if (state.tag !== 'proposed' || state.taking !== null || state.proposed.header.campaign !== campaign) continue;
      const again = await library.weighAgain(state.proposed);
      if (again.ok) this.#set(key, { ...state, proposed: again.value });
      else this.#set(key, { tag: 'refused', error: again.error });
    }
  }

  /** Stops what is going on with a file; nothing of it is taken in. */
  cancel(key: number): void {
    const running = this.#running[key];
    if (running) running.abort();
    else if (this.#find(key)?.state.tag === 'reading') this.#set(key, { tag: 'cancelled' });
  }

  /** Makes a campaign of a table, all or none. */
  async adoptTable(campaign: TableCampaign): Promise<Result<string, StorageFault | BadData | { tag: 'no-acts' }>> {
    const at = Date.now();
    const acts = actsFromTable(campaign).map((act) => ({ ...act, who: device.who, at }) as Act);
    return library.createFrom(acts);
  }

  /** Puts a file off the desk; the file itself is not touched. */
  remove(key: number): void {
    this.#letGo(key);
    this.#files = this.#files.filter((file) => file.key !== key);
  }

  /** Leaves the desk: what is going on ends. */
  close(): void {
    for (const { key } of this.#files) this.#letGo(key);
    this.#files = [];
  }

  #letGo(key: number): void {
    this.#running[key]?.abort();
    const state = this.#find(key)?.state;
    if (state?.tag === 'proposed') state.proposed.worker.stop();
  }

  async #abortable<T>(key: number, run: (signal: AbortSignal) => Promise<T>): Promise<T> {
    const controller = new AbortController();
    this.#running[key] = controller;
    try {
      return await run(controller.signal);
    } finally {
      delete this.#running[key];
    }
  }

  #find(key: number): DroppedFile | undefined {
    return this.#files.find((file) => file.key === key);
  }

  #set(key: number, state: FileState): void {
    this.#files = this.#files.map((file) => (file.key === key ? { ...file, state } : file));
  }
}
