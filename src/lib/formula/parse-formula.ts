import { create, parseDependencies, type MathNode } from 'mathjs/number';
import { fail, ok, type Result } from '#lib/core/result.ts';
import type { FormulaError } from './formula-error.ts';
import { formulaFunctions, reservedNames } from './formula-functions.ts';
import type { FormulaNode, FormulaOperator } from './formula-node.ts';

const longest = 1000;
const deepest = 60;
const operators: ReadonlyMap<string, FormulaOperator> = new Map([
  ['add', '+'],
  ['subtract', '-'],
  ['multiply', '*'],
  ['divide', '/'],
  ['pow', '^']
]);

if (!parseDependencies) throw new Error('mathjs/number came without its parser');
const { parse } = create(parseDependencies, {});

/**
 * Returns the tree of a formula, made of whitelisted parts only.
 *
 * The text is parsed, never evaluated; the parser's tree is walked node by node and copied into a tree that can hold
 * nothing but numbers, the given names, + − * / ^ and the known functions. A name means a reading or a constant and
 * never anything the parser's library knows under that name.
 *
 * @param text - as typed; at most 1,000 characters
 * @param names - names a formula may use
 * @returns the tree, or the first fault found
 *
 * **Checked by** test/formula/parse-formula.test.ts
 */
export function parseFormula(text: string, names: readonly string[]): Result<FormulaNode, FormulaError> {
  if (text.trim() === '') return fail({ tag: 'formula-empty' });
  if (text.length > longest) return fail({ tag: 'formula-too-long', length: text.length, most: longest });
  const seen = new Set<string>();
  for (const name of names) {
    if (reservedNames.has(name)) return fail({ tag: 'formula-reserved-name', name });
    if (seen.has(name)) return fail({ tag: 'formula-duplicate-name', name });
    seen.add(name);
  }
  let tree: MathNode;
  try {
    tree = parse(plainSigns(text));
  } catch (thrown) {
    const at = (thrown as { char?: unknown }).char;
    return fail({ tag: 'formula-syntax', at: typeof at === 'number' ? at : null, comma: /\d,\d/.test(text) });
  }
  try {
    return ok(copy(tree, seen, 0));
  } catch (thrown) {
    if (thrown instanceof Refusal) return fail(thrown.error);
    throw thrown;
  }
}

class Refusal extends Error {
  constructor(readonly error: FormulaError) {
    super(error.tag);
  }
}
const refuse = (error: FormulaError): never => {
  throw new Refusal(error);
};

/** Signs a word processor puts in place of those a keyboard has; one character for one, so that places stay. */
const plainSigns = (text: string) =>
  text
    .replace(/[\r\n\t]/g, ' ')
    .replace(/[−–]/g, '-')
    .replace(/[×·⋅]/g, '*')
    .replace(/[÷∕]/g, '/');

interface Walked {
  type: string;
  value?: unknown;
  name?: string;
  fn?: unknown;
  op?: string;
  implicit?: boolean;
  isPercentage?: boolean;
  optional?: boolean;
  content?: MathNode;
  args?: MathNode[];
}

function copy(parsed: MathNode, names: ReadonlySet<string>, depth: number): FormulaNode {
  if (depth > deepest) return refuse({ tag: 'formula-too-deep', most: deepest });
  const node = parsed as unknown as Walked;
  const below = (child: MathNode | undefined): FormulaNode =>
    child ? copy(child, names, depth + 1) : refuse({ tag: 'formula-syntax', at: null, comma: false });
  switch (node.type) {
    case 'ConstantNode':
      return typeof node.value === 'number' && Number.isFinite(node.value)
        ? { kind: 'number', value: node.value }
        : refuse({ tag: 'formula-forbidden', what: String(parsed) });
    case 'SymbolNode':
      return names.has(node.name ?? '')
        ? { kind: 'name', name: node.name ?? '' }
        : refuse({ tag: 'formula-unknown-name', name: node.name ?? '', known: [...names] });
    case 'ParenthesisNode':
      return below(node.content);
    case 'OperatorNode':
      return copyOperator(parsed, node, below);
    case 'FunctionNode':
      return copyCall(node, below);
    default:
      return refuse({ tag: 'formula-forbidden', what: excerpt(parsed) });
  }
}

function copyOperator(
  parsed: MathNode,
  node: Walked,
  below: (child: MathNode | undefined) => FormulaNode
): FormulaNode {
  const args = node.args ?? [];
  if (node.isPercentage) return refuse({ tag: 'formula-forbidden', what: '%' });
  if (node.fn === 'unaryMinus' && args.length === 1) return { kind: 'negate', of: below(args[0]) };
  if (node.fn === 'unaryPlus' && args.length === 1) return below(args[0]);
  const operator = operators.get(String(node.fn));
  if (!operator || args.length !== 2) return refuse({ tag: 'formula-forbidden', what: node.op ?? excerpt(parsed) });
  if (node.implicit) {
    return refuse({ tag: 'formula-implicit-product', left: excerpt(args[0]), right: excerpt(args[1]) });
  }
  return { kind: 'operator', operator, left: below(args[0]), right: below(args[1]) };
}

function copyCall(node: Walked, below: (child: MathNode | undefined) => FormulaNode): FormulaNode {
  const called = node.fn as Walked;
  if (called.type !== 'SymbolNode' || node.optional)
    return refuse({ tag: 'formula-forbidden', what: excerpt(node.fn) });
  const name = called.name ?? '';
  if (name === 'log') return refuse({ tag: 'formula-ambiguous-log' });
  const known = formulaFunctions.get(name);
  if (!known) return refuse({ tag: 'formula-unknown-function', name, known: [...formulaFunctions.keys()] });
  const args = node.args ?? [];
  if (args.length < known.least || (known.most !== null && args.length > known.most)) {
    const { least, most } = known;
    return refuse({ tag: 'formula-argument-count', name, least, most, actual: args.length });
  }
  return { kind: 'call', name, arguments: args.map(below) };
}

const excerpt = (node: unknown): string => String(node).slice(0, 40);
