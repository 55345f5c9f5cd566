import { sandwich, traceOfProduct } from '../../numerics/symmetric-products.ts';
import { fittedBy } from '../model/run-vectors.ts';
import { addBetween, type RemlPoint, type RemlProblem } from './reml-problem.ts';

/** A symmetric 2×2 matrix in the order session variance, run variance. */
export type Pair = readonly [ss: number, sr: number, rr: number];

/**
 * Everything the small-sample methods need at the estimate, in units where σ² = 1. With d_k = 1/(1 + γk), H = XᵀV⁻¹X:
 *
 *     G = ∂Φ/∂σ_b² = H⁻¹·D·H⁻¹,  D = Σ k·d²·between;   ∂Φ/∂σ² = H⁻¹ − γG
 *
 * (Φ is homogeneous of degree one in the two variances, so only one of the derivatives costs anything.)
 */
export interface VarianceInformation {
  problem: RemlProblem;
  point: RemlPoint;
  /** q×q. */
  D: Float64Array;
  /** q×q. */
  G: Float64Array;
  /** Session sums of the residuals of the generalised least squares fit, length b. */
  sessionSums: Float64Array;
  /** Inverse of the expected information, times σ⁻⁴; null where it is singular. */
  expected: Pair | null;
  /** Inverse of the observed information, times σ⁻⁴; null where it is not positive definite. */
  observed: Pair | null;
}

/**
 * Returns derivatives and information matrices of the restricted likelihood.
 *
 *     expected_ij = ½·tr(P V_i P V_j),   observed_ij = yᵀP V_i P V_j P y − expected_ij
 *
 * Source: S. R. Searle, G. Casella & C. E. McCulloch (1992), Variance Components, §6.6; traces through session sizes own.
 * Checked by: test/core/analysis/random/variance-information.test.ts
 */
export function varianceInformation(problem: RemlProblem, point: RemlPoint): VarianceInformation {
  const { q, table, moments, sizes } = problem;
  const { gamma, inverse } = point;
  const d = (k: number): number => 1 / (1 + gamma * k);
  const D = addBetween(problem, (k) => k * d(k) ** 2, new Float64Array(q * q));
  const G = sandwich(inverse, D, q);

  // tr(P V_1 P V_1) from its three terms; the others follow from P(V_2 + γV_1)P = P.
  let t11 = 0;
  let e11 = 0;
  let p1 = 0;
  for (const { k, count, between } of sizes) {
    const w = d(k);
    t11 += count * (k * w) ** 2;
    p1 += count * k * w;
    e11 += k * k * w ** 3 * traceOfProduct(inverse, between);
  }
  const tr11 = t11 - 2 * e11 + traceOfProduct(G, D);
  const tr1 = p1 - traceOfProduct(inverse, D);
  const tr12 = tr1 - gamma * tr11;
  const tr2 = problem.n - q - gamma * tr1;
  const tr22 = tr2 - gamma * tr12;
  const expected: Pair = [tr11 / 2, tr12 / 2, tr22 / 2];

  // Quadratic forms in the residuals, likewise.
  const full = expand(problem, point.beta);
  const fit = fittedBy(table, full);
  const sessionSums = new Float64Array(table.b);
  const v = new Float64Array(table.p);
  let a1 = 0;
  let a11 = 0;
  for (let j = 0; j < table.b; j++) {
    const k = sizes[moments.sizeOf[j]!]!.k;
    const w = d(k);
    let sum = 0;
    for (let i = table.start[j]!; i < table.start[j + 1]!; i++) sum += problem.response[i]! - fit[i]!;
    sessionSums[j] = sum;
    const u = sum * w;
    a1 += u * u;
    a11 += k * w * u * u;
    for (let e = table.start[j]! * table.width; e < table.start[j + 1]! * table.width; e++) {
      v[table.column[e]!]! += table.value[e]! * w * u;
    }
  }
  const kept = Float64Array.from(problem.columns, (c) => v[c]!);
  for (let i = 0; i < q; i++) for (let j = 0; j < q; j++) a11 -= kept[i]! * inverse[i * q + j]! * kept[j]!;
  const a0 = point.sigma2 * (problem.n - q);
  const a12 = a1 - gamma * a11;
  const a22 = a0 - gamma * a1 - gamma * a12;
  const s2 = point.sigma2;
  const observed: Pair = [a11 / s2 - expected[0], a12 / s2 - expected[1], a22 / s2 - expected[2]];
  return {
    problem,
    point,
    D,
    G,
    sessionSums,
    expected: invertPair(expected),
    observed: invertPair(observed)
  };
}

/** Coefficients of the kept columns, at their places among all columns. */
export function expand(problem: RemlProblem, beta: Float64Array): Float64Array {
  const full = new Float64Array(problem.table.p);
  problem.columns.forEach((c, i) => (full[c] = beta[i]!));
  return full;
}

function invertPair([ss, sr, rr]: Pair): Pair | null {
  const det = ss * rr - sr * sr;
  if (!(ss > 0) || !(rr > 0) || !(det > 1e-12 * ss * rr)) return null;
  return [rr / det, -sr / det, ss / det];
}

/** gᵀ·W·g. */
export function pairForm([ss, sr, rr]: Pair, session: number, run: number): number {
  return ss * session * session + 2 * sr * session * run + rr * run * run;
}
