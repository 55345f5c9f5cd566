import type { FileError } from '#lib/core/exchange/read-campaign-file.ts';
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
import { device } from './device.svelte.ts';
import { library, type ProposedImport } from './library.svelte.ts';

type Act = Parameters<typeof library.createFrom>[0][number];

/** A file on the desk: what it is and what has become of it. */
export type FileState =
  | { tag: 'reading' }
  | { tag: 'proposed'; proposed: ProposedImport; fault: StorageFault | BadData | null; busy: boolean }
  | { tag: 'taken'; campaign: string; added: number }
  | { tag: 'table'; table: DelimitedTable }
  | { tag: 'not-a-table'; fault: DelimitedFault }
  | { tag: 'refused'; error: FileError | StorageFault };

export interface DroppedFile {
  key: number;
  name: string;
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

  get files(): readonly DroppedFile[] {
    return this.#files;
  }

  /** Reads files one after the other and says what each would bring. */
  async add(files: Iterable<File>): Promise<void> {
    const added = [...files].map((file) => ({ file, key: this.#next++ }));
    this.#files = [
      ...this.#files,
      ...added.map(({ file, key }) => ({ key, name: file.name, state: { tag: 'reading' } as const }))
    ];
    for (const { file, key } of added) this.#set(key, await this.#read(file));
  }

  async #read(file: File): Promise<FileState> {
    const bytes = new Uint8Array(await file.arrayBuffer());
    const proposed = await library.propose(bytes, file.name);
    if (proposed.ok) return { tag: 'proposed', proposed: proposed.value, fault: null, busy: false };
    const { error } = proposed;
    if (error.tag === 'not-a-campaign-file' && (error.looksLike === 'csv' || error.looksLike === 'text')) {
      const table = readDelimited(decodeText(bytes));
      return table.ok ? { tag: 'table', table: table.value } : { tag: 'not-a-table', fault: table.error };
    }
    return { tag: 'refused', error };
  }

  /** Takes a proposed file in, whole or not at all; resolves to the campaign's id, or null when it failed. */
  async accept(key: number): Promise<string | null> {
    const state = this.#files.find((file) => file.key === key)?.state;
    if (state?.tag !== 'proposed') return null;
    this.#set(key, { ...state, busy: true, fault: null });
    const taken = await library.accept(state.proposed);
    if (!taken.ok) {
      this.#set(key, { ...state, busy: false, fault: taken.error });
      return null;
    }
    this.#set(key, { tag: 'taken', campaign: taken.value, added: state.proposed.summary.added.length });
    return taken.value;
  }

  /** Makes a campaign of a table, all or none. */
  async adoptTable(campaign: TableCampaign): Promise<Result<string, StorageFault | BadData | { tag: 'no-acts' }>> {
    const at = Date.now();
    const acts = actsFromTable(campaign).map((act) => ({ ...act, who: device.who, at }) as Act);
    return library.createFrom(acts);
  }

  /** Puts a file off the desk; the file itself is not touched. */
  remove(key: number): void {
    this.#files = this.#files.filter((file) => file.key !== key);
  }

  #set(key: number, state: FileState): void {
    this.#files = this.#files.map((file) => (file.key === key ? { ...file, state } : file));
  }
}
