import type { FactorChoice, Observations } from '../observations.ts';
import {
  factorColumns,
  levelReaders,
  quantityColumn,
  treatmentColumns,
  type KeptRow,
  type LeftOut,
  type OrderedRows,
  type TermColumns
} from './model-columns.ts';
import type { RunTable } from './run-table.ts';

/**
 * Builds the model matrix of the given runs: treatments first, then the chosen factors that have at least two levels.
 *
 * @param rows positions in `observations.rows`; every one must have a reading
 * @param factors the factors to use instead of those of the observations
 * @param withOrder adds the place of the session in the order of sessions as a quantity, for a test of drift
 * @returns the table, and the chosen factors that could not be used with the reason
 *
 * Readings are taken less a centre that is itself a reading: for readings within a factor two of it the subtraction is
 * exact (Sterbenz), so a large offset costs no digits.
 *
 * Checked by: test/core/analysis/model/build-run-table.test.ts
 */
export function buildRunTable(
  observations: Observations,
  rows: readonly number[],
  factors: FactorChoice = observations.factors,
  withOrder = false
): { table: RunTable; leftOut: LeftOut[] } {
  const { ordered, sessionIndex } = orderBySession(observations, rows);
  const n = ordered.rows.length;
  const columns: TermColumns[] = [treatmentColumns(observations, ordered)];
  const leftOut: LeftOut[] = [];
  let p = observations.treatments.length;
  const add = (made: TermColumns | LeftOut): void => {
    if ('reason' in made) leftOut.push(made);
    else {
      columns.push(made);
      p += made.term.size;
    }
  };
  for (const { name, read } of levelReaders(observations, factors)) add(factorColumns(name, read, ordered, p));
  if (factors.covariate === true) add(quantityColumn('covariate', (row) => row.covariate, ordered, p));
  if (withOrder) add(quantityColumn('order', (row) => row.session, ordered, p));

  const width = columns.length;
  const column = new Int32Array(n * width);
  const value = new Float64Array(n * width);
  columns.forEach((entry, f) => {
    for (let i = 0; i < n; i++) {
      column[i * width + f] = entry.column[i]!;
      value[i * width + f] = entry.value[i]!;
    }
  });
  const readings = ordered.rows.map((row) => row.y);
  const centre = middle(readings);
  const table: RunTable = {
    n,
    b: sessionIndex.length,
    p,
    terms: columns.map((entry) => entry.term),
    width,
    start: Int32Array.from(ordered.start),
    sessionIndex: Int32Array.from(sessionIndex),
    rowIndex: Int32Array.from(ordered.rowIndex),
    column,
    value,
    y: Float64Array.from(readings, (v) => v - centre),
    centre,
    magnitude: readings.reduce((m, v) => Math.max(m, Math.abs(v)), 0)
  };
  return { table, leftOut };
}

/** Sorts the rows by session, keeping their order inside it. */
function orderBySession(
  observations: Observations,
  rows: readonly number[]
): { ordered: OrderedRows; sessionIndex: number[] } {
  const kept = (r: number): KeptRow => observations.rows[r] as KeptRow;
  const sizes = new Int32Array(observations.sessions.length);
  for (const r of rows) sizes[kept(r).session]!++;
  const start = [0];
  const sessionIndex: number[] = [];
  const next = new Int32Array(sizes.length);
  sizes.forEach((size, session) => {
    if (size === 0) return;
    next[session] = start.at(-1)!;
    start.push(start.at(-1)! + size);
    sessionIndex.push(session);
  });
  const rowIndex = new Array<number>(rows.length);
  for (const r of rows) rowIndex[next[kept(r).session]!++] = r;
  return { ordered: { rows: rowIndex.map(kept), rowIndex, start }, sessionIndex };
}

/** A reading from the middle of the sorted list. */
function middle(readings: readonly number[]): number {
  if (readings.length === 0) return 0;
  return Float64Array.from(readings).sort()[readings.length >> 1]!;
}
