import type { Workbox } from 'workbox-window';
import { whoIsBusy } from './busy.ts';

export type OfflineState = 'unsupported' | 'preparing' | 'ready' | 'failed';

/** The service worker as a person sees it: ready without network or not, which version runs, which one waits. */
class Updates {
  #offline = $state<OfflineState>('preparing');
  #waiting = $state<string | null>(null);
  #refused = $state<'here' | 'elsewhere' | null>(null);
  #checked = $state<Date | null>(null);
  #fault = $state<'check' | 'install' | null>(null);
  #workbox: Workbox | null = null;
  #registration: ServiceWorkerRegistration | null = null;
  /** A tap asked for the change; only then may the page reload itself. */
  #reloadDue = false;

  get offline() {
    return this.#offline;
  }
  /** Version name of the worker that waits; null when none does. */
  get waiting() {
    return this.#waiting;
  }
  /** Why the last tap on "change over" was refused. */
  get refused() {
    return this.#refused;
  }
  get checked() {
    return this.#checked;
  }
  get fault() {
    return this.#fault;
  }

  /** Registers the worker; call once. */
  async start(scriptUrl: string): Promise<void> {
    if (!('serviceWorker' in navigator)) {
      this.#offline = 'unsupported';
      return;
    }
    navigator.serviceWorker.addEventListener('controllerchange', () => void this.#controllerChanged());
    try {
      // Later than the screen: the first load of a route does without it.
      const { Workbox } = await import('workbox-window');
      this.#workbox = new Workbox(scriptUrl, { updateViaCache: 'none' });
      this.#workbox.addEventListener('waiting', () => void this.#nameWaiting());
      const registration = (await this.#workbox.register()) ?? null;
      this.#registration = registration;
      if (registration) this.#watch(registration);
      this.#checked = new Date();
      if (registration?.waiting) await this.#nameWaiting();
    } catch {
      // A running worker of an earlier visit still serves; without one there is no work without network yet.
      this.#offline = navigator.serviceWorker.controller ? 'ready' : 'failed';
      this.#fault = 'check';
    }
  }

  #watch(registration: ServiceWorkerRegistration): void {
    if (registration.active) this.#offline = 'ready';
    const follow = (worker: ServiceWorker | null) =>
      worker?.addEventListener('statechange', () => {
        if (worker.state === 'activated') this.#offline = 'ready';
        if (worker.state === 'installed' && registration.active) void this.#nameWaiting();
        if (worker.state === 'redundant' && !registration.waiting && worker !== registration.active) {
          this.#fault = 'install';
          if (!registration.active) this.#offline = 'failed';
        }
      });
    follow(registration.installing);
    registration.addEventListener('updatefound', () => follow(registration.installing));
  }

  async #nameWaiting(): Promise<void> {
    const worker = this.#registration?.waiting;
    if (!worker) return;
    this.#fault = null;
    this.#waiting = await new Promise<string>((resolve) => {
      const channel = new MessageChannel();
      channel.port1.onmessage = (event: MessageEvent<{ version: string }>) => resolve(event.data.version);
      worker.postMessage({ type: 'version' }, [channel.port2]);
    });
  }

  /** Looks for a new version. `registration.update()` resolves even when the new worker's install failed: see `fault`. */
  async check(): Promise<void> {
    this.#fault = null;
    try {
      await this.#registration?.update();
      this.#checked = new Date();
    } catch {
      this.#fault = 'check';
    }
  }

  /** Changes over to the waiting version, unless work is going on here or in another tab. */
  async apply(): Promise<void> {
    const busy = await whoIsBusy();
    this.#refused = busy === 'nobody' ? null : busy;
    if (busy !== 'nobody' || !this.#registration?.waiting) return;
    this.#reloadDue = true;
    this.#registration.waiting.postMessage({ type: 'SKIP_WAITING' });
  }

  async #controllerChanged(): Promise<void> {
    // The first worker of all takes control without a reload; so does a change that another tab asked for while this
    // one is at work: its pieces stay in the cache of the version before.
    if (this.#reloadDue || (this.#waiting !== null && (await whoIsBusy()) !== 'here')) location.reload();
  }
}

export const updates = new Updates();
