import { replay } from '#lib/core/campaign/replay.ts';
import { fail, type Result } from '#lib/core/result.ts';
import { readCanary } from '#lib/storage/canary.ts';
import { eraseDatabase } from '#lib/storage/erase-device.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import { campaignsWithEvents, inspect } from '#lib/storage/inspect.ts';
import { load } from '#lib/storage/journal.ts';
import { alarm } from './alarm.svelte.ts';
import { connection, databaseNews } from './database.svelte.ts';
import { device } from './device.svelte.ts';
import { type ExportedFile, type ExportFault, fileOf } from './make-export.ts';
import { timeNow } from './surroundings.ts';

/** What was read of one campaign when everything was read again, hash by hash. */
export interface Rescued {
  campaign: string;
  title: string;
  events: number;
  unreadable: { id: string; path: string; cause: string }[];
  /** Gaps, forks, edits. */
  broken: number;
  demo: boolean;
  /** A file of all that can be read. */
  file: ExportedFile | null;
  fault: ExportFault | null;
}

/** The way out when something is wrong: reads all that can be read, makes files of it, tells what it found. */
class Recovery {
  #rescued = $state.raw<Rescued[]>([]);
  #diagnosis = $state('');
  #fault = $state.raw<StorageFault | null>(null);
  #busy = $state(false);
  #looked = $state(false);
  /** Campaigns whose file a person has kept since it was made. */
  #kept = $state.raw<readonly string[]>([]);

  get rescued(): Rescued[] {
    return this.#rescued;
  }
  get diagnosis(): string {
    return this.#diagnosis;
  }
  get fault(): StorageFault | null {
    return this.#fault;
  }
  get busy(): boolean {
    return this.#busy;
  }
  get looked(): boolean {
    return this.#looked;
  }
  /** Every campaign but the demo has a verified file that a person has kept: only then may the device be erased. */
  get mayErase(): boolean {
    return this.#looked && this.#rescued.every(({ campaign, demo }) => demo || this.#kept.includes(campaign));
  }

  /** Reads everything anew, down to each event's hash. */
  async look(): Promise<void> {
    this.#busy = true;
    connection.drop();
    await device.start();
    await alarm.check();
    const found = await campaignsWithEvents(connection);
    this.#fault = found.ok ? null : found.error;
    const rescued: Rescued[] = [];
    for (const campaign of found.ok ? found.value : []) rescued.push(await this.#read(campaign));
    this.#rescued = rescued;
    this.#kept = [];
    this.#diagnosis = await this.#diagnose();
    this.#looked = found.ok;
    this.#busy = false;
  }

  async #read(campaign: string): Promise<Rescued> {
    const empty = { campaign, title: '', events: 0, unreadable: [], broken: 0, demo: false, file: null, fault: null };
    const loaded = await load(connection, campaign, true);
    if (!loaded.ok) return { ...empty, fault: loaded.error };
    const { events, unreadable } = loaded.value;
    const state = replay(events, campaign);
    const file = await fileOf(events, campaign, state.title);
    return {
      campaign,
      title: state.title,
      demo: state.demo,
      events: events.length,
      unreadable,
      broken: state.flags.filter(({ kind }) => kind === 'gap' || kind === 'fork' || kind === 'altered').length,
      file: file.ok ? file.value : null,
      fault: file.ok ? null : file.error
    };
  }

  keep(campaign: string): void {
    this.#kept = [...this.#kept, campaign];
  }

  /** Takes everything off this device. */
  async erase(): Promise<Result<void, StorageFault | { tag: 'not-exported' }>> {
    if (!this.mayErase) return fail({ tag: 'not-exported' });
    return eraseDatabase(connection);
  }

  /** Plain text for whoever helps; it holds no readings and no names of people. */
  async #diagnose(): Promise<string> {
    const inspected = await inspect(connection);
    const estimate = await navigator.storage?.estimate?.().catch(() => null);
    const lines: [string, unknown][] = [
      ['written', timeNow()],
      ['program', __APP_VERSION__],
      ['browser', navigator.userAgent],
      ['device', device.id],
      ['online', navigator.onLine],
      ['persistence', device.persistence],
      ['space used / allowed', `${estimate?.usage ?? '?'} / ${estimate?.quota ?? '?'}`],
      ['worker', navigator.serviceWorker?.controller?.state ?? 'none'],
      ['web locks', 'locks' in navigator],
      ['database', inspected.ok ? JSON.stringify(inspected.value) : JSON.stringify(inspected.error)],
      ['news of the database', databaseNews.current ?? 'none'],
      ['fault of the device', JSON.stringify(device.fault)],
      [
        'remembered outside',
        JSON.stringify(Object.entries(readCanary()?.campaigns ?? {}).map(([id, one]) => [id, one.events, one.at]))
      ],
      ['missing', JSON.stringify(alarm.lost.map(({ campaign, expected, found }) => [campaign, expected, found]))],
      ...this.#rescued.map((one): [string, unknown] => [
        `campaign ${one.campaign}`,
        `${one.events} events, ${one.unreadable.length} unreadable, ${one.broken} breaks in chains${one.unreadable.map((bad) => `; ${bad.id} ${bad.path} ${bad.cause}`).join('')}`
      ])
    ];
    return lines.map(([name, value]) => `${name}: ${String(value)}`).join('\n');
  }
}

export const recovery = new Recovery();
