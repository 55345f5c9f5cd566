export type FormulaOperator = '+' | '-' | '*' | '/' | '^';

/** A formula after the whitelist: nothing but numbers, names, five operators and calls of known functions. */
export type FormulaNode =
  | { kind: 'number'; value: number }
  | { kind: 'name'; name: string }
  | { kind: 'negate'; of: FormulaNode }
  | { kind: 'operator'; operator: FormulaOperator; left: FormulaNode; right: FormulaNode }
  | { kind: 'call'; name: string; arguments: FormulaNode[] }
  /** Put in by the unit check where two units of one dimension meet (grams and kilograms). */
  | { kind: 'scale'; by: number; of: FormulaNode };
