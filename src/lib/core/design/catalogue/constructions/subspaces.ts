import type { FiniteField } from '../../../numerics/finite-field.ts';
import { allCombinations } from '../all-combinations.ts';

/** A vector over a finite field, one field element a coordinate. */
type Vector = readonly number[];

/**
 * Every m-dimensional subspace of GF(q)ⁿ, each as its q^m vectors (the zero vector first), by running through the
 * matrices in reduced row echelon form.
 *
 * @param field GF(q)
 * @param n dimension of the whole space
 * @param m dimension of the subspaces, 0 ≤ m ≤ n
 * Cost: n·q^m for each of the [n choose m]_q subspaces.
 *
 * Source: P. J. Cameron (1994), Combinatorics, section 9.2 (Gaussian coefficients through echelon forms).
 * Checked by: test/core/design/catalogue/constructions/finite-geometry.test.ts
 */
export function subspaces(field: FiniteField, n: number, m: number): Vector[][] {
  const q = field.order;
  const found: Vector[][] = [];
  for (const pivots of allCombinations(n, m)) {
    // The entries right of a row's pivot and not in a pivot column are free.
    const free: [row: number, column: number][] = [];
    pivots.forEach((pivot, row) => {
      for (let column = pivot + 1; column < n; column++) if (!pivots.includes(column)) free.push([row, column]);
    });
    const choices = q ** free.length;
    for (let choice = 0; choice < choices; choice++) {
      const rows = pivots.map((pivot) => Array.from({ length: n }, (_, column) => Number(column === pivot)));
      let rest = choice;
      for (const [row, column] of free) {
        rows[row]![column] = rest % q;
        rest = Math.floor(rest / q);
      }
      found.push(span(field, rows, n));
    }
  }
  return found;
}

/** All linear combinations of the rows. */
function span(field: FiniteField, rows: readonly Vector[], n: number): Vector[] {
  let vectors: Vector[] = [Array.from({ length: n }, () => 0)];
  for (const row of rows) {
    vectors = vectors.flatMap((vector) =>
      Array.from({ length: field.order }, (_, c) => vector.map((x, i) => field.add(x, field.multiply(c, row[i]!))))
    );
  }
  return vectors;
}
