import { chiSquaredUpper } from '../../numerics/distributions/chi-squared.ts';
import { normalQuantile, normalUpper } from '../../numerics/distributions/normal.ts';
import { fail, ok } from '../../result.ts';
import type { CensoredFit } from '../check-result.ts';
import { estimable, prepareIntra, solveIntra, type IntraModel } from '../fixed/intra-projection.ts';
import { buildRunTable } from '../model/build-run-table.ts';
import { equalWeights } from '../model/equal-weights.ts';
import { momentsOf } from '../model/moments.ts';
import { partsOf } from '../model/parts.ts';
import { withoutBetween } from '../model/run-table.ts';
import { fittedBy, sessionMeans } from '../model/run-vectors.ts';
import type { Observations } from '../observations.ts';
import type { Section } from '../reason.ts';
import { maximiseLimits, solveInformation, type LimitMaximum, type LimitProblem } from './maximise-limits.ts';
import { settledRows } from './settled-rows.ts';

/**
 * Fits the normal model with sessions fixed to readings of which some stopped at a limit, by maximum likelihood: adjusted
 * means (averaged over the sessions with equal weight), all pairs by Wald's test, likelihood-ratio test of the treatments.
 *
 * With few runs a session the maximum-likelihood standard deviation is too small (it divides by n, not by the degrees of
 * freedom) and so are the standard errors; the ordinary analysis stands beside it.
 *
 * @param kept positions of the kept rows
 *
 * Source: J. Tobin (1958), Econometrica 26, 24–36; R. J. Olsen (1978), Econometrica 46, 1211–1215.
 * Checked by: test/core/analysis/censored/fit-censored.test.ts (R's survival::survreg)
 */
export function fitCensored(observations: Observations, kept: readonly number[]): Section<CensoredFit> {
  const limited = kept.filter((r) => observations.rows[r]!.limit !== 'none').length;
  if (limited === 0) return fail({ tag: 'no-limits' });
  const { rows, unbounded } = settledRows(observations, kept);
  const left = new Set(rows.map((r) => observations.rows[r]!.treatment));
  if (left.size < 2) return fail({ tag: 'no-maximum', treatments: unbounded });
  const table = withoutBetween(buildRunTable(observations, rows).table);
  const intra = prepareIntra(table, momentsOf(table));
  const treatments = table.terms[0]!.size;
  const free = columnsOf(intra);
  const fitted = fitColumns(observations, intra, free);
  if (!fitted.ok) return fitted;
  const maximum = fitted.value;
  const { scale } = maximum;
  const rho = maximum.coefficients.at(-1)!;
  const variance = (sessions: Float64Array, coefficients: Float64Array): number => {
    const x = solveInformation(maximum.information, sessions, coefficients);
    return (
      x.sessions.reduce((s, v, j) => s + v * sessions[j]!, 0) +
      x.coefficients.reduce((s, v, i) => s + v * coefficients[i]!, 0)
    );
  };
  const z = normalQuantile(1 - observations.alpha / 2);
  const none = new Float64Array(table.b);
  const unit = (at: number, size: number): Float64Array => {
    const e = new Float64Array(size);
    e[at] = 1;
    return e;
  };
  const last = free.length;
  const sigmaSe = (Math.sqrt(variance(none, unit(last, last + 1))) / rho ** 2) * scale;
  const means = adjustedMeans(maximum, intra, observations, variance, z);
  const restricted = free.filter((c) => c >= treatments);
  const without = fitColumns(observations, intra, restricted);
  const df = free.length - restricted.length;
  if (df < 1) return fail({ tag: 'no-shared-session' });
  const statistic = without.ok ? Math.max(0, 2 * (maximum.logLik - without.value.logLik)) : 0;
  return ok({
    n: rows.length,
    limited,
    logLik: maximum.logLik,
    sigma: scale / rho,
    sigmaSe,
    iterations: maximum.iterations,
    means,
    pairs: pairsOf(maximum, intra, variance),
    test: without.ok ? ok({ statistic, df, p: chiSquaredUpper(statistic, df) }) : without
  });
}

/** A maximum with the scale of its response undone in `logLik`. */
interface ScaledMaximum extends LimitMaximum {
  centre: number;
  scale: number;
}

const columnsOf = (intra: IntraModel): Int32Array =>
  Int32Array.from([...intra.factor.kept.keys()].filter((c) => intra.factor.kept[c] === 1));

