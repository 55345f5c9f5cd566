import { aValue } from '../a-value.ts';
import { combinationCount } from '../catalogue/all-combinations.ts';
import { connectedParts } from '../connected-parts.ts';
import { informationMatrix } from '../information-matrix.ts';
import { moorePenrose } from '../moore-penrose.ts';

/** The one more session that brings the A-value down most. */
export interface ExtraSession {
  /** A-value with it. */
  aValue: number;
  /** Every session that gives this A-value (to a relative 1e-9), each ascending; of a search only the one it found. */
  sessions: number[][];
  /** Whether every possible session was priced. */
  exhaustive: boolean;
}

/** The A-value of a design with one more session; infinite while some difference cannot be estimated. */
export type SessionPricing = (session: readonly number[]) => number;

/** Elementary operations that an exhaustive answer may take. */
const EXHAUSTIVE = 1.2e9;
const TIE = 1e-9;

/**
 * Returns how much the A-value falls by one more session.
 *
 * The session adds `I − J/k` on its treatments to C, the sum of k − 1 rank-one terms vvᵀ with Helmert's contrasts v; each
 * turns M = C⁺ into `M − Mv vᵀM/(1 + vᵀMv)` and lets the A-value fall by `vᵀQv/(1 + vᵀMv)`, Q = 2/(t − 1)·M². Only the rows and
 * columns of the session's treatments are needed.
 *
 * @param M Moore–Penrose inverse of a connected design's C, t·t
 * @param Q 2/(t − 1)·M², t·t
 * @param session its treatments
 *
 * Cost: 8 k³.
 *
 * **Source**: Sherman & Morrison (1950), Annals of Mathematical Statistics 21, 124–127.
 * **Checked by** test/core/design/repair/extra-session.test.ts
 */
export function fallByExtraSession(M: Float64Array, Q: Float64Array, t: number, session: readonly number[]): number {
  const k = session.length;
  const m = new Float64Array(k * k);
  const n = new Float64Array(k * k);
  for (let a = 0; a < k; a++) {
    for (let b = 0; b < k; b++) {
      m[a * k + b] = M[session[a]! * t + session[b]!]!;
      n[a * k + b] = Q[session[a]! * t + session[b]!]!;
    }
  }
  const p = new Float64Array(k);
  const q = new Float64Array(k);
  let fall = 0;
  for (let last = 1; last < k; last++) {
    const unit = 1 / Math.sqrt(last * (last + 1));
    let vMv = 0;
    let vQv = 0;
    for (let a = 0; a < k; a++) {
      let sum = -last * m[a * k + last]!;
      let sum2 = -last * n[a * k + last]!;
      for (let b = 0; b < last; b++) {
        sum += m[a * k + b]!;
        sum2 += n[a * k + b]!;
      }
      p[a] = unit * sum;
      q[a] = unit * sum2;
    }
    for (let a = 0; a <= last; a++) {
      const v = a < last ? unit : -last * unit;
      vMv += v * p[a]!;
      vQv += v * q[a]!;
    }
    const s = 1 / (1 + vMv);
    fall += s * vQv;
    for (let a = 0; a < k; a++) {
      for (let b = 0; b < k; b++) {
        m[a * k + b]! -= s * p[a]! * p[b]!;
        n[a * k + b]! += s * (s * vQv * p[a]! * p[b]! - p[a]! * q[b]! - q[a]! * p[b]!);
      }
    }
  }
  return fall;
}

/**
 * Returns the one more session of k treatments that leaves the least A-value, or null when no single session can make
 * every difference estimable (more parts than slots, or a part without a specimen).
 *
 * Every session is priced where that is feasible; else one is built treatment by treatment and improved by exchanges
 * until none helps. A design that is not connected is refitted for each session that touches all its parts, as long as every
 * one is priced; a search there weighs sessions by faint ties between the parts and refits only what it found.
 *
 * @param blocks sessions with what was kept of them
 * @param treatments number of treatments t
 * @param available treatments that still have specimens
 * @param k slots of the session
 * @param priced what `sessionPricing(blocks, treatments)` gave, where it is known already
 *
 * **Checked by** test/core/design/repair/extra-session.test.ts
 */
export function bestExtraSession(
  blocks: readonly (readonly number[])[],
  treatments: number,
  available: readonly number[],
  k: number,
  priced?: SessionPricing | null
): ExtraSession | null {
  const t = treatments;
  const size = Math.min(k, available.length);
  if (size < 2) return null;
  const kept = blocks.filter((block) => block.length > 0);
  const parts = connectedParts(kept, t);
  const reachable = parts.every((part) => part.some((i) => available.includes(i)));
  if (parts.length > size || !reachable) return null;

  const sorted = [...available].sort((a, b) => a - b);
  const joined = parts.length === 1;
  const exact = joined
    ? (priced ?? sessionPricing(kept, t)!)
    : joining(parts, t, (session) => aValue([...kept, session], t));
  const each = joined ? 8 * size ** 3 : t ** 3;
  if (combinationCount(available.length, size) * each <= EXHAUSTIVE) return cheapest(sorted, size, exact);
  const found = improved(sorted, size, parts, joined ? exact : joining(parts, t, weaklyTied(kept, parts, t)));
  return found && { ...found, aValue: exact(found.sessions[0]!) };
}

