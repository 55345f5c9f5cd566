import { fUpper } from '../../numerics/distributions/f.ts';
import { factorSemidefinite, forwardSemidefinite } from '../../numerics/semidefinite-cholesky.ts';
import { symmetricEigen } from '../../numerics/symmetric-eigen.ts';
import { estimable } from '../fixed/intra-projection.ts';
import type { FactorTest } from '../fit-result.ts';
import type { Term } from '../model/run-table.ts';
import { kenwardRogerF, singleDf } from './kenward-roger.ts';
import type { Pair, VarianceInformation } from './variance-information.ts';

/** Rows of contrasts in the kept columns, r×q row-major. */
export interface ContrastRows {
  r: number;
  rows: Float64Array;
}

/**
 * Returns independent contrasts between the levels of a term that are estimable with sessions random: each level less the
 * first it can be compared with. Where the treatments are the only term, the differences are then combined so that they
 * are uncorrelated in a design without sessions; Satterthwaite's F depends on this choice (the other tests do not), and both
 * choices are those of the reference library.
 *
 * Source: A. Kuznetsova, P. B. Brockhoff & R. H. B. Christensen (2017), J. Statist. Software 82(13), type III contrasts.
 * Checked by: test/reference-run
 */
export function termContrasts(info: VarianceInformation, term: Term): ContrastRows {
  const { problem } = info;
  const { table, q, columns, nulls, moments } = problem;
  const levels = [...Array(term.size).keys()].map((i) => term.start + i).filter((c) => moments.diagonal[c]! > 0);
  if (term.scaling !== null) return restrict(columns.includes(term.start) ? [[[term.start, 1]]] : []);
  const differences: { level: number; from: number }[] = [];
  const heads: number[] = [];
  for (const c of levels) {
    const from = heads.find((h) => {
      const l = new Float64Array(table.p);
      l[c] = 1;
      l[h] = -1;
      return estimable(nulls, l);
    });
    if (from === undefined) heads.push(c);
    else differences.push({ level: c, from });
  }
  if (table.terms.length > 1 || heads.length > 1) {
    return restrict(
      differences.map(({ level, from }) => [
        [level, 1],
        [from, -1]
      ])
    );
  }
  // Row i of the unit upper triangle of the factorised replication matrix (intercept eliminated).
  const n = table.n;
  const m = differences.length;
  const S = new Float64Array(m * m);
  const size = (i: number): number => moments.diagonal[differences[i]!.level]!;
  for (let i = 0; i < m; i++) {
    for (let j = 0; j < m; j++) S[i * m + j] = (i === j ? size(i) : 0) - (size(i) * size(j)) / n;
  }
  const { L } = factorSemidefinite(S, m);
  return restrict(
    differences.map((_, i) =>
      differences.flatMap(({ level, from }, j): [number, number][] => {
        const weight = j < i ? 0 : L[j * m + i]! / L[i * m + i]!;
        return [
          [level, weight],
          [from, -weight]
        ];
      })
    )
  );

  function restrict(lines: [column: number, weight: number][][]): ContrastRows {
    const place = new Int32Array(table.p).fill(-1);
    columns.forEach((c, i) => (place[c] = i));
    const rows = new Float64Array(lines.length * q);
    lines.forEach((line, i) => {
      for (const [column, weight] of line) if (place[column]! >= 0) rows[i * q + place[column]!]! += weight;
    });
    return { r: lines.length, rows };
  }
}

/** L·A·Lᵀ, r×r. */
function project({ r, rows }: ContrastRows, A: Float64Array, q: number): Float64Array {
  const half = new Float64Array(r * q);
  for (let i = 0; i < r; i++) {
    for (let k = 0; k < q; k++) {
      const f = rows[i * q + k]!;
      if (f === 0) continue;
      for (let j = 0; j < q; j++) half[i * q + j]! += f * A[k * q + j]!;
    }
  }
  const out = new Float64Array(r * r);
  for (let i = 0; i < r; i++) {
    for (let j = 0; j <= i; j++) {
      let s = 0;
      for (let k = 0; k < q; k++) s += half[i * q + k]! * rows[j * q + k]!;
      out[i * r + j] = s;
      out[j * r + i] = s;
    }
  }
  return out;
}

function times({ r, rows }: ContrastRows, x: Float64Array): Float64Array {
  const q = x.length;
  return Float64Array.from({ length: r }, (_, i) => x.reduce((s, v, k) => s + v * rows[i * q + k]!, 0));
}

/**
 * Kenward & Roger's F test of a term; null where it has no estimable contrast.
 *
 * @param beta coefficients (kept columns) with the offset put back
 */
