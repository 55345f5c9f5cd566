import { fail, ok } from '../../result.ts';
import type { LettersLine } from '../comparison-result.ts';
import type { Section } from '../reason.ts';

/** Far more columns than any page can hold; only contrived patterns of differences come near. */
const MOST_COLUMNS = 2000;
const ALPHABET = 'abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ';

/**
 * Letters for treatments such that two share a letter exactly when they do not differ: insert-and-absorb, then sweep.
 *
 * @param ordered treatments in the order in which the letters shall run, best first
 * @param differs whether two treatments differ; symmetric
 * @returns a line for each treatment, in the order given; after z come A to Z, then numbers in brackets
 *
 * Cost: columns² for each differing pair; with nearly equal standard errors there are few columns.
 * Source: H.-P. Piepho (2004), An algorithm for a letter-based representation of all-pairwise comparisons, J. Comp.
 * Graph. Statist. 13, 456–466.
 * Checked by: test/core/analysis/comparisons/compact-letters.test.ts
 */
export function compactLetters(
  ordered: readonly number[],
  differs: (a: number, b: number) => boolean
): Section<LettersLine[]> {
  const n = ordered.length;
  let columns: boolean[][] = [new Array<boolean>(n).fill(true)];
  for (let i = 0; i < n; i++) {
    for (let j = i + 1; j < n; j++) {
      if (!differs(ordered[i]!, ordered[j]!)) continue;
      columns = insert(columns, i, j);
      if (columns.length > MOST_COLUMNS) return fail({ tag: 'too-large', have: columns.length, limit: MOST_COLUMNS });
    }
  }
  sweep(columns);
  const used = columns.filter((column) => column.some(Boolean)).sort(byFirstMembers);
  return ok(
    ordered.map((treatment, i) => ({
      treatment,
      letters: used.map((column, at) => (column[i] ? letter(at) : '')).join('')
    }))
  );
}

/** Splits every column that holds both, then drops columns contained in another. */
function insert(columns: readonly boolean[][], i: number, j: number): boolean[][] {
  const split: boolean[][] = [];
  const untouched: boolean[][] = [];
  for (const column of columns) {
    if (!column[i] || !column[j]) untouched.push(column);
    else split.push(without(column, i), without(column, j));
  }
  const kept = [...untouched];
  // Only the new columns can be contained in others: they have just shrunk.
  for (const [at, column] of split.entries()) {
    const inOther = (other: boolean[], order: number) =>
      order !== at && contains(other, column) && (order < at || !contains(column, other));
    if (!untouched.some((other) => contains(other, column)) && !split.some(inOther)) kept.push(column);
  }
  return kept;
}

function without(column: readonly boolean[], i: number): boolean[] {
  const copy = [...column];
  copy[i] = false;
  return copy;
}

function contains(outer: readonly boolean[], inner: readonly boolean[]): boolean {
  return inner.every((member, i) => !member || outer[i]);
}

/** Takes a letter off a treatment where every pair that it joins is joined by another column. */
function sweep(columns: boolean[][]): void {
  for (const column of columns) {
    for (let i = 0; i < column.length; i++) {
      if (!column[i]) continue;
      const needed = column.some(
        (member, j) => member && j !== i && !columns.some((other) => other !== column && other[i] && other[j])
      );
      const alone = !columns.some((other) => other !== column && other[i]);
      if (!needed && !alone) column[i] = false;
    }
  }
}

function byFirstMembers(a: readonly boolean[], b: readonly boolean[]): number {
  for (let i = 0; i < a.length; i++) if (a[i] !== b[i]) return a[i] ? -1 : 1;
  return 0;
}

function letter(at: number): string {
  return ALPHABET[at] ?? `[${at + 1}]`;
}
