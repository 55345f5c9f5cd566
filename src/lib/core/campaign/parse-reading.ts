import { fail, ok, type Result } from '../result.ts';

/** What is known about the reading that is being typed. */
export interface ReadingContext {
  /** The reading's unit; only this unit may stand behind the number. Empty: none may. */
  unit: string;
  /** Decimals of the instrument; null when not known. */
  decimals: number | null;
  /** Whether "≥ 10 000" is a reading here. */
  mayStopAtLimit: boolean;
  /** True when the only separator that can have been typed is the decimal one (the program's own keypad). */
  separatorIsDecimal: boolean;
}

/** A number as understood: the value, and the same in plain digits with a point, for the echo. */
export interface UnderstoodReading {
  value: number;
  /** As typed, in plain digits with a decimal point: `1.234,50` is `1234.50`. */
  plain: string;
  limit: 'none' | 'at-least' | 'at-most';
}

/** Why a text is not taken as a number. `ambiguous` and `unfinished` carry what it could be, to be asked. */
export type ReadingNotUnderstood =
  | { tag: 'empty' }
  | { tag: 'not-a-number'; at: string }
  | { tag: 'ambiguous'; candidates: UnderstoodReading[] }
  | { tag: 'unfinished'; candidates: UnderstoodReading[] }
  | { tag: 'other-unit'; typed: string; unit: string }
  | { tag: 'limit-not-allowed' }
  | { tag: 'too-many-digits' }
  | { tag: 'too-large-or-small' };

type Outcome = Result<UnderstoodReading, ReadingNotUnderstood>;
type Limit = UnderstoodReading['limit'];

const noContext: ReadingContext = { unit: '', decimals: null, mayStopAtLimit: false, separatorIsDecimal: false };

/** Unicode fractions that are finite decimals; a third is refused because no decimal number is a third. */
const fractions: Record<string, string> = {
  '½': '5',
  '¼': '25',
  '¾': '75',
  '⅕': '2',
  '⅖': '4',
  '⅗': '6',
  '⅘': '8',
  '⅛': '125',
  '⅜': '375',
  '⅝': '625',
  '⅞': '875',
  '⅒': '1'
};
const superscripts: Record<string, string> = {
  '⁰': '0',
  '¹': '1',
  '²': '2',
  '³': '3',
  '⁴': '4',
  '⁵': '5',
  '⁶': '6',
  '⁷': '7',
  '⁸': '8',
  '⁹': '9',
  '⁻': '-'
};

const limitSigns: [RegExp, Limit][] = [
  [/^(?:≥|>=|>)\s*/u, 'at-least'],
  [/^(?:≤|<=|<)\s*/u, 'at-most']
];

/**
 * Returns the number that a typed or sent text means, or why it is not taken as one. Decimal comma and decimal point are
 * both right, group marks (point, comma, apostrophe, space in threes) are understood where they leave one meaning, and where
 * two meanings are left it returns both to be asked. No text is turned into another number: too many digits to be
 * kept, overflow, underflow, an unfinished number and a foreign unit are refused.
 *
 * @param raw the text to the letter, at most 200 characters are looked at
 * @param context what is known about the reading
 * @returns value and its plain digits; errors are tagged
 * Source: ISO 80000-1:2022, 7.3 (decimal sign is a comma or a point on the line; groups of three parted by a small space).
 * Checked by: test/core/campaign/parse-reading.test.ts
 */
export function parseReading(raw: string, context: Partial<ReadingContext> = {}): Outcome {
  const known = { ...noContext, ...context };
  let text = tidy(raw);
  if (text === '') return fail({ tag: 'empty' });
  if (raw.length > 200) return fail({ tag: 'not-a-number', at: raw.slice(0, 20) });

  let limit: Limit = 'none';
  for (const [sign, meaning] of limitSigns) {
    if (!sign.test(text)) continue;
    text = text.replace(sign, '');
    limit = meaning;
    break;
  }

  const unit = cutUnit(text, known.unit);
  if (!unit.ok) return unit;
  const number = readNumber(unit.value, limit, known);
  if (limit !== 'none' && !known.mayStopAtLimit && (number.ok || number.error.tag !== 'not-a-number'))
    return fail({ tag: 'limit-not-allowed' });
  return number;
}

/** One kind of minus, of space, of micro sign and of digit width; no invisible marks at all. */
function tidy(raw: string): string {
  return raw
    .replace(/[\u200b-\u200f\u202a-\u202e\u2060\ufeff]/gu, '')
    .replace(/[\uff10-\uff19]/gu, (wide) => String.fromCharCode(wide.charCodeAt(0) - 0xfee0))
    .replace(/\uff0e/gu, '.')
    .replace(/\uff0c/gu, ',')
    .replace(/[\u2212\u2013\u2010\u2011\uff0d]/gu, '-')
    .replace(/\uff0b/gu, '+')
    .replace(/\u00b5/gu, '\u03bc')
    .replace(/\s/gu, ' ')
    .trim();
}

