import fc from 'fast-check';
import { unit as libraryUnit } from 'mathjs';
import { describe, expect, test } from 'vitest';
import { printUnit, readUnit, sameKind } from '#lib/formula/unit.ts';

const read = (text: string) => {
  const unit = readUnit(text);
  if (!unit.ok) throw new Error(`not understood: ${text}`);
  return unit.value;
};

describe('readUnit(text)', () => {
  // Sizes from the definitions: SI prefixes (SI Brochure, 9th ed., table 7), inch = 25.4 mm, pound = 0.453 592 37 kg
  // (international yard and pound agreement, 1959), litre = 1 dm³, bar = 100 kPa.
  test.each([
    ['', 1],
    ['1', 1],
    ['g', 1e-3],
    ['kg', 1],
    ['mg', 1e-6],
    ['µg', 1e-9],
    ['μm', 1e-6],
    ['um', 1e-6],
    ['mm²', 1e-6],
    ['mm^2', 1e-6],
    ['mm2', 1e-6],
    ['cm³', 1e-6],
    ['g/cm³', 1000],
    ['g/cm^3', 1000],
    ['g cm⁻³', 1000],
    ['g·cm^-3', 1000],
    ['g*cm**-3', 1000],
    ['kg/(m·s²)', 1],
    ['N/mm²', 1e6],
    ['MPa', 1e6],
    ['bar', 1e5],
    ['mL', 1e-6],
    ['ml', 1e-6],
    ['in', 0.0254],
    ['lb', 0.45359237],
    ['min', 60],
    ['h', 3600],
    ['1/h', 1 / 3600],
    ['%', 0.01],
    ['‰', 0.001],
    ['ppm', 1e-6],
    ['kΩ', 1000],
    ['°', Math.PI / 180]
  ])('takes %j as %f SI units', (text, size) => {
    expect(Math.abs(read(text).size / size - 1)).toBeLessThan(1e-14);
  });

  test.each(['GU', 'points', '°C', '°F', 'cycles', 'score', 'rpm', 'Kratzer', 'VAR'])(
    'takes %s as a unit of its own kind',
    (text) => {
      expect(read(text).size).toBe(1);
      expect(sameKind(read(text), read(text))).toBe(true);
      expect(sameKind(read(text), read(''))).toBe(false);
      expect(sameKind(read(text), read('K'))).toBe(false);
      expect(printUnit(read(text))).toBe(text);
    }
  );

  test.each(['g/', '/', '(g', 'g)', 'g^', 'g^0.5', 'g^99', '3', '2 g', '#', 'g//m', '<b>'])(
    'does not understand %j',
    (text) => {
      expect(readUnit(text)).toEqual({ ok: false, error: { tag: 'unit-not-understood', unit: text } });
    }
  );

  test('agrees with the mathjs unit reader on products and quotients', () => {
    const names = fc.constantFrom('g', 'kg', 'mm', 'cm', 'm', 's', 'min', 'N', 'kPa', 'J', 'mol', 'mL', 'A', 'V');
    fc.assert(
      fc.property(
        fc.array(fc.tuple(names, fc.integer({ min: 1, max: 3 })), { minLength: 1, maxLength: 4 }),
        (parts) => {
          const text = parts.map(([name, power]) => `${name}^${power}`).join(' / ');
          const si = libraryUnit(1, text).toSI().toNumeric() as number;
          return Math.abs(read(text).size / si - 1) < 1e-12;
        }
      )
    );
  });

  test('never throws', () => {
    fc.assert(
      fc.property(
        fc.oneof(fc.string(), fc.string({ unit: 'binary' })),
        (text) => typeof readUnit(text).ok === 'boolean'
      ),
      { numRuns: 2000 }
    );
    expect(readUnit('constructor').ok).toBe(true);
    expect(readUnit('__proto__').ok && readUnit('hasOwnProperty').ok).toBe(true);
  });
});

describe('printUnit(unit)', () => {
  test.each([
    ['g/(m²·g/cm³)', 'cm³/m²'],
    ['kg m^-1 s^-2', 'kg/(m·s²)'],
    ['s^-1', '1/s'],
    ['g/g', '']
  ])('writes %s as %j', (text, shown) => {
    expect(printUnit(read(text))).toBe(shown);
  });
});