export function kenwardRogerTest(
  info: VarianceInformation,
  term: Term,
  beta: Float64Array,
  adjusted: Float64Array,
  W: Pair
): FactorTest | null {
  const { q } = info.problem;
  const { sigma2, gamma, inverse } = info.point;
  const L = termContrasts(info, term);
  const { r } = L;
  if (r === 0) return null;
  const U = factorSemidefinite(project(L, inverse, q), r);
  const T = whiten(U.L, project(L, info.G, q), r);
  let trace1 = 0;
  let trace11 = 0;
  for (let i = 0; i < r; i++) {
    trace1 += T[i * r + i]!;
    for (let j = 0; j < r; j++) trace11 += T[i * r + j]! * T[j * r + i]!;
  }
  const { denDf, scale } = kenwardRogerF(r, W, gamma, trace1, trace11);
  const z = forwardSemidefinite(factorSemidefinite(project(L, adjusted, q), r), times(L, beta));
  const F = (scale * z.reduce((s, v) => s + v * v, 0)) / (sigma2 * r);
  return usableTest({ source: term.name, numDf: r, denDf, F, p: fUpper(F, r, denDf) });
}

/** Small-sample formulas can fail on a handful of runs; such a test is left out. */
function usableTest(test: FactorTest): FactorTest | null {
  const { denDf, F, p } = test;
  return denDf > 0 && denDf < Infinity && F >= 0 && F < Infinity && p >= 0 ? test : null;
}

/** U⁻¹·A·U⁻ᵀ for a lower triangle U. */
function whiten(U: Float64Array, A: Float64Array, r: number): Float64Array {
  const out = A.slice();
  for (let pass = 0; pass < 2; pass++) {
    for (let c = 0; c < r; c++) {
      for (let i = 0; i < r; i++) {
        let s = out[i * r + c]!;
        for (let m = 0; m < i; m++) s -= U[i * r + m]! * out[m * r + c]!;
        out[i * r + c] = s / U[i * r + i]!;
      }
    }
    for (let i = 0; i < r; i++) {
      for (let j = 0; j < i; j++) {
        const swap = out[i * r + j]!;
        out[i * r + j] = out[j * r + i]!;
        out[j * r + i] = swap;
      }
    }
  }
  return out;
}

/**
 * Satterthwaite's F test of a term: independent directions from the eigenvectors of the covariance of its contrasts, each
 * with its own degrees of freedom ν_m, combined by matching the mean of F.
 *
 *     E = Σ ν_m/(ν_m − 2),   denominator df = 2E/(E − r)
 *
 * @param fixedDf degrees of freedom when the session variance is on its boundary; null otherwise
 *
 * Source: A. H. Fai & P. L. Cornelius (1996), J. Statist. Comput. Simul. 54, 363–378.
 * Checked by: test/reference-run
 */
export function satterthwaiteTest(
  info: VarianceInformation,
  term: Term,
  beta: Float64Array,
  W: Pair | null,
  fixedDf: number | null
): FactorTest | null {
  const { q } = info.problem;
  const { sigma2, gamma, inverse } = info.point;
  const L = termContrasts(info, term);
  const { r } = L;
  if (r === 0) return null;
  const { values, vectors } = symmetricEigen(project(L, inverse, q), r);
  const estimate = times(L, beta);
  const LG = project(L, info.G, q);
  let F = 0;
  const nu: number[] = [];
  for (let m = 0; m < r; m++) {
    const P = vectors.subarray(m * r, (m + 1) * r);
    let value = 0;
    let vG = 0;
    for (let i = 0; i < r; i++) {
      value += P[i]! * estimate[i]!;
      for (let j = 0; j < r; j++) vG += P[i]! * LG[i * r + j]! * P[j]!;
    }
    F += (value * value) / (values[m]! * sigma2 * r);
    nu.push(fixedDf ?? (W === null ? NaN : singleDf(W, gamma, values[m]!, vG)));
  }
  const denDf = combine(nu);
  return usableTest({ source: term.name, numDf: r, denDf, F, p: fUpper(F, r, denDf) });
}

function combine(nu: readonly number[]): number {
  const spread = Math.max(...nu) - Math.min(...nu);
  if (nu.length === 1 || spread < 1e-8) return nu.reduce((s, v) => s + v, 0) / nu.length;
  if (nu.some((v) => v <= 2)) return 2;
  const E = nu.reduce((s, v) => s + v / (v - 2), 0);
  return (2 * E) / (E - nu.length);
}