/** Takes the reading's own unit off the end; any other letters are said to be another unit. */
function cutUnit(text: string, unit: string): Result<string, ReadingNotUnderstood> {
  const own = tidy(unit);
  if (own !== '' && text.endsWith(own)) {
    const before = text.slice(0, text.length - own.length).trimEnd();
    // "5e" with a unit "e" would leave a number that was not finished.
    if (before !== '' && !/^[eE]$/u.test(own)) return ok(before);
  }
  const other = /^(.*[\d.,½¼¾⅕⅖⅗⅘⅛⅜⅝⅞⅒])\s*((?:\p{L}|[°%‰′″"Ω])[\p{L}°%‰′″"Ω/·.^²³⁻¹-]*)$/u.exec(text);
  const typed = other?.[2] ?? '';
  if (other && own !== '' && !/^[eExX]$/u.test(typed)) return fail({ tag: 'other-unit', typed, unit });
  return ok(text);
}

const shape =
  /^([+-]?)\s*([\d.,'’ ]*)([½¼¾⅕⅖⅗⅘⅛⅜⅝⅞⅒]?)\s*(?:([eE])\s*([+-]?\d+)|[×x*·]\s*10\s*(?:\^\s*([+-]?\d+)|([⁻]?[⁰¹²³⁴⁵⁶⁷⁸⁹]+)))?$/u;

function readNumber(text: string, limit: Limit, known: ReadingContext): Outcome {
  const found = shape.exec(text);
  const refused = fail({ tag: 'not-a-number' as const, at: firstOddity(text) });
  if (!found) return refused;
  const [, sign = '', body = '', fraction = ''] = found;
  const exponent = found[5] ?? found[6] ?? [...(found[7] ?? '')].map((c) => superscripts[c] ?? '').join('');
  const digits = body.trim();
  const make = (plain: string): Outcome => toNumber(sign, plain, exponent, limit);

  if (fraction !== '') {
    if (!/^\d*$/u.test(digits) || exponent !== '') return refused;
    return make(`${digits === '' ? '0' : digits}.${fractions[fraction] ?? ''}`);
  }
  const meanings = meaningsOf(digits, known);
  const numbers: UnderstoodReading[] = [];
  for (const plain of meanings.plain) {
    const number = make(plain);
    if (!number.ok) return number;
    numbers.push(number.value);
  }
  const [first] = numbers;
  if (!first) return refused;
  if (meanings.unfinished) return fail({ tag: 'unfinished', candidates: numbers });
  return numbers.length === 1 ? ok(first) : fail({ tag: 'ambiguous', candidates: numbers });
}

/** Every plain number that digits with separators can mean: none, one, or two. */
function meaningsOf(digits: string, known: ReadingContext): { plain: string[]; unfinished: boolean } {
  const one = (plain: string, unfinished = false) => ({ plain: [plain], unfinished });
  const none = { plain: [], unfinished: false };
  if (/^\d+$/u.test(digits)) return one(digits);

  const single = /^(\d*)([.,])(\d*)$/u.exec(digits);
  if (single) {
    const [, whole = '', , part = ''] = single;
    if (whole === '' && part === '') return none;
    if (part === '') return one(whole, true);
    const decimal = `${whole === '' ? '0' : whole}.${part}`;
    const couldBeGroup = /^[1-9]\d{0,2}$/u.test(whole) && part.length === 3;
    const mustBeDecimal = known.separatorIsDecimal || (known.decimals !== null && known.decimals >= 3);
    return couldBeGroup && !mustBeDecimal ? { plain: [decimal, whole + part], unfinished: false } : one(decimal);
  }

  // Groups of three, all with the same mark, then perhaps a decimal sign that is another mark.
  const grouped = /^([1-9]\d{0,2})([.,'’ ])(\d{3}(?:\2\d{3})*)(?:([.,])(\d*))?$/u.exec(digits);
  if (!grouped || grouped[2] === grouped[4]) return none;
  const whole = (grouped[1] ?? '') + (grouped[3] ?? '').replace(/\D/gu, '');
  if (grouped[4] === undefined) return one(whole);
  return grouped[5] === '' ? one(whole, true) : one(`${whole}.${grouped[5] ?? ''}`);
}

/** The double nearest to plain digits, refused when it does not keep every digit. */
function toNumber(sign: string, plain: string, exponent: string, limit: Limit): Outcome {
  const shown = (sign === '-' ? '-' : '') + plain + (exponent === '' ? '' : `e${exponent}`);
  const value = Number(shown);
  const isZero = !/[1-9]/u.test(plain);
  if (!Number.isFinite(value) || (value === 0 && !isZero)) return fail({ tag: 'too-large-or-small' });
  if (significant(plain) !== significant(mantissa(value))) return fail({ tag: 'too-many-digits' });
  return ok({ value: isZero ? 0 : value, plain: isZero && sign === '-' ? plain : shown, limit });
}

const mantissa = (value: number) => String(Math.abs(value)).replace(/e.*$/u, '');

/** The digits that carry the value: no separator, no zeros before or behind. */
const significant = (plain: string) => plain.replace('.', '').replace(/^0+/u, '').replace(/0+$/u, '');

function firstOddity(text: string): string {
  return /[^\d.,+\-'’ ]/u.exec(text)?.[0] ?? text.slice(0, 20);
}
