import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { formulaFunctions } from '#lib/formula/formula-functions.ts';
import type { FormulaNode } from '#lib/formula/formula-node.ts';
import { parseFormula } from '#lib/formula/parse-formula.ts';
import { printFormula } from '#lib/formula/print-formula.ts';

const names = ['before', 'after', 'm', 'e', 'i', 'a', 'b'];
const errorOf = (text: string, known = names) => {
  const parsed = parseFormula(text, known);
  return parsed.ok ? null : parsed.error;
};

describe('parseFormula(text, names)', () => {
  test.each([
    ['before-after', 'before − after'],
    ['(before − after) ÷ (m × e)', '(before − after) / (m × e)'],
    ['-m^2', '−m^2'],
    ['(-m)^2', '(−m)^2'],
    ['2^3^2', '2^3^2'],
    ['(2^3)^2', '(2^3)^2'],
    ['a-(b-e)', 'a − (b − e)'],
    ['mean(a, b,\n e)', 'mean(a, b, e)'],
    ['+a', 'a']
  ])('reads %j as %s', (text, printed) => {
    const parsed = parseFormula(text, names);
    expect(parsed.ok && printFormula(parsed.value)).toBe(printed);
  });

  test.each([
    ['', 'formula-empty'],
    ['   ', 'formula-empty'],
    ['a + '.repeat(400), 'formula-too-long'],
    [`${'('.repeat(90)}a${')'.repeat(90)}`, 'formula-too-deep'],
    ['a +', 'formula-syntax'],
    ['a / 0,5', 'formula-syntax'],
    ['((a', 'formula-syntax'],
    ['x', 'formula-unknown-name'],
    ['pi', 'formula-unknown-name'],
    ['constructor', 'formula-unknown-name'],
    ['__proto__', 'formula-unknown-name'],
    ['a(b)', 'formula-unknown-function'],
    ['import("x")', 'formula-unknown-function'],
    ['evaluate("1")', 'formula-unknown-function'],
    ['toString()', 'formula-unknown-function'],
    ['log(a)', 'formula-ambiguous-log'],
    ['sqrt(a, b)', 'formula-argument-count'],
    ['max()', 'formula-argument-count'],
    ['2 a', 'formula-implicit-product'],
    ['(a)(b)', 'formula-implicit-product'],
    ['a = 3', 'formula-forbidden'],
    ['f(a) = a', 'formula-forbidden'],
    ['a.constructor', 'formula-forbidden'],
    ['a["constructor"]', 'formula-forbidden'],
    ['a?.b', 'formula-forbidden'],
    ['a.b(1)', 'formula-forbidden'],
    ['[a, b]', 'formula-forbidden'],
    ['{a: 1}', 'formula-forbidden'],
    ['"text"', 'formula-forbidden'],
    ['a; b', 'formula-forbidden'],
    ['a > b', 'formula-forbidden'],
    ['a > b > e', 'formula-forbidden'],
    ['a ? b : e', 'formula-forbidden'],
    ['1:3', 'formula-forbidden'],
    ['a!', 'formula-forbidden'],
    ["a'", 'formula-forbidden'],
    ['a % b', 'formula-forbidden'],
    ['5%', 'formula-forbidden'],
    ['a to b', 'formula-forbidden'],
    ['a .* b', 'formula-forbidden'],
    ['a and b', 'formula-forbidden'],
    ['true', 'formula-forbidden'],
    ['Infinity', 'formula-forbidden'],
    ['1e999', 'formula-forbidden']
  ])('refuses %j: %s', (text, tag) => {
    expect(errorOf(text)?.tag).toBe(tag);
  });

  test('names m, e and i mean the readings of that name and nothing where there is none', () => {
    expect(parseFormula('m + e + i', names).ok).toBe(true);
    expect(errorOf('m + 1', ['a'])).toEqual({ tag: 'formula-unknown-name', name: 'm', known: ['a'] });
    expect(errorOf('e', ['a'])?.tag).toBe('formula-unknown-name');
    expect(errorOf('3 * i', ['a'])?.tag).toBe('formula-unknown-name');
  });

  test('says where a text makes no sense and whether a decimal comma is likely', () => {
    expect(errorOf('a / 0,5')).toEqual({ tag: 'formula-syntax', at: 6, comma: true });
    expect(errorOf('a + ')).toMatchObject({ comma: false });
  });

  test('refuses names the language keeps for itself and names given twice', () => {
    expect(errorOf('a', ['a', 'mod'])).toEqual({ tag: 'formula-reserved-name', name: 'mod' });
    expect(errorOf('a', ['a', 'a'])).toEqual({ tag: 'formula-duplicate-name', name: 'a' });
  });

  const allowed = (node: FormulaNode): boolean => {
    switch (node.kind) {
      case 'number':
        return Number.isFinite(node.value);
      case 'name':
        return names.includes(node.name);
      case 'negate':
        return allowed(node.of);
      case 'operator':
        return '+-*/^'.includes(node.operator) && allowed(node.left) && allowed(node.right);
      case 'call':
        return formulaFunctions.has(node.name) && node.arguments.every(allowed);
      case 'scale':
        return false;
    }
  };
  const soup = fc
    .array(
      fc.constantFrom(
        ...['a', 'm', 'i', 'e', 'x', '1', '.5', '1e3', '0x1f', '(', ')', '[', ']', '{', '}', ',', ';', '\n', '"', "'"],
        ...[
          '+',
          '-',
          '*',
          '/',
          '^',
          '%',
          '!',
          '.',
          '..',
          '?.',
          '?',
          ':',
          '=',
          '==',
          '<',
          '&',
          '|',
          '~',
          '#',
          '\\',
          '$'
        ],
        ...[
          'sqrt',
          'log',
          'ln',
          'max',
          'import',
          'evaluate',
          'constructor',
          '__proto__',
          'prototype',
          'end',
          'in',
          'to'
        ],
        ...['mod', 'not', 'true', 'NaN', 'null', 'undefined', 'cos', ' ', '²', 'µ', '−', '×']
      ),
      { maxLength: 30 }
    )
    .map((parts) => parts.join(''));

  test('never throws and lets nothing off the list through, whatever is typed', () => {
    fc.assert(
      fc.property(fc.oneof(soup, fc.string({ maxLength: 60, unit: 'binary' })), (text) => {
        const parsed = parseFormula(text, names);
        return parsed.ok ? allowed(parsed.value) : parsed.error.tag.startsWith('formula-');
      }),
      { numRuns: 5000 }
    );
  });
});
