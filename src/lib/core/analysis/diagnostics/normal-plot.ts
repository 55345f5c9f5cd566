import { normalQuantile } from '../../numerics/distributions/normal.ts';
import { seededRandom } from '../../numerics/random/seeded-random.ts';
import { fail, ok } from '../../result.ts';
import type { NormalPlot, RowDiagnostics } from '../check-result.ts';
import type { FixedModel } from '../fixed/fit-fixed.ts';
import { solveIntra } from '../fixed/intra-projection.ts';
import type { Section } from '../reason.ts';

const LEVEL = 0.95;

/**
 * Returns the ordered internally studentised residuals against normal quantiles, with a pointwise envelope: the same model
 * refitted to simulated normal readings, so that the envelope carries the correlation of the residuals.
 *
 * @param rows diagnostics in the order of the runs of the table
 * @param seed same seed, same envelope
 *
 * Source: A. C. Atkinson (1985), Plots, Transformations and Regression, §4.2; plotting positions (i − 3/8)/(n + 1/4) of
 * G. Blom (1958).
 * Checked by: test/core/analysis/diagnostics/normal-plot.test.ts
 *
 * Cost: 199 refits, fewer (at least 39) for more than 2,000 runs.
 */
export function normalPlot(fixed: FixedModel, rows: readonly RowDiagnostics[], seed: number): Section<NormalPlot> {
  const { model, sigma } = fixed;
  const { table, errorDf } = model;
  const used = rows.flatMap(({ row, standardized, leverage }, i) =>
    standardized === null ? [] : [{ i, row, standardized, spread: Math.sqrt(1 - leverage) }]
  );
  const n = used.length;
  if (sigma === null) return fail({ tag: 'no-scatter' });
  if (n < 3) return fail({ tag: 'too-few-readings', have: n, need: 3 });
  const draws = Math.max(39, Math.min(199, Math.floor(400_000 / n)));
  const random = seededRandom(`normal-plot ${seed}`);
  const sorted: Float64Array[] = [];
  const noise = new Float64Array(table.n);
  for (let d = 0; d < draws; d++) {
    for (let i = 0; i < table.n; i++) noise[i] = normalQuantile((random.bits() + 0.5) / 4294967296);
    const { residual, errorSs } = solveIntra(model, noise);
    const scale = Math.sqrt(errorSs / errorDf);
    sorted.push(Float64Array.from(used, ({ i, spread }) => residual[i]! / (scale * spread)).sort());
  }
  used.sort((x, y) => x.standardized - y.standardized || x.row - y.row);
  const column = new Float64Array(draws);
  const points = used.map(({ row, standardized }, at) => {
    for (let d = 0; d < draws; d++) column[d] = sorted[d]![at]!;
    column.sort();
    return {
      row,
      theoretical: normalQuantile((at + 1 - 0.375) / (n + 0.25)),
      observed: standardized,
      lower: between(column, (1 - LEVEL) / 2),
      upper: between(column, (1 + LEVEL) / 2)
    };
  });
  return ok({ points, level: LEVEL, draws, seed });
}

/** Quantile at plotting position q·(m + 1), interpolated. */
function between(sorted: Float64Array, q: number): number {
  const place = Math.min(sorted.length, Math.max(1, q * (sorted.length + 1))) - 1;
  const low = Math.floor(place);
  const high = Math.min(sorted.length - 1, low + 1);
  return sorted[low]! + (place - low) * (sorted[high]! - sorted[low]!);
}
