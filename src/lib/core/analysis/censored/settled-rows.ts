import type { Observations } from '../observations.ts';

/** Rows on which the likelihood has a maximum, and the treatments that have none. */
export interface SettledRows {
  rows: number[];
  /** All their runs stopped at the same kind of limit: the mean is only bounded. */
  unbounded: number[];
}

/**
 * Leaves out what sends a parameter to infinity: a session whose runs all stopped at the same kind of limit says nothing
 * (its offset can explain them all), a treatment whose runs all did has only a bound; until nothing more falls out.
 */
export function settledRows(observations: Observations, kept: readonly number[]): SettledRows {
  let rows = [...kept];
  const unbounded = new Set<number>();
  for (;;) {
    const lost = oneSided(rows, (r) => observations.rows[r]!.treatment, observations);
    lost.forEach((treatment) => unbounded.add(treatment));
    const empty = oneSided(rows, (r) => observations.rows[r]!.session, observations);
    if (lost.size === 0 && empty.size === 0) return { rows, unbounded: [...unbounded].sort((a, b) => a - b) };
    rows = rows.filter((r) => !lost.has(observations.rows[r]!.treatment) && !empty.has(observations.rows[r]!.session));
  }
}

function oneSided(rows: readonly number[], group: (r: number) => number, observations: Observations): Set<number> {
  const kinds = new Map<number, Set<string>>();
  for (const r of rows) {
    const g = group(r);
    if (!kinds.has(g)) kinds.set(g, new Set());
    kinds.get(g)!.add(observations.rows[r]!.limit);
  }
  return new Set([...kinds].flatMap(([g, found]) => (found.size === 1 && !found.has('none') ? [g] : [])));
}
