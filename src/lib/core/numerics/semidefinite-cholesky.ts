/** Cholesky factor of a symmetric matrix that may lack full rank: L·Lᵀ over the columns that were kept. */
export interface SemidefiniteFactor {
  size: number;
  rank: number;
  /** Lower triangle, row-major size×size; columns of dropped indices are zero. */
  L: Float64Array;
  /** 1 where the index was kept. */
  kept: Uint8Array;
  /** log of the determinant of the kept part. */
  logDet: number;
}

/** Relative size of a pivot below which its column depends on the columns before it. */
export const RANK_TOLERANCE = 1e-10;

/**
 * Factorises a symmetric positive semidefinite matrix column by column, leaving out each column that depends on those
 * before it: A[K,K] = L·Lᵀ over the kept indices K.
 *
 * @param a row-major size×size, only the lower triangle is read; not changed
 * @param scale what a pivot is measured against, length size; the diagonal of `a` if left out. Where `a` is itself a
 *   difference (sessions eliminated), hand in the diagonal before the subtraction, so that rounding noise counts as zero
 * @param tolerance a pivot of at most tolerance × scale counts as zero
 * @returns the factor; a zero matrix has rank 0
 *
 * Cost: size³/3 operations.
 *
 * Source: G. H. Golub & C. F. Van Loan (2013), Matrix Computations, 4th ed., §4.2 (row version, without pivoting).
 * Checked by: test/core/numerics/semidefinite-cholesky.test.ts
 */
export function factorSemidefinite(
  a: Float64Array,
  size: number,
  scale?: Float64Array,
  tolerance = RANK_TOLERANCE
): SemidefiniteFactor {
  if (a.length !== size * size) {
    throw new Error(`factorSemidefinite: expected ${size}×${size} = ${size * size} numbers, got ${a.length}`);
  }
  const L = new Float64Array(size * size);
  const kept = new Uint8Array(size);
  let rank = 0;
  let logDet = 0;
  for (let i = 0; i < size; i++) {
    const ri = i * size;
    let pivot = a[ri + i]!;
    for (let j = 0; j < i; j++) {
      if (kept[j] === 0) continue;
      const rj = j * size;
      let s = a[ri + j]!;
      for (let m = 0; m < j; m++) s -= L[ri + m]! * L[rj + m]!;
      const l = s / L[rj + j]!;
      L[ri + j] = l;
      pivot -= l * l;
    }
    if (pivot > 0 && pivot > tolerance * (scale === undefined ? a[ri + i]! : scale[i]!)) {
      kept[i] = 1;
      L[ri + i] = Math.sqrt(pivot);
      logDet += Math.log(pivot);
      rank++;
    } else {
      // The row stays: it is how the dropped column depends on the kept ones (see nullVectors).
      L[ri + i] = 0;
    }
  }
  return { size, rank, L, kept, logDet };
}

/**
 * Solves A·x = b for consistent b, with zeros at the dropped indices.
 *
 * @param b right-hand side, length size
 * @returns x, length size
 */
export function solveSemidefinite(factor: SemidefiniteFactor, b: Float64Array): Float64Array {
  const { size } = factor;
  if (b.length !== size) throw new Error(`solveSemidefinite: L is ${size}×${size} but b has ${b.length}`);
  return backward(factor, forwardSemidefinite(factor, b));
}

/** Solves L·z = b over the kept indices; zeros elsewhere. Sums of squares of z are sequential sums of squares. */
export function forwardSemidefinite(factor: SemidefiniteFactor, b: Float64Array): Float64Array {
  const { size, L, kept } = factor;
  const z = new Float64Array(size);
  for (let i = 0; i < size; i++) {
    if (kept[i] === 0) continue;
    let s = b[i]!;
    for (let m = 0; m < i; m++) s -= L[i * size + m]! * z[m]!;
    z[i] = s / L[i * size + i]!;
  }
  return z;
}

function backward(factor: SemidefiniteFactor, z: Float64Array): Float64Array {
  const { size, L, kept } = factor;
  const x = z.slice();
  for (let i = size - 1; i >= 0; i--) {
    if (kept[i] === 0) {
      x[i] = 0;
      continue;
    }
    const xi = x[i]! / L[i * size + i]!;
    x[i] = xi;
    for (let m = 0; m < i; m++) x[m]! -= L[i * size + m]! * xi;
  }
  return x;
}

/**
 * Returns the reflexive generalised inverse that belongs to the factor: (L·Lᵀ)⁻¹ on the kept indices, zero elsewhere.
 *
 * @returns row-major size×size, both triangles filled
 *
 * Cost: 2·size³/3 operations.
 */
export function inverseSemidefinite(factor: SemidefiniteFactor): Float64Array {
  const { size, L, kept } = factor;
  // Rows of `t` are the columns of L⁻¹, so that every inner loop runs along memory.
  const t = new Float64Array(size * size);
  for (let c = 0; c < size; c++) {
    if (kept[c] === 0) continue;
    const rc = c * size;
    t[rc + c] = 1 / L[rc + c]!;
    for (let i = c + 1; i < size; i++) {
      if (kept[i] === 0) continue;
      const ri = i * size;
      let s = 0;
      for (let m = c; m < i; m++) s += L[ri + m]! * t[rc + m]!;
      t[rc + i] = -s / L[ri + i]!;
    }
  }
  const inverse = new Float64Array(size * size);
  for (let i = 0; i < size; i++) {
    for (let j = 0; j <= i; j++) {
      let s = 0;
      for (let m = i; m < size; m++) s += t[i * size + m]! * t[j * size + m]!;
      inverse[i * size + j] = s;
      inverse[j * size + i] = s;
    }
  }
  return inverse;
}

/**
 * Returns a basis of the null space: for each dropped index one vector with 1 there, and the kept indices filled so that
 * A·v = 0. A linear function l of the parameters is estimable when l·v = 0 for all of them.
 */
export function nullVectors(factor: SemidefiniteFactor): Float64Array[] {
  const { size, L, kept } = factor;
  const vectors: Float64Array[] = [];
  for (let d = 0; d < size; d++) {
    if (kept[d] === 1) continue;
    // Row d of L holds L⁻¹·A[K,d] for the kept indices before d; later ones do not take part.
    const z = new Float64Array(size);
    for (let m = 0; m < d; m++) if (kept[m] === 1) z[m] = -L[d * size + m]!;
    const v = backward(factor, z);
    v[d] = 1;
    vectors.push(v);
  }
  return vectors;
}
