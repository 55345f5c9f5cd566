import { fUpper } from '../../numerics/distributions/f.ts';
import { fail, ok } from '../../result.ts';
import type { FTest } from '../check-result.ts';
import type { FixedModel } from '../fixed/fit-fixed.ts';
import { solveIntra } from '../fixed/intra-projection.ts';
import { sumOfSquares } from '../model/run-vectors.ts';
import type { Section } from '../reason.ts';

export interface AddedVariable extends FTest {
  slope: number;
  se: number;
  ss: number;
}

/**
 * Tests one further quantity beside the model with sessions fixed: w is its residual after the model, e that of the readings.
 *
 *     slope = eᵀw/wᵀw,   SS = (eᵀw)²/wᵀw,   F = SS / ((RSS − SS)/(ν − 1)) on 1 and ν − 1
 *
 * @param quantity one value a run of the table
 * @param name what to call it when it cannot be told from the terms of the model
 */
export function addedVariable(
  { model, solution, sigma }: FixedModel,
  quantity: Float64Array,
  name: string
): Section<AddedVariable> {
  const df2 = model.errorDf - 1;
  if (df2 < 1) {
    return fail({ tag: 'no-error-degrees-of-freedom', runs: model.table.n, parameters: model.rank + 1 });
  }
  if (sigma === null) return fail({ tag: 'no-scatter' });
  const mean = quantity.reduce((s, v) => s + v, 0) / quantity.length;
  const centred = quantity.map((v) => v - mean);
  const { residual: w, errorSs: ww } = solveIntra(model, centred);
  if (!(ww > 1e-18 * sumOfSquares(centred))) return fail({ tag: 'confounded', factor: name, with: 'model' });
  let ew = 0;
  for (let i = 0; i < w.length; i++) ew += w[i]! * solution.residual[i]!;
  const ss = (ew * ew) / ww;
  const left = solution.errorSs - ss;
  if (!(left > 0)) return fail({ tag: 'no-scatter' });
  const ms = left / df2;
  const F = ss / ms;
  return ok({ slope: ew / ww, se: Math.sqrt(ms / ww), ss, df1: 1, df2, F, p: fUpper(F, 1, df2) });
}

/**
 * Tukey's one degree of freedom for non-additivity: the square of the fitted value as the further quantity (in a two-way
 * layout without replication the same as the product of treatment and session effects).
 *
 * Source: J. W. Tukey (1949), Biometrics 5, 232–242; squared fitted values as in G. A. Milliken & F. A. Graybill (1970),
 * J. Amer. Statist. Assoc. 65, 797–807.
 * Checked by: test/reference-run
 */
export function nonadditivity(fixed: FixedModel): Section<{ ss: number; coefficient: number } & FTest> {
  const { model, solution } = fixed;
  const { y, n } = model.table;
  const fitted = y.map((v, i) => v - solution.residual[i]!);
  const mean = fitted.reduce((s, v) => s + v, 0) / n;
  const tested = addedVariable(
    fixed,
    fitted.map((v) => (v - mean) ** 2),
    'non-additivity'
  );
  if (!tested.ok) return tested;
  const { slope, ss, df1, df2, F, p } = tested.value;
  return ok({ ss, coefficient: slope, df1, df2, F, p });
}
