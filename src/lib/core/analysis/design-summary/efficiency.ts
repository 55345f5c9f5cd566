import { factorSemidefinite, inverseSemidefinite } from '../../numerics/semidefinite-cholesky.ts';
import { symmetricEigen } from '../../numerics/symmetric-eigen.ts';
import type { Efficiency } from '../analysis-result.ts';
import type { Moments } from '../model/moments.ts';
import type { RunTable } from '../model/run-table.ts';

/** An efficiency factor below this is a contrast that cannot be estimated. */
const ZERO = 1e-8;

/**
 * Returns the canonical efficiency factors of a set of runs, the eigenvalues of R^(−1/2)·C·R^(−1/2), and the variances of
 * treatment differences in units of the run variance; sessions and all further terms of the table are eliminated.
 *
 * Source: A. T. James & G. N. Wilkinson (1971), Biometrika 58, 279–294; J. A. John & E. R. Williams (1995), Cyclic and
 * Computer Generated Designs, 2nd ed., §2.2. Pairwise efficiency = mean(1/r_i + 1/r_j) / mean pair variance.
 * Checked by: test/reference-run, test/core/analysis/design-summary/efficiency.test.ts
 *
 * Cost: about 12·t³ operations.
 */
export function efficiencyOf(table: RunTable, moments: Moments): Efficiency {
  const { p } = table;
  const present = [...Array(table.terms[0]!.size).keys()].filter((i) => moments.diagonal[i]! > 0);
  const t = present.length;
  const C = reduced(table, moments, present);
  const r = Float64Array.from(present, (i) => moments.diagonal[i]!);
  const scaled = C.map((v, at) => v / Math.sqrt(r[Math.floor(at / t)]! * r[at % t]!));
  const { values } = symmetricEigen(scaled, t);
  const canonical = [...values].filter((v) => v > ZERO);
  const zeros = t - canonical.length;
  const eliminated = ['session', ...table.terms.slice(1).map((term) => term.name)];
  const base = {
    eliminated,
    canonical,
    zeros,
    average: canonical.length === 0 ? null : canonical.length / canonical.reduce((s, v) => s + 1 / v, 0),
    min: canonical[0] ?? null,
    max: canonical.at(-1) ?? null
  };
  if (zeros !== 1 || t < 2 || p === 0) return { ...base, pairVariance: null };
  const inverse = inverseSemidefinite(factorSemidefinite(C, t, r));
  let min = Infinity;
  let max = 0;
  let sum = 0;
  let unblocked = 0;
  for (let a = 0; a < t; a++) {
    for (let b = a + 1; b < t; b++) {
      const v = inverse[a * t + a]! + inverse[b * t + b]! - 2 * inverse[a * t + b]!;
      min = Math.min(min, v);
      max = Math.max(max, v);
      sum += v;
      unblocked += 1 / r[a]! + 1 / r[b]!;
    }
  }
  return { ...base, pairVariance: { average: (2 * sum) / (t * (t - 1)), min, max, efficiency: unblocked / sum } };
}

/** Information matrix of the treatments after sessions and further terms, t×t. */
function reduced(table: RunTable, moments: Moments, present: readonly number[]): Float64Array {
  const { p } = table;
  const t = present.length;
  const C = new Float64Array(t * t);
  for (let a = 0; a < t; a++) for (let b = 0; b < t; b++) C[a * t + b] = moments.within[present[a]! * p + present[b]!]!;
  const first = table.terms[0]!.size;
  const f = p - first;
  if (f === 0) return C;
  const F = new Float64Array(f * f);
  for (let i = 0; i < f; i++) for (let j = 0; j < f; j++) F[i * f + j] = moments.within[(first + i) * p + first + j]!;
  const G = inverseSemidefinite(factorSemidefinite(F, f, moments.diagonal.slice(first)));
  for (let a = 0; a < t; a++) {
    const half = new Float64Array(f);
    for (let i = 0; i < f; i++) {
      for (let j = 0; j < f; j++) half[j]! += moments.within[present[a]! * p + first + i]! * G[i * f + j]!;
    }
    for (let b = 0; b < t; b++) {
      let s = 0;
      for (let j = 0; j < f; j++) s += half[j]! * moments.within[present[b]! * p + first + j]!;
      C[a * t + b]! -= s;
    }
  }
  return C;
}