/**
 * Returns the function that prices one more session of a connected design: its A-value with it, without a refit; null when the
 * design is not connected.
 *
 * Cost: t³ once, 8 k³ a session.
 * **Checked by** test/core/design/repair/extra-session.test.ts
 */
export function sessionPricing(kept: readonly (readonly number[])[], t: number): SessionPricing | null {
  const M = moorePenrose(informationMatrix(kept, t), t);
  return M ? pricing(M, t) : null;
}

function pricing(M: Float64Array, t: number): SessionPricing {
  const Q = new Float64Array(t * t);
  let now = 0;
  for (let i = 0; i < t; i++) {
    now += (2 / (t - 1)) * M[i * t + i]!;
    for (let l = 0; l <= i; l++) {
      let sum = 0;
      for (let m = 0; m < t; m++) sum += M[i * t + m]! * M[l * t + m]!;
      Q[i * t + l] = Q[l * t + i] = (2 / (t - 1)) * sum;
    }
  }
  return (session) => now - fallByExtraSession(M, Q, t, session);
}

/** A session that leaves a part untouched leaves the design in parts. */
function joining(parts: readonly (readonly number[])[], t: number, price: SessionPricing): SessionPricing {
  const partOf = new Int32Array(t);
  parts.forEach((part, at) => part.forEach((i) => (partOf[i] = at)));
  return (session) => (new Set(session.map((i) => partOf[i]!)).size < parts.length ? Infinity : price(session));
}

/** Weight of the ties between parts, as a share of the mean diagonal of C. */
const WEAK = 1e-3;

/**
 * Prices sessions of a design in parts as if faint ties held the parts together: enough to tell sessions apart without a refit
 * for each; whoever uses it prices what is found exactly.
 */
function weaklyTied(
  kept: readonly (readonly number[])[],
  parts: readonly (readonly number[])[],
  t: number
): SessionPricing {
  const c = informationMatrix(kept, t);
  let trace = 0;
  for (let i = 0; i < t; i++) trace += c[i * t + i]!;
  // Every treatment of a part is tied to every one of the first, so that none of them is preferred.
  const [first, ...others] = parts;
  for (const part of others) {
    const weight = (WEAK * trace) / (t * part.length * first!.length);
    for (const i of part) {
      for (const l of first!) {
        c[i * t + i]! += weight;
        c[l * t + l]! += weight;
        c[i * t + l]! -= weight;
        c[l * t + i]! -= weight;
      }
    }
  }
  return pricing(moorePenrose(c, t)!, t);
}

function cheapest(available: readonly number[], size: number, price: SessionPricing): ExtraSession | null {
  let least = Infinity;
  let sessions: number[][] = [];
  const at = Array.from({ length: size }, (_, n) => n);
  for (;;) {
    const session = at.map((n) => available[n]!);
    const value = price(session);
    if (value < least * (1 - TIE)) sessions = [];
    if (value <= least * (1 + TIE) && value < Infinity) sessions.push(session);
    least = Math.min(least, value);
    let move = size - 1;
    while (move >= 0 && at[move]! === available.length - size + move) move--;
    if (move < 0) break;
    at[move]! += 1;
    for (let n = move + 1; n < size; n++) at[n] = at[n - 1]! + 1;
  }
  return least === Infinity ? null : { aValue: least, sessions, exhaustive: true };
}

/** Begins with one treatment of each part and the first others; exchanges while the best exchange helps. */
function improved(
  available: readonly number[],
  size: number,
  parts: readonly (readonly number[])[],
  price: SessionPricing
): ExtraSession | null {
  const needed = parts.length > 1 ? parts.map((part) => part.find((i) => available.includes(i))!) : [];
  let session = [...needed, ...available.filter((i) => !needed.includes(i))].slice(0, size);
  let least = price(session);
  for (;;) {
    let next: number[] | null = null;
    for (let n = 0; n < size; n++) {
      for (const i of available) {
        if (session.includes(i)) continue;
        const other = [...session];
        other[n] = i;
        const value = price(other);
        if (value < least * (1 - 1e-12)) [least, next] = [value, other];
      }
    }
    if (!next) break;
    session = next;
  }
  if (least === Infinity) return null;
  return { aValue: least, sessions: [[...session].sort((a, b) => a - b)], exhaustive: false };
}
