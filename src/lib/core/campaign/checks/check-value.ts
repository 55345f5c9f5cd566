import type { Range } from '../plan.ts';
import { checkRange } from './check-range.ts';
import { checkSlip } from './check-slip.ts';
import type { Finding } from './finding.ts';

/** What the kept readings so far predict for this one; handed in, because the record computes no statistics. */
export interface Predicted {
  low: number;
  high: number;
  center: number;
}

/**
 * Returns what range, prediction and likely slip say about one value, the strongest first: a value outside its limits is
 * named as that; inside them, a value outside the prediction is a surprise. Either way it is asked whether the
 * value was meant to be another one that lies inside everything that was expected.
 *
 * @param value the number as understood
 * @param plain its digits as typed, with a decimal point
 * @param limits possible and expected range of the reading
 * @param predicted prediction for this reading; null while there is none
 * @param measurand what is predicted, to be named
 * Checked by: test/core/campaign/checks/check-value.test.ts; npm run bench:checks
 */
export function checkValue(
  value: number,
  plain: string,
  limits: { possible: Range; expected: Range },
  predicted: Predicted | null,
  measurand: string
): Finding[] {
  const range = checkRange(value, limits.possible, limits.expected);
  const surprise = checkSurprise(value, predicted, measurand);
  const odd = range ?? surprise;
  if (!odd) return [];
  const candidates = checkSlip(value, plain, narrowest(limits.expected, predicted));
  return candidates.length > 0 ? [odd, { check: 'slip', value, candidates }] : [odd];
}

/** Returns a finding where the value lies outside what the kept readings so far predict. */
export function checkSurprise(value: number, predicted: Predicted | null, measurand: string): Finding | null {
  if (!predicted || (value >= predicted.low && value <= predicted.high)) return null;
  return { check: 'surprise', value, measurand, ...predicted };
}

/** The part of the prediction inside the expected range; the prediction alone where the two exclude each other. */
function narrowest(expected: Range, predicted: Predicted | null): Range {
  if (!predicted) return expected;
  const min = Math.max(expected.min ?? -Infinity, predicted.low);
  const max = Math.min(expected.max ?? Infinity, predicted.high);
  return min <= max ? { min, max } : { min: predicted.low, max: predicted.high };
}
