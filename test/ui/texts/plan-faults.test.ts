import { describe, expect, test } from 'vitest';
import { compileFormula } from '#lib/formula/compile-formula.ts';
import { planFaults as de } from '#lib/ui/texts/de/plan-faults.ts';
import { planFaults as en } from '#lib/ui/texts/en/plan-faults.ts';

const sentences = (formula: string, unit = 'g') => {
  const compiled = compileFormula(formula, {
    readings: [
      { id: 'mass', unit: 'g' },
      { id: 'width', unit: 'mm' }
    ],
    constants: [],
    unit
  });
  if (compiled.ok) throw new Error(`${formula} is sound`);
  return [en.formula({ ...compiled.error }), de.formula({ ...compiled.error })];
};

describe('planFaults.formula(error)', () => {
  test('says why grams and millimetres cannot be added', () => {
    expect(sentences('mass + width')).toEqual([
      'mass is in g, width is in mm: these cannot be added, because they are different kinds of quantity.',
      'mass ist in g, width ist in mm: das lässt sich nicht addieren, denn es sind verschiedene Größenarten.'
    ]);
  });

  test('names an unknown name and those that are known', () => {
    expect(sentences('mas')[0]).toBe('“mas” is neither a reading nor a constant. Known are: mass, width.');
  });

  test('names a forbidden part', () => {
    expect(sentences('mass[1]')[0]).toContain('“mass[1]” is not allowed in a formula.');
  });

  test('tells a decimal comma from other nonsense', () => {
    expect(sentences('mass * 0,5')[0]).toContain('write 0.5, not 0,5');
    expect(sentences('mass *')[0]).not.toContain('0.5');
  });

  test.each([
    ['', 'g'],
    ['mass +', 'g'],
    ['2 mass', 'g'],
    ['log(mass)', 'g'],
    ['foo(mass)', 'g'],
    ['sqrt(mass, mass)', 'g'],
    ['2 ^ mass', 'g'],
    ['ln(mass)', 'g'],
    ['mass', 'mm'],
    ['mass', 'g/'],
    ['mass', ''],
    ['a'.repeat(1001), 'g']
  ])('has a sentence of its own for %j in %j, in both languages', (formula, unit) => {
    const [english, german] = sentences(formula, unit);
    expect(english).not.toBe('The formula cannot be used.');
    expect(german).not.toBe('Die Formel lässt sich nicht verwenden.');
    expect(`${english} ${german}`).not.toMatch(/undefined|\[object/);
  });
});
