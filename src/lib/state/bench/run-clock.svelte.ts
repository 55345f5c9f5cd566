/** A running session's clock, reckoned from stored times: a page that slept shows the right time at once. */
export class RunClock {
  #now = $state(Date.now());
  #timer: ReturnType<typeof setInterval> | null = null;

  /** Begins to tick; returns how to stop. */
  start(): () => void {
    this.#now = Date.now();
    this.#timer ??= setInterval(() => (this.#now = Date.now()), 250);
    const woken = () => (this.#now = Date.now());
    document.addEventListener('visibilitychange', woken);
    return () => {
      document.removeEventListener('visibilitychange', woken);
      if (this.#timer) clearInterval(this.#timer);
      this.#timer = null;
    };
  }

  /**
   * @param started RFC 3339 time of the start
   * @param seconds planned length; null: none
   * @returns seconds since the start, and to the planned end (below zero: overrun)
   */
  reading(started: string, seconds: number | null): { elapsed: number; left: number | null; share: number | null } {
    const elapsed = Math.max(0, (this.#now - Date.parse(started)) / 1000);
    return {
      elapsed,
      left: seconds === null ? null : seconds - elapsed,
      share: seconds === null || seconds <= 0 ? null : Math.min(1, elapsed / seconds)
    };
  }
}
