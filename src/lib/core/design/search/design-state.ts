import { informationMatrix } from '../information-matrix.ts';
import { moorePenrose } from '../moore-penrose.ts';
import type { SearchProblem } from './search-problem.ts';

/**
 * A design in the making, with all that is needed to price a change of it without a factorisation: M = C⁺ and Q = M W M
 * (t·t), W being the weights of the criterion `trace(W C⁺)`.
 */
export interface DesignState {
  readonly t: number;
  readonly b: number;
  /** `cells[start[j] … start[j + 1] − 1]`: treatments of session j, the controls last. */
  readonly cells: Int32Array;
  readonly start: Int32Array;
  /** How many cells of each session may move. */
  readonly movable: Int32Array;
  /** 1/k of each session. */
  readonly share: Float64Array;
  /** `holds[j·t + i]`: 1 when session j holds treatment i. */
  readonly holds: Uint8Array;
  readonly replication: Int32Array;
  readonly M: Float64Array;
  readonly Q: Float64Array;
  /** trace(W C⁺); Infinity when the design is not connected. */
  value: number;
  /** Changes made since everything was last recomputed. */
  changes: number;
  /** Elementary operations spent so far, about; the measure of effort, since it is the same on every device. */
  work: number;
  readonly weights: Float64Array | null;
  /** Room for the vectors of one change: Mu, Mz, Qu, Qz and their transforms. */
  readonly x1: Float64Array;
  readonly x2: Float64Array;
  readonly y1: Float64Array;
  readonly y2: Float64Array;
  readonly e1: Float64Array;
  readonly e2: Float64Array;
}

/** The numbers of one change; see `applyChange`. */
export interface PricedChange {
  a: number;
  beta: number;
  c: number;
  a2: number;
  b2: number;
  c2: number;
}

/** Without any change D is −1; above this a change is taken to disconnect the design. */
export const SINGULAR = -1e-9;

/** After so many changes everything is recomputed, so that rounding does not add up. */
const REFRESH = 500;

/** Returns the empty state of a problem; `loadCells` fills it. */
export function designState(problem: SearchProblem): DesignState {
  const { t, sizes, controls, weights } = problem;
  const start = new Int32Array(sizes.length + 1);
  sizes.forEach((size, j) => (start[j + 1] = start[j]! + size));
  const vector = (): Float64Array => new Float64Array(t);
  return {
    t,
    b: sizes.length,
    cells: new Int32Array(start[sizes.length]!),
    start,
    movable: Int32Array.from(sizes, (size) => size - controls.length),
    share: Float64Array.from(sizes, (size) => 1 / size),
    holds: new Uint8Array(sizes.length * t),
    replication: new Int32Array(t),
    M: new Float64Array(t * t),
    Q: new Float64Array(t * t),
    value: Infinity,
    changes: 0,
    work: 0,
    weights,
    x1: vector(),
    x2: vector(),
    y1: vector(),
    y2: vector(),
    e1: vector(),
    e2: vector()
  };
}

/** Takes over cells and recomputes everything; returns whether the design is connected. */
export function loadCells(state: DesignState, cells: ArrayLike<number>): boolean {
  if (cells.length !== state.cells.length) {
    throw new RangeError(`loadCells: ${cells.length} cells, not ${state.cells.length}`);
  }
  state.cells.set(cells);
  state.holds.fill(0);
  state.replication.fill(0);
  for (let j = 0; j < state.b; j++) {
    for (let s = state.start[j]!; s < state.start[j + 1]!; s++) {
      state.holds[j * state.t + cells[s]!] = 1;
      state.replication[cells[s]!]! += 1;
    }
  }
  return refresh(state);
}

/** Treatments of each session, ascending. */
export function blocksOf(state: DesignState): number[][] {
  return Array.from({ length: state.b }, (_, j) =>
    [...state.cells.subarray(state.start[j], state.start[j + 1])].sort((a, b) => a - b)
  );
}

