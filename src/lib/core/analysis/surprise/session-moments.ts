import {
  factorSemidefinite,
  solveSemidefinite,
  type SemidefiniteFactor
} from '../../numerics/semidefinite-cholesky.ts';

/** One kept reading, as the running model needs it. */
export interface RunningReading {
  readonly treatment: number;
  readonly session: number;
  readonly y: number;
}

/** Readings sorted by session, with treatments numbered as they first occur, and taken about their middle. */
export interface SessionTable {
  readonly n: number;
  /** Number of the treatment in the table, by its number outside. */
  readonly place: ReadonlyMap<number, number>;
  readonly treatment: Int32Array;
  readonly y: Float64Array;
  /** Taken off every y. */
  readonly middle: number;
  /** Position of each row in the readings handed in. */
  readonly origin: Int32Array;
  /** First row of each session, and the number of rows at the end. */
  readonly start: Int32Array;
  /** Number of the session in the table, by its number outside. */
  readonly session: ReadonlyMap<number, number>;
  /** Readings less treatments less sessions plus connected parts. */
  readonly errorDf: number;
  /** Readings and totals of each treatment. */
  readonly replication: Float64Array;
  readonly total: Float64Array;
  readonly sizes: readonly SizeMoments[];
}

/** Sums over the sessions of one size k, which share their shrinkage at every ratio. */
interface SizeMoments {
  readonly k: number;
  readonly sessions: number;
  /** Σ n_j n_jᵀ, t×t. */
  readonly between: Float64Array;
  /** Σ B_j n_j, with B_j the session total. */
  readonly cross: Float64Array;
}

/** Generalised least squares at one ratio γ of session variance to run variance. */
export interface RatioFit {
  readonly ratio: number;
  readonly beta: Float64Array;
  readonly factor: SemidefiniteFactor;
  /** γ/(1 + kγ) of each session. */
  readonly shrink: Float64Array;
  /** Sum of y − treatment mean over each session. */
  readonly sessionSum: Float64Array;
  readonly residual: Float64Array;
  /** Generalised residual sum of squares; over n − t it estimates the run variance. */
  readonly squares: number;
  /** Restricted log-likelihood, up to a constant. */
  readonly logLik: number;
}

/** Sorts readings into a table. `skip` marks positions that are left out. */
export function sessionTable(readings: readonly RunningReading[], skip: ReadonlySet<number>): SessionTable {
  const kept = readings.map((_, i) => i).filter((i) => !skip.has(i));
  kept.sort((a, b) => readings[a]!.session - readings[b]!.session || a - b);
  const place = new Map<number, number>();
  const session = new Map<number, number>();
  const start: number[] = [];
  const sorted = kept.map((i) => readings[i]!.y).sort((a, b) => a - b);
  const middle = sorted[Math.floor(sorted.length / 2)] ?? 0;
  const treatment = new Int32Array(kept.length);
  const y = new Float64Array(kept.length);
  kept.forEach((i, row) => {
    const reading = readings[i]!;
    if (!place.has(reading.treatment)) place.set(reading.treatment, place.size);
    if (!session.has(reading.session)) {
      session.set(reading.session, session.size);
      start.push(row);
    }
    treatment[row] = place.get(reading.treatment)!;
    y[row] = reading.y - middle;
  });
  start.push(kept.length);
  const table = { n: kept.length, place, treatment, y, middle, origin: Int32Array.from(kept), session };
  const starts = Int32Array.from(start);
  const t = place.size;
  const replication = new Float64Array(t);
  const total = new Float64Array(t);
  for (let row = 0; row < kept.length; row++) {
    replication[treatment[row]!]! += 1;
    total[treatment[row]!]! += y[row]!;
  }
  const errorDf = kept.length - t - session.size + countParts(treatment, starts, t);
  return { ...table, start: starts, errorDf, replication, total, sizes: sizeMoments(treatment, y, starts, t) };
}

