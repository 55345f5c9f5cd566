import { describe, expect, test } from 'vitest';
import { checkUnits } from '#lib/formula/check-units.ts';
import { evaluateFormula } from '#lib/formula/evaluate-formula.ts';
import { parseFormula } from '#lib/formula/parse-formula.ts';

const units = new Map([
  ['g1', 'g'],
  ['g2', 'g'],
  ['kg', 'kg'],
  ['mm', 'mm'],
  ['inch', 'in'],
  ['s', 's'],
  ['deg', '°'],
  ['share', '%'],
  ['pure', ''],
  ['gloss', 'GU'],
  ['warm', '°C'],
  ['warm2', '°C']
]);
const check = (text: string, wanted: string) => {
  const parsed = parseFormula(text, [...units.keys()]);
  if (!parsed.ok) throw new Error(parsed.error.tag);
  return checkUnits(parsed.value, units, wanted);
};
const factor = (text: string, wanted: string) => {
  const checked = check(text, wanted);
  if (!checked.ok) throw new Error(JSON.stringify(checked.error));
  return checked.value.factor;
};

describe('checkUnits(formula, units, wanted)', () => {
  test.each([
    ['g1 + mm', 'g', { tag: 'units-differ', how: 'add', left: 'g1', leftUnit: 'g', right: 'mm', rightUnit: 'mm' }],
    [
      'g1 - mm^2',
      'g',
      { tag: 'units-differ', how: 'subtract', left: 'g1', leftUnit: 'g', right: 'mm^2', rightUnit: 'mm²' }
    ],
    ['max(g1, s)', 'g', { tag: 'units-differ', how: 'compare', left: 'g1', leftUnit: 'g', right: 's', rightUnit: 's' }],
    ['g1 + 5', 'g', { tag: 'units-differ', how: 'add', left: 'g1', leftUnit: 'g', right: '5', rightUnit: '' }],
    [
      'gloss + pure',
      'GU',
      { tag: 'units-differ', how: 'add', left: 'gloss', leftUnit: 'GU', right: 'pure', rightUnit: '' }
    ],
    ['2 ^ s', '', { tag: 'unit-in-exponent', text: 's', unit: 's' }],
    ['mm ^ pure', '', { tag: 'unit-to-unknown-power', text: 'mm', unit: 'mm', power: 'pure' }],
    ['ln(mm)', '', { tag: 'unit-in-function', name: 'ln', text: 'mm', unit: 'mm' }],
    ['cos(mm)', '', { tag: 'unit-in-function', name: 'cos', text: 'mm', unit: 'mm' }],
    ['g1 / s', 'mm', { tag: 'unit-of-result', found: 'g/s', wanted: 'mm' }],
    ['g1', '', { tag: 'unit-of-result', found: 'g', wanted: '' }],
    ['g1', 'g/', { tag: 'unit-not-understood', of: '', unit: 'g/' }]
  ])('refuses %s in %j', (text, wanted, error) => {
    expect(check(text, wanted)).toEqual({ ok: false, error });
  });

  test.each([
    ['g1 - g2', 'g', 1],
    ['g1 - g2', 'mg', 1000],
    ['g1 + kg', 'g', 1],
    ['g1 / g2', '', 1],
    ['g1 / g2', '%', 100],
    ['share', '', 0.01],
    ['sqrt(mm^2)', 'm', 0.001],
    ['mm^-1', '1/m', 1000],
    ['(mm^3)^(1/3)', 'mm', 1],
    ['max(0, g1 - g2)', 'g', 1],
    ['g1 + 0', 'g', 1],
    ['0', 'g', 1],
    ['gloss - gloss', 'GU', 1],
    ['warm - warm2', '°C', 1],
    ['mm / s', 'm/h', 3.6],
    ['inch', 'mm', 25.4],
    ['ln(g1 / g2)', '', 1],
    ['cos(deg)', '', 1]
  ])('%s in %j has the factor %d', (text, wanted, expected) => {
    expect(factor(text, wanted)).toBe(expected);
  });

  test.each([
    // 1 g + 2 kg = 2001 g; 1 in + 1 mm = 26.4 mm; cos 60° = 1/2; ln of 50 % is ln 0.5
    ['g1 + kg', 'g', { g1: 1, kg: 2 }, 2001],
    ['inch + mm', 'mm', { inch: 1, mm: 1 }, 26.4],
    ['mean(g1, kg)', 'g', { g1: 0, kg: 1 }, 500],
    ['cos(deg)', '', { deg: 60 }, 0.5],
    ['ln(share)', '', { share: 50 }, Math.log(0.5)],
    ['2 ^ share', '', { share: 50 }, Math.SQRT2]
  ])('converts inside %s', (text, wanted, values, expected) => {
    const checked = check(text, wanted);
    const result = checked.ok && evaluateFormula(checked.value.node, values as Record<string, number>);
    expect(checked.ok && result && result.ok && result.value * checked.value.factor).toBeCloseTo(expected, 12);
  });
});
