import { inverseSemidefinite } from '../../numerics/semidefinite-cholesky.ts';
import type { RatioFit, SessionTable } from './session-moments.ts';

/**
 * How far each reading lies from what all the others predict for it, in standard errors (externally studentised, with
 * n − t − 1 degrees of freedom); 0 where the others say nothing.
 *
 * t_r = (Py)_r / (σ̂_(r) √P_rr) with P = V⁻¹ − V⁻¹X(XᵀV⁻¹X)⁻XᵀV⁻¹: its row is the reading less its prediction, over
 * the variance of that difference.
 *
 * Cost: t³ and k² for each reading.
 * Source: J. Haslett & K. Hayes (1998), Residuals for the linear model with general covariance structure, JRSS B 60,
 * 201–215.
 * Checked by: test/core/analysis/surprise/running-model.test.ts
 */
export function leftOutDeviations(table: SessionTable, fit: RatioFit): Float64Array {
  const { n, treatment, start } = table;
  const t = table.place.size;
  const deviations = new Float64Array(n);
  const df = n - t;
  if (df < 2) return deviations;
  const variance = fit.squares / df;
  const inverse = inverseSemidefinite(fit.factor);
  for (let j = 0; j + 1 < start.length; j++) {
    const c = fit.shrink[j]!;
    for (let row = start[j]!; row < start[j + 1]!; row++) {
      const i = treatment[row]!;
      // dᵀM⁻¹d for d = e_i − c n_j.
      let taken = inverse[i * (t + 1)]!;
      for (let one = start[j]!; one < start[j + 1]!; one++) {
        const at = treatment[one]! * t;
        taken -= 2 * c * inverse[at + i]!;
        for (let two = start[j]!; two < start[j + 1]!; two++) taken += c * c * inverse[at + treatment[two]!]!;
      }
      const precision = 1 - c - taken;
      if (!(precision > 1e-9)) continue;
      const innovation = fit.residual[row]! - c * fit.sessionSum[j]!;
      const squared = (innovation * innovation) / (precision * variance);
      // Without the reading itself in the variance.
      const left = Math.max(1e-12 * df, df - squared) / (df - 1);
      deviations[row] = Math.sign(innovation) * Math.sqrt(squared / left);
    }
  }
  return deviations;
}
