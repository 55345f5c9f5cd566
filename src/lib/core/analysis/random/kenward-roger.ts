import { sandwich } from '../../numerics/symmetric-products.ts';
import { addBetween } from './reml-problem.ts';
import { pairForm, type Pair, type VarianceInformation } from './variance-information.ts';

/**
 * Returns the adjusted covariance matrix of the coefficients divided by σ², q×q:
 *
 *     Φ_A = Φ + 2Φ{Σ_ij W_ij (Q_ij − P_i Φ P_j)}Φ,   W the inverse expected information
 *
 * For the two variances of this model P_1 = −D, P_2 = −(H − γD) and the sums over Q reduce to sums over session sizes, so
 * the whole costs three products of q×q matrices.
 *
 * Source: M. G. Kenward & J. H. Roger (1997), Small sample inference for fixed effects from restricted maximum likelihood,
 * Biometrics 53, 983–997, eq. (5) without the term R that vanishes for a covariance linear in its parameters.
 * Checked by: test/reference-run (pbkrtest), test/core/analysis/random/kenward-roger.test.ts (the formulas written out n×n)
 */
export function kenwardRogerCovariance(info: VarianceInformation, W: Pair): Float64Array {
  const { problem, point, D } = info;
  const { q } = problem;
  const { gamma, inverse } = point;
  const [w11, w12, w22] = W;
  const d = (k: number): number => 1 / (1 + gamma * k);
  // Σ W_ij Q_ij, with Q_11 = Σ k²d³·between, Q_12 = Σ k·d³·between, Q_22 = C + Σ d³·between.
  const S = problem.within.slice();
  for (let i = 0; i < S.length; i++) S[i]! *= w22;
  addBetween(problem, (k) => d(k) ** 3 * (w11 * k * k + 2 * w12 * k + w22), S);
  // Less Σ W_ij P_i Φ P_j, with K = D·H⁻¹·D: P_1ΦP_2 = D − γK, P_2ΦP_2 = H − 2γD + γ²K.
  const K = sandwich(D, inverse, q);
  const H = addBetween(problem, d, problem.within.slice());
  const fK = w11 - 2 * w12 * gamma + w22 * gamma * gamma;
  const fD = 2 * w12 - 2 * w22 * gamma;
  for (let i = 0; i < S.length; i++) S[i]! -= fK * K[i]! + fD * D[i]! + w22 * H[i]!;
  const inflation = sandwich(inverse, S, q);
  const adjusted = inverse.slice();
  for (let i = 0; i < adjusted.length; i++) adjusted[i]! += 2 * inflation[i]!;
  return adjusted;
}

/**
 * Degrees of freedom of one linear function with unscaled variance v = lᵀH⁻¹l and derivatives g = (lᵀGl, v − γ·lᵀGl):
 *
 *     df = 2v² / gᵀWg
 *
 * With W the inverse expected information this is Kenward & Roger's value for one numerator degree of freedom (their scale
 * is then 1); with the inverse observed information it is Satterthwaite's.
 *
 * Source: Kenward & Roger (1997), §2; F. E. Satterthwaite (1946), Biometrics Bulletin 2, 110–114, as in A. H. Fai & P. L.
 * Cornelius (1996), J. Statist. Comput. Simul. 54, 363–378.
 */
export function singleDf(W: Pair, gamma: number, v: number, vG: number): number {
  return (2 * v * v) / pairForm(W, vG, v - gamma * vG);
}

/**
 * Kenward & Roger's scale and denominator degrees of freedom of an F test of r functions.
 *
 * @param r numerator degrees of freedom, at least 1
 * @param W inverse expected information
 * @param trace1 tr T, T = U⁻¹(L·G·Lᵀ)U⁻ᵀ with UUᵀ = L·H⁻¹·Lᵀ
 * @param trace11 tr T²
 *
 * Source: Kenward & Roger (1997), p. 987.
 */
export function kenwardRogerF(
  r: number,
  W: Pair,
  gamma: number,
  trace1: number,
  trace11: number
): { denDf: number; scale: number } {
  // The matrix for the run variance is I − γT.
  const trace2 = r - gamma * trace1;
  const trace12 = trace1 - gamma * trace11;
  const trace22 = trace2 - gamma * trace12;
  const A1 = pairForm(W, trace1, trace2);
  const A2 = W[0] * trace11 + 2 * W[1] * trace12 + W[2] * trace22;
  if (r === 1) return { denDf: 2 / A2, scale: 1 };
  const B = (A1 + 6 * A2) / (2 * r);
  const g = ((r + 1) * A1 - (r + 4) * A2) / ((r + 2) * A2);
  const base = 3 * r + 2 * (1 - g);
  const c1 = g / base;
  const c2 = (r - g) / base;
  const c3 = (r + 2 - g) / base;
  const E = 1 / (1 - A2 / r);
  const V = ((2 / r) * (1 + c1 * B)) / ((1 - c2 * B) ** 2 * (1 - c3 * B));
  const rho = V / (2 * E * E);
  const denDf = 4 + (r + 2) / (r * rho - 1);
  return { denDf, scale: denDf / (E * (denDf - 2)) };
}
