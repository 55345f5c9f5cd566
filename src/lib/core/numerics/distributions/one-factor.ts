/** Correlations written as a product, ρ_ij ≈ λ_i·λ_j for i ≠ j. */
export interface OneFactor {
  /** λ, length m, each in (−1, 1). */
  readonly loadings: Float64Array;
  /** Largest |ρ_ij − λ_i·λ_j|. */
  readonly residual: number;
}

const LARGEST_LOADING = 0.9999;

/**
 * The one-factor structure nearest to a correlation matrix (least squares over the off-diagonal).
 *
 * Differences to a shared control have it exactly in balanced designs and when every session holds the control.
 *
 * @param correlation row-major m×m, ones on the diagonal
 * Cost: m² a sweep, few sweeps for large m.
 * Source: H. H. Harman & W. H. Jones (1966), Factor analysis by minimizing residuals, Psychometrika 31, 351–368.
 * Checked by: test/core/numerics/distributions/dunnett.test.ts
 */
export function fitOneFactor(correlation: Float64Array, m: number): OneFactor {
  const loadings = new Float64Array(m);
  if (m === 1) return { loadings, residual: 0 };
  if (m === 2) {
    const rho = correlation[1]!;
    loadings[0] = clip(Math.sqrt(Math.abs(rho)));
    loadings[1] = clip(Math.sign(rho) * Math.sqrt(Math.abs(rho)));
  } else {
    start(correlation, m, loadings);
    for (let sweep = 0; sweep < 20_000; sweep++) if (improve(correlation, m, loadings) < 1e-15) break;
  }
  let residual = 0;
  for (let i = 0; i < m; i++) {
    for (let j = 0; j < i; j++) {
      residual = Math.max(residual, Math.abs(correlation[i * m + j]! - loadings[i]! * loadings[j]!));
    }
  }
  return { loadings, residual };
}

function clip(loading: number): number {
  return Math.max(-LARGEST_LOADING, Math.min(LARGEST_LOADING, loading));
}

function start(correlation: Float64Array, m: number, loadings: Float64Array): void {
  let total = 0;
  for (let i = 0; i < m; i++) {
    let row = 0;
    for (let j = 0; j < m; j++) row += correlation[i * m + j]!;
    loadings[i] = row;
    total += Math.abs(row);
  }
  for (let i = 0; i < m; i++) loadings[i] = clip(loadings[i]! / Math.sqrt(total + 1e-300));
}

/** One round of exact minimisations over each λ in turn; returns the largest change. */
function improve(correlation: Float64Array, m: number, loadings: Float64Array): number {
  let change = 0;
  for (let i = 0; i < m; i++) {
    let top = 0;
    let bottom = 0;
    for (let j = 0; j < m; j++) {
      if (j === i) continue;
      top += correlation[i * m + j]! * loadings[j]!;
      bottom += loadings[j]! * loadings[j]!;
    }
    const next = bottom > 0 ? clip(top / bottom) : 0;
    change = Math.max(change, Math.abs(next - loadings[i]!));
    loadings[i] = next;
  }
  return change;
}
