import { fail, ok, type Result } from '#lib/core/result.ts';
import { checkUnits } from './check-units.ts';
import { evaluateFormula, type FormulaValues } from './evaluate-formula.ts';
import type { EvaluationError, FormulaError } from './formula-error.ts';
import type { FormulaNode } from './formula-node.ts';
import { parseFormula } from './parse-formula.ts';

export interface FormulaContext {
  /** Names with their units; "" is a plain number. */
  readings: readonly { id: string; unit: string }[];
  constants: readonly { id: string; unit: string; value: number }[];
  /** Unit of the result. */
  unit: string;
}

export interface CompiledFormula {
  /** Value in the wanted unit for the readings of one run, by id. */
  evaluate: (readings: FormulaValues) => Result<number, EvaluationError>;
  /** Ids of the readings the formula uses, in order of appearance. */
  readings: string[];
  constants: string[];
  units: {
    /** The unit the formula gives by itself, and the one wanted: "cm³/m²" and "µm". */
    found: string;
    wanted: string;
    /** What the formula's number is multiplied by. */
    factor: number;
  };
}

/**
 * Returns a formula ready for use: parsed, checked against the whitelist, its units in order.
 *
 * @returns the compiled formula, or the first fault
 *
 * **Checked by** test/formula/compile-formula.test.ts (ISO 11998 film loss by hand)
 */
export function compileFormula(expression: string, context: FormulaContext): Result<CompiledFormula, FormulaError> {
  const named = [...context.readings, ...context.constants];
  const parsed = parseFormula(
    expression,
    named.map(({ id }) => id)
  );
  if (!parsed.ok) return parsed;
  const used = [...new Set(namesIn(parsed.value))];
  const inUse = new Map(named.filter(({ id }) => used.includes(id)).map(({ id, unit }) => [id, unit]));
  const checked = checkUnits(parsed.value, inUse, context.unit);
  if (!checked.ok) return fail(checked.error);
  const { node, found, wanted, factor } = checked.value;
  const scaled: FormulaNode = factor === 1 ? node : { kind: 'scale', by: factor, of: node };
  const constants = Object.fromEntries(context.constants.map(({ id, value }) => [id, value]));
  const isConstant = (id: string) => Object.hasOwn(constants, id);
  return ok({
    evaluate: (readings) => evaluateFormula(scaled, { ...readings, ...constants }),
    readings: used.filter((id) => !isConstant(id)),
    constants: used.filter(isConstant),
    units: { found, wanted, factor }
  });
}

function namesIn(node: FormulaNode): string[] {
  switch (node.kind) {
    case 'number':
      return [];
    case 'name':
      return [node.name];
    case 'negate':
    case 'scale':
      return namesIn(node.of);
    case 'call':
      return node.arguments.flatMap(namesIn);
    case 'operator':
      return [...namesIn(node.left), ...namesIn(node.right)];
  }
}
