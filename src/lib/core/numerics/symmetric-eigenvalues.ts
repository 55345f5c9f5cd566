/**
 * Returns the eigenvalues of a symmetric matrix, ascending, by cyclic Jacobi rotations.
 *
 * Sweeps until the off-diagonal sum of squares is below 1e-30 of the whole, or 60 sweeps.
 *
 * @param matrix n·n values, row by row; only its symmetric part counts; it is not changed
 * @param n order
 *
 * Cost: about 10 n³.
 *
 * **Source**: Golub & Van Loan (2013), Matrix Computations, 4th ed., section 8.5.
 * **Checked by** test/core/design/information.test.ts
 */
export function symmetricEigenvalues(matrix: Float64Array, n: number): Float64Array {
  if (matrix.length !== n * n) throw new RangeError(`symmetricEigenvalues: ${matrix.length} values, not ${n}×${n}`);
  const a = Float64Array.from(matrix);
  let total = 0;
  for (const value of a) total += value * value;
  for (let sweep = 0; sweep < 60; sweep++) {
    let off = 0;
    for (let i = 0; i < n; i++) for (let j = 0; j < i; j++) off += 2 * a[i * n + j]! ** 2;
    if (off <= 1e-30 * total) break;
    for (let p = 0; p < n - 1; p++) for (let q = p + 1; q < n; q++) rotate(a, n, p, q);
  }
  return Float64Array.from({ length: n }, (_, i) => a[i * n + i]!).sort();
}

/** One Jacobi rotation that makes a[p][q] zero. */
function rotate(a: Float64Array, n: number, p: number, q: number): void {
  const apq = a[p * n + q]!;
  if (apq === 0) return;
  const tau = (a[q * n + q]! - a[p * n + p]!) / (2 * apq);
  const t = (tau >= 0 ? 1 : -1) / (Math.abs(tau) + Math.sqrt(1 + tau * tau));
  const c = 1 / Math.sqrt(1 + t * t);
  const s = t * c;
  for (let i = 0; i < n; i++) {
    const aip = a[i * n + p]!;
    const aiq = a[i * n + q]!;
    a[i * n + p] = c * aip - s * aiq;
    a[i * n + q] = s * aip + c * aiq;
  }
  for (let i = 0; i < n; i++) {
    const api = a[p * n + i]!;
    const aqi = a[q * n + i]!;
    a[p * n + i] = c * api - s * aqi;
    a[q * n + i] = s * api + c * aqi;
  }
}
