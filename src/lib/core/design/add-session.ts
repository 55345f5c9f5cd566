/**
 * Adds one session to a connected design: changes C⁺ in place into that of the larger design.
 *
 * With `P = I − J/k` the session adds `E P Eᵀ` to C, E the k unit columns of its treatments, so that
 * `C⁺ ← C⁺ − W (I + P G P)⁻¹ Wᵀ`, `W = C⁺ E P`, `G = Eᵀ C⁺ E`; all of it stays orthogonal to the constant vector.
 *
 * @param inverse C⁺, t·t, of a connected design
 * @param t number of treatments
 * @param block treatments of the session; one may be there twice
 *
 * Cost: t² k.
 *
 * **Source**: Woodbury (1950), Inverting modified matrices; Meyer (1973), Generalized inversion of modified matrices, case
 * of columns inside the range.
 * **Checked by** test/core/design/information.test.ts
 */
export function addSession(inverse: Float64Array, t: number, block: readonly number[]): void {
  const k = block.length;
  if (k < 2) return;
  const w = new Float64Array(t * k);
  for (let i = 0; i < t; i++) {
    let mean = 0;
    for (let a = 0; a < k; a++) mean += w[i * k + a] = inverse[i * t + block[a]!]!;
    mean /= k;
    for (let a = 0; a < k; a++) w[i * k + a]! -= mean;
  }
  // I + P G P = L Lᵀ.
  const columnMean = new Float64Array(k);
  for (let a = 0; a < k; a++) for (let c = 0; c < k; c++) columnMean[a]! += w[block[c]! * k + a]! / k;
  const l = new Float64Array(k * k);
  for (let a = 0; a < k; a++) {
    for (let b = 0; b <= a; b++) {
      let sum = w[block[a]! * k + b]! - columnMean[b]! + (a === b ? 1 : 0);
      for (let m = 0; m < b; m++) sum -= l[a * k + m]! * l[b * k + m]!;
      l[a * k + b] = a === b ? Math.sqrt(sum) : sum / l[b * k + b]!;
    }
  }
  // Each row of W becomes that of W L⁻ᵀ.
  for (let i = 0; i < t; i++) {
    for (let a = 0; a < k; a++) {
      let sum = w[i * k + a]!;
      for (let m = 0; m < a; m++) sum -= l[a * k + m]! * w[i * k + m]!;
      w[i * k + a] = sum / l[a * k + a]!;
    }
  }
  for (let i = 0; i < t; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = inverse[i * t + j]!;
      for (let a = 0; a < k; a++) sum -= w[i * k + a]! * w[j * k + a]!;
      inverse[i * t + j] = inverse[j * t + i] = sum;
    }
  }
}
