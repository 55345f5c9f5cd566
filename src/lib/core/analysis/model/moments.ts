import type { RunTable } from './run-table.ts';

/**
 * Sums of squares and products of the model matrix X, split into the part inside sessions and, for each session size k, the
 * part between sessions: XᵀX = within + Σ_k between_k. Everything later is p×p; nothing is ever n×n.
 */
export interface Moments {
  p: number;
  /** Σ_j X_jᵀ(I − 11ᵀ/k_j)X_j, row-major p×p. */
  within: Float64Array;
  /** diag(XᵀX): what pivots of `within` are measured against. */
  diagonal: Float64Array;
  bySize: SizeMoments[];
  /** Position in `bySize` of each session's size. */
  sizeOf: Int32Array;
}

export interface SizeMoments {
  /** Session size. */
  k: number;
  /** Sessions of that size. */
  count: number;
  /** Σ x_j·x_jᵀ / k over the sessions of that size, x_j the column sums of X_j; row-major p×p. */
  between: Float64Array;
}

/**
 * Returns the moments of a model matrix. Cost: n·k·width² + (sizes)·p².
 *
 * Checked by: test/core/analysis/model/moments.test.ts
 */
export function momentsOf(table: RunTable): Moments {
  const { p, b, width, start, column, value } = table;
  const total = new Float64Array(p * p);
  const bySize: SizeMoments[] = [];
  const place = new Map<number, number>();
  const sizeOf = new Int32Array(b);
  for (let j = 0; j < b; j++) {
    const k = start[j + 1]! - start[j]!;
    let s = place.get(k);
    if (s === undefined) {
      s = bySize.length;
      place.set(k, s);
      bySize.push({ k, count: 0, between: new Float64Array(p * p) });
    }
    sizeOf[j] = s;
    const size = bySize[s]!;
    size.count++;
    const from = start[j]! * width;
    const to = start[j + 1]! * width;
    for (let e = from; e < to; e++) {
      const row = column[e]! * p;
      const v = value[e]!;
      for (let f = from; f < to; f++) size.between[row + column[f]!]! += v * value[f]!;
    }
    for (let i = start[j]!; i < start[j + 1]!; i++) {
      for (let e = i * width; e < (i + 1) * width; e++) {
        for (let f = i * width; f < (i + 1) * width; f++) total[column[e]! * p + column[f]!]! += value[e]! * value[f]!;
      }
    }
  }
  for (const { k, between } of bySize) for (let i = 0; i < between.length; i++) between[i]! /= k;
  const within = total.slice();
  for (const { between } of bySize) for (let i = 0; i < within.length; i++) within[i]! -= between[i]!;
  return { p, within, diagonal: Float64Array.from({ length: p }, (_, i) => total[i * p + i]!), bySize, sizeOf };
}

/** Returns XᵀX, put together again from its parts. */
export function crossProduct(moments: Moments): Float64Array {
  const out = moments.within.slice();
  for (const { between } of moments.bySize) for (let i = 0; i < out.length; i++) out[i]! += between[i]!;
  return out;
}
