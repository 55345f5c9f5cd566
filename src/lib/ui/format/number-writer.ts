/** Writes numbers for people: decimal sign and grouping of the locale, a true minus, digits fit for the precision. */
export interface NumberWriter {
  locale: string;
  /** A fixed number of decimals. */
  fixed(value: number | null, decimals: number): string;
  /** The same with a sign always. */
  signed(value: number | null, decimals: number): string;
  whole(value: number | null): string;
  /** A fixed number of significant digits, plain or scientific as its size asks. */
  significant(value: number | null, digits: number): string;
  /** A probability: never "0", never more digits than mean anything. */
  p(value: number | null): string;
  percent(share: number | null, decimals?: number): string;
}

const ABSENT = '–';
const minus = (text: string): string => text.replace('-', '−');

/** Decimals that show a standard error with so many significant digits; 0 to 12. */
export function decimalsFor(se: number | null, digits: number, otherwise: number): number {
  if (se === null || !Number.isFinite(se) || se <= 0) return Math.min(12, Math.max(0, otherwise));
  return Math.min(12, Math.max(0, digits - 1 - Math.floor(Math.log10(se))));
}

/**
 * Locale for numbers: the person's own variant of the screen language if there is one, else the person's first language.
 * `preferred` is the browser's list.
 */
export function numberLocale(language: string, preferred: readonly string[]): string {
  const known = preferred.filter(isLanguageTag);
  const own = known.find((tag) => tag.toLowerCase().split('-')[0] === language);
  return own ?? known[0] ?? language;
}

/** A browser may hand on what its system says: "C" of a bare POSIX system is no language tag, and Intl refuses it. */
function isLanguageTag(tag: string): boolean {
  try {
    return Intl.getCanonicalLocales(tag).length > 0;
  } catch {
    return false;
  }
}

export function numberWriter(locale: string): NumberWriter {
  const cache = new Map<string, Intl.NumberFormat>();
  const format = (value: number, options: Intl.NumberFormatOptions): string => {
    const key = JSON.stringify(options);
    let made = cache.get(key);
    if (made === undefined) {
      made = new Intl.NumberFormat(locale, options);
      cache.set(key, made);
    }
    return minus(made.format(value));
  };
  const usable = (value: number | null): value is number => value !== null && Number.isFinite(value);
  const fixed = (value: number | null, decimals: number, sign = false): string => {
    if (!usable(value)) return ABSENT;
    const options: Intl.NumberFormatOptions =
      Math.abs(value) >= 1e12 || (value !== 0 && decimals >= 12 && Math.abs(value) < 1e-9)
        ? { notation: 'scientific', maximumSignificantDigits: 6 }
        : { minimumFractionDigits: decimals, maximumFractionDigits: decimals };
    return format(value, { ...options, signDisplay: sign ? 'exceptZero' : 'negative' });
  };
  return {
    locale,
    fixed: (value, decimals) => fixed(value, decimals),
    signed: (value, decimals) => fixed(value, decimals, true),
    whole: (value) => (usable(value) ? format(value, { maximumFractionDigits: 0 }) : ABSENT),
    significant: (value, digits) => {
      if (!usable(value)) return ABSENT;
      const size = Math.abs(value);
      const far = size !== 0 && (size < 1e-5 || size >= 1e9);
      return format(value, {
        minimumSignificantDigits: digits,
        maximumSignificantDigits: digits,
        notation: far ? 'scientific' : 'standard'
      });
    },
    p: (value) => {
      if (!usable(value)) return ABSENT;
      if (value < 0.0001) return `< ${format(0.0001, { minimumFractionDigits: 4 })}`;
      if (value > 0.999) return `> ${format(0.999, { minimumFractionDigits: 3 })}`;
      const decimals = value < 0.01 ? 4 : 3;
      return format(value, { minimumFractionDigits: decimals, maximumFractionDigits: decimals });
    },
    percent: (share, decimals = 0) =>
      usable(share)
        ? format(share, { style: 'percent', minimumFractionDigits: decimals, maximumFractionDigits: decimals })
        : ABSENT
  };
}
