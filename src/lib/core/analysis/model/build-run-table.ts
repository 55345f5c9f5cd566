import type { FactorChoice, ObservationRow, Observations } from '../observations.ts';
import type { Reason } from '../reason.ts';
import type { RunTable, Term, TermName } from './run-table.ts';

export interface LeftOut {
  factor: TermName;
  reason: Reason;
}

/** A row that counts: kept and read. */
export type KeptRow = ObservationRow & { y: number };

/**
 * Builds the model matrix of the given runs: treatments first, then the chosen factors that have at least two levels.
 *
 * @param rows positions in `observations.rows`; every one must have a reading
 * @returns the table, and the chosen factors that could not be used with the reason
 *
 * Readings are taken less a centre that is itself a reading: for readings within a factor two of it the subtraction is
 * exact (Sterbenz), so a large offset costs no digits.
 */
export function buildRunTable(
  observations: Observations,
  rows: readonly number[],
  factors: FactorChoice = observations.factors
): { table: RunTable; leftOut: LeftOut[] } {
  const kept = (r: number): KeptRow => observations.rows[r] as KeptRow;
  const n = rows.length;
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
  const order = new Array<number>(n);
  for (const r of rows) order[next[kept(r).session]!++] = r;

  const columns: { term: Term; column: (i: number) => number; value: (i: number) => number }[] = [];
  const leftOut: LeftOut[] = [];
  let p = observations.treatments.length;
  columns.push({
    term: {
      name: 'treatment',
      start: 0,
      size: p,
      levels: observations.treatments.map((t) => t.id),
      between: false
    },
    column: (i) => kept(order[i]!).treatment,
    value: () => 1
  });

  const addFactor = (name: TermName, levelOf: (row: KeptRow) => string | null): void => {
    const found = order.map((r) => levelOf(kept(r)));
    const missing = order.filter((_, i) => found[i] === null);
    if (missing.length > 0) {
      leftOut.push({
        factor: name,
        reason: name === 'slot' ? { tag: 'no-slots' } : { tag: 'level-missing', factor: name, rows: missing }
      });
      return;
    }
    const labels = found as string[];
    const levels = [...new Set(labels)].sort(compareLevels);
    if (levels.length < 2) {
      leftOut.push({ factor: name, reason: { tag: 'one-level', factor: name } });
      return;
    }
    const index = new Map(levels.map((level, i) => [level, i]));
    const first = p;
    const between = sessionIndex.every((_, j) => {
      for (let i = start[j]! + 1; i < start[j + 1]!; i++) if (labels[i] !== labels[start[j]!]) return false;
      return true;
    });
    columns.push({
      term: { name, start: first, size: levels.length, levels, between },
      column: (i) => first + index.get(labels[i]!)!,
      value: () => 1
    });
    p += levels.length;
  };

  if (factors.slot) addFactor('slot', (row) => (row.slot === null ? null : String(row.slot)));
  if (factors.machine)
    addFactor('machine', (row) => row.machine ?? observations.sessions[row.session]!.machine ?? null);
  if (factors.shift) addFactor('shift', (row) => observations.sessions[row.session]!.shift ?? null);

  let covariate: RunTable['covariate'] = null;
  if (factors.covariate === true) {
    const values = order.map((r) => kept(r).covariate);
    const missing = order.filter((_, i) => values[i] === undefined);
    if (missing.length > 0) {
      leftOut.push({ factor: 'covariate', reason: { tag: 'covariate-missing', rows: missing } });
    } else {
      const x = values as number[];
      const centre = x.reduce((s, v) => s + (v - x[0]!), 0) / n + x[0]!;
      const scale = Math.sqrt(x.reduce((s, v) => s + (v - centre) ** 2, 0) / n);
      if (scale <= Number.EPSILON * 8 * Math.max(...x.map(Math.abs))) {
        leftOut.push({ factor: 'covariate', reason: { tag: 'one-level', factor: 'covariate' } });
      } else {
        covariate = { centre, scale };
        const column = p;
        columns.push({
          term: { name: 'covariate', start: p, size: 1, levels: ['covariate'], between: false },
          column: () => column,
          value: (i) => (x[i]! - centre) / scale
        });
        p += 1;
      }
    }
  }

  const width = columns.length;
  const column = new Int32Array(n * width);
  const value = new Float64Array(n * width);
  for (let i = 0; i < n; i++) {
    for (let f = 0; f < width; f++) {
      column[i * width + f] = columns[f]!.column(i);
      value[i * width + f] = columns[f]!.value(i);
    }
  }
  const readings = order.map((r) => kept(r).y);
  const centre = middle(readings);
  return {
    table: {
      n,
      b: sessionIndex.length,
      p,
      terms: columns.map((c) => c.term),
      width,
      start: Int32Array.from(start),
      sessionIndex: Int32Array.from(sessionIndex),
      rowIndex: Int32Array.from(order),
      column,
      value,
      y: Float64Array.from(readings, (v) => v - centre),
      centre,
      covariate,
      magnitude: readings.reduce((m, v) => Math.max(m, Math.abs(v)), 0)
    },
    leftOut
  };
}

/** A reading from the middle of the sorted list. */
function middle(readings: readonly number[]): number {
  if (readings.length === 0) return 0;
  return Float64Array.from(readings).sort()[readings.length >> 1]!;
}

/** Numbers by value, else by text. */
function compareLevels(a: string, b: string): number {
  const d = Number(a) - Number(b);
  return Number.isNaN(d) ? (a < b ? -1 : a > b ? 1 : 0) : d;
}
