/** What a campaign file may be at most; anything above is refused before it is read further. */
export const fileLimits = {
  /** Bytes of a whole file. */
  bytes: 256 * 1024 * 1024,
  /** Characters of a line; the longest honest one is the issue of a plan with 1,000 sessions. */
  line: 8 * 1024 * 1024,
  /** Events in a file. */
  events: 500_000,
  /** Nesting of objects and lists in a line. */
  depth: 40
} as const;
