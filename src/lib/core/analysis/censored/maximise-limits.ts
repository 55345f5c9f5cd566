import {
  factorSemidefinite,
  solveSemidefinite,
  type SemidefiniteFactor
} from '../../numerics/semidefinite-cholesky.ts';
import { fail, ok } from '../../result.ts';
import type { RunTable } from '../model/run-table.ts';
import type { Limit } from '../observations.ts';
import type { Section } from '../reason.ts';
import { limitTerm } from './limit-terms.ts';

const STEPS = 100;

/**
 * The normal model with sessions fixed and readings that stopped at a limit, in Olsen's parameters: with ρ = 1/σ and θ = β/σ the
 * residual r = ρy − x̃ᵀθ is linear and the log-likelihood is concave, so that Newton's method cannot go to a wrong hill.
 */
export interface LimitProblem {
  table: RunTable;
  /** Limit of each run. */
  limits: readonly Limit[];
  /** Columns of the model matrix that have a coefficient. */
  columns: Int32Array;
  /** Response, centred and scaled to about unit spread. */
  y: Float64Array;
}

export interface LimitMaximum {
  problem: LimitProblem;
  /** Minus θ of each session. */
  sessions: Float64Array;
  /** θ of each column, then ρ; length q + 1. */
  coefficients: Float64Array;
  logLik: number;
  iterations: number;
  information: Information;
}

/** Observed information with the sessions eliminated: diagonal over sessions, cross products, and the factored rest. */
export interface Information {
  diagonal: Float64Array;
  /** b×(q+1). */
  cross: Float64Array;
  factor: SemidefiniteFactor;
}

/**
 * Maximises the likelihood from a start by damped Newton steps; sessions are eliminated, so that a step costs (q + 1)³ and
 * n·width².
 *
 * @param start θ of the columns and ρ; sessions
 *
 * Source: R. J. Olsen (1978), Note on the uniqueness of the maximum likelihood estimator for the Tobit model, Econometrica
 * 46, 1211–1215.
 * Checked by: test/core/analysis/censored/fit-censored.test.ts (R's survreg)
 */
export function maximiseLimits(
  problem: LimitProblem,
  start: { sessions: Float64Array; coefficients: Float64Array }
): Section<LimitMaximum> {
  let { sessions, coefficients } = start;
  const q = problem.columns.length;
  let state = evaluate(problem, sessions, coefficients);
  for (let iterations = 1; iterations <= STEPS; iterations++) {
    const information = eliminate(problem, state);
    if (information === null) return fail({ tag: 'no-maximum', treatments: [] });
    const step = newtonStep(information, state);
    let size = 1;
    let next: State | null = null;
    let moved = { sessions, coefficients };
    while (size > 1e-10) {
      moved = {
        sessions: sessions.map((v, j) => v + size * step.sessions[j]!),
        coefficients: coefficients.map((v, i) => v + size * step.coefficients[i]!)
      };
      if (moved.coefficients[q]! > 0) {
        next = evaluate(problem, moved.sessions, moved.coefficients);
        if (next.logLik >= state.logLik - 1e-12 * Math.abs(state.logLik)) break;
      }
      next = null;
      size /= 2;
    }
    // Half of gᵀI⁻¹g is what the likelihood can still gain, whatever the scale of the parameters.
    const gain = step.decrement / 2;
    if (next === null || gain < 1e-20 * Math.max(1, Math.abs(state.logLik))) {
      const settled = gain < 1e-9 * Math.max(1, Math.abs(state.logLik));
      if (!settled) return fail({ tag: 'did-not-converge', iterations });
      return ok({ problem, sessions, coefficients, logLik: state.logLik, iterations, information });
    }
    ({ sessions, coefficients } = moved);
    state = next;
    // A likelihood that grows only by sending a parameter away has no maximum.
    if (coefficients.some((v) => Math.abs(v) > 1e7)) return fail({ tag: 'no-maximum', treatments: [] });
  }
  return fail({ tag: 'did-not-converge', iterations: STEPS });
}

interface State {
  logLik: number;
  /** Derivatives by the sessions and by the coefficients. */
  sessionSlope: Float64Array;
  slope: Float64Array;
  weight: Float64Array;
  rho: number;
  read: number;
}

