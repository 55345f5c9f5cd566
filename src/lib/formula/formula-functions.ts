/** How a function treats units: keeps them, takes a root, wants a plain number, or wants an angle. */
export type UnitRule = 'keep' | 'square-root' | 'cube-root' | 'plain' | 'angle';

export interface FormulaFunction {
  least: number;
  /** null: as many as wanted. */
  most: number | null;
  units: UnitRule;
  apply: (values: readonly number[]) => number;
}

const one = (units: UnitRule, f: (value: number) => number): FormulaFunction => ({
  least: 1,
  most: 1,
  units,
  apply: ([value]) => f(value ?? NaN)
});

const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);

/**
 * Every function a formula may call. `log` is left out on purpose: to some it is the natural, to others the decimal
 * logarithm, and a wrong number would follow.
 */
export const formulaFunctions: ReadonlyMap<string, FormulaFunction> = new Map([
  ['abs', one('keep', Math.abs)],
  ['sqrt', one('square-root', Math.sqrt)],
  ['cbrt', one('cube-root', Math.cbrt)],
  ['exp', one('plain', Math.exp)],
  ['ln', one('plain', Math.log)],
  ['log10', one('plain', Math.log10)],
  ['log2', one('plain', Math.log2)],
  ['sin', one('angle', Math.sin)],
  ['cos', one('angle', Math.cos)],
  ['tan', one('angle', Math.tan)],
  ['min', { least: 1, most: null, units: 'keep', apply: (values) => Math.min(...values) }],
  ['max', { least: 1, most: null, units: 'keep', apply: (values) => Math.max(...values) }],
  ['sum', { least: 1, most: null, units: 'keep', apply: sum }],
  ['mean', { least: 1, most: null, units: 'keep', apply: (values) => sum(values) / values.length }]
]);

/** Words the formula language keeps for itself; no reading or constant may bear one. */
export const reservedNames: ReadonlySet<string> = new Set([
  ...formulaFunctions.keys(),
  'log',
  'and',
  'or',
  'xor',
  'not',
  'mod',
  'to',
  'in',
  'end',
  'true',
  'false',
  'null',
  'undefined',
  'NaN',
  'Infinity'
]);
