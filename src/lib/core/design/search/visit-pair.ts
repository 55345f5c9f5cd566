import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { applyChange, SINGULAR } from './design-state.ts';
import type { DesignState, PricedChange } from './design-state.ts';
import { NOISE_RANGE, thermalNoise } from './thermal-noise.ts';

/** Least fall of the value, in parts of it, that counts at temperature zero. */
const STILL = 1e-12;

/** Whether treatment l may not enter the session when the treatment of cell x leaves it. */
export function clashes(state: DesignState, forbidden: Uint8Array, session: number, x: number, l: number): boolean {
  for (let s = state.start[session]!; s < state.start[session + 1]!; s++) {
    if (s !== x && forbidden[l * state.t + state.cells[s]!]) return true;
  }
  return false;
}

/**
 * For each cell of session `own` the product of its row of M, and of Q, with `n_p/k_p − n_q/k_q`.
 */
function crossSums(state: DesignState, own: number, p: number, q: number, inM: Float64Array, inQ: Float64Array): void {
  const { t, start, cells, share, M, Q } = state;
  const p0 = start[p]!;
  const pEnd = start[p + 1]!;
  const q0 = start[q]!;
  const qEnd = start[q + 1]!;
  const sp = share[p]!;
  const sq = share[q]!;
  for (let x = start[own]!, out = 0, end = start[own + 1]!; x < end; x++, out++) {
    const row = cells[x]! * t;
    let m = 0;
    let m2 = 0;
    for (let s = p0; s < pEnd; s++) {
      const at = row + cells[s]!;
      m += M[at]!;
      m2 += Q[at]!;
    }
    let n = 0;
    let n2 = 0;
    for (let s = q0; s < qEnd; s++) {
      const at = row + cells[s]!;
      n += M[at]!;
      n2 += Q[at]!;
    }
    inM[out] = sp * m - sq * n;
    inQ[out] = sp * m2 - sq * n2;
  }
}

/**
 * Prices every exchange of a treatment of session p against one of session q and makes one of them or none, drawn with
 * probability proportional to `exp(fall/T)`; at temperature zero the steepest fall, or none.
 *
 * Exchange of i (of p) and l (of q): `u = e_l − e_i`, `z = −w − h u` with `w = n_p/k_p − n_q/k_q` and
 * `h = (1/k_p + 1/k_q)/2`; see `applyChange`. The sums over the sessions are shared by all exchanges.
 *
 * @param forbidden see SearchProblem
 * @returns whether an exchange was made
 *
 * Cost: 2 (k_p + k_q)² + 30 k_p k_q, and 12 t² when an exchange is made.
 *
 * **Checked by** test/core/design/search/visit-pair.test.ts
 */
export function visitPair(
  state: DesignState,
  forbidden: Uint8Array | null,
  p: number,
  q: number,
  temperature: number,
  random: SeededRandom
): boolean {
  const { t, start, cells, movable, share, holds, M, Q, y1: pM, y2: pQ, e1: qM, e2: qQ } = state;
  crossSums(state, p, p, q, pM, pQ);
  crossSums(state, q, p, q, qM, qQ);
  const p0 = start[p]!;
  const q0 = start[q]!;
  const kp = start[p + 1]! - p0;
  const kq = start[q + 1]! - q0;
  const sp = share[p]!;
  const sq = share[q]!;
  const h = 0.5 * (sp + sq);
  state.work += 4 * (kp + kq) ** 2 + 24 * kp * kq;
  let wMw = 0;
  let wQw = 0;
  for (let x = 0; x < kp; x++) {
    wMw += sp * pM[x]!;
    wQw += sp * pQ[x]!;
  }
  for (let y = 0; y < kq; y++) {
    wMw -= sq * qM[y]!;
    wQw -= sq * qQ[y]!;
  }

  const hot = temperature > 0;
  const out = temperature * NOISE_RANGE;
  let best = hot ? temperature * thermalNoise(random) : STILL * state.value;
  let bestX = -1;
  let bestY = -1;
  const change: PricedChange = { a: 0, beta: 0, c: 0, a2: 0, b2: 0, c2: 0 };
  for (let x = 0; x < movable[p]!; x++) {
    const i = cells[p0 + x]!;
    if (holds[q * t + i]) continue;
    const Mii = M[i * t + i]!;
    const Qii = Q[i * t + i]!;
    const pMx = pM[x]!;
    const pQx = pQ[x]!;
    for (let y = 0; y < movable[q]!; y++) {
      const l = cells[q0 + y]!;
      if (holds[p * t + l]) continue;
      const a = Mii + M[l * t + l]! - 2 * M[i * t + l]!;
      const a2 = Qii + Q[l * t + l]! - 2 * Q[i * t + l]!;
      const m = qM[y]! - pMx;
      const m2 = qQ[y]! - pQx;
      const beta = 1 - m - h * a;
      const b2 = -m2 - h * a2;
      const c = wMw + h * (h * a + 2 * m);
      const c2 = wQw + h * (h * a2 + 2 * m2);
      const determinant = a * c - beta * beta;
      if (determinant > SINGULAR) continue;
      let score = (c * a2 - 2 * beta * b2 + a * c2) / determinant;
      if (hot) {
        if (score < best - out) continue;
        score += temperature * thermalNoise(random);
      }
      if (score <= best) continue;
      if (forbidden && (clashes(state, forbidden, p, p0 + x, l) || clashes(state, forbidden, q, q0 + y, i))) continue;
      best = score;
      bestX = x;
      bestY = y;
      change.a = a;
      change.beta = beta;
      change.c = c;
      change.a2 = a2;
      change.b2 = b2;
      change.c2 = c2;
    }
  }
  if (bestX < 0) return false;
  exchange(state, p, q, p0 + bestX, q0 + bestY, change);
  return true;
}

function exchange(state: DesignState, p: number, q: number, x: number, y: number, change: PricedChange): void {
  const { t, start, cells, share, holds, M, Q, x1, x2, y1, y2 } = state;
  const i = cells[x]!;
  const l = cells[y]!;
  const sp = share[p]!;
  const sq = share[q]!;
  const h = 0.5 * (sp + sq);
  for (let n = 0; n < t; n++) {
    const u = M[l * t + n]! - M[i * t + n]!;
    const v = Q[l * t + n]! - Q[i * t + n]!;
    x1[n] = u;
    y1[n] = v;
    x2[n] = -h * u;
    y2[n] = -h * v;
  }
  addRows(state, start[p]!, start[p + 1]!, -sp);
  addRows(state, start[q]!, start[q + 1]!, sq);
  cells[x] = l;
  cells[y] = i;
  holds[p * t + i] = 0;
  holds[p * t + l] = 1;
  holds[q * t + l] = 0;
  holds[q * t + i] = 1;
  applyChange(state, change);
}

/** Adds `factor` times the rows of M to x2, and of Q to y2, for the treatments of the cells given. */
export function addRows(state: DesignState, from: number, end: number, factor: number): void {
  const { t, cells, M, Q, x2, y2 } = state;
  for (let s = from; s < end; s++) {
    const row = cells[s]! * t;
    for (let n = 0; n < t; n++) {
      x2[n]! += factor * M[row + n]!;
      y2[n]! += factor * Q[row + n]!;
    }
  }
}
