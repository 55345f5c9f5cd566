import { describe, expect, test } from 'vitest';
import { decimalsFor, numberLocale, numberWriter } from '#lib/ui/format/number-writer.ts';

describe('numberWriter(locale)', () => {
  const en = numberWriter('en-GB');
  const de = numberWriter('de-DE');

  test('fixed() writes the decimal sign and grouping of the locale', () => {
    expect(en.fixed(12345.678, 2)).toBe('12,345.68');
    expect(de.fixed(12345.678, 2)).toBe('12.345,68');
  });

  test('fixed() writes a true minus and no negative zero', () => {
    expect(en.fixed(-1.5, 1)).toBe('−1.5');
    expect(en.fixed(-0.0001, 2)).toBe('0.00');
  });

  test('signed() writes a sign on both sides of zero', () => {
    expect([en.signed(2, 1), en.signed(-2, 1), en.signed(0, 1)]).toEqual(['+2.0', '−2.0', '0.0']);
  });

  test('every writer says a dash for a value that is not there', () => {
    expect([en.fixed(null, 2), en.p(null), en.significant(NaN, 3), en.percent(null), en.whole(null)]).toEqual(
      Array(5).fill('–')
    );
  });

  test('p() never says zero or one', () => {
    expect(en.p(1e-12)).toBe('< 0.0001');
    expect(en.p(1)).toBe('> 0.999');
    expect(en.p(0.0107)).toBe('0.011');
    expect(en.p(0.00107)).toBe('0.0011');
    expect(de.p(0.5)).toBe('0,500');
  });

  test('significant() turns to powers of ten where plain digits would be unreadable', () => {
    expect(en.significant(3.25e-9, 3)).toBe('3.25E−9');
    expect(en.significant(0.0325, 3)).toBe('0.0325');
  });
});

describe('decimalsFor(se, digits, otherwise)', () => {
  test('shows the standard error with the asked significant digits', () => {
    expect(decimalsFor(0.487, 3, 0)).toBe(3);
    expect(decimalsFor(12.3, 3, 0)).toBe(1);
    expect(decimalsFor(4870, 2, 3)).toBe(0);
    expect(decimalsFor(9.99e-7, 2, 0)).toBe(8);
  });

  test('falls back without a usable standard error', () => {
    expect(decimalsFor(null, 3, 2)).toBe(2);
    expect(decimalsFor(0, 3, 2)).toBe(2);
  });
});

describe('numberLocale(language, preferred)', () => {
  test('passes over what is no language tag, as the "C" of a bare POSIX system', () => {
    expect(numberLocale('en', ['C'])).toBe('en');
    expect(numberLocale('de', ['C', 'de-AT'])).toBe('de-AT');
  });
  test("takes the person's variant of the screen language, else the first preference", () => {
    expect(numberLocale('de', ['en-US', 'de-CH'])).toBe('de-CH');
    expect(numberLocale('en', ['fr-FR', 'fr'])).toBe('fr-FR');
    expect(numberLocale('en', [])).toBe('en');
  });
});
