/** Keeps the screen on while something asks for it. Released by the browser when the page is hidden, and asked for again. */
export class WakeLock {
  #sentinel: WakeLockSentinel | null = null;
  #wanted = false;
  #awake = $state(false);

  get awake(): boolean {
    return this.#awake;
  }

  /** Asks for the lock; returns how to let go. Without the browser's help nothing happens. */
  hold(): () => void {
    this.#wanted = true;
    const visible = () => {
      if (document.visibilityState === 'visible') void this.#ask();
    };
    document.addEventListener('visibilitychange', visible);
    void this.#ask();
    return () => {
      document.removeEventListener('visibilitychange', visible);
      this.#wanted = false;
      void this.#sentinel?.release();
      this.#sentinel = null;
      this.#awake = false;
    };
  }

  async #ask(): Promise<void> {
    if (!('wakeLock' in navigator) || !navigator.wakeLock) return;
    try {
      const sentinel = await navigator.wakeLock.request('screen');
      if (!this.#wanted) {
        await sentinel.release();
        return;
      }
      this.#sentinel = sentinel;
      this.#awake = true;
      sentinel.addEventListener('release', () => (this.#awake = false), { once: true });
    } catch {
      // Battery saver and hidden pages refuse it; the screen then goes dark by itself and the clock goes on.
      this.#awake = false;
    }
  }
}
