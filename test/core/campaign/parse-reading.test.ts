import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { parseReading, type ReadingContext } from '#lib/core/campaign/parse-reading.ts';

// What each text means follows from ISO 80000-1:2022, 7.3 (decimal sign, groups of three); the rest is arithmetic by hand.
const understood: [string, number, Partial<ReadingContext>?][] = [
  ['12,5', 12.5],
  ['12.5', 12.5],
  ['-0,3', -0.3],
  ['+.5', 0.5],
  ['1e-3', 0.001],
  [' 12.5 mm', 12.5, { unit: 'mm' }],
  ['12,5mm', 12.5, { unit: 'mm' }],
  ['12.5\r', 12.5],
  ['\t12.5\n', 12.5],
  ['1.234,5', 1234.5],
  ['1,234.5', 1234.5],
  ['1.234.567', 1234567],
  ['1,234,567', 1234567],
  ['1.234.567,89', 1234567.89],
  ['1,234,567.89', 1234567.89],
  ['1 234', 1234],
  ['1 234,5', 1234.5],
  ['1\u202f234.5', 1234.5],
  ["1'234.50", 1234.5],
  ['1’234,5', 1234.5],
  ['1.234,567', 1234.567],
  ['½', 0.5],
  ['1½', 1.5],
  ['-2¾', -2.75],
  ['⅛', 0.125],
  ['0', 0],
  ['-0', 0],
  ['0,000', 0],
  ['0,123', 0.123],
  ['0.123', 0.123],
  ['1,2345', 1.2345],
  ['1234,567', 1234.567],
  ['12345.678', 12345.678],
  ['007', 7],
  ['1,5e3', 1500],
  ['1E+3', 1000],
  ['2.5×10^-3', 0.0025],
  ['2.5 x 10^3', 2500],
  ['2,5·10⁻³', 0.0025],
  ['−4.2', -4.2],
  ['–4.2', -4.2],
  ['- 4.2', -4.2],
  ['+12', 12],
  ['１２．５', 12.5],
  ['\u200e12.5', 12.5],
  ['1,234', 1.234, { decimals: 3 }],
  ['84.213', 84.213, { decimals: 4 }],
  ['1,234', 1.234, { separatorIsDecimal: true }],
  ['15 µm', 15, { unit: 'μm' }],
  ['60 %', 60, { unit: '%' }],
  ['23.5 °C', 23.5, { unit: '°C' }],
  ['3 m²', 3, { unit: 'm²' }],
  ['0.1', 0.1],
  ['123456789012345', 123456789012345],
  ['0.1000000000000000', 0.1],
  ['5e-324', 5e-324]
];

const refused: [string, string, Partial<ReadingContext>?][] = [
  ['', 'empty'],
  ['   ', 'empty'],
  ['1,234', 'ambiguous'],
  ['1.234', 'ambiguous'],
  ['-123.456', 'ambiguous'],
  ['1,234', 'ambiguous', { decimals: 2 }],
  ['1,234e3', 'ambiguous'],
  ['12,', 'unfinished'],
  ['12.', 'unfinished'],
  ['1.234,', 'unfinished'],
  ['12.5.3', 'not-a-number'],
  ['1..5', 'not-a-number'],
  ['1,,5', 'not-a-number'],
  ['1.,5', 'not-a-number'],
  ['.', 'not-a-number'],
  ['-', 'not-a-number'],
  ['12 5', 'not-a-number'],
  ['1,23,456', 'not-a-number'],
  ['1.234,567.8', 'not-a-number'],
  ['12-5', 'not-a-number'],
  ['5-', 'not-a-number'],
  ['--5', 'not-a-number'],
  ['(5)', 'not-a-number'],
  ['1/2', 'not-a-number'],
  ['⅓', 'not-a-number'],
  ['½e3', 'not-a-number'],
  ['1e', 'not-a-number'],
  ['1e3.5', 'not-a-number'],
  ['0x1F', 'not-a-number'],
  ['NaN', 'not-a-number'],
  ['Infinity', 'not-a-number'],
  ['1O', 'not-a-number'],
  ['l2.5', 'not-a-number'],
  ['12l5', 'not-a-number', { unit: 'mm' }],
  ['1O', 'other-unit', { unit: 'mm' }],
  ['12.5 mm', 'not-a-number'],
  ['12.5 m', 'other-unit', { unit: 'mm' }],
  ['12.5 g', 'other-unit', { unit: 'mg' }],
  ['12.5 Mg', 'other-unit', { unit: 'mg' }],
  ['0.5"', 'other-unit', { unit: 'mm' }],
  ['1e400', 'too-large-or-small'],
  ['1e-400', 'too-large-or-small'],
  ['12345678901234567890', 'too-many-digits'],
  ['0.1234567890123456789', 'too-many-digits'],
  ['≥ 10000', 'limit-not-allowed'],
  ['<0.1', 'limit-not-allowed'],
  ['mm', 'not-a-number', { unit: 'mm' }],
  ['12·5', 'not-a-number'],
  ['=1+1', 'not-a-number'],
  ['1\u0660', 'not-a-number']
];

