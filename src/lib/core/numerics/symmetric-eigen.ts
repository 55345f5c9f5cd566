import { EigenvalueDecomposition, Matrix } from 'ml-matrix';

export interface SymmetricEigen {
  /** Ascending. */
  values: Float64Array;
  /** Row-major size×size; row i is the unit vector that belongs to values[i]. */
  vectors: Float64Array;
}

/**
 * Returns eigenvalues and eigenvectors of a symmetric matrix.
 *
 * @param a row-major size×size
 *
 * Cost: about 10·size³ operations.
 *
 * Source: ml-matrix (Householder reduction and implicit QL).
 * Checked by: test/core/numerics/symmetric-eigen.test.ts
 */
export function symmetricEigen(a: Float64Array, size: number): SymmetricEigen {
  if (a.length !== size * size) throw new RangeError(`symmetricEigen: ${a.length} values, not ${size}×${size}`);
  if (size === 0) return { values: new Float64Array(0), vectors: new Float64Array(0) };
  // Scaled by a power of two (exactly), so that no square overflows; entries far below the rounding of the largest would
  // only feed subnormal numbers to the reduction, which costs it its orthogonality.
  const largest = a.reduce((most, x) => Math.max(most, Math.abs(x)), 0);
  const scale = largest > 0 ? 2 ** Math.min(1000, -Math.floor(Math.log2(largest))) : 1;
  const m = Matrix.from1DArray(
    size,
    size,
    a.map((x) => (Math.abs(x) > 1e-40 * largest ? x * scale : 0))
  );
  const { realEigenvalues, eigenvectorMatrix } = new EigenvalueDecomposition(m, { assumeSymmetric: true });
  const order = realEigenvalues.map((_, i) => i).sort((i, j) => realEigenvalues[i]! - realEigenvalues[j]!);
  const values = new Float64Array(size);
  const vectors = new Float64Array(size * size);
  for (let i = 0; i < size; i++) {
    const from = order[i]!;
    values[i] = realEigenvalues[from]! / scale;
    for (let k = 0; k < size; k++) vectors[i * size + k] = eigenvectorMatrix.get(k, from);
  }
  return { values, vectors };
}