function fitColumns(observations: Observations, intra: IntraModel, columns: Int32Array): Section<ScaledMaximum> {
  const { table } = intra;
  const start = solveIntra(intra, table.y);
  const sd = Math.sqrt(table.y.reduce((s, v) => s + v * v, 0) / table.n);
  if (!(sd > 0)) return fail({ tag: 'no-scatter' });
  const y = table.y.map((v) => v / sd);
  const limits = Array.from(table.rowIndex, (row) => observations.rows[row]!.limit);
  const problem: LimitProblem = { table, limits, columns, y };
  // Start from the limits taken as values.
  const sigma = Math.max(Math.sqrt(start.errorSs / table.n) / sd, 1e-3);
  const beta = new Float64Array(table.p);
  for (const c of columns) beta[c] = start.beta[c]! / sd;
  const fit = fittedBy(table, beta);
  const offsets = sessionMeans(
    table,
    y.map((v, i) => v - fit[i]!)
  );
  const found = maximiseLimits(problem, {
    sessions: offsets.map((v) => -v / sigma),
    coefficients: Float64Array.from([...columns].map((c) => beta[c]! / sigma).concat(1 / sigma))
  });
  if (!found.ok) return found;
  const read = limits.filter((limit) => limit === 'none').length;
  const logLik = found.value.logLik - read * Math.log(sd);
  return ok({ ...found.value, logLik, centre: table.centre, scale: sd });
}

type Variance = (sessions: Float64Array, coefficients: Float64Array) => number;

function adjustedMeans(
  maximum: ScaledMaximum,
  intra: IntraModel,
  observations: Observations,
  variance: Variance,
  z: number
): CensoredFit['means'] {
  const { table, nulls } = intra;
  const { problem, sessions, coefficients, scale, centre } = maximum;
  const { columns } = problem;
  const q = columns.length;
  const rho = coefficients[q]!;
  const parts = partsOf(table);
  const weights = equalWeights(table);
  return observations.treatments.map((_, treatment) => {
    const none = { treatment, estimate: null, se: null, lower: null, upper: null };
    const part = parts.ofTreatment[treatment]!;
    if (part < 0) return none;
    const members = [...parts.ofSession.keys()].filter((j) => parts.ofSession[j] === part);
    const l = weights.slice();
    l[treatment]! += 1;
    const check = l.slice();
    for (const j of members) {
      const k = table.start[j + 1]! - table.start[j]!;
      for (let e = table.start[j]! * table.width; e < table.start[j + 1]! * table.width; e++) {
        check[table.column[e]!]! -= table.value[e]! / (k * members.length);
      }
    }
    if (!estimable(nulls, check)) return none;
    // μ = (xᵀθ − mean of the session parameters)/ρ, with its derivatives.
    let eta = 0;
    const gradient = new Float64Array(q + 1);
    columns.forEach((c, i) => {
      eta += l[c]! * coefficients[i]!;
      gradient[i] = l[c]! / rho;
    });
    const session = new Float64Array(table.b);
    for (const j of members) {
      eta -= sessions[j]! / members.length;
      session[j] = -1 / (rho * members.length);
    }
    const mu = eta / rho;
    gradient[q] = -mu / rho;
    const estimate = centre + scale * mu;
    const se = scale * Math.sqrt(variance(session, gradient));
    return { treatment, estimate, se, lower: estimate - z * se, upper: estimate + z * se };
  });
}

function pairsOf(maximum: ScaledMaximum, intra: IntraModel, variance: Variance): CensoredFit['pairs'] {
  const { table, nulls } = intra;
  const { problem, coefficients, scale } = maximum;
  const q = problem.columns.length;
  const rho = coefficients[q]!;
  const place = new Int32Array(table.p).fill(-1);
  problem.columns.forEach((c, i) => (place[c] = i));
  const parts = partsOf(table);
  const none = new Float64Array(table.b);
  const t = table.terms[0]!.size;
  const pairs: CensoredFit['pairs'] = [];
  for (let a = 0; a < t; a++) {
    for (let b = a + 1; b < t; b++) {
      const present = parts.ofTreatment[a]! >= 0 && parts.ofTreatment[b]! >= 0;
      if (!present || !nulls.every((v) => Math.abs(v[a]! - v[b]!) <= 1e-7)) {
        pairs.push({ a, b, estimate: null, se: null, z: null, p: null });
        continue;
      }
      const gradient = new Float64Array(q + 1);
      const add = (treatment: number, sign: number): number => {
        const at = place[treatment]!;
        if (at < 0) return 0;
        gradient[at] = sign / rho;
        return sign * coefficients[at]!;
      };
      const mu = (add(a, 1) + add(b, -1)) / rho;
      gradient[q] = -mu / rho;
      const estimate = scale * mu;
      const se = scale * Math.sqrt(variance(none, gradient));
      const z = estimate / se;
      pairs.push({ a, b, estimate, se, z, p: Math.min(1, 2 * normalUpper(Math.abs(z))) });
    }
  }
  return pairs;
}
