import type { FactorChoice, ObservationRow, Observations } from '../observations.ts';
import type { Reason } from '../reason.ts';
import type { Term, TermName } from './run-table.ts';

/** A row that counts: kept and read. */
export type KeptRow = ObservationRow & { y: number };

/** A chosen factor that could not be used. */
export interface LeftOut {
  factor: TermName;
  reason: Reason;
}

/** A term with the entry that each run has in its columns. */
export interface TermColumns {
  term: Term;
  column: Int32Array;
  value: Float64Array;
}

/** The kept rows in the order of the table, and the first run of each session. */
export interface OrderedRows {
  rows: readonly KeptRow[];
  rowIndex: readonly number[];
  start: readonly number[];
}

const ones = (n: number): Float64Array => new Float64Array(n).fill(1);

/** The treatments: one column for every treatment of the campaign, with or without readings. */
export function treatmentColumns(observations: Observations, { rows }: OrderedRows): TermColumns {
  const levels = observations.treatments.map((t) => t.id);
  return {
    term: { name: 'treatment', start: 0, size: levels.length, levels, between: false, scaling: null },
    column: Int32Array.from(rows, (row) => row.treatment),
    value: ones(rows.length)
  };
}

/** How the level of each chosen factor is read from a row; null where it is not known. */
export function levelReaders(
  observations: Observations,
  factors: FactorChoice
): { name: TermName; read: (row: KeptRow) => string | null }[] {
  const session = (row: KeptRow) => observations.sessions[row.session]!;
  const readers: { name: TermName; chosen: boolean; read: (row: KeptRow) => string | null }[] = [
    { name: 'slot', chosen: factors.slot, read: (row) => (row.slot === null ? null : String(row.slot)) },
    { name: 'machine', chosen: factors.machine, read: (row) => row.machine ?? session(row).machine ?? null },
    { name: 'shift', chosen: factors.shift, read: (row) => session(row).shift ?? null }
  ];
  return readers.filter((reader) => reader.chosen);
}

/** One column a level of a factor, from column `first` on; or why it cannot be used. */
export function factorColumns(
  name: TermName,
  read: (row: KeptRow) => string | null,
  ordered: OrderedRows,
  first: number
): TermColumns | LeftOut {
  const { rows, rowIndex } = ordered;
  const labels = rows.map(read);
  const missing = rowIndex.filter((_, i) => labels[i] === null);
  if (missing.length > 0) {
    const reason: Reason =
      name === 'slot' ? { tag: 'no-slots' } : { tag: 'level-missing', factor: name, rows: missing };
    return { factor: name, reason };
  }
  const levels = [...new Set(labels as string[])].sort(compareLevels);
  if (levels.length < 2) return { factor: name, reason: { tag: 'one-level', factor: name } };
  const index = new Map(levels.map((level, i) => [level, i]));
  const column = Int32Array.from(labels as string[], (label) => first + index.get(label)!);
  const between = constantInside(ordered, (i) => column[i]!);
  return {
    term: { name, start: first, size: levels.length, levels, between, scaling: null },
    column,
    value: ones(rows.length)
  };
}

/** One column of a measured quantity, centred and scaled to unit spread; or why it cannot be used. */
export function quantityColumn(
  name: TermName,
  read: (row: KeptRow) => number | undefined,
  ordered: OrderedRows,
  first: number
): TermColumns | LeftOut {
  const { rows, rowIndex } = ordered;
  const values = rows.map(read);
  const missing = rowIndex.filter((_, i) => values[i] === undefined);
  if (missing.length > 0) return { factor: name, reason: { tag: 'covariate-missing', rows: missing } };
  const x = values as number[];
  const from = x[0] ?? 0;
  const centre = from + x.reduce((s, v) => s + (v - from), 0) / x.length;
  const scale = Math.sqrt(x.reduce((s, v) => s + (v - centre) ** 2, 0) / x.length);
  const noise = 8 * Number.EPSILON * x.reduce((m, v) => Math.max(m, Math.abs(v)), 0);
  if (!(scale > noise)) return { factor: name, reason: { tag: 'one-level', factor: name } };
  const between = constantInside(ordered, (i) => x[i]!);
  return {
    term: { name, start: first, size: 1, levels: [name], between, scaling: { centre, scale } },
    column: new Int32Array(x.length).fill(first),
    value: Float64Array.from(x, (v) => (v - centre) / scale)
  };
}

function constantInside({ start }: OrderedRows, at: (run: number) => number): boolean {
  for (let j = 0; j + 1 < start.length; j++) {
    for (let i = start[j]! + 1; i < start[j + 1]!; i++) if (at(i) !== at(start[j]!)) return false;
  }
  return true;
}

/** Numbers by value, else by text. */
function compareLevels(a: string, b: string): number {
  const d = Number(a) - Number(b);
  return Number.isNaN(d) ? (a < b ? -1 : a > b ? 1 : 0) : d;
}
