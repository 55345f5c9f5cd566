import { findRoot } from '../../numerics/find-root.ts';
import { evaluateReml, type RemlPoint, type RemlProblem } from './reml-problem.ts';

export interface RemlMaximum {
  point: RemlPoint;
  zero: RemlPoint;
  boundary: boolean;
  /** Stationary point without the limit at zero; null where the likelihood has none below zero. */
  unconstrained: RemlPoint | null;
  evaluations: number;
  converged: boolean;
}

/** Ratios at which the likelihood is looked at first: 10^−3 … 10^8. */
const GRID = Array.from({ length: 12 }, (_, i) => 10 ** (i - 3));

/**
 * Maximises the profiled restricted likelihood over the ratio γ ≥ 0: a coarse look at eleven orders of magnitude (so that a
 * second, lower hill is not taken), then the root of the score by a safeguarded search. Where the maximum lies at zero, the
 * stationary point below zero is given as well.
 *
 * Source: H. D. Patterson & R. Thompson (1971), Biometrika 58, 545–554.
 * Checked by: test/core/analysis/random/reml.test.ts, test/reference-run
 */
export function maximiseReml(problem: RemlProblem): RemlMaximum {
  let evaluations = 0;
  const known = new Map<number, RemlPoint>();
  const at = (gamma: number): RemlPoint => {
    let point = known.get(gamma);
    if (point === undefined) {
      evaluations++;
      known.set(gamma, (point = evaluateReml(problem, gamma)));
    }
    return point;
  };
  const zero = at(0);
  let best = zero;
  let index = -1;
  // Uphill from zero and then down for three decades is enough of a look.
  for (let i = 0; i < GRID.length && i < index + 5; i++) {
    const point = at(GRID[i]!);
    if (point.logLik > best.logLik) {
      best = point;
      index = i;
    }
  }
  if (index === -1 && zero.score <= 0) {
    const below = rootBelowZero(problem, zero);
    return { point: zero, zero, boundary: true, unconstrained: below, evaluations, converged: true };
  }
  let low = index === -1 ? 0 : best.score > 0 ? best.gamma : index === 0 ? 0 : GRID[index - 1]!;
  let high = index === -1 ? GRID[0]! : best.score > 0 ? GRID[index]! * 10 : best.gamma;
  while (low > 0 && at(low).score < 0) low /= 10;
  while (at(high).score > 0 && high < 1e14) high *= 10;
  if (low === 0 && zero.score <= 0) low = high * 1e-6;
  const searched = searchScore((g) => at(g).score, low, high);
  const point = at(searched.root);
  return { point, zero, boundary: false, unconstrained: point, evaluations, converged: searched.converged };
}

/** The root on a log scale where both ends are positive: the ratio is then found to the same relative accuracy anywhere. */
function searchScore(score: (g: number) => number, low: number, high: number): { root: number; converged: boolean } {
  if (score(low) * score(high) > 0) return { root: score(low) > 0 ? high : low, converged: false };
  if (low === 0) return findRoot(score, low, high, 1e-13);
  const found = findRoot((x) => score(Math.exp(x)), Math.log(low), Math.log(high), 1e-14);
  return { root: Math.exp(found.root), converged: found.converged };
}

function rootBelowZero(problem: RemlProblem, zero: RemlPoint): RemlPoint | null {
  if (zero.score === 0) return zero;
  const limit = -1 / Math.max(...problem.sizes.map(({ k }) => k));
  let high = 0;
  for (let i = 1; i <= 20; i++) {
    const low = limit * (1 - 2 ** -i);
    if (evaluateReml(problem, low).score > 0) {
      const { root } = findRoot((g) => evaluateReml(problem, g).score, low, high, 1e-13);
      return evaluateReml(problem, root);
    }
    high = low;
  }
  return null;
}
