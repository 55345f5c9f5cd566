import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { applyChange, SINGULAR } from './design-state.ts';
import type { DesignState, PricedChange } from './design-state.ts';
import type { SearchProblem } from './search-problem.ts';
import { NOISE_RANGE, thermalNoise } from './thermal-noise.ts';
import { addRows, clashes } from './visit-pair.ts';

/** How many treatments are tried as newcomers in one visit. */
const NEWCOMERS = 8;
const STILL = 1e-12;

/**
 * Prices the replacement of each treatment of session p by each of some treatments drawn from outside it, within the
 * replications allowed, and makes one of them or none, as `visitPair` does.
 *
 * Replacement of i by l: `u = e_l − e_i`, `z = (e_l + e_i)/2 − n/k − u/(2k)`; see `applyChange`.
 *
 * @returns whether a replacement was made
 *
 * Cost: 2 k² + 8 (2 k + 30 k), and 12 t² when a replacement is made.
 *
 * **Checked by** test/core/design/search/visit-pair.test.ts
 */
export function visitSession(
  state: DesignState,
  problem: SearchProblem,
  p: number,
  temperature: number,
  random: SeededRandom
): boolean {
  const { t, start, cells, movable, share, holds, replication, M, Q, y1: inM, y2: inQ } = state;
  const { forbidden } = problem;
  const { least, most } = problem.replication;
  const p0 = start[p]!;
  const end = start[p + 1]!;
  const s = share[p]!;
  const h = 0.5 * s;
  const k = end - p0;
  state.work += 4 * k * k + NEWCOMERS * 40 * k;
  let nMn = 0;
  let nQn = 0;
  for (let x = p0; x < end; x++) {
    inM[x - p0] = rowSum(M, cells, cells[x]! * t, p0, end);
    inQ[x - p0] = rowSum(Q, cells, cells[x]! * t, p0, end);
    nMn += inM[x - p0]!;
    nQn += inQ[x - p0]!;
  }

  const hot = temperature > 0;
  const out = temperature * NOISE_RANGE;
  let best = hot ? temperature * thermalNoise(random) : STILL * state.value;
  let bestX = -1;
  let bestL = -1;
  const change: PricedChange = { a: 0, beta: 0, c: 0, a2: 0, b2: 0, c2: 0 };
  for (let attempt = 0; attempt < NEWCOMERS; attempt++) {
    const l = random.below(t);
    if (holds[p * t + l] || replication[l]! >= most[l]!) continue;
    const Mll = M[l * t + l]!;
    const Qll = Q[l * t + l]!;
    const Ml = rowSum(M, cells, l * t, p0, end);
    const Ql = rowSum(Q, cells, l * t, p0, end);
    for (let x = 0; x < movable[p]!; x++) {
      const i = cells[p0 + x]!;
      if (replication[i]! <= least[i]!) continue;
      const Mii = M[i * t + i]!;
      const Mil = M[i * t + l]!;
      const Qii = Q[i * t + i]!;
      const Qil = Q[i * t + l]!;
      const Mi = inM[x]!;
      const Qi = inQ[x]!;
      const a = Mii + Mll - 2 * Mil;
      const a2 = Qii + Qll - 2 * Qil;
      const beta = 1 + 0.5 * (Mll - Mii) - s * (Ml - Mi) - h * a;
      const b2 = 0.5 * (Qll - Qii) - s * (Ql - Qi) - h * a2;
      const c = 0.25 * (Mii + Mll + 2 * Mil) + s * s * (nMn + Ml - Mi + 0.25 * a) - s * (Ml + Mi) - h * (Mll - Mii);
      const c2 = 0.25 * (Qii + Qll + 2 * Qil) + s * s * (nQn + Ql - Qi + 0.25 * a2) - s * (Ql + Qi) - h * (Qll - Qii);
      const determinant = a * c - beta * beta;
      if (determinant > SINGULAR) continue;
      let score = (c * a2 - 2 * beta * b2 + a * c2) / determinant;
      if (hot) {
        if (score < best - out) continue;
        score += temperature * thermalNoise(random);
      }
      if (score <= best) continue;
      if (forbidden && clashes(state, forbidden, p, p0 + x, l)) continue;
      best = score;
      bestX = x;
      bestL = l;
      change.a = a;
      change.beta = beta;
      change.c = c;
      change.a2 = a2;
      change.b2 = b2;
      change.c2 = c2;
    }
  }
  if (bestX < 0) return false;
  replace(state, p, p0 + bestX, bestL, change);
  return true;
}

function rowSum(A: Float64Array, cells: Int32Array, row: number, from: number, end: number): number {
  let sum = 0;
  for (let s = from; s < end; s++) sum += A[row + cells[s]!]!;
  return sum;
}

function replace(state: DesignState, p: number, x: number, l: number, change: PricedChange): void {
  const { t, start, cells, share, holds, replication, M, Q, x1, x2, y1, y2 } = state;
  const i = cells[x]!;
  const s = share[p]!;
  const h = 0.5 * s;
  for (let n = 0; n < t; n++) {
    const u = M[l * t + n]! - M[i * t + n]!;
    const v = Q[l * t + n]! - Q[i * t + n]!;
    x1[n] = u;
    y1[n] = v;
    x2[n] = 0.5 * (M[l * t + n]! + M[i * t + n]!) - h * u;
    y2[n] = 0.5 * (Q[l * t + n]! + Q[i * t + n]!) - h * v;
  }
  addRows(state, start[p]!, start[p + 1]!, -s);
  cells[x] = l;
  holds[p * t + i] = 0;
  holds[p * t + l] = 1;
  replication[i]! -= 1;
  replication[l]! += 1;
  applyChange(state, change);
}
