import type { FormulaNode } from './formula-node.ts';

const strength = { '+': 1, '-': 1, '*': 2, '/': 2, '^': 4 } as const;
const strengthOf = (node: FormulaNode): number =>
  node.kind === 'operator'
    ? strength[node.operator]
    : node.kind === 'negate'
      ? 3
      : node.kind === 'scale'
        ? strengthOf(node.of)
        : 5;

/** Returns the formula as a person would write it, with no parenthesis too many; unit factors stay unwritten. */
export function printFormula(node: FormulaNode): string {
  switch (node.kind) {
    case 'number':
      return String(node.value);
    case 'name':
      return node.name;
    case 'scale':
      return printFormula(node.of);
    case 'call':
      return `${node.name}(${node.arguments.map(printFormula).join(', ')})`;
    case 'negate':
      return `−${wrap(node.of, 3)}`;
    case 'operator': {
      const own = strength[node.operator];
      const left = wrap(node.left, node.operator === '^' ? own + 1 : own);
      const right = wrap(node.right, node.operator === '^' ? own : own + 1);
      const shown = { '+': ' + ', '-': ' − ', '*': ' × ', '/': ' / ', '^': '^' }[node.operator];
      return `${left}${shown}${right}`;
    }
  }
}

function wrap(node: FormulaNode, least: number): string {
  const text = printFormula(node);
  return strengthOf(node) < least ? `(${text})` : text;
}
