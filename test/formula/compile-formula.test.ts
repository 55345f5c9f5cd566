import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { compileFormula } from '#lib/formula/compile-formula.ts';

const scrub = {
  readings: [
    { id: 'before', unit: 'g' },
    { id: 'after', unit: 'g' }
  ],
  constants: [
    { id: 'area', unit: 'm^2', value: 0.004 },
    { id: 'density', unit: 'g/cm^3', value: 1.5 }
  ],
  unit: 'µm'
};

describe('compileFormula(expression, context)', () => {
  test('gives the film loss of ISO 11998 in micrometres from grams, square metres and grams per cubic centimetre', () => {
    // By hand: 0.0430 g ÷ (0.0040 m² × 1.5 g/cm³) = 0.0430 ÷ 0.0060 cm³/m² = 7.1667 cm³/m²,
    // and 1 cm³/m² = 10⁻⁶ m³/m² = 1 µm. Definition of ISO 11998 (mass loss over area and dry film density) from memory.
    const compiled = compileFormula('(before - after)/(area*density)', scrub);
    if (!compiled.ok) throw new Error(compiled.error.tag);
    expect(compiled.value.units).toEqual({ found: 'cm³/m²', wanted: 'µm', factor: 1 });
    expect(compiled.value.readings).toEqual(['before', 'after']);
    expect(compiled.value.constants).toEqual(['area', 'density']);
    const loss = compiled.value.evaluate({ before: 85.043, after: 85.0 });
    expect(loss.ok && loss.value).toBeCloseTo(7.1667, 4);
    expect(loss.ok && loss.value).toBeCloseTo(0.043 / 0.006, 9);
  });

  test('gives the same film loss whatever units area and density are stated in', () => {
    const restated = {
      ...scrub,
      constants: [
        { id: 'area', unit: 'cm²', value: 40 },
        { id: 'density', unit: 'kg/m³', value: 1500 }
      ]
    };
    const compiled = compileFormula('(before - after)/(area*density)', restated);
    if (!compiled.ok) throw new Error(compiled.error.tag);
    // g/(cm²·kg/m³) = 10⁻³ kg ÷ (10⁻⁴ m² · kg/m³) = 10 m = 10⁷ µm
    expect(compiled.value.units).toEqual({ found: 'g·m³/(cm²·kg)', wanted: 'µm', factor: 1e7 });
    const loss = compiled.value.evaluate({ before: 85.043, after: 85.0 });
    expect(loss.ok && loss.value).toBeCloseTo(7.166667, 5);
  });

  test('says which reading is missing', () => {
    const compiled = compileFormula('(before - after)/(area*density)', scrub);
    expect(compiled.ok && compiled.value.evaluate({ before: 85, after: null })).toEqual({
      ok: false,
      error: { tag: 'value-missing', name: 'after' }
    });
  });

  test('does not mind a bad unit of a reading the formula does not use', () => {
    const context = { ...scrub, readings: [...scrub.readings, { id: 'gloss', unit: '((' }] };
    expect(compileFormula('(before - after)/(area*density)', context).ok).toBe(true);
    expect(compileFormula('gloss', context)).toEqual({
      ok: false,
      error: { tag: 'unit-not-understood', of: 'gloss', unit: '((' }
    });
  });

  test('lets no reading overrule a constant and none come in from outside', () => {
    const compiled = compileFormula('area', { ...scrub, unit: 'm²' });
    expect(compiled.ok && compiled.value.evaluate({ area: 7 })).toEqual({ ok: true, value: 0.004 });
  });

  test('never throws and never gives anything but a finite number or a tagged error', () => {
    const token = fc.constantFrom(
      ...[
        'before',
        'after',
        'area',
        'density',
        '0',
        '1',
        '2.5',
        '+',
        '-',
        '*',
        '/',
        '^',
        '(',
        ')',
        'sqrt(',
        'ln(',
        'max(',
        ','
      ]
    );
    const number = fc.double({ noNaN: true, noDefaultInfinity: true });
    fc.assert(
      fc.property(
        fc.array(token, { maxLength: 14 }).map((parts) => parts.join(' ')),
        fc.constantFrom('µm', '', 'g', 'g²', '('),
        fc.record({ before: fc.option(number), after: fc.option(number) }),
        (text, unit, values) => {
          const compiled = compileFormula(text, { ...scrub, unit });
          if (!compiled.ok) return compiled.error.tag.length > 0;
          const result = compiled.value.evaluate(values);
          return result.ok ? Number.isFinite(result.value) : result.error.tag.length > 0;
        }
      ),
      { numRuns: 5000 }
    );
  });
});
