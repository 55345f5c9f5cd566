/**
 * An RFC 3339 time as the clock on the wall showed it where it was recorded, in the person's way of writing; never moved to the
 * zone of this device.
 */
export function timeText(at: string, locale: string): string {
  const found = /^(\d{4})-(\d\d)-(\d\d)T(\d\d):(\d\d)/.exec(at);
  if (found === null) return at;
  const [, year, month, day, hour, minute] = found.map(Number);
  const wall = new Date(Date.UTC(year ?? 0, (month ?? 1) - 1, day, hour, minute));
  return new Intl.DateTimeFormat(locale, { dateStyle: 'medium', timeStyle: 'short', timeZone: 'UTC' }).format(wall);
}
