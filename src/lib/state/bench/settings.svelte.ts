import * as v from 'valibot';
import { getSetting, putSetting } from '#lib/storage/settings.ts';
import { connection } from '../database.svelte.ts';

const Schema = v.object({
  keys: v.optional(v.fallback(v.picklist(['normal', 'larger', 'largest']), 'normal'), 'normal'),
  hand: v.optional(v.fallback(v.picklist(['right', 'left']), 'right'), 'right'),
  typing: v.optional(v.fallback(v.picklist(['own', 'system']), 'own'), 'own'),
  signals: v.optional(v.fallback(v.boolean(), true), true),
  baud: v.optional(v.fallback(v.pipe(v.number(), v.integer(), v.minValue(300), v.maxValue(921_600)), 9600), 9600)
});
export type BenchSettings = v.InferOutput<typeof Schema>;

/** How this device's bench is set up; kept on the device, no part of any campaign. */
class Settings {
  #current = $state.raw<BenchSettings>(v.parse(Schema, {}));
  #started = false;

  get current(): BenchSettings {
    return this.#current;
  }

  async start(): Promise<void> {
    if (this.#started) return;
    this.#started = true;
    const kept = await getSetting(connection, 'bench');
    const read = v.safeParse(Schema, kept.ok ? (kept.value ?? {}) : {});
    if (read.success) this.#current = read.output;
  }

  async change(next: BenchSettings): Promise<void> {
    this.#current = next;
    await putSetting(connection, 'bench', next);
  }
}

export const benchSettings = new Settings();
