import { Matrix } from 'ml-matrix';
import type { RunTable } from '#lib/core/analysis/model/run-table.ts';
import { observations } from './kept-model.ts';

/** The model matrix written out, n×p. */
export function modelMatrix(table: RunTable): Matrix {
  const X = Matrix.zeros(table.n, table.p);
  for (let i = 0; i < table.n; i++) {
    for (let e = i * table.width; e < (i + 1) * table.width; e++) {
      X.set(i, table.column[e]!, X.get(i, table.column[e]!) + table.value[e]!);
    }
  }
  return X;
}

/** The sessions of the runs, n×b. */
export function sessionMatrix(table: RunTable): Matrix {
  const Z = Matrix.zeros(table.n, table.b);
  for (let j = 0; j < table.b; j++) for (let i = table.start[j]!; i < table.start[j + 1]!; i++) Z.set(i, j, 1);
  return Z;
}

/** Chosen columns of a matrix. */
export function columnsOf(A: Matrix, columns: readonly number[]): Matrix {
  return A.subMatrixColumn([...columns]);
}

/** The largest difference between a row-major array and a matrix, over the largest entry. */
export function distance(actual: Float64Array, wanted: Matrix): number {
  const flat = wanted.to1DArray();
  if (flat.length !== actual.length) throw new Error(`distance: ${actual.length} values, expected ${flat.length}`);
  const size = flat.reduce((most, v) => Math.max(most, Math.abs(v)), 1e-300);
  return flat.reduce((most, v, i) => Math.max(most, Math.abs(v - actual[i]!)), 0) / size;
}

/** Sessions of unequal size with repeated treatments and uneven slots: no special structure to lean on. */
export const irregular = observations(
  [
    [0, 1, 2],
    [0, 3, 4, 1],
    [2, 3],
    [4, 0, 0],
    [1, 2, 4, 3],
    [3, 1]
  ].flatMap((session, j) =>
    session.map((i, slot) => [i, j, 20 + 2 * i + 3 * Math.sin(j) + Math.cos(7 * i + 3 * j + slot), slot] as const)
  ),
  { factors: { slot: true, machine: false, shift: false } }
);