/** Recomputes M, Q and the value from the cells; returns whether the design is connected. */
export function refresh(state: DesignState): boolean {
  const { t, M, Q, weights } = state;
  state.changes = 0;
  state.work += 6 * t ** 3;
  state.value = Infinity;
  const inverse = moorePenrose(informationMatrix(blocksOf(state), t), t);
  if (!inverse) return false;
  M.set(inverse);
  const weighted = weights ? new Float64Array(t * t) : M;
  if (weights) multiply(weights, M, t, weighted);
  multiply(M, weighted, t, Q);
  const scale = weights ? 1 : 2 / (t - 1);
  let trace = 0;
  for (let i = 0; i < t; i++) trace += weighted[i * t + i]!;
  if (!weights) for (let at = 0; at < t * t; at++) Q[at]! *= scale;
  state.value = scale * trace;
  return true;
}

/**
 * Makes a priced change of M, Q and the value. Every change of a design here turns C into `C + u zᵀ + z uᵀ` with
 * u = e_l − e_i; with
 *
 *     a = uᵀMu, β = 1 + uᵀMz, c = zᵀMz, a₂ = uᵀQu, b₂ = uᵀQz, c₂ = zᵀQz, D = ac − β²
 *
 * the criterion falls by `(c a₂ − 2 β b₂ + a c₂)/D` (Woodbury's identity); D = 0 when the change disconnects. With
 * X = [Mu Mz], S = [a β; β c]⁻¹, E = XS, V = [a₂ b₂; b₂ c₂] and Y = [Qu Qz] − EV/2 the new matrices are `M − E Xᵀ` and
 * `Q − Y Eᵀ − E Yᵀ`.
 *
 * @param state its x1, x2 hold Mu, Mz and y1, y2 hold Qu, Qz
 *
 * Cost: 12 t².
 *
 * **Source**: Nguyen (1994), Construction of optimal block designs by computer, Technometrics 36, 300–307, for updating C⁺
 * instead of refitting; Woodbury (1950) for the identity. The form with two vectors is derived for this file.
 * **Checked by** test/core/design/search/visit-pair.test.ts
 */
export function applyChange(state: DesignState, change: PricedChange): void {
  const { t, M, Q, x1, x2, y1, y2, e1, e2 } = state;
  const { a, beta, c, a2, b2, c2 } = change;
  const determinant = a * c - beta * beta;
  const s11 = c / determinant;
  const s12 = -beta / determinant;
  const s22 = a / determinant;
  for (let i = 0; i < t; i++) {
    const u = s11 * x1[i]! + s12 * x2[i]!;
    const v = s12 * x1[i]! + s22 * x2[i]!;
    e1[i] = u;
    e2[i] = v;
    y1[i]! -= 0.5 * (u * a2 + v * b2);
    y2[i]! -= 0.5 * (u * b2 + v * c2);
  }
  for (let i = 0; i < t; i++) {
    const row = i * t;
    const f1 = x1[i]!;
    const f2 = x2[i]!;
    const g1 = e1[i]!;
    const g2 = e2[i]!;
    const h1 = y1[i]!;
    const h2 = y2[i]!;
    for (let n = 0; n < t; n++) {
      const u = e1[n]!;
      const v = e2[n]!;
      M[row + n]! -= f1 * u + f2 * v;
      Q[row + n]! -= h1 * u + h2 * v + g1 * y1[n]! + g2 * y2[n]!;
    }
  }
  state.value -= (c * a2 - 2 * beta * b2 + a * c2) / determinant;
  state.changes++;
  state.work += 12 * t * t;
  if (state.changes >= REFRESH) refresh(state);
}

function multiply(a: Float64Array, b: Float64Array, n: number, result: Float64Array): void {
  result.fill(0);
  for (let i = 0; i < n; i++) {
    for (let m = 0; m < n; m++) {
      const factor = a[i * n + m]!;
      if (factor === 0) continue;
      for (let j = 0; j < n; j++) result[i * n + j]! += factor * b[m * n + j]!;
    }
  }
}
