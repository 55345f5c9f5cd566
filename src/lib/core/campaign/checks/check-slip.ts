import type { Range } from '../plan.ts';
import { sideOutside } from './check-range.ts';
import type { SlipCandidate } from './finding.ts';

const decimalShifts = [10, 100, 1000, 0.1, 0.01, 0.001];
/** Exact by definition: 1 inch = 25.4 mm. */
const inch = 25.4;

/**
 * Returns what an unexpected value was probably meant to be: the value with its decimal sign one to three places off, with
 * inch and millimetre confused, or with two neighbouring digits swapped, where that lies inside what was expected. The nearest
 * to the middle of the expectation comes first; at most three. An expected value gives none, and so does an
 * expectation without both limits, because almost anything would fit it.
 *
 * @param value the number as understood
 * @param plain its digits as typed, with a decimal point and perhaps a sign and exponent
 * @param expected what was expected: the narrowest interval known
 * Source: ISO 31-1 / international yard and pound agreement 1959 for 25.4; the other factors are common practice, no source.
 * Checked by: test/core/campaign/checks/check-slip.test.ts
 */
export function checkSlip(value: number, plain: string, expected: Range): SlipCandidate[] {
  const { min, max } = expected;
  if (min === null || max === null || sideOutside(value, expected) === null) return [];
  const middle = (min + max) / 2;
  const likely = slipCandidates(value, plain)
    .filter((c) => sideOutside(c.value, expected) === null)
    .sort((a, b) => Math.abs(a.value - middle) - Math.abs(b.value - middle));
  return likely.filter((c, i) => likely.findIndex((d) => d.value === c.value) === i).slice(0, 3);
}

/** Every other number that a value could have been meant to be, likely or not. */
export function slipCandidates(value: number, plain: string): SlipCandidate[] {
  const candidates: SlipCandidate[] = [];
  for (const factor of decimalShifts)
    candidates.push({ value: shifted(plain, Math.round(Math.log10(factor))), how: 'decimal', factor });
  candidates.push({ value: tidy(value * inch), how: 'inch', factor: inch });
  candidates.push({ value: tidy(value / inch), how: 'inch', factor: 1 / inch });
  for (const swapped of swaps(plain)) candidates.push({ value: swapped, how: 'swapped-digits', factor: 1 });
  return candidates.filter((one) => Number.isFinite(one.value) && one.value !== value);
}

/** The typed digits with the decimal sign moved; reads the digits anew, so that 0.07 becomes 0.7 and not 0.7000000000000001. */
function shifted(plain: string, places: number): number {
  const [digits = '', exponent = '0'] = plain.split('e');
  return Number(`${digits}e${Number(exponent) + places}`);
}

/** Six significant digits are enough for a value that was converted. */
const tidy = (value: number) => Number(value.toPrecision(6));

/** Every number that two different neighbouring digits make when swapped; the decimal sign stays where it is. */
function swaps(plain: string): number[] {
  const [digits = '', exponent] = plain.split('e');
  const places = [...digits].flatMap((c, i) => (c >= '0' && c <= '9' ? [i] : []));
  const found: number[] = [];
  for (let i = 0; i + 1 < places.length; i++) {
    const left = places[i] ?? 0;
    const right = places[i + 1] ?? 0;
    if (digits[left] === digits[right]) continue;
    const changed = [...digits];
    [changed[left], changed[right]] = [digits[right] ?? '', digits[left] ?? ''];
    found.push(Number(changed.join('') + (exponent === undefined ? '' : `e${exponent}`)));
  }
  return found;
}