describe('parseReading(raw, context)', () => {
  it.each(understood)('takes %j as %d', (raw, value, context) => {
    expect(parseReading(raw, context)).toMatchObject({ ok: true, value: { value, limit: 'none' } });
  });

  it.each(refused)('does not take %j: %s', (raw, tag, context) => {
    expect(parseReading(raw, context)).toMatchObject({ ok: false, error: { tag } });
  });

  it('offers both meanings of 1,234', () => {
    const result = parseReading('1,234');
    expect(result).toMatchObject({ error: { candidates: [{ value: 1.234 }, { value: 1234 }] } });
  });

  it('offers the whole number of an unfinished decimal', () => {
    expect(parseReading('12,')).toMatchObject({ error: { candidates: [{ value: 12 }] } });
  });

  it.each([
    ['≥ 10 000', 10000, 'at-least'],
    ['>=10000 cycles', 10000, 'at-least'],
    ['> 10.000,5', 10000.5, 'at-least'],
    ['≤0,1', 0.1, 'at-most'],
    ['< 0.1', 0.1, 'at-most']
  ])('takes %j as %d %s where a reading may stop at a limit', (raw, value, limit) => {
    expect(parseReading(raw, { unit: 'cycles', mayStopAtLimit: true })).toMatchObject({ value: { value, limit } });
  });

  it('echoes plain digits with every digit that was typed', () => {
    expect(parseReading('1.234,50')).toMatchObject({ value: { plain: '1234.50' } });
    expect(parseReading('-,5')).toMatchObject({ value: { plain: '-0.5' } });
  });

  it('gives back every finite double written by the language, with point or comma', () => {
    fc.assert(
      fc.property(fc.double({ noDefaultInfinity: true, noNaN: true }), fc.boolean(), (value, comma) => {
        const written = String(value);
        const result = parseReading(comma ? written.replace('.', ',') : written, { separatorIsDecimal: true });
        expect(result).toMatchObject({ ok: true, value: { value: value === 0 ? 0 : value } });
      })
    );
  });

  it('never throws, and what it takes has the digits that were typed', () => {
    const typed = fc.string({ unit: fc.constantFrom(..."0123456789.,+-eE '½×^⁻³≥<mm"), maxLength: 14 });
    fc.assert(
      fc.property(typed, (raw) => {
        const result = parseReading(raw, { unit: 'mm', mayStopAtLimit: true });
        if (!result.ok || /[eE×½]/u.test(raw)) return;
        const digits = (text: string) => text.replace(/\D/gu, '').replace(/^0+/u, '').replace(/0+$/u, '');
        expect(digits(result.value.plain)).toBe(digits(raw));
      }),
      { numRuns: 2000 }
    );
  });
});
