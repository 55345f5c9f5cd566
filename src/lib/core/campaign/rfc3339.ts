const two = (n: number): string => String(n).padStart(2, '0');

/**
 * Wall-clock time with offset to the millisecond, as in 2026-03-02T08:15:00.000+01:00.
 * @param now milliseconds since 1970
 * @param offset minutes east of UTC
 * Source: RFC 3339, 5.6.
 */
export function rfc3339(now: number, offset: number): string {
  const local = new Date(now + offset * 60_000).toISOString().slice(0, -1);
  const size = Math.abs(offset);
  return `${local}${offset < 0 ? '-' : '+'}${two(Math.trunc(size / 60))}:${two(size % 60)}`;
}

/** Milliseconds since 1970 of a time that `rfc3339` wrote; the schema has let nothing else in. */
export const instantOf = (at: string): number => {
  const instant = Date.parse(at);
  return Number.isNaN(instant) ? 0 : instant;
};
