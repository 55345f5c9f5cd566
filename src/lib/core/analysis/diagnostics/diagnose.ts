import { fail, ok } from '../../result.ts';
import type { Diagnostics } from '../check-result.ts';
import type { FixedModel } from '../fixed/fit-fixed.ts';
import type { Parts } from '../model/parts.ts';
import type { Observations } from '../observations.ts';
import { nonadditivity } from './added-variable.ts';
import { normalPlot } from './normal-plot.ts';
import { outlierTest } from './outlier-test.ts';
import { sessionTrend, slotTest, slotTrend } from './place-tests.ts';
import { powerScale } from './power-scale.ts';
import { rowDiagnostics } from './row-diagnostics.ts';
import { shapiroWilk } from './shapiro-wilk.ts';
import { treatmentScatter } from './treatment-scatter.ts';

/**
 * Returns all checks of the model with sessions fixed.
 *
 * @param kept positions of the kept rows
 */
export function diagnose(
  observations: Observations,
  kept: readonly number[],
  fixed: FixedModel,
  parts: Parts
): Diagnostics {
  const { model, solution, sigma } = fixed;
  const rows = rowDiagnostics(fixed);
  return {
    rows,
    outlier: outlierTest(rows, sigma === null ? 0 : model.errorDf),
    normalPlot: normalPlot(fixed, rows, observations.seed),
    normality: sigma === null ? fail({ tag: 'no-scatter' }) : shapiroWilk(solution.residual),
    slot: slotTest(observations, kept),
    slotTrend: slotTrend(observations, fixed),
    sessionTrend: sessionTrend(observations, kept),
    scatter: ok(treatmentScatter(model.table, rows)),
    nonadditivity: nonadditivity(fixed),
    powerScale: powerScale(fixed, parts, observations.alpha)
  };
}
