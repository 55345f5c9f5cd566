import { fail, ok, type Result } from '../result.ts';
import type { Observations } from './observations.ts';
import type { InputFault } from './reason.ts';

/** Positions of the rows that count, and how the rest divides. */
export interface SortedRows {
  kept: number[];
  ruined: number[];
  unread: number[];
}

const isIndex = (value: number, size: number): boolean => Number.isInteger(value) && value >= 0 && value < size;

/**
 * Checks the input and sorts its rows into kept, ruined and unread.
 *
 * @returns the first fault found, in the order: what is asked, the rows, their number
 *
 * Checked by: test/core/analysis/check-observations.test.ts
 */
export function checkObservations(observations: Observations): Result<SortedRows, InputFault> {
  const { treatments, sessions, rows, alpha, control, direction, equivalenceMargin, seed } = observations;
  if (treatments.length === 0) return fail({ tag: 'no-treatments' });
  if (sessions.length === 0) return fail({ tag: 'no-sessions' });
  if (!(alpha > 0 && alpha < 0.5)) return fail({ tag: 'bad-alpha', alpha });
  if (control !== null && !isIndex(control, treatments.length)) {
    return fail({ tag: 'unknown-control', index: control });
  }
  if (typeof direction === 'object' && !Number.isFinite(direction.target)) return fail({ tag: 'bad-target' });
  if (equivalenceMargin !== null && !(equivalenceMargin > 0 && Number.isFinite(equivalenceMargin))) {
    return fail({ tag: 'bad-margin', margin: equivalenceMargin });
  }
  if (!Number.isSafeInteger(seed)) return fail({ tag: 'bad-seed' });
  for (const { name, weights } of observations.contrasts ?? []) {
    const size = weights.reduce((s, w) => s + Math.abs(w), 0);
    const sum = weights.reduce((s, w) => s + w, 0);
    const wrong = weights.length !== treatments.length || !(size > 0) || !(Math.abs(sum) <= 1e-9 * size);
    if (wrong) return fail({ tag: 'bad-contrast', name, need: treatments.length, have: weights.length });
  }
  const sorted: SortedRows = { kept: [], ruined: [], unread: [] };
  for (const [r, row] of rows.entries()) {
    if (!isIndex(row.treatment, treatments.length)) {
      return fail({ tag: 'unknown-treatment', row: r, index: row.treatment });
    }
    if (!isIndex(row.session, sessions.length)) return fail({ tag: 'unknown-session', row: r, index: row.session });
    const numbers: unknown[] = [row.y, row.covariate ?? 0, row.slot ?? 0];
    const bad = numbers.find((value) => value !== null && (typeof value !== 'number' || !Number.isFinite(value)));
    if (bad !== undefined) return fail({ tag: 'not-a-number', row: r, found: String(bad) });
    sorted[row.ruined ? 'ruined' : row.y === null ? 'unread' : 'kept'].push(r);
  }
  return sorted.kept.length === 0 ? fail({ tag: 'no-readings' }) : ok(sorted);
}
