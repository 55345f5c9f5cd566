import type { CopyFault } from '#lib/storage/copy-into-folder.ts';
import { mirrorFolder, type MirrorFolder } from '#lib/storage/mirror-folder.ts';
import { getSetting, putSetting } from '#lib/storage/settings.ts';
import { connection } from './database.svelte.ts';
import { timeNow } from './surroundings.ts';

/** What a copy in a folder needs of an open campaign. */
interface Mirrored {
  readonly id: string;
  readonly role: string;
  readonly state: { readonly title: string; readonly events: number };
}

/** After the last save, and at the latest after the first that is not copied; milliseconds. Common practice, no source. */
const quiet = 3_000;
const longest = 30_000;

type Picker = (options: { id: string; mode: 'readwrite' }) => Promise<FileSystemDirectoryHandle>;
const picker = () => (globalThis as { showDirectoryPicker?: Picker }).showDirectoryPicker;

/**
 * A copy of the campaign file in a folder of this computer, kept up to date on its own: the file and the one before it. It
 * is a second place, not an export: both may lie on the same disk, so it does not count as *off the device*.
 * Checked by: test/e2e/bench-mirror.spec.ts
 */
export class Mirror {
  #campaign: Mirrored;
  #folder = $state.raw<MirrorFolder | null>(null);
  #permitted = $state(false);
  #last = $state.raw<{ at: string; events: number } | null>(null);
  #fault = $state.raw<CopyFault | null>(null);
  #copied = $state(0);
  #timer: ReturnType<typeof setTimeout> | null = null;
  #since: number | null = null;
  #copying = false;
  #closed = false;

  constructor(campaign: Mirrored) {
    this.#campaign = campaign;
  }

  /** This browser can write into a folder on its own. */
  get possible(): boolean {
    return picker() !== undefined;
  }
  /** Name of the chosen folder; null: none is chosen. */
  get folder(): string | null {
    return this.#folder?.name ?? null;
  }
  /** A folder is chosen, and the browser wants to be asked anew. */
  get waiting(): boolean {
    return this.#folder !== null && !this.#permitted;
  }
  get last() {
    return this.#last;
  }
  get fault() {
    return this.#fault;
  }

  /** Takes up the folder that was chosen before; returns how to let go. */
  start(): () => void {
    const hidden = () => document.visibilityState === 'hidden' && this.#timer !== null && void this.#copy();
    document.addEventListener('visibilitychange', hidden);
    if (this.possible) void this.#takeUp();
    return () => {
      this.#closed = true;
      document.removeEventListener('visibilitychange', hidden);
      if (this.#timer !== null) void this.#copy();
    };
  }

  /** Lets the person choose the folder; call it from a tap. */
  async begin(): Promise<void> {
    try {
      const handle = await picker()?.({ id: 'evenload-copy', mode: 'readwrite' });
      if (!handle) return;
      const kept = await putSetting(connection, this.#setting, handle);
      this.#fault = kept.ok ? null : { tag: 'failed', detail: kept.error.tag };
      await this.#use(handle, true);
    } catch (cause) {
      // Closing the list of folders without a choice is no fault.
      if (cause instanceof DOMException && cause.name === 'AbortError') return;
      this.#fault = { tag: 'failed', detail: cause instanceof Error ? cause.message : String(cause) };
    }
  }

  /** Asks for the permission anew; call it from a tap. */
  async resume(): Promise<boolean> {
    this.#permitted = (await this.#folder?.permitted(true).catch(() => false)) ?? false;
    if (this.#permitted) await this.#copy();
    return this.#permitted;
  }

  /** The files stay; nothing is written any more. */
  async stop(): Promise<void> {
    this.#cancel();
    this.#folder = null;
    this.#fault = null;
    this.#last = null;
    await putSetting(connection, this.#setting, null);
  }

  /** Something was saved: a copy is due in a moment. */
  touch(): void {
    if (!this.#folder || !this.#permitted || this.#campaign.state.events === this.#copied) return;
    this.#since ??= Date.now();
    if (this.#timer !== null) clearTimeout(this.#timer);
    const left = Math.max(0, this.#since + longest - Date.now());
    this.#timer = setTimeout(() => void this.#copy(), Math.min(quiet, left));
  }

  get #setting(): string {
    return `mirror:${this.#campaign.id}`;
  }

  async #takeUp(): Promise<void> {
    const kept = await getSetting(connection, this.#setting);
    if (!this.#closed && kept.ok && kept.value instanceof FileSystemDirectoryHandle) await this.#use(kept.value, false);
  }

  async #use(handle: FileSystemDirectoryHandle, ask: boolean): Promise<void> {
    const folder = mirrorFolder(handle);
    const permitted = await folder.permitted(ask).catch(() => false);
    this.#folder = folder;
    this.#permitted = permitted;
    if (permitted) await this.#copy();
  }

  #cancel(): void {
    if (this.#timer !== null) clearTimeout(this.#timer);
    this.#timer = null;
    this.#since = null;
  }

  async #copy(): Promise<void> {
    this.#cancel();
    const folder = this.#folder;
    // Two tabs that write one file would undo each other's copy: the one that records does it.
    if (!folder || this.#copying || this.#campaign.role === 'following') return;
    this.#copying = true;
    try {
      this.#permitted = await folder.permitted(false);
      if (!this.#permitted) return;
      const { id, state } = this.#campaign;
      const { events } = state;
      const { copyCampaign } = await import('./copy-campaign.ts');
      const copied = await copyCampaign(folder, id, state.title);
      if (this.#folder !== folder) return;
      this.#fault = copied.ok ? null : copied.error;
      if (!copied.ok) return;
      this.#copied = events;
      this.#last = { at: timeNow(), events: copied.value.events };
    } catch (cause) {
      this.#fault = { tag: 'failed', detail: cause instanceof Error ? cause.message : String(cause) };
    } finally {
      this.#copying = false;
      if (this.#fault === null && !this.#closed) this.touch();
    }
  }
}
