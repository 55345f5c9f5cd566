import type { Range } from '../plan.ts';

/** What a value could have been meant to be. */
export interface SlipCandidate {
  value: number;
  /** What would have happened: a shifted decimal sign, inch for millimetre, two digits swapped. */
  how: 'decimal' | 'inch' | 'swapped-digits';
  /** What the typed value was multiplied by, for the first two; 1 for swapped digits. */
  factor: number;
}

/** A reading outside its limits, or a measurand outside its own: then it is named. */
export interface OutsideRange {
  check: 'impossible' | 'unexpected';
  value: number;
  side: 'below' | 'above';
  range: Range;
  measurand?: string;
}

/** What a check has to say about one value; words are made from it in one place. A check warns and never blocks. */
export type Finding =
  | OutsideRange
  | { check: 'slip'; value: number; candidates: SlipCandidate[] }
  | { check: 'stuck'; value: number; times: number }
  | { check: 'surprise'; value: number; measurand: string; low: number; high: number; center: number }
  | { check: 'condition'; condition: string; value: number; side: 'below' | 'above'; window: Range };
