import type { Range } from '../plan.ts';
import type { OutsideRange } from './finding.ts';

/** On which side of a range a value lies; null inside or where no limit is set. A limit itself is inside. */
export function sideOutside(value: number, range: Range): 'below' | 'above' | null {
  if (range.min !== null && value < range.min) return 'below';
  if (range.max !== null && value > range.max) return 'above';
  return null;
}

/**
 * Returns what two pairs of limits say about a value: outside the possible range it cannot be, outside the expected range it is
 * worth a second look. The stronger of the two speaks alone.
 *
 * @param value the reading, in its unit
 * @param possible limits that physics or the instrument set
 * @param expected limits that the engineer expects
 * Checked by: test/core/campaign/checks/check-range.test.ts
 */
export function checkRange(value: number, possible: Range, expected: Range): OutsideRange | null {
  const cannot = sideOutside(value, possible);
  if (cannot) return { check: 'impossible', value, side: cannot, range: possible };
  const odd = sideOutside(value, expected);
  return odd ? { check: 'unexpected', value, side: odd, range: expected } : null;
}
