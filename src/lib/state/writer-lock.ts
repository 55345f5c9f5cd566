/** Which tab of this device may write a campaign. */
export type Role = 'writing' | 'following';

/**
 * Holds the right to write a campaign: one tab has it, the others follow and wait for it. It is freed by the browser when
 * its holder closes or dies; *take over* takes it from a holder that lives.
 */
export class WriterLock {
  #name: string;
  #onRole: (role: Role) => void;
  #release: (() => void) | null = null;
  #waiting: AbortController | null = null;
  #closed = false;

  constructor(campaign: string, onRole: (role: Role) => void) {
    this.#name = `evenload-write-${campaign}`;
    this.#onRole = onRole;
  }

  /** Takes the right if it is free; else follows and waits. Resolves when the first role is known. */
  async start(): Promise<Role> {
    const { locks } = navigator;
    // Without Web Locks the unique sequence number still keeps two tabs from writing over each other.
    if (!locks) return this.#tell('writing');
    const first = await new Promise<Role>((resolve) => {
      locks
        .request(this.#name, { ifAvailable: true }, (lock) => {
          resolve(lock ? 'writing' : 'following');
          return lock ? this.#held() : undefined;
        })
        .catch(() => this.#lost());
    });
    if (first === 'following') this.#wait();
    return this.#tell(first);
  }

  /** Takes the right from the tab that has it. */
  takeOver(): Promise<void> {
    const { locks } = navigator;
    if (!locks || this.#release) return Promise.resolve();
    this.#waiting?.abort();
    return new Promise((resolve) => {
      locks
        .request(this.#name, { steal: true }, () => {
          this.#tell('writing');
          resolve();
          return this.#held();
        })
        .catch(() => this.#lost());
    });
  }

  close(): void {
    this.#closed = true;
    this.#waiting?.abort();
    this.#release?.();
  }

  #held(): Promise<void> {
    return new Promise<void>((resolve) => (this.#release = resolve));
  }

  /** Another tab took over. */
  #lost(): void {
    this.#release = null;
    if (this.#closed) return;
    this.#tell('following');
    this.#wait();
  }

  #wait(): void {
    const waiting = new AbortController();
    this.#waiting = waiting;
    navigator.locks
      .request(this.#name, { signal: waiting.signal }, () => {
        this.#tell('writing');
        return this.#held();
      })
      .catch(() => {
        if (!waiting.signal.aborted) this.#lost();
      });
  }

  #tell(role: Role): Role {
    this.#onRole(role);
    return role;
  }
}
