import { openDB } from 'idb';
import { fail, ok, type Result } from '#lib/core/result.ts';
import { faultOf, isLostConnection, type StorageFault } from './fault.ts';
import { type Database, databaseName, type EvenloadSchema, migrations } from './schema.ts';

/** What a connection tells whoever wants to know. */
export interface ConnectionNews {
  /** Another tab holds an older version open; ours waits. */
  onBlocked?: () => void;
  /** A later version of the program wants in: this connection has closed itself. */
  onSuperseded?: () => void;
  /** The browser dropped the connection. */
  onTerminated?: () => void;
  /** The browser threw data away and began anew. */
  onDataLoss?: (how: string) => void;
}

/** How long each try waits for the database to open. An open request can die without a word when the browser cuts it. */
const patience = [2_000, 3_000, 5_000];

/**
 * The way to the database: opens on first use, closes for a later version, reopens after a loss. A page that was asleep
 * may hold a dead connection; an operation is tried three times, each on a new connection, then the fault is told.
 */
export class Connection {
  #db: Promise<Database> | null = null;
  #name: string;
  #news: ConnectionNews;
  /** Version of a database written by a later program; it is then open for reading only. */
  newer: number | null = null;

  constructor(news: ConnectionNews = {}, name = databaseName) {
    this.#news = news;
    this.#name = name;
  }

  /**
   * Runs an operation on an open database. The operation must bear being run again when it is not known whether its
   * first try was written: `attempt` says which try it is, from 1.
   */
  async use<T>(operation: (db: Database, attempt: number) => Promise<T>): Promise<Result<T, StorageFault>> {
    let fault: StorageFault = { tag: 'connection-lost', detail: '' };
    for (const [before, wait] of patience.entries()) {
      const opened = await this.#open(wait);
      if (!opened.ok) {
        fault = opened.error;
        if (fault.tag === 'open-timeout' || fault.tag === 'connection-lost') continue;
        return opened;
      }
      const { db, source } = opened.value;
      try {
        return ok(await operation(db, before + 1));
      } catch (cause) {
        fault = faultOf(cause);
        if (!isLostConnection(cause)) return fail(fault);
        // Another operation may have replaced the dead connection already: its new one is not to be closed.
        if (this.#db === source) this.drop();
      }
    }
    return fail(fault);
  }

  /** Like `use`, for operations that write: refused on a database of a later program. */
  async write<T>(operation: (db: Database, attempt: number) => Promise<T>): Promise<Result<T, StorageFault>> {
    const done = await this.use(async (db, attempt) =>
      this.newer === null ? { did: await operation(db, attempt) } : null
    );
    if (!done.ok) return done;
    return done.value ? ok(done.value.did) : fail({ tag: 'newer-schema', version: this.newer ?? 0 });
  }

  /** Forgets the connection; the next use opens a new one. */
  drop(): void {
    const old = this.#db;
    this.#db = null;
    void old?.then(
      (db) => db.close(),
      () => undefined
    );
  }

  async #open(wait: number): Promise<Result<{ db: Database; source: Promise<Database> }, StorageFault>> {
    if (!this.#db) {
      const connecting: Promise<Database> = this.#connect(() => connecting);
      this.#db = connecting;
    }
    const source = this.#db;
    let timer: ReturnType<typeof setTimeout> | undefined;
    const late = new Promise<null>((resolve) => (timer = setTimeout(() => resolve(null), wait)));
    try {
      // A migration takes the time it needs.
      const db = (await Promise.race([source, late])) ?? (this.#migrating ? await source : null);
      if (db) return ok({ db, source });
      if (this.#db === source) this.#db = null;
      void source.then(
        (opened) => opened.close(),
        () => undefined
      );
      return fail(this.#waiting ? { tag: 'blocked' } : { tag: 'open-timeout', seconds: wait / 1000 });
    } catch (cause) {
      if (this.#db === source) this.#db = null;
      return fail(faultOf(cause));
    } finally {
      clearTimeout(timer);
    }
  }

  #waiting = false;
  #migrating = false;

  async #connect(mine: () => Promise<Database>): Promise<Database> {
    if (!('indexedDB' in globalThis)) throw new DOMException('no indexedDB here', 'SecurityError');
    const events = {
      blocked: () => {
        this.#waiting = true;
        this.#news.onBlocked?.();
      },
      blocking: () => {
        this.drop();
        this.#news.onSuperseded?.();
      },
      terminated: () => {
        if (this.#db === mine()) this.#db = null;
        this.#news.onTerminated?.();
      }
    };
    try {
      const db = await openDB<EvenloadSchema>(this.#name, migrations.length, {
        ...events,
        upgrade: async (database, from, _to, tx, event) => {
          const loss = (event as IDBVersionChangeEvent & { dataLoss?: string }).dataLoss;
          if (loss && loss !== 'none') this.#news.onDataLoss?.(loss);
          this.#waiting = false;
          this.#migrating = true;
          for (const step of migrations.slice(from)) await step(database, tx);
        }
      });
      this.newer = null;
      return db;
    } catch (cause) {
      if (!(cause instanceof DOMException) || cause.name !== 'VersionError') throw cause;
      const db = await openDB<EvenloadSchema>(this.#name, undefined, events);
      this.newer = db.version;
      return db;
    } finally {
      this.#waiting = false;
      this.#migrating = false;
    }
  }
}
