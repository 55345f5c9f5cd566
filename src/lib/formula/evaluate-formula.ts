import { fail, ok, type Result } from '#lib/core/result.ts';
import { formulaFunctions } from './formula-functions.ts';
import type { EvaluationError } from './formula-error.ts';
import type { FormulaNode } from './formula-node.ts';
import { printFormula } from './print-formula.ts';

export type FormulaValues = Readonly<Record<string, number | null | undefined>>;

/**
 * Returns the value of a formula for these readings and constants.
 *
 * Every step is checked: a result is a finite real number or an error that names the part at fault.
 *
 * @param values - by name; null or absent where nothing was recorded
 * @returns the number, or `value-missing`, `division-by-zero`, `not-real`, `not-finite`
 *
 * **Checked by** test/formula/evaluate-formula.test.ts (against mathjs, which shares only the parser).
 */
export function evaluateFormula(node: FormulaNode, values: FormulaValues): Result<number, EvaluationError> {
  try {
    return ok(valueOf(node, values));
  } catch (thrown) {
    if (thrown instanceof Stop) return fail(thrown.error);
    throw thrown;
  }
}

class Stop extends Error {
  constructor(readonly error: EvaluationError) {
    super(error.tag);
  }
}

function valueOf(node: FormulaNode, values: FormulaValues): number {
  const value = step(node, values);
  if (Number.isNaN(value)) throw new Stop({ tag: 'not-real', text: printFormula(node) });
  if (!Number.isFinite(value)) throw new Stop({ tag: 'not-finite', text: printFormula(node) });
  return value;
}

function step(node: FormulaNode, values: FormulaValues): number {
  switch (node.kind) {
    case 'number':
      return node.value;
    case 'name': {
      const value = Object.hasOwn(values, node.name) ? values[node.name] : null;
      if (value === null || value === undefined) throw new Stop({ tag: 'value-missing', name: node.name });
      return value;
    }
    case 'negate':
      return -valueOf(node.of, values);
    case 'scale':
      return node.by * valueOf(node.of, values);
    case 'call':
      return call(node, values);
    case 'operator':
      return operate(node, valueOf(node.left, values), valueOf(node.right, values));
  }
}

function call(node: FormulaNode & { kind: 'call' }, values: FormulaValues): number {
  const known = formulaFunctions.get(node.name);
  if (!known) throw new Error(`evaluateFormula: the whitelist let the function "${node.name}" through`);
  const given = node.arguments.map((argument) => valueOf(argument, values));
  if (/^l(n|og)/.test(node.name) && (given[0] ?? NaN) <= 0) {
    throw new Stop({ tag: 'not-real', text: printFormula(node) });
  }
  return known.apply(given);
}

function operate(node: FormulaNode & { kind: 'operator' }, left: number, right: number): number {
  switch (node.operator) {
    case '+':
      return left + right;
    case '-':
      return left - right;
    case '*':
      return left * right;
    case '/':
      if (right === 0) throw new Stop({ tag: 'division-by-zero', text: printFormula(node.right) });
      return left / right;
    case '^':
      if (left === 0 && right < 0) throw new Stop({ tag: 'division-by-zero', text: printFormula(node.left) });
      return left ** right;
  }
}
