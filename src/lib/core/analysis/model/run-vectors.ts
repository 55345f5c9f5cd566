import type { RunTable } from './run-table.ts';

/** Operations on vectors with one element a run (length n) or a session (length b). */

/** Returns X·beta, length n. */
export function fittedBy(table: RunTable, beta: Float64Array): Float64Array {
  const { n, width, column, value } = table;
  const out = new Float64Array(n);
  for (let i = 0; i < n; i++) {
    let s = 0;
    for (let e = i * width; e < (i + 1) * width; e++) s += value[e]! * beta[column[e]!]!;
    out[i] = s;
  }
  return out;
}

/** Returns Xᵀ·v, length p. */
export function transposeTimes(table: RunTable, v: Float64Array): Float64Array {
  const { n, p, width, column, value } = table;
  const out = new Float64Array(p);
  for (let i = 0; i < n; i++) {
    const f = v[i]!;
    for (let e = i * width; e < (i + 1) * width; e++) out[column[e]!]! += value[e]! * f;
  }
  return out;
}

/** Returns the session means of v, length b. */
export function sessionMeans(table: RunTable, v: Float64Array): Float64Array {
  const { b, start } = table;
  const out = new Float64Array(b);
  for (let j = 0; j < b; j++) {
    let s = 0;
    for (let i = start[j]!; i < start[j + 1]!; i++) s += v[i]!;
    out[j] = s / (start[j + 1]! - start[j]!);
  }
  return out;
}

/** Returns v less the mean of its session. */
export function lessSessionMeans(table: RunTable, v: Float64Array): Float64Array {
  const means = sessionMeans(table, v);
  const out = v.slice();
  for (let j = 0; j < table.b; j++) {
    for (let i = table.start[j]!; i < table.start[j + 1]!; i++) out[i]! -= means[j]!;
  }
  return out;
}

/** Returns the vector with session value u[j] at each run of session j. */
export function spread(table: RunTable, u: Float64Array): Float64Array {
  const out = new Float64Array(table.n);
  for (let j = 0; j < table.b; j++) out.fill(u[j]!, table.start[j]!, table.start[j + 1]!);
  return out;
}

/** Returns Σ v². */
export function sumOfSquares(v: Float64Array): number {
  let s = 0;
  for (let i = 0; i < v.length; i++) s += v[i]! * v[i]!;
  return s;
}
