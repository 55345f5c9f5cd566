import type { Constant, Measurand, ReadingDefinition } from '#lib/core/campaign/plan.ts';
import { fail, ok, type Result } from '#lib/core/result.ts';
import type { CompiledFormula } from './compile-formula.ts';
import type { FormulaError } from './formula-error.ts';

export interface MeasurandContext {
  readings: readonly ReadingDefinition[];
  constants: readonly Constant[];
}

/**
 * Returns how a measurand is computed from the readings of a run: by its formula, or as the reading of its own id.
 *
 * The formula library (mathjs) is loaded only when there is a formula, or a unit to convert.
 *
 * **Checked by** test/formula/compile-measurand.test.ts
 */
export async function compileMeasurand(
  measurand: Measurand,
  { readings, constants }: MeasurandContext
): Promise<Result<CompiledFormula, FormulaError>> {
  const { id, unit } = measurand;
  const reading = readings.find((candidate) => candidate.id === id);
  if (measurand.formula === null && !reading) return fail({ tag: 'formula-missing-reading', name: id });
  const formula = measurand.formula ?? (reading?.unit === unit ? null : id);
  if (formula !== null) {
    const { compileFormula } = await import('./compile-formula.ts');
    return compileFormula(formula, { readings, constants, unit });
  }
  return ok({
    evaluate: (values) => {
      const value = Object.hasOwn(values, id) ? values[id] : null;
      return value === null || value === undefined ? fail({ tag: 'value-missing', name: id }) : ok(value);
    },
    readings: [id],
    constants: [],
    units: { found: unit, wanted: unit, factor: 1 }
  });
}
