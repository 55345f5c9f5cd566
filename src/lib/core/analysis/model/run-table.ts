/** Name of a fixed effect of the model. */
export type TermName = 'treatment' | 'slot' | 'machine' | 'shift' | 'covariate' | 'order';

/** A fixed effect: columns start … start + size − 1 of the model matrix, one a level (a quantity has one). */
export interface Term {
  name: TermName;
  start: number;
  size: number;
  levels: string[];
  /** Constant inside every session, so that it goes with the sessions when these are fixed. */
  between: boolean;
  /** A quantity stands in its column as (x − centre) / scale; null for a factor. */
  scaling: { centre: number; scale: number } | null;
}

/**
 * The kept runs as a sparse model matrix, sorted by session, readings less a centre. Every run has `width` entries, one a
 * term; all levels have a column (columns that depend on others are left out when a matrix is factorised).
 */
export interface RunTable {
  /** Runs. */
  n: number;
  /** Sessions with a kept run. */
  b: number;
  /** Columns of the model matrix. */
  p: number;
  terms: Term[];
  width: number;
  /** Length b + 1: runs of session j are start[j] … start[j+1] − 1. */
  start: Int32Array;
  /** Position of session j in the input. */
  sessionIndex: Int32Array;
  /** Position of each run in the input rows. */
  rowIndex: Int32Array;
  /** n×width: column and value of each entry. */
  column: Int32Array;
  value: Float64Array;
  /** Readings less `centre`. */
  y: Float64Array;
  centre: number;
  /** Largest absolute reading as typed: rounding noise is measured against it. */
  magnitude: number;
}

/** Returns the term of that name, or undefined. */
export function termOf(table: RunTable, name: TermName): Term | undefined {
  return table.terms.find((term) => term.name === name);
}

/** Returns the treatment of each run (the treatment is the first term, its columns come first). */
export function treatmentOfRun(table: RunTable, run: number): number {
  return table.column[run * table.width]!;
}

/**
 * Returns the table without the terms that are constant inside every session: the model with sessions fixed holds them
 * already. The same table where there are none.
 */
export function withoutBetween(table: RunTable): RunTable {
  if (!table.terms.some((term) => term.between)) return table;
  const keep = table.terms.flatMap((term, f) => (term.between ? [] : [f]));
  const width = keep.length;
  const column = new Int32Array(table.n * width);
  const value = new Float64Array(table.n * width);
  const terms: Term[] = [];
  let p = 0;
  keep.forEach((f, place) => {
    const term = table.terms[f]!;
    for (let i = 0; i < table.n; i++) {
      column[i * width + place] = table.column[i * table.width + f]! - term.start + p;
      value[i * width + place] = table.value[i * table.width + f]!;
    }
    terms.push({ ...term, start: p });
    p += term.size;
  });
  return { ...table, p, terms, width, column, value };
}
