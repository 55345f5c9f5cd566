import { fUpper } from '../../numerics/distributions/f.ts';
import { fail, ok } from '../../result.ts';
import type { FTest, TrendTest } from '../check-result.ts';
import { termAdjusted } from '../fixed/anova.ts';
import { solveFixed, type FixedModel } from '../fixed/fit-fixed.ts';
import { buildRunTable } from '../model/build-run-table.ts';
import { momentsOf } from '../model/moments.ts';
import { termOf, withoutBetween } from '../model/run-table.ts';
import type { Observations } from '../observations.ts';
import { quantityLine, solveRandom } from '../random/fit-random.ts';
import { kenwardRogerCovariance } from '../random/kenward-roger.ts';
import type { Section } from '../reason.ts';
import { addedVariable } from './added-variable.ts';

const confoundedWith = (factor: string, other: string) => ({ tag: 'confounded', factor, with: other }) as const;

/**
 * Do the slots differ? F test of the slots after sessions, treatments and the other factors, whether or not the model holds
 * the slots.
 *
 * @param kept positions of the kept rows
 */
export function slotTest(observations: Observations, kept: readonly number[]): Section<FTest> {
  const built = buildRunTable(observations, kept, { ...observations.factors, slot: true });
  const table = withoutBetween(built.table);
  const term = termOf(table, 'slot');
  if (term === undefined) {
    return fail(built.leftOut.find(({ factor }) => factor === 'slot')?.reason ?? confoundedWith('slot', 'session'));
  }
  const { model, solution, sigma } = solveFixed(table, momentsOf(table));
  if (model.errorDf < 1) return fail({ tag: 'no-error-degrees-of-freedom', runs: table.n, parameters: model.rank });
  if (sigma === null) return fail({ tag: 'no-scatter' });
  const { df, ss } = termAdjusted(model, term);
  if (df < 1) return fail(confoundedWith('slot', 'treatment'));
  const F = ss / df / (solution.errorSs / model.errorDf);
  return ok({ df1: df, df2: model.errorDf, F, p: fUpper(F, df, model.errorDf) });
}

/** Is there a straight-line trend along the slots, beside the model? Per slot. */
export function slotTrend(observations: Observations, fixed: FixedModel): Section<TrendTest> {
  const { table } = fixed.model;
  const slots = Array.from(table.rowIndex, (row) => observations.rows[row]!.slot);
  if (slots.some((slot) => slot === null)) return fail({ tag: 'no-slots' });
  if (new Set(slots).size < 2) return fail({ tag: 'one-level', factor: 'slot' });
  const tested = addedVariable(fixed, Float64Array.from(slots as number[]), 'slot');
  if (!tested.ok) return tested;
  const { slope, se, df2, p } = tested.value;
  return ok({ slope, se, t: slope / se, df: df2, p });
}

/**
 * Do the sessions drift in the order in which they stand in the input? Slope per session with sessions random and Kenward &
 * Roger's degrees of freedom.
 */
export function sessionTrend(observations: Observations, kept: readonly number[]): Section<TrendTest> {
  const { table } = buildRunTable(observations, kept, observations.factors, true);
  if (table.b < 3) return fail({ tag: 'too-few-readings', have: table.b, need: 3 });
  const solved = solveRandom(table, momentsOf(table));
  if (!solved.ok) return solved;
  const { info } = solved.value;
  if (info.expected === null) return fail({ tag: 'no-shared-session' });
  const line = quantityLine(solved.value, 'order', kenwardRogerCovariance(info, info.expected));
  return line === null ? fail(confoundedWith('order', 'shift')) : ok(line);
}
