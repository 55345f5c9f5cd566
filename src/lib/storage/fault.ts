/** What the environment can do to a read or write; made into words for people in one place. */
export type StorageFault =
  /** The device has no room left for this origin. */
  | { tag: 'quota' }
  /** Another tab of this device wrote in between: read again. */
  | { tag: 'stale' }
  /** The connection was lost and three new ones did not help. */
  | { tag: 'connection-lost'; detail: string }
  /** The database did not open in time. */
  | { tag: 'open-timeout'; seconds: number }
  /** Another tab holds an older version of the program open. */
  | { tag: 'blocked' }
  /** The database was written by a later program: it is only read. */
  | { tag: 'newer-schema'; version: number }
  /** This browser has no database here (private window, policy). */
  | { tag: 'unavailable'; detail: string }
  /** Anything else the database said. */
  | { tag: 'storage-failed'; detail: string };

const nameOf = (cause: unknown): string => (cause instanceof Error || cause instanceof DOMException ? cause.name : '');

/** Is it worth opening a new connection and trying again? */
export const isLostConnection = (cause: unknown): boolean =>
  ['InvalidStateError', 'AbortError', 'UnknownError', 'TransactionInactiveError', 'TimeoutError'].includes(
    nameOf(cause)
  );

/** The tagged fault of what the database threw. */
export function faultOf(cause: unknown): StorageFault {
  const detail =
    cause instanceof Error || cause instanceof DOMException ? `${cause.name}: ${cause.message}` : String(cause);
  switch (nameOf(cause)) {
    case 'QuotaExceededError':
      return { tag: 'quota' };
    case 'ConstraintError':
      return { tag: 'stale' };
    case 'SecurityError':
      return { tag: 'unavailable', detail };
    default:
      return isLostConnection(cause) ? { tag: 'connection-lost', detail } : { tag: 'storage-failed', detail };
  }
}
