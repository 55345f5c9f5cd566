import { moorePenrose } from './moore-penrose.ts';
import type { Bound } from './propose-types.ts';
import type { SearchProblem } from './search/search-problem.ts';

/** Least Σ1/x of n positive numbers of given sum and of sum of squared deviations from their mean at least `spread`. */
function leastReciprocals(n: number, sum: number, spread: number): number {
  const mean = sum / n;
  if (n < 2 || !(spread > 1e-12)) return n / mean;
  // One large, the others equal: the third derivative of 1/x is negative, so positive skewness is least.
  const step = Math.sqrt(spread / (n * (n - 1)));
  return step < mean ? 1 / (mean + (n - 1) * step) + (n - 1) / (mean - step) : n / mean;
}

/** Least Σx² of n whole numbers of a given sum. */
function leastSquares(n: number, sum: number): number {
  const low = Math.floor(sum / n);
  const over = sum - low * n;
  return over * (low + 1) ** 2 + (n - over) * low ** 2;
}

/**
 * Bound by the mean of the eigenvalues: the criterion of C averaged over all renamings of the tests (and of the controls)
 * among themselves. The averaged matrix is known without a design, and `trace(W C⁺)` is convex in C.
 */
function meanBound({ t, sizes, controls, weights }: SearchProblem): number {
  const tests = t - controls.length;
  const c = controls.length;
  let controlDiagonal = 0;
  let controlControl = 0;
  let controlTest = 0;
  let testDiagonal = 0;
  for (const k of sizes) {
    controlDiagonal += 1 - 1 / k;
    controlControl -= 1 / k;
    controlTest -= (k - c) / k / tests;
    testDiagonal += ((k - c) * (1 - 1 / k)) / tests;
  }
  const testTest = tests > 1 ? -(testDiagonal + c * controlTest) / (tests - 1) : 0;
  const isControl = Uint8Array.from({ length: t }, (_, i) => (controls.includes(i) ? 1 : 0));
  const mean = Float64Array.from({ length: t * t }, (_, at) => {
    const i = Math.floor(at / t);
    const l = at % t;
    const held = isControl[i]! + isControl[l]!;
    if (i === l) return held ? controlDiagonal : testDiagonal;
    return held === 2 ? controlControl : held === 1 ? controlTest : testTest;
  });
  const inverse = moorePenrose(mean, t);
  if (!inverse) return 0;
  let value = 0;
  for (let i = 0; i < t * t; i++) {
    if (weights) value += weights[i]! * inverse[i]!;
    else if (i % (t + 1) === 0) value += (2 / (t - 1)) * inverse[i]!;
  }
  return value;
}

/**
 * Bound by the spread that whole-number concurrences force upon the eigenvalues: trace C² is least when replications and
 * each row of concurrences are as equal as whole numbers can be. All sessions of one size k, no treatment twice in one.
 */
function concurrenceBound(t: number, b: number, k: number): number {
  const runs = b * k;
  const low = Math.floor(runs / t);
  const over = runs - low * t;
  const row = (r: number): number => (r * (1 - 1 / k)) ** 2 + leastSquares(t - 1, r * (k - 1)) / (k * k);
  const squares = over * row(low + 1) + (t - over) * row(low);
  const trace = b * (k - 1);
  const spread = squares - trace ** 2 / (t - 1);
  return (2 / (t - 1)) * leastReciprocals(t - 1, trace, spread);
}

/**
 * Bound through the dual design (sessions as treatments), where t ≥ b, all sessions are of size k and all replications r:
 * t − b canonical efficiency factors are 1 and the other b − 1 are those of the dual; in a resolvable design r − 1 of these
 * are 1 too.
 */
function dualBound(t: number, b: number, k: number, resolvable: boolean): number {
  const r = (b * k) / t;
  const perReplicate = b / r;
  const free = resolvable ? b - r : b - 1;
  const sum = resolvable ? b - r - (perReplicate - 1) : b - b / r;
  const others = resolvable ? (r - 1) * leastSquares(perReplicate, k) : leastSquares(b - 1, k * (r - 1));
  // Σ(1 − e)² over the b − 1 factors is trace (NᵀN)²/(rk)² − 1.
  const squares = (b * (k * k + others)) / (r * k) ** 2 - 1;
  const spread = squares - (free - sum) ** 2 / free;
  return (2 / (r * (t - 1))) * (t - 1 - free + leastReciprocals(free, sum, spread));
}

/**
 * Returns a value of the criterion that no design of a problem can pass: the largest of the published bounds that apply.
 *
 * @param problem sizes, controls and weights count; limits on replication and forbidden pairs only make designs worse
 *
 * **Source**: mean: Kiefer (1975), A Survey of Statistical Design and Linear Models, 333–353 (convexity and symmetry);
 * concurrence: Jarrett (1977), Bounds for the efficiency factor of block designs, Biometrika 64, 67–72, here with the
 * eigenvalues of C so that it holds for any replication; dual and resolvable: Patterson & Williams (1976), Proc. 5th British
 * Combinatorial Conference, 441–459, and Williams & Patterson (1977), Austral. J. Statist. 19, 194–201.
 * **Checked by** test/core/design/bounds.test.ts
 */
export function criterionBound(problem: SearchProblem): Bound {
  const { t, sizes, controls, groupOf } = problem;
  const b = sizes.length;
  const k = sizes[0]!;
  const bounds: Bound[] = [
    {
      aValue: meanBound(problem),
      by: controls.length > 0 ? 'control' : 'mean',
      source: 'Kiefer (1975), A Survey of Statistical Design and Linear Models, 333-353'
    }
  ];
  if (controls.length === 0 && sizes.every((size) => size === k) && k < t) {
    bounds.push({
      aValue: concurrenceBound(t, b, k),
      by: 'concurrence',
      source: 'Jarrett (1977), Biometrika 64, 67-72'
    });
    const equal = problem.replication.least.every((r) => r * t === b * k);
    if (equal && b <= t) {
      bounds.push({
        aValue: dualBound(t, b, k, false),
        by: 'dual',
        source: 'Patterson & Williams (1976), Proc. 5th British Combinatorial Conference, 441-459'
      });
    }
    const perReplicate = (b * t) / (b * k);
    if (groupOf && equal && Number.isInteger(perReplicate) && (b * k) / t >= 2) {
      bounds.push({
        aValue: dualBound(t, b, k, true),
        by: 'resolvable',
        source: 'Williams & Patterson (1977), Austral. J. Statist. 19, 194-201'
      });
    }
  }
  return bounds.reduce((best, bound) => (bound.aValue > best.aValue * (1 + 1e-12) ? bound : best));
}
