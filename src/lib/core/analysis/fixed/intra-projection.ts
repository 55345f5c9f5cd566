import {
  factorSemidefinite,
  inverseSemidefinite,
  nullVectors,
  solveSemidefinite,
  type SemidefiniteFactor
} from '../../numerics/semidefinite-cholesky.ts';
import type { Moments } from '../model/moments.ts';
import type { RunTable } from '../model/run-table.ts';
import { fittedBy, lessSessionMeans, sumOfSquares, transposeTimes } from '../model/run-vectors.ts';

/** The model with sessions fixed, ready for any response: sessions are eliminated, the rest is p×p. */
export interface IntraModel {
  table: RunTable;
  moments: Moments;
  factor: SemidefiniteFactor;
  /** Generalised inverse of the information matrix. */
  inverse: Float64Array;
  /** A linear function l of the coefficients is estimable when l·v = 0 for each of these. */
  nulls: Float64Array[];
  /** Rank of sessions and coefficients together. */
  rank: number;
  errorDf: number;
}

export interface IntraSolution {
  /** Coefficients, zero where a column was left out. */
  beta: Float64Array;
  residual: Float64Array;
  errorSs: number;
}

/**
 * Prepares the intra-block analysis.
 *
 *     C = Σ_j X_jᵀ(I − 11ᵀ/k_j)X_j,   rank = b + rank C
 *
 * Source: J. A. John & E. R. Williams (1995), Cyclic and Computer Generated Designs, 2nd ed., §1.3; with further columns in X
 * the same elimination of sessions.
 * Checked by: test/core/analysis/fixed/fit-fixed.test.ts
 */
export function prepareIntra(table: RunTable, moments: Moments): IntraModel {
  const factor = factorSemidefinite(moments.within, table.p, moments.diagonal);
  const rank = table.b + factor.rank;
  return {
    table,
    moments,
    factor,
    inverse: inverseSemidefinite(factor),
    nulls: nullVectors(factor),
    rank,
    errorDf: table.n - rank
  };
}

/**
 * Fits a response (length n) by least squares with sessions fixed. One step of iterative refinement on the residuals
 * removes what the normal equations lose.
 */
export function solveIntra(model: IntraModel, y: Float64Array): IntraSolution {
  const { table, factor } = model;
  const centred = lessSessionMeans(table, y);
  const beta = new Float64Array(table.p);
  let residual = centred;
  for (let pass = 0; pass < 2; pass++) {
    const step = solveSemidefinite(factor, transposeTimes(table, residual));
    for (let i = 0; i < beta.length; i++) beta[i]! += step[i]!;
    const fit = lessSessionMeans(table, fittedBy(table, step));
    const next = new Float64Array(table.n);
    for (let i = 0; i < next.length; i++) next[i] = residual[i]! - fit[i]!;
    residual = next;
  }
  return { beta, residual, errorSs: sumOfSquares(residual) };
}

/** Is the linear function l of the coefficients estimable with sessions fixed? */
export function estimable(nulls: readonly Float64Array[], l: Float64Array): boolean {
  for (const v of nulls) {
    let s = 0;
    let size = 0;
    for (let i = 0; i < l.length; i++) {
      const term = l[i]! * v[i]!;
      s += term;
      size += Math.abs(term);
    }
    if (Math.abs(s) > 1e-7 * Math.max(1, size)) return false;
  }
  return true;
}
