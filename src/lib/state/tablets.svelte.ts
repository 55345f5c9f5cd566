import * as v from 'valibot';
import { type AcceptedTablet, AcceptedTabletSchema, type Origin } from '#lib/core/exchange/judge-origin.ts';
import { type Result } from '#lib/core/result.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import { changeSetting, getSetting } from '#lib/storage/settings.ts';
import { tellOthers, whenOthersWrite } from './channel.ts';
import { connection } from './database.svelte.ts';
import { device } from './device.svelte.ts';
import { ownKey, type SigningFault } from './signing.ts';
import { timeNow } from './surroundings.ts';

const setting = 'accepted-tablets';
const ListSchema = v.array(AcceptedTabletSchema);

/** The tablets whose keys were accepted on this device, and this device's own key. */
class Tablets {
  #accepted = $state.raw<readonly AcceptedTablet[]>([]);
  #fingerprint = $state.raw<string | null>(null);
  #unsigned = $state.raw<SigningFault | null>(null);
  #fault = $state.raw<StorageFault | { tag: 'bad-list' } | null>(null);
  #ready: Promise<void> | null = null;

  get accepted(): readonly AcceptedTablet[] {
    return this.#accepted;
  }
  /** Of this device's own key; null before it is known, and when there is none. */
  get fingerprint(): string | null {
    return this.#fingerprint;
  }
  /** Why this device cannot sign; null when it can. */
  get unsigned(): SigningFault | null {
    return this.#unsigned;
  }
  /** Why the list could not be read or written. */
  get fault(): StorageFault | { tag: 'bad-list' } | null {
    return this.#fault;
  }

  /** Reads the list and this device's key once; every caller waits for the same reading. */
  start(): Promise<void> {
    this.#ready ??= this.#start();
    return this.#ready;
  }

  async #start(): Promise<void> {
    const own = await ownKey();
    this.#fingerprint = own.ok ? own.value.fingerprint : null;
    this.#unsigned = own.ok ? null : own.error;
    await this.#read();
    whenOthersWrite(null, () => void this.#read());
  }

  async #read(): Promise<void> {
    const found = await getSetting(connection, setting);
    if (found.ok) this.#show(found.value);
    else this.#fault = found.error;
  }

  #show(value: unknown): void {
    const parsed = v.safeParse(ListSchema, value ?? []);
    this.#fault = parsed.success ? null : { tag: 'bad-list' };
    if (parsed.success) this.#accepted = parsed.output;
  }

  /** From now on files signed with this key are known by the name given. */
  accept(origin: Extract<Origin, { key: unknown }>, name: string): Promise<Result<void, StorageFault>> {
    const { fingerprint, key, device: from } = origin;
    const tablet = { fingerprint, key, device: from, name: name.trim().slice(0, 120), at: timeNow(), by: device.who };
    return this.#change((list) => [...list.filter((one) => one.fingerprint !== fingerprint), tablet]);
  }

  /** Files signed with this key are those of a new tablet again. Files taken in before stay as they are. */
  remove(fingerprint: string): Promise<Result<void, StorageFault>> {
    return this.#change((list) => list.filter((one) => one.fingerprint !== fingerprint));
  }

  async #change(change: (list: AcceptedTablet[]) => AcceptedTablet[]): Promise<Result<void, StorageFault>> {
    const changed = await changeSetting(connection, setting, (value) => {
      const parsed = v.safeParse(ListSchema, value ?? []);
      return change(parsed.success ? parsed.output : []);
    });
    if (!changed.ok) return changed;
    this.#show(changed.value);
    tellOthers('');
    return { ok: true, value: undefined };
  }
}

export const tablets = new Tablets();
