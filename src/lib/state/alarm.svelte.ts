import { ok, type Result } from '#lib/core/result.ts';
import { forget, readCanary } from '#lib/storage/canary.ts';
import { countEvents } from '#lib/storage/count-events.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import { connection } from './database.svelte.ts';

/** A campaign of which this device held more than it finds now. */
export interface Lost {
  campaign: string;
  title: string;
  expected: number;
  found: number;
  /** When the last event was written here. */
  at: string;
  /** When the last verified file was made; null: never. */
  exported: string | null;
  /** Events that no file held when the last one was written. */
  notExported: number;
}

/**
 * The empty-start alarm: what the device remembers outside the database does not agree with what the database holds. It
 * stands until the events are back (from a file) or a person says that they know.
 */
class Alarm {
  #lost = $state.raw<Lost[]>([]);

  get lost(): Lost[] {
    return this.#lost;
  }
  get raised(): boolean {
    return this.#lost.length > 0;
  }

  /** Compares again; at the start of the program, after an import, when the database was opened anew. */
  async check(): Promise<Result<Lost[], StorageFault>> {
    const remembered = Object.entries(readCanary()?.campaigns ?? {});
    const counted = await countEvents(
      connection,
      remembered.map(([id]) => id)
    );
    if (!counted.ok) return counted;
    this.#lost = remembered.flatMap(([campaign, { title, events, at, exported, notExported }]) => {
      const found = counted.value[campaign] ?? 0;
      return found < events ? [{ campaign, title, expected: events, found, at, exported, notExported }] : [];
    });
    return ok(this.#lost);
  }

  /** A person knows: what is gone is no longer looked for. */
  async acknowledge(): Promise<void> {
    for (const { campaign } of this.#lost) forget(campaign);
    await this.check();
  }
}

export const alarm = new Alarm();
