/** The decimal sign of a locale. */
export function decimalSign(locale: string): string {
  return new Intl.NumberFormat(locale).formatToParts(1.5).find(({ type }) => type === 'decimal')?.value ?? '.';
}

/** Plain digits as typed, with the decimal sign of the locale and a true minus. No grouping: a reading has one meaning. */
export function writtenPlain(plain: string, locale: string): string {
  const [digits = '', exponent] = plain.split('e');
  const written = digits.replace('.', decimalSign(locale)).replace('-', '−');
  return exponent === undefined ? written : `${written}·10^${exponent.replace('-', '−')}`;
}

/** A value with its instrument's decimals, or more when it was given with more. */
export function writtenValue(value: number, decimals: number, locale: string): string {
  const digits = /\.(\d+)$/u.exec(String(value))?.[1]?.length ?? 0;
  if (String(value).includes('e')) return writtenPlain(String(value), locale);
  return writtenPlain(value.toFixed(Math.min(12, Math.max(decimals, digits))), locale);
}
