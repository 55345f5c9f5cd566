import { tTwoSided } from '../../numerics/distributions/student-t.ts';
import { solveSemidefinite } from '../../numerics/semidefinite-cholesky.ts';
import { leftOutDeviations } from './left-out.ts';
import { mixture, type Located, type Prediction } from './prediction.ts';
import { fitAtRatio, sessionTable, type RatioFit, type RunningReading, type SessionTable } from './session-moments.ts';

/** With fewer error degrees of freedom than this nothing is predicted. */
export const FEWEST_ERROR_DF = 4;
/** An earlier reading is set aside when chance would make the furthest one as odd less often than this. */
const SET_ASIDE = 0.02;
const MOST_SET_ASIDE = 4;

/** Ratios over which the prediction is averaged, as natural logarithms. */
const GRID = { from: -6, to: 18, step: 0.5 };
const COARSE = 4;
/** Where the likeliest ratio is looked for before readings are set aside. */
const LOOK = { from: -4, to: 16, step: 2 };
/** In the logarithm of the posterior. */
const NEGLIGIBLE = 9;

/** The session-random model of the readings that the others do not contradict. */
export interface CleanedModel {
  readonly table: SessionTable;
  readonly setAside: readonly number[];
  readonly predict: (treatment: number, session: number, alpha: number) => Omit<Prediction, 'basis'> | null;
}

/**
 * Fits the session-random model, setting contradicted readings aside one at a time.
 *
 * @param robust whether to set any aside
 * Source and check: as for fitRunningModel.
 */
export function cleanedModel(readings: readonly RunningReading[], robust: boolean): CleanedModel {
  const setAside = new Set<number>();
  let near: number | null = null;
  let table = sessionTable(readings, setAside);
  while (robust && setAside.size < MOST_SET_ASIDE && table.errorDf >= FEWEST_ERROR_DF) {
    const fit = likeliest(table, near);
    const odd = oddest(table, fit);
    if (odd === null) break;
    near = Math.log(fit.ratio);
    setAside.add(odd);
    table = sessionTable(readings, setAside);
  }
  let components: Component[] | null = null;
  return {
    table,
    setAside: [...setAside].sort((a, b) => a - b),
    predict: (treatment, session, alpha) => {
      const i = table.place.get(treatment);
      if (table.errorDf < FEWEST_ERROR_DF || i === undefined) return null;
      components ??= weigh(table);
      if (components.length === 0) return null;
      return mixture(
        components.map(({ fit, weight }) => ({ weight, ...predictAt(table, fit, i, table.session.get(session)) })),
        table.n - table.place.size,
        alpha
      );
    }
  };
}

/** The likeliest ratio on a coarse grid: a look at all of it, or uphill from `near`, the outcome with one reading more. */
function likeliest(table: SessionTable, near: number | null): RatioFit {
  if (near === null) {
    let best = fitAtRatio(table, Math.exp(LOOK.from));
    for (let log = LOOK.from + LOOK.step; log <= LOOK.to; log += LOOK.step) {
      const fit = fitAtRatio(table, Math.exp(log));
      if (fit.logLik > best.logLik) best = fit;
    }
    return best;
  }
  let best = fitAtRatio(table, Math.exp(near));
  for (const direction of [1, -1]) {
    for (let log = near + direction * LOOK.step; log >= LOOK.from && log <= LOOK.to; log += direction * LOOK.step) {
      const fit = fitAtRatio(table, Math.exp(log));
      if (!(fit.logLik > best.logLik)) break;
      best = fit;
    }
  }
  return best;
}

/** Position of the reading that the others contradict most, if they do. */
function oddest(table: SessionTable, best: RatioFit): number | null {
  if (!(best.squares > 0)) return null;
  const deviations = leftOutDeviations(table, best);
  let furthest = 0;
  deviations.forEach((d, row) => {
    if (Math.abs(d) > Math.abs(deviations[furthest]!)) furthest = row;
  });
  const df = table.n - table.place.size - 1;
  const chance = table.n * tTwoSided(deviations[furthest]!, df);
  return chance < SET_ASIDE ? table.origin[furthest]! : null;
}

interface Component {
  readonly fit: RatioFit;
  readonly weight: number;
}

/** Fits over the grid of ratios with their posterior weights; empty where the readings have no scatter. */
function weigh(table: SessionTable): Component[] {
  const size = table.y.reduce((s, v) => s + v * v, 0);
  const fits = new Map<number, RatioFit>();
  const add = (log: number) => {
    if (!fits.has(log)) fits.set(log, fitAtRatio(table, Math.exp(log)));
  };
  // A coarse look first; the fine grid only where the posterior is not negligible.
  for (let log = GRID.from; log <= GRID.to; log += COARSE * GRID.step) add(log);
  const coarse = [...fits];
  if (coarse.some(([, fit]) => !(fit.squares > 1e-26 * size))) return [];
  const top = Math.max(...coarse.map(([, fit]) => logPosterior(fit)));
  for (const [log, fit] of coarse) {
    if (logPosterior(fit) < top - NEGLIGIBLE) continue;
    for (let i = 1 - COARSE; i < COARSE; i++) {
      const near = log + i * GRID.step;
      if (near >= GRID.from && near <= GRID.to) add(near);
    }
  }
  const logs = [...fits.values()].map((fit) => ({ fit, log: logPosterior(fit) }));
  const highest = Math.max(...logs.map(({ log }) => log));
  const kept = logs.filter(({ log }) => log > highest - NEGLIGIBLE);
  const total = kept.reduce((s, { log }) => s + Math.exp(log - highest), 0);
  return kept.map(({ fit, log }) => ({ fit, weight: Math.exp(log - highest) / total }));
}

/** Flat in γ/(1 + γ): a step in ln γ has the width γ/(1 + γ)². */
function logPosterior({ logLik, ratio }: RatioFit): number {
  return logLik + Math.log(ratio) - 2 * Math.log1p(ratio);
}

/** Mean and standard error of the prediction at one ratio; `j` undefined for a session without readings. */
function predictAt(table: SessionTable, fit: RatioFit, i: number, j: number | undefined): Omit<Located, 'weight'> {
  const t = table.place.size;
  const direction = new Float64Array(t);
  direction[i] = 1;
  let offset = 0;
  let spread = 1 + fit.ratio;
  if (j !== undefined) {
    const c = fit.shrink[j]!;
    for (let row = table.start[j]!; row < table.start[j + 1]!; row++) direction[table.treatment[row]!]! -= c;
    offset = c * fit.sessionSum[j]!;
    spread = 1 + c;
  }
  const solved = solveSemidefinite(fit.factor, direction);
  for (let at = 0; at < t; at++) spread += direction[at]! * solved[at]!;
  const variance = fit.squares / (table.n - t);
  return { mean: table.middle + fit.beta[i]! + offset, scale: Math.sqrt(variance * spread) };
}
