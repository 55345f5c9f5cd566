import type { Stamp } from '#lib/core/campaign/make-event.ts';
import { rfc3339 } from '#lib/core/campaign/rfc3339.ts';
import { uuid7 } from '#lib/core/campaign/uuid7.ts';

const random = (bytes: number): Uint8Array => crypto.getRandomValues(new Uint8Array(bytes));

/** A random word for this start of the program: events of one start share a forward-only clock. */
const run = Array.from(random(4), (byte) => byte.toString(16).padStart(2, '0')).join('');

const offsetAt = (now: number): number => -new Date(now).getTimezoneOffset();

/** What the surroundings give the next event: both clocks, chance, the program's version. */
export function stampNow(): Stamp {
  const now = Date.now();
  return {
    now,
    offset: offsetAt(now),
    mono: Math.round(performance.now()),
    run,
    app: __APP_VERSION__,
    random: random(10)
  };
}

/** The wall clock as RFC 3339 with offset. */
export function timeNow(): string {
  const now = Date.now();
  return rfc3339(now, offsetAt(now));
}

export const newId = (): string => uuid7(Date.now(), random(10));
