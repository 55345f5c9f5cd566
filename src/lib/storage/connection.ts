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

const patience = 8_000;
const tries = 3;

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
    let last: unknown = null;
    for (let attempt = 1; attempt <= tries; attempt++) {
      const opened = await this.#open();
      if (!opened.ok) return opened;
      try {
        return ok(await operation(opened.value, attempt));
      } catch (cause) {
        last = cause;
        if (!isLostConnection(cause)) return fail(faultOf(cause));
        this.drop();
      }
    }
    return fail(faultOf(last));
  }

  /** Like `use`, for operations that write: refused on a database of a later program. */
  async write<T>(operation: (db: Database, attempt: number) => Promise<T>): Promise<Result<T, StorageFault>> {
    const opened = await this.#open();
    if (!opened.ok) return opened;
    if (this.newer !== null) return fail({ tag: 'newer-schema', version: this.newer });
    return this.use(operation);
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

  async #open(): Promise<Result<Database, StorageFault>> {
    this.#db ??= this.#connect();
    const mine = this.#db;
    let timer: ReturnType<typeof setTimeout> | undefined;
    const late = new Promise<'late'>((resolve) => (timer = setTimeout(() => resolve('late'), patience)));
    try {
      const first = await Promise.race([mine, late]);
      if (first !== 'late') return ok(first);
      if (this.#db === mine) this.#db = null;
      void mine.then(
        (db) => db.close(),
        () => undefined
      );
      return fail(this.#waiting ? { tag: 'blocked' } : { tag: 'open-timeout', seconds: patience / 1000 });
    } catch (cause) {
      if (this.#db === mine) this.#db = null;
      return fail(faultOf(cause));
    } finally {
      clearTimeout(timer);
    }
  }

  #waiting = false;

  async #connect(): Promise<Database> {
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
        this.#db = null;
        this.#news.onTerminated?.();
      }
    };
    try {
      const db = await openDB<EvenloadSchema>(this.#name, migrations.length, {
        ...events,
        upgrade: async (database, from, _to, tx, event) => {
          const loss = (event as IDBVersionChangeEvent & { dataLoss?: string }).dataLoss;
          if (loss && loss !== 'none') this.#news.onDataLoss?.(loss);
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
    }
  }
}
