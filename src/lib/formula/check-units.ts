import { fail, ok, type Result } from '#lib/core/result.ts';
import type { UnitError } from './formula-error.ts';
import { formulaFunctions, type UnitRule } from './formula-functions.ts';
import type { FormulaNode } from './formula-node.ts';
import { printFormula } from './print-formula.ts';
import { multiply, plain, printUnit, raise, readUnit, sameKind, type Unit } from './unit.ts';

export interface UnitCheck {
  /** The formula with conversions put in where two units of one kind meet. */
  node: FormulaNode;
  /** What the formula gives by itself, as a person writes it. */
  found: string;
  /** The unit that is wanted. */
  wanted: string;
  /** The formula's number times this is the number in the wanted unit. */
  factor: number;
}

/**
 * Returns the formula with every unit in order and the factor from the formula's own unit to the wanted one, or the
 * first place where units do not fit.
 *
 * Lengths may be added to lengths (millimetres are converted to the left side's centimetres), never to masses. A number
 * written in the formula is a plain number; 0 fits every unit.
 *
 * @param units - unit text by name; "" is a plain number
 * @param wanted - unit of the measurand
 *
 * **Source**: dimensional homogeneity, ISO 80000-1:2022 (quantities of the same kind can be added); from memory.
 * **Checked by** test/formula/check-units.test.ts
 */
export function checkUnits(
  formula: FormulaNode,
  units: ReadonlyMap<string, string>,
  wanted: string
): Result<UnitCheck, UnitError> {
  try {
    const of = new Map([...units].map(([name, text]) => [name, unitOf(text, name)]));
    const target = unitOf(wanted, '');
    const { node, unit } = walk(formula, of);
    if (unit === 'any') return ok({ node, found: printUnit(target), wanted: printUnit(target), factor: 1 });
    if (!sameKind(unit, target)) refuse({ tag: 'unit-of-result', found: printUnit(unit), wanted: printUnit(target) });
    return ok({ node, found: printUnit(unit), wanted: printUnit(target), factor: neat(unit.size / target.size) });
  } catch (thrown) {
    if (thrown instanceof Misfit) return fail(thrown.error);
    throw thrown;
  }
}

class Misfit extends Error {
  constructor(readonly error: UnitError) {
    super(error.tag);
  }
}
function refuse(error: UnitError): never {
  throw new Misfit(error);
}

/** `any`: a zero, which fits every unit. */
interface Weighed {
  node: FormulaNode;
  unit: Unit | 'any';
}
type Units = ReadonlyMap<string, Unit>;

/** Unit sizes are decimal fractions; their quotients should be too, not 0.30000000000000004. */
const neat = (factor: number) => Number(factor.toPrecision(15));

function unitOf(text: string, of: string): Unit {
  const read = readUnit(text);
  return read.ok ? read.value : refuse({ tag: 'unit-not-understood', of, unit: text });
}

function walk(node: FormulaNode, units: Units): Weighed {
  switch (node.kind) {
    case 'number':
      return { node, unit: node.value === 0 ? 'any' : plain };
    case 'name':
      return { node, unit: units.get(node.name) ?? plain };
    case 'scale':
      throw new Error('checkUnits: the formula has been checked already');
    case 'negate': {
      const of = walk(node.of, units);
      return { node: { ...node, of: of.node }, unit: of.unit };
    }
    case 'call':
      return call(node, units);
    case 'operator':
      return operate(node, walk(node.left, units), walk(node.right, units));
  }
}

function operate(node: FormulaNode & { kind: 'operator' }, left: Weighed, right: Weighed): Weighed {
  const { operator } = node;
  if (operator === '^') return power(node, left, right);
  if (operator === '*' || operator === '/') {
    const unit = multiply(settled(left), settled(right), operator === '*' ? 1 : -1);
    return { node: { ...node, left: left.node, right: right.node }, unit };
  }
  const fitted = fit(left, right, operator === '+' ? 'add' : 'subtract');
  const unit = left.unit === 'any' ? right.unit : left.unit;
  return { node: { ...node, left: left.node, right: fitted }, unit };
}

