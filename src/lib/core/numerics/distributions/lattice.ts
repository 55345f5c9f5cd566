const known = new Map<string, Int32Array>();

/**
 * Generating vector of a rank-1 lattice with n points, built component by component.
 *
 * Each component minimises the worst-case error of smooth periodic functions, −1 + (1/n) Σ_k Π_j (1 + γ·2π² B₂({k z_j/n})).
 *
 * @param n number of points, a prime
 * @param dimensions at least 0
 * Cost: n²/2 operations for each dimension, once.
 * Source: I. H. Sloan & A. V. Reztsov (2002), Component-by-component construction of good lattice rules, Math. Comp. 71,
 * 263–273. The weight γ = 0.2 favours functions that are nearly sums of functions of few variables.
 * Checked by: test/core/numerics/distributions/lattice.test.ts
 */
export function latticeVector(n: number, dimensions: number): Int32Array {
  const key = `${n} ${dimensions}`;
  let vector = known.get(key);
  if (!vector) known.set(key, (vector = build(n, dimensions)));
  return vector;
}

function build(n: number, dimensions: number): Int32Array {
  const kernel = Float64Array.from({ length: n }, (_, k) => {
    const x = k / n;
    return 0.2 * 2 * Math.PI * Math.PI * (x * x - x + 1 / 6);
  });
  const products = new Float64Array(n).fill(1);
  const vector = new Int32Array(dimensions);
  for (let d = 0; d < dimensions; d++) {
    let best = 1;
    let least = Infinity;
    // The lattice of z and that of n − z are mirror images.
    for (let z = 1; z <= n / 2; z++) {
      let error = 0;
      for (let k = 0; k < n; k++) error += products[k]! * kernel[(k * z) % n]!;
      if (error < least * (1 - 1e-12)) {
        least = error;
        best = z;
      }
      if (d === 0) break;
    }
    vector[d] = best;
    for (let k = 0; k < n; k++) products[k]! *= 1 + kernel[(k * best) % n]!;
  }
  return vector;
}
