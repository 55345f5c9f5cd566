/** Correlations split in a common factor and a residual: ρ = λ·λᵀ + L·Lᵀ. */
export interface ResidualFactor {
  /** λ, length m: the wanted loadings, shrunk as far as needed for the residual to be a covariance. */
  readonly loadings: Float64Array;
  /** Lower triangle L, row-major m×m; zero pivots where a variable depends on those before it. */
  readonly L: Float64Array;
}

const ZERO = 1e-9;

/**
 * Splits a correlation matrix in a common factor and the Cholesky factor of what it leaves.
 *
 * @param correlation row-major m×m, positive semidefinite
 * @param wanted loadings to take off, length m
 * Cost: m³/6, a few times where the loadings must be shrunk.
 * Checked by: test/core/numerics/distributions/dunnett.test.ts
 */
export function residualFactor(correlation: Float64Array, m: number, wanted: Float64Array): ResidualFactor {
  for (let attempt = 0; attempt <= 40; attempt++) {
    const shrink = attempt === 40 ? 0 : 0.97 ** attempt;
    const loadings = wanted.map((l) => l * shrink);
    const L = factor(correlation, m, loadings);
    if (L) return { loadings, L };
  }
  throw new Error(`residualFactor: the ${m}×${m} correlation matrix is not positive semidefinite`);
}

function factor(correlation: Float64Array, m: number, loadings: Float64Array): Float64Array | null {
  const L = new Float64Array(m * m);
  for (let i = 0; i < m; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = correlation[i * m + j]! - loadings[i]! * loadings[j]!;
      for (let k = 0; k < j; k++) sum -= L[i * m + k]! * L[j * m + k]!;
      if (i === j) {
        if (sum < -ZERO) return null;
        L[i * m + i] = sum > ZERO ? Math.sqrt(sum) : 0;
      } else {
        const pivot = L[j * m + j]!;
        if (pivot > 0) L[i * m + j] = sum / pivot;
        else if (Math.abs(sum) > 1e-6) return null;
      }
    }
  }
  return L;
}
