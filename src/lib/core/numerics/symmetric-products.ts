/** Products of small dense symmetric matrices, row-major size×size. */

/** Returns A·B for square matrices. Cost: 2·size³ operations. */
export function multiply(a: Float64Array, b: Float64Array, size: number): Float64Array {
  const out = new Float64Array(size * size);
  for (let i = 0; i < size; i++) {
    const row = out.subarray(i * size, (i + 1) * size);
    for (let k = 0; k < size; k++) {
      const f = a[i * size + k]!;
      if (f === 0) continue;
      const o = k * size;
      for (let j = 0; j < size; j++) row[j]! += f * b[o + j]!;
    }
  }
  return out;
}

/** Returns S·A·S for symmetric S and A; the result is symmetric to the last bit. Cost: 3·size³ operations. */
export function sandwich(s: Float64Array, a: Float64Array, size: number): Float64Array {
  const half = multiply(a, s, size);
  const out = new Float64Array(size * size);
  // out[i][j] = Σ_k s[i][k]·half[k][j]; the lower triangle is computed and mirrored.
  for (let i = 0; i < size; i++) {
    const o = i * size;
    for (let k = 0; k < size; k++) {
      const f = s[o + k]!;
      if (f === 0) continue;
      const h = k * size;
      for (let j = 0; j <= i; j++) out[o + j]! += f * half[h + j]!;
    }
    for (let j = 0; j < i; j++) out[j * size + i] = out[o + j]!;
  }
  return out;
}

/** Returns trace(A·B) for symmetric A and B: the sum of the products of their elements. */
export function traceOfProduct(a: Float64Array, b: Float64Array): number {
  let s = 0;
  for (let i = 0; i < a.length; i++) s += a[i]! * b[i]!;
  return s;
}

/** Returns A·x for a square matrix. */
export function multiplyVector(a: Float64Array, x: Float64Array): Float64Array {
  const size = x.length;
  const out = new Float64Array(size);
  for (let i = 0; i < size; i++) {
    let s = 0;
    for (let j = 0; j < size; j++) s += a[i * size + j]! * x[j]!;
    out[i] = s;
  }
  return out;
}

/** Returns xᵀy. */
export function dot(x: Float64Array, y: Float64Array): number {
  let s = 0;
  for (let i = 0; i < x.length; i++) s += x[i]! * y[i]!;
  return s;
}

/** Returns lᵀ·A·l. */
export function quadraticForm(a: Float64Array, l: Float64Array): number {
  const size = l.length;
  let s = 0;
  for (let i = 0; i < size; i++) {
    const f = l[i]!;
    if (f === 0) continue;
    for (let j = 0; j < size; j++) s += f * a[i * size + j]! * l[j]!;
  }
  return s;
}