function sizeMoments(treatment: Int32Array, y: Float64Array, start: Int32Array, t: number): SizeMoments[] {
  const bySize = new Map<number, { k: number; sessions: number; between: Float64Array; cross: Float64Array }>();
  for (let j = 0; j + 1 < start.length; j++) {
    const from = start[j]!;
    const to = start[j + 1]!;
    const k = to - from;
    let own = bySize.get(k);
    if (!own) bySize.set(k, (own = { k, sessions: 0, between: new Float64Array(t * t), cross: new Float64Array(t) }));
    own.sessions++;
    let sum = 0;
    for (let row = from; row < to; row++) sum += y[row]!;
    for (let row = from; row < to; row++) {
      own.cross[treatment[row]!]! += sum;
      for (let other = from; other < to; other++) own.between[treatment[row]! * t + treatment[other]!]! += 1;
    }
  }
  return [...bySize.values()];
}

/** Connected parts of the treatment–session graph. */
function countParts(treatment: Int32Array, start: Int32Array, t: number): number {
  const parent = Int32Array.from({ length: t }, (_, i) => i);
  const root = (i: number): number => {
    while (parent[i] !== i) i = parent[i] = parent[parent[i]!]!;
    return i;
  };
  for (let j = 0; j + 1 < start.length; j++) {
    for (let row = start[j]! + 1; row < start[j + 1]!; row++) {
      parent[root(treatment[row]!)] = root(treatment[start[j]!]!);
    }
  }
  let parts = 0;
  for (let i = 0; i < t; i++) if (root(i) === i) parts++;
  return parts;
}

/**
 * Fits treatment means with sessions random at a given ratio, by generalised least squares on the t×t moments.
 *
 *     M = diag(r) − Σ_j c_j n_j n_jᵀ,  M β = T − Σ_j c_j B_j n_j,  c_j = γ/(1 + k_j γ)
 *
 * @param ratio γ at least 0
 * Cost: t³/3 + n.
 * Source: H. D. Patterson & R. Thompson (1971), Biometrika 58, 545–554, reduced to the treatments.
 * Checked by: test/core/analysis/surprise/running-model.test.ts
 */
export function fitAtRatio(table: SessionTable, ratio: number): RatioFit {
  const { n, start } = table;
  const t = table.place.size;
  const b = start.length - 1;
  const moments = new Float64Array(t * t);
  const right = table.total.slice();
  let logDet = 0;
  for (let i = 0; i < t; i++) moments[i * (t + 1)] = table.replication[i]!;
  for (const { k, sessions, between, cross } of table.sizes) {
    const c = ratio / (1 + k * ratio);
    logDet += sessions * Math.log1p(k * ratio);
    for (let at = 0; at < t * t; at++) moments[at]! -= c * between[at]!;
    for (let i = 0; i < t; i++) right[i]! -= c * cross[i]!;
  }
  const factor = factorSemidefinite(moments, t, undefined, 1e-14);
  const beta = solveSemidefinite(factor, right);
  const residual = new Float64Array(n);
  const shrink = new Float64Array(b);
  const sessionSum = new Float64Array(b);
  let squares = 0;
  for (let j = 0; j < b; j++) {
    const k = start[j + 1]! - start[j]!;
    const mean = sumInto(residual, table, beta, j) / k;
    shrink[j] = ratio / (1 + k * ratio);
    sessionSum[j] = mean * k;
    // Σe² − c(Σe)² as scatter in the session plus what is left of its mean, so that nothing cancels at large ratios.
    for (let row = start[j]!; row < start[j + 1]!; row++) squares += (residual[row]! - mean) ** 2;
    squares += (k * mean * mean) / (1 + k * ratio);
  }
  const logLik = -0.5 * ((n - t) * Math.log(squares) + logDet + factor.logDet);
  return { ratio, beta, factor, shrink, sessionSum, residual, squares, logLik };
}

function sumInto(residual: Float64Array, table: SessionTable, beta: Float64Array, j: number): number {
  let sum = 0;
  for (let row = table.start[j]!; row < table.start[j + 1]!; row++) {
    residual[row] = table.y[row]! - beta[table.treatment[row]!]!;
    sum += residual[row]!;
  }
  return sum;
}
