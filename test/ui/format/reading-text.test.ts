import { expect, it } from 'vitest';
import { decimalSign, writtenPlain, writtenValue } from '#lib/ui/format/reading-text.ts';

it('decimalSign(locale) is that of the locale', () => {
  expect([decimalSign('en-GB'), decimalSign('de-DE')]).toEqual(['.', ',']);
});

it('writtenPlain(plain) keeps every digit, writes no groups and a true minus', () => {
  expect(writtenPlain('-12345.60', 'de-DE')).toBe('−12345,60');
  expect(writtenPlain('1.5e-3', 'en-GB')).toBe('1.5·10^−3');
});

it('writtenValue(value, decimals) shows the decimals of the instrument, and more when there are more', () => {
  expect(writtenValue(84.2, 4, 'en-GB')).toBe('84.2000');
  expect(writtenValue(84.21345, 2, 'de-DE')).toBe('84,21345');
  expect(writtenValue(1e21, 0, 'en-GB')).toBe('1·10^+21');
});