function evaluate({ table, limits, columns, y }: LimitProblem, sessions: Float64Array, c: Float64Array): State {
  const q = columns.length;
  const rho = c[q]!;
  const place = placeOf(table, columns);
  const sessionSlope = new Float64Array(table.b);
  const slope = new Float64Array(q + 1);
  const weight = new Float64Array(table.n);
  let logLik = 0;
  let read = 0;
  for (let j = 0; j < table.b; j++) {
    for (let i = table.start[j]!; i < table.start[j + 1]!; i++) {
      let r = sessions[j]! + rho * y[i]!;
      for (let e = i * table.width; e < (i + 1) * table.width; e++) {
        const at = place[table.column[e]!]!;
        if (at >= 0) r -= table.value[e]! * c[at]!;
      }
      const term = limitTerm(r, limits[i]!);
      logLik += term.logLik;
      weight[i] = term.weight;
      sessionSlope[j]! += term.slope;
      slope[q]! += term.slope * y[i]!;
      for (let e = i * table.width; e < (i + 1) * table.width; e++) {
        const at = place[table.column[e]!]!;
        if (at >= 0) slope[at]! -= term.slope * table.value[e]!;
      }
      if (limits[i] === 'none') read++;
    }
  }
  slope[q]! += read / rho;
  return { logLik: logLik + read * Math.log(rho), sessionSlope, slope, weight, rho, read };
}

const placeOf = (table: RunTable, columns: Int32Array): Int32Array => {
  const place = new Int32Array(table.p).fill(-1);
  columns.forEach((c, i) => (place[c] = i));
  return place;
};

function eliminate({ table, columns, y }: LimitProblem, state: State): Information | null {
  const q = columns.length;
  const m = q + 1;
  const place = placeOf(table, columns);
  const diagonal = new Float64Array(table.b);
  const cross = new Float64Array(table.b * m);
  const rest = new Float64Array(m * m);
  const entry = new Int32Array(table.width + 1);
  const value = new Float64Array(table.width + 1);
  for (let j = 0; j < table.b; j++) {
    for (let i = table.start[j]!; i < table.start[j + 1]!; i++) {
      let size = 0;
      for (let e = i * table.width; e < (i + 1) * table.width; e++) {
        const at = place[table.column[e]!]!;
        if (at < 0) continue;
        entry[size] = at;
        value[size++] = -table.value[e]!;
      }
      entry[size] = q;
      value[size++] = y[i]!;
      const w = state.weight[i]!;
      diagonal[j]! += w;
      for (let a = 0; a < size; a++) {
        cross[j * m + entry[a]!]! += w * value[a]!;
        for (let b = 0; b < size; b++) rest[entry[a]! * m + entry[b]!]! += w * value[a]! * value[b]!;
      }
    }
  }
  rest[q * m + q]! += state.read / state.rho ** 2;
  const scale = Float64Array.from({ length: m }, (_, i) => rest[i * m + i]!);
  for (let j = 0; j < table.b; j++) {
    if (!(diagonal[j]! > 1e-12)) return null;
    for (let a = 0; a < m; a++) {
      const f = cross[j * m + a]! / diagonal[j]!;
      if (f !== 0) for (let b = 0; b < m; b++) rest[a * m + b]! -= f * cross[j * m + b]!;
    }
  }
  const factor = factorSemidefinite(rest, m, scale, 1e-13);
  return factor.rank < m ? null : { diagonal, cross, factor };
}

/** Solves information·x = (sessions, coefficients). */
export function solveInformation(
  { diagonal, cross, factor }: Information,
  sessions: Float64Array,
  coefficients: Float64Array
): { sessions: Float64Array; coefficients: Float64Array } {
  const m = coefficients.length;
  const rhs = coefficients.slice();
  for (let j = 0; j < diagonal.length; j++) {
    const f = sessions[j]! / diagonal[j]!;
    if (f !== 0) for (let a = 0; a < m; a++) rhs[a]! -= f * cross[j * m + a]!;
  }
  const x = solveSemidefinite(factor, rhs);
  const s = sessions.map((v, j) => {
    let left = v;
    for (let a = 0; a < m; a++) left -= cross[j * m + a]! * x[a]!;
    return left / diagonal[j]!;
  });
  return { sessions: s, coefficients: x };
}

function newtonStep(
  information: Information,
  { sessionSlope, slope }: State
): { sessions: Float64Array; coefficients: Float64Array; decrement: number } {
  const { sessions, coefficients } = solveInformation(information, sessionSlope, slope);
  const decrement =
    sessions.reduce((s, v, j) => s + v * sessionSlope[j]!, 0) + coefficients.reduce((s, v, i) => s + v * slope[i]!, 0);
  return { sessions, coefficients, decrement };
}
