import { factorSemidefinite, inverseSemidefinite, nullVectors } from '../../numerics/semidefinite-cholesky.ts';
import { dot, multiplyVector, quadraticForm, traceOfProduct } from '../../numerics/symmetric-products.ts';
import { prepareIntra, solveIntra } from '../fixed/intra-projection.ts';
import { crossProduct, type Moments } from '../model/moments.ts';
import type { RunTable } from '../model/run-table.ts';
import { fittedBy } from '../model/run-vectors.ts';

/** Sessions of one size, in the coordinates of the kept columns, with the response. */
export interface SizePart {
  k: number;
  count: number;
  /** Σ x_j·x_jᵀ/k, q×q. */
  between: Float64Array;
  /** Σ x_j·s_j/k, s_j the session sum of the response, length q. */
  cross: Float64Array;
  /** Σ s_j²/k. */
  square: number;
}

/**
 * The model y = Xβ + Zu + ε, Var u = γσ², Var ε = σ², reduced to q×q: the response is taken less its fit with sessions fixed
 * (which changes no residual contrast), so that everything about y is one error sum of squares inside sessions and small
 * sums between them.
 */
export interface RemlProblem {
  table: RunTable;
  moments: Moments;
  n: number;
  /** Rank of X. */
  q: number;
  /** Columns of the model matrix that were kept, length q. */
  columns: Int32Array;
  /** Null vectors of X, in all columns. */
  nulls: Float64Array[];
  /** Coefficients that were taken off the response, in all columns. */
  offset: Float64Array;
  /** Response less its fit with sessions fixed, length n. */
  response: Float64Array;
  within: Float64Array;
  /** Error sum of squares inside sessions. */
  errorSs: number;
  /** Error degrees of freedom inside sessions. */
  errorDf: number;
  sizes: SizePart[];
  /** Added to log|XᵀV⁻¹X| to undo the scale of quantities. */
  logScale: number;
}

/** Reduces the kept runs to a REML problem. Cost: that of the moments and one q³. */
export function remlProblem(table: RunTable, moments: Moments): RemlProblem {
  const intra = prepareIntra(table, moments);
  const solution = solveIntra(intra, table.y);
  const full = factorSemidefinite(crossProduct(moments), table.p, moments.diagonal);
  const columns = Int32Array.from([...full.kept.keys()].filter((c) => full.kept[c] === 1));
  const q = columns.length;
  const place = new Int32Array(table.p).fill(-1);
  columns.forEach((c, i) => (place[c] = i));
  const fit = fittedBy(table, solution.beta);
  const response = table.y.map((v, i) => v - fit[i]!);
  const sizes: SizePart[] = moments.bySize.map(({ k, count, between }) => ({
    k,
    count,
    between: compress(between, table.p, columns),
    cross: new Float64Array(q),
    square: 0
  }));
  for (let j = 0; j < table.b; j++) {
    const part = sizes[moments.sizeOf[j]!]!;
    let sum = 0;
    for (let i = table.start[j]!; i < table.start[j + 1]!; i++) sum += response[i]!;
    part.square += (sum * sum) / part.k;
    for (let e = table.start[j]! * table.width; e < table.start[j + 1]! * table.width; e++) {
      const c = place[table.column[e]!]!;
      if (c >= 0) part.cross[c]! += (table.value[e]! * sum) / part.k;
    }
  }
  return {
    table,
    moments,
    n: table.n,
    q,
    columns,
    nulls: nullVectors(full),
    offset: solution.beta,
    response,
    within: compress(moments.within, table.p, columns),
    errorSs: solution.errorSs,
    errorDf: intra.errorDf,
    sizes,
    logScale: table.terms.reduce((s, { scaling }) => s + (scaling === null ? 0 : 2 * Math.log(scaling.scale)), 0)
  };
}

function compress(a: Float64Array, p: number, columns: Int32Array): Float64Array {
  const q = columns.length;
  const out = new Float64Array(q * q);
  for (let i = 0; i < q; i++) for (let j = 0; j < q; j++) out[i * q + j] = a[columns[i]! * p + columns[j]!]!;
  return out;
}

/** Σ over session sizes of weight(k)·between_k, added to `into`. */
export function addBetween(problem: RemlProblem, weight: (k: number) => number, into: Float64Array): Float64Array {
  for (const { k, between } of problem.sizes) {
    const w = weight(k);
    for (let i = 0; i < into.length; i++) into[i]! += w * between[i]!;
  }
  return into;
}

/** The restricted likelihood at one ratio γ, profiled over σ² and β. */
export interface RemlPoint {
  gamma: number;
  logLik: number;
  /** Derivative of logLik by γ; NaN where it was not asked for. */
  score: number;
  sigma2: number;
  /** Generalised least squares coefficients of the response, kept columns. */
  beta: Float64Array;
  /** (XᵀV⁻¹X/σ⁻²)⁻¹, q×q. */
  inverse: Float64Array;
}

/**
 * Evaluates the profiled restricted log-likelihood. With d_k = 1/(1 + γk) and H = C + Σ_k d_k·between_k:
 *
 *     −2ℓ = (n−q)(log 2π + 1 + log(Q/(n−q))) + Σ_j log(1 + γk_j) + log|H|,   Q = yᵀ(V⁻¹ − V⁻¹X(XᵀV⁻¹X)⁻¹XᵀV⁻¹)y
 *
 * @param gamma ratio of session variance to run variance; above −1/max k (negative values serve the unconstrained root)
 *
 * Source: H. D. Patterson & R. Thompson (1971), Biometrika 58, 545–554.
 * Checked by: test/core/analysis/random/reml.test.ts
 */
export function evaluateReml(problem: RemlProblem, gamma: number): RemlPoint {
  const { n, q, sizes } = problem;
  const d = (k: number): number => 1 / (1 + gamma * k);
  const H = addBetween(problem, d, problem.within.slice());
  const factor = factorSemidefinite(H, q, undefined, 0);
  if (factor.rank < q)
    throw new Error(`evaluateReml: XᵀV⁻¹X has rank ${factor.rank}, expected ${q}, at ratio ${gamma}`);
  const inverse = inverseSemidefinite(factor);
  const h = new Float64Array(q);
  let squares = problem.errorSs;
  let logs = 0;
  for (const { k, count, cross, square } of sizes) {
    const w = d(k);
    squares += w * square;
    logs += count * Math.log1p(gamma * k);
    for (let i = 0; i < q; i++) h[i]! += w * cross[i]!;
  }
  const beta = multiplyVector(inverse, h);
  const Q = squares - dot(beta, h);
  const df = n - q;
  const sigma2 = Q / df;
  const logDet = factor.logDet + problem.logScale;
  const logLik = -0.5 * (df * (Math.log(2 * Math.PI * sigma2) + 1) + logs + logDet);
  // dQ/dγ and d log|H|/dγ through d_k' = −k·d_k².
  let slope = 0;
  for (const { k, count, between, cross, square } of sizes) {
    const w = d(k);
    const dw = -k * w * w;
    const dQ = dw * (square - 2 * dot(beta, cross) + quadraticForm(between, beta));
    slope += (df * dQ) / Q + count * k * w + dw * traceOfProduct(inverse, between);
  }
  return { gamma, logLik, score: -0.5 * slope, sigma2, beta, inverse };
}
