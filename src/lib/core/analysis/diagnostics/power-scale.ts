import { chiSquaredUpper, chiSquaredUpperQuantile } from '../../numerics/distributions/chi-squared.ts';
import { findRoot } from '../../numerics/find-root.ts';
import { fail, ok } from '../../result.ts';
import type { PowerScale } from '../check-result.ts';
import { fitFixed, type FixedModel } from '../fixed/fit-fixed.ts';
import { solveIntra } from '../fixed/intra-projection.ts';
import type { Parts } from '../model/parts.ts';
import type { RunTable } from '../model/run-table.ts';
import type { Section } from '../reason.ts';
import { power, powerSlope, unpower } from './power-transform.ts';

const LIMIT = 5;
const GRID = [-2, -1.5, -1, -0.5, 0, 0.5, 1, 1.5, 2];
const HANDY = [-2, -1, -0.5, 0, 0.5, 1, 2, 3];
/** Largest over smallest reading below which no power makes a difference that can be seen. */
const NARROW = 1 + 1e-5;

/**
 * Returns the profile likelihood of a power transformation, its maximum in [−5, 5], its 95 % interval, and the analysis
 * repeated on the handy power nearest to the maximum inside the interval (not where the scale as it is lies inside).
 *
 *     ℓ(λ) = −(n/2)·log RSS(((y/ġ)^λ − 1)/λ),   ġ the geometric mean
 *
 * Back-transformed means are medians on the scale of the readings.
 *
 * Source: G. E. P. Box & D. R. Cox (1964), J. Roy. Statist. Soc. B 26, 211–252.
 * Checked by: test/reference-run, test/core/analysis/diagnostics/power-scale.test.ts
 */
export function powerScale(fixed: FixedModel, parts: Parts, alpha: number): Section<PowerScale> {
  const { model, sigma } = fixed;
  const { table } = model;
  const { n } = table;
  const y = table.y.map((v) => v + table.centre);
  const bad = Array.from(table.rowIndex).filter((_, i) => !(y[i]! > 0));
  if (bad.length > 0) return fail({ tag: 'not-positive', rows: bad.sort((a, b) => a - b) });
  if (sigma === null) return fail({ tag: 'no-scatter' });
  const ratio = y.reduce((m, v) => Math.max(m, v), 0) / y.reduce((m, v) => Math.min(m, v), Infinity);
  if (ratio < NARROW) return fail({ tag: 'narrow-range', ratio });
  const meanLog = y.reduce((s, v) => s + Math.log(v), 0) / n;
  const u = y.map((v) => v / Math.exp(meanLog));
  const errorSs = (lambda: number): number => {
    const z = u.map((v) => power(v, lambda));
    return solveIntra(model, z).errorSs;
  };
  const logLik = (lambda: number): number => (-n / 2) * Math.log(errorSs(lambda));
  const score = (lambda: number): number => {
    const z = u.map((v) => power(v, lambda));
    const solution = solveIntra(model, z);
    let slope = 0;
    for (let i = 0; i < n; i++) slope += solution.residual[i]! * powerSlope(u[i]!, lambda);
    return (-n * slope) / solution.errorSs;
  };
  const { lambda, atLimit } = maximum(logLik, score);
  const top = logLik(lambda);
  const drop = chiSquaredUpperQuantile(0.05, 1) / 2;
  const end = (side: -1 | 1): number | null => {
    const excess = (l: number): number => logLik(l) - (top - drop);
    const limit = side * LIMIT;
    if (lambda === limit || excess(limit) > 0) return null;
    return findRoot(excess, lambda, limit, 1e-12).root;
  };
  const [lower, upper] = [end(-1), end(1)];
  const statistic = 2 * (top - logLik(1));
  const inside = (l: number): boolean => l >= (lower ?? -LIMIT) && l <= (upper ?? LIMIT);
  const nearest = HANDY.filter(inside).sort((a, b) => Math.abs(a - lambda) - Math.abs(b - lambda))[0];
  const chosen = inside(1) ? 1 : (nearest ?? Math.round(lambda * 10) / 10);
  return ok({
    lambda,
    atLimit,
    logLik: top,
    lower,
    upper,
    asIs: { statistic, p: chiSquaredUpper(Math.max(0, statistic), 1) },
    grid: GRID.map((l) => ({ lambda: l, logLik: logLik(l) })),
    chosen,
    refit: chosen === 1 ? null : refit(fixed, parts, alpha, y, chosen)
  });
}

function maximum(logLik: (l: number) => number, score: (l: number) => number): { lambda: number; atLimit: boolean } {
  const step = 0.25;
  const places = Array.from({ length: (2 * LIMIT) / step + 1 }, (_, i) => -LIMIT + i * step);
  const heights = places.map(logLik);
  const best = places[heights.indexOf(Math.max(...heights))]!;
  const slope = score(best);
  if (slope === 0) return { lambda: best, atLimit: false };
  const other = best + Math.sign(slope) * step;
  if (Math.abs(other) > LIMIT) return { lambda: best, atLimit: true };
  if (score(other) * slope > 0) return { lambda: best, atLimit: false };
  return { lambda: findRoot(score, best, other, 1e-13).root, atLimit: false };
}

function refit(fixed: FixedModel, parts: Parts, alpha: number, y: Float64Array, lambda: number): PowerScale['refit'] {
  const { model } = fixed;
  const z = y.map((v) => power(v, lambda));
  const magnitude = z.reduce((m, v) => Math.max(m, Math.abs(v)), 0);
  const table: RunTable = { ...model.table, y: z, centre: 0, magnitude };
  const again = { ...model, table };
  const solution = solveIntra(again, z);
  const sigma = Math.sqrt(solution.errorSs / model.errorDf);
  const fit = fitFixed({ model: again, solution, sigma }, parts, alpha, null);
  const back = (v: number | null): number | null => (v === null ? null : unpower(v, lambda));
  return {
    fit,
    back: fit.means.map(({ treatment, estimate, lower, upper }) => ({
      treatment,
      median: back(estimate),
      lower: back(lower),
      upper: back(upper)
    }))
  };
}
