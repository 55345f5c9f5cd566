import type { RowDiagnostics } from '../check-result.ts';
import type { FixedModel } from '../fixed/fit-fixed.ts';
import type { IntraModel } from '../fixed/intra-projection.ts';

/** A leverage closer to 1 than this leaves nothing to judge. */
const FULL = 1e-9;

/**
 * Returns the leverage of each run of the table: h_i = 1/k + (x_i − x̄)ᵀC⁻(x_i − x̄) within its session.
 *
 * Cost: n·k·width².
 */
export function leverages({ table, inverse }: IntraModel): Float64Array {
  const { b, p, start, width, column, value } = table;
  const out = new Float64Array(table.n);
  for (let j = 0; j < b; j++) {
    const first = start[j]!;
    const k = start[j + 1]! - first;
    const rowMean = new Float64Array(k);
    let all = 0;
    for (let r = 0; r < k; r++) {
      for (let s = 0; s < k; s++) {
        let v = 0;
        for (let e = (first + r) * width; e < (first + r + 1) * width; e++) {
          for (let f = (first + s) * width; f < (first + s + 1) * width; f++) {
            v += value[e]! * value[f]! * inverse[column[e]! * p + column[f]!]!;
          }
        }
        rowMean[r]! += v / k;
        all += v / (k * k);
        if (r === s) out[first + r] = v;
      }
    }
    for (let r = 0; r < k; r++) out[first + r]! += 1 / k - 2 * rowMean[r]! + all;
  }
  return out;
}

/**
 * Returns residuals, fitted values, leverage, internally and externally studentised residuals and Cook's distance.
 *
 *     r_i = e_i / (s√(1 − h_i)),   t_i = r_i·√((ν − 1)/(ν − r_i²)),   D_i = r_i²·h_i / ((1 − h_i)·rank)
 *
 * Source: R. D. Cook & S. Weisberg (1982), Residuals and Influence in Regression, §2.2 and §3.1.
 * Checked by: test/reference-run
 */
export function rowDiagnostics({ model, solution, sigma }: FixedModel): RowDiagnostics[] {
  const { table, errorDf, rank } = model;
  const h = leverages(model);
  return Array.from(table.rowIndex, (row, i): RowDiagnostics => {
    const residual = solution.residual[i]!;
    const base = {
      row,
      fitted: table.centre + (table.y[i]! - residual),
      residual,
      leverage: h[i]!,
      standardized: null,
      studentized: null,
      cook: null
    };
    if (sigma === null || 1 - h[i]! < FULL) return base;
    const standardized = residual / (sigma * Math.sqrt(1 - h[i]!));
    const left = errorDf - standardized ** 2;
    return {
      ...base,
      standardized,
      studentized: errorDf > 1 && left > 0 ? standardized * Math.sqrt((errorDf - 1) / left) : null,
      cook: (standardized ** 2 * h[i]!) / ((1 - h[i]!) * rank)
    };
  });
}
