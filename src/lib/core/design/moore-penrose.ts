/**
 * Returns the Moore–Penrose inverse of the information matrix of a connected design, or undefined when it is not
 * connected.
 *
 * `C⁺ = (C + (s/t) 1 1ᵀ)⁻¹ − 1/(s t) 1 1ᵀ` with s the mean diagonal of C: the added part only shifts the zero eigenvalue
 * of the constant vector to s. Factorised by Cholesky; a pivot at or below 1e-10 of s means rank below t − 1.
 *
 * @param c information matrix, t·t
 * @param t number of treatments
 *
 * Cost: t³.
 *
 * **Source**: John & Williams (1995), Cyclic and Computer Generated Designs, 2nd ed., section 1.4.
 * **Checked by** test/core/design/information.test.ts
 */
export function moorePenrose(c: Float64Array, t: number): Float64Array | undefined {
  let trace = 0;
  for (let i = 0; i < t; i++) trace += c[i * t + i]!;
  const s = trace / t;
  if (!(s > 0)) return t === 1 ? new Float64Array(1) : undefined;
  const l = new Float64Array(t * t);
  for (let i = 0; i < t; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = c[i * t + j]! + s / t;
      for (let m = 0; m < j; m++) sum -= l[i * t + m]! * l[j * t + m]!;
      if (i > j) l[i * t + j] = sum / l[j * t + j]!;
      else if (sum > 1e-10 * s) l[i * t + i] = Math.sqrt(sum);
      else return undefined;
    }
  }
  // X = L⁻ᵀ in rows, so that every sum runs along a row of both; then (L Lᵀ)⁻¹ = X Xᵀ.
  const x = new Float64Array(t * t);
  for (let j = 0; j < t; j++) {
    x[j * t + j] = 1 / l[j * t + j]!;
    for (let i = j + 1; i < t; i++) {
      let sum = 0;
      for (let m = j; m < i; m++) sum += l[i * t + m]! * x[j * t + m]!;
      x[j * t + i] = -sum / l[i * t + i]!;
    }
  }
  const inverse = l;
  for (let i = 0; i < t; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = -1 / (s * t);
      for (let m = i; m < t; m++) sum += x[i * t + m]! * x[j * t + m]!;
      inverse[i * t + j] = inverse[j * t + i] = sum;
    }
  }
  return inverse;
}