const settled = ({ unit }: Weighed): Unit => (unit === 'any' ? plain : unit);

/** The right side in the unit of the left. */
function fit(left: Weighed, right: Weighed, how: 'add' | 'subtract' | 'compare'): FormulaNode {
  if (left.unit === 'any' || right.unit === 'any') return right.node;
  if (!sameKind(left.unit, right.unit)) {
    refuse({
      tag: 'units-differ',
      how,
      left: printFormula(left.node),
      leftUnit: printUnit(left.unit),
      right: printFormula(right.node),
      rightUnit: printUnit(right.unit)
    });
  }
  return scale(right.node, neat(right.unit.size / left.unit.size));
}

const scale = (node: FormulaNode, by: number): FormulaNode => (by === 1 ? node : { kind: 'scale', by, of: node });

function power(node: FormulaNode & { kind: 'operator' }, left: Weighed, right: Weighed): Weighed {
  const exponent = asPlain(right, (unit) => ({ tag: 'unit-in-exponent', text: printFormula(right.node), unit }));
  const known = constant(node.right);
  const base = settled(left);
  const done = { ...node, left: left.node, right: exponent };
  if (known !== null) return { node: done, unit: raise(base, known) };
  if (base.dimension.size > 0) {
    const text = printFormula(left.node);
    refuse({ tag: 'unit-to-unknown-power', text, unit: printUnit(base), power: printFormula(right.node) });
  }
  return { node: { ...done, left: scale(left.node, base.size) }, unit: plain };
}

/** The value of an exponent that is written out: 2, −1, 1/3. */
function constant(node: FormulaNode): number | null {
  if (node.kind === 'number') return node.value;
  if (node.kind === 'negate') {
    const of = constant(node.of);
    return of === null ? null : -of;
  }
  if (node.kind !== 'operator' || node.operator !== '/') return null;
  const [over, under] = [constant(node.left), constant(node.right)];
  return over === null || under === null || under === 0 ? null : over / under;
}

/** A number without unit; per cent and the like become the fraction they stand for. */
function asPlain(of: Weighed, error: (unit: string) => UnitError): FormulaNode {
  const unit = settled(of);
  return unit.dimension.size === 0 ? scale(of.node, neat(unit.size)) : refuse(error(printUnit(unit)));
}

function call(node: FormulaNode & { kind: 'call' }, units: Units): Weighed {
  const rule: UnitRule = formulaFunctions.get(node.name)?.units ?? 'plain';
  const args = node.arguments.map((argument) => walk(argument, units));
  const [first] = args;
  if (!first) throw new Error(`checkUnits: ${node.name} has no argument`);
  if (rule === 'square-root' || rule === 'cube-root') {
    return { node: rebuilt(node, [first.node]), unit: raise(settled(first), rule === 'square-root' ? 1 / 2 : 1 / 3) };
  }
  if (rule === 'keep') {
    const lead = args.find(({ unit }) => unit !== 'any') ?? first;
    return {
      node: rebuilt(
        node,
        args.map((argument) => fit(lead, argument, 'compare'))
      ),
      unit: lead.unit
    };
  }
  const unit = settled(first);
  const angle = rule === 'angle' && unit.dimension.size === 1 && unit.dimension.get('angle') === 1;
  if (angle) return { node: rebuilt(node, [scale(first.node, unit.size)]), unit: plain };
  const text = printFormula(first.node);
  return {
    node: rebuilt(node, [asPlain(first, (shown) => ({ tag: 'unit-in-function', name: node.name, text, unit: shown }))]),
    unit: plain
  };
}

const rebuilt = (node: FormulaNode & { kind: 'call' }, args: FormulaNode[]): FormulaNode => ({
  ...node,
  arguments: args
});
