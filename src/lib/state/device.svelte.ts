import { readCanary } from '#lib/storage/canary.ts';
import { getSetting, putSetting, settleSetting } from '#lib/storage/settings.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import { locale, type Locale } from '#lib/ui/texts/locale.svelte.ts';
import { alarm } from './alarm.svelte.ts';
import { connection } from './database.svelte.ts';
import { newId } from './surroundings.ts';

export type Light = 'auto' | 'light' | 'dark';
/** May the browser delete what is kept here? `granted`: not by itself. */
export type Persistence = 'granted' | 'refused' | 'not-asked' | 'unsupported';

export interface Space {
  used: number;
  /** What the browser says this origin may use, bytes; an estimate. */
  quota: number;
}

/** This tablet or desk: its id, who works at it, how the screen is to be, and how safe its store is. */
class Device {
  #id = $state('');
  #who = $state('');
  #light = $state<Light>('auto');
  #persistence = $state<Persistence>('not-asked');
  #space = $state.raw<Space | null>(null);
  #fault = $state.raw<StorageFault | null>(null);
  #ready: Promise<void> | null = null;

  get id(): string {
    return this.#id;
  }
  /** Name that events bear. It attributes, it does not authenticate. */
  get who(): string {
    return this.#who;
  }
  get locale(): Locale {
    return locale.current;
  }
  get light(): Light {
    return this.#light;
  }
  get persistence(): Persistence {
    return this.#persistence;
  }
  get space(): Space | null {
    return this.#space;
  }
  /** Why the device's settings could not be read or written; null when all is well. */
  get fault(): StorageFault | null {
    return this.#fault;
  }

  /** Reads the settings once; every caller waits for the same reading. */
  start(): Promise<void> {
    this.#ready ??= this.#start();
    return this.#ready;
  }

  async #start(): Promise<void> {
    const id = await settleSetting(connection, 'device', newId());
    if (!id.ok) {
      this.#fault = id.error;
      this.#ready = null;
      return;
    }
    this.#fault = null;
    this.#id = String(id.value);
    await this.#lookForLosses();
    this.#who = await this.#text('who', '');
    const light = await this.#text('light', 'auto');
    this.#showLight(light === 'light' || light === 'dark' ? light : 'auto');
    const language = await this.#text('locale', navigator.language.startsWith('de') ? 'de' : 'en');
    locale.set(language === 'de' ? 'de' : 'en');
    await this.measure();
  }

  /**
   * When events this device remembers are gone, numbers it has given out may stand in files elsewhere: it goes on under a
   * new id, so that no number is ever given twice.
   */
  async #lookForLosses(): Promise<void> {
    const found = await alarm.check();
    if (!found.ok || found.value.length === 0 || readCanary()?.device !== this.#id) return;
    const id = newId();
    const kept = await putSetting(connection, 'device', id);
    if (kept.ok) this.#id = id;
    else this.#fault = kept.error;
  }

  async #text(name: string, otherwise: string): Promise<string> {
    const found = await getSetting(connection, name);
    return found.ok && typeof found.value === 'string' ? found.value : otherwise;
  }

  async #keep(name: string, value: string): Promise<void> {
    const kept = await putSetting(connection, name, value);
    this.#fault = kept.ok ? null : kept.error;
  }

  async setWho(who: string): Promise<void> {
    this.#who = who.trim().slice(0, 120);
    await this.#keep('who', this.#who);
  }

  async setLocale(next: Locale): Promise<void> {
    locale.set(next);
    await this.#keep('locale', next);
  }

  async setLight(light: Light): Promise<void> {
    this.#showLight(light);
    await this.#keep('light', light);
  }

  #showLight(light: Light): void {
    this.#light = light;
    if (light === 'auto') delete document.documentElement.dataset.light;
    else document.documentElement.dataset.light = light;
  }

  /** Asks the browser not to delete by itself; call it from a tap. */
  async askPersistence(): Promise<Persistence> {
    if (!navigator.storage?.persist) this.#persistence = 'unsupported';
    else this.#persistence = (await navigator.storage.persist()) ? 'granted' : 'refused';
    return this.#persistence;
  }

  /** Looks again at what the browser says about persistence and space. */
  async measure(): Promise<void> {
    if (!navigator.storage?.persisted) {
      this.#persistence = 'unsupported';
      return;
    }
    if (await navigator.storage.persisted()) this.#persistence = 'granted';
    const { usage, quota } = await navigator.storage.estimate();
    this.#space = usage !== undefined && quota !== undefined ? { used: usage, quota } : null;
  }
}

export const device = new Device();
