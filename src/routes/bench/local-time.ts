import { rfc3339 } from '#lib/core/campaign/rfc3339.ts';

/** A moment as a date-and-time field of the device writes it: local, to the minute. */
export function localMinute(moment: Date): string {
  return rfc3339(moment.getTime(), -moment.getTimezoneOffset()).slice(0, 16);
}

/** RFC 3339 with the offset that holds at that local time. */
export function rfcOfLocal(local: string): string {
  const moment = new Date(local);
  return rfc3339(moment.getTime(), -moment.getTimezoneOffset());
}
