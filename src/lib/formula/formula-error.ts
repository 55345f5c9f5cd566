/** Why a formula cannot be used. The words for people are made from the tag, in the texts. */
export type FormulaError =
  | { tag: 'formula-empty' }
  | { tag: 'formula-too-long'; length: number; most: number }
  | { tag: 'formula-too-deep'; most: number }
  /** `at` is the 1-based place of the first character that makes no sense; `comma` when a decimal comma is likely. */
  | { tag: 'formula-syntax'; at: number | null; comma: boolean }
  | { tag: 'formula-forbidden'; what: string }
  | { tag: 'formula-implicit-product'; left: string; right: string }
  | { tag: 'formula-unknown-name'; name: string; known: string[] }
  | { tag: 'formula-unknown-function'; name: string; known: string[] }
  | { tag: 'formula-ambiguous-log' }
  | { tag: 'formula-argument-count'; name: string; least: number; most: number | null; actual: number }
  | { tag: 'formula-reserved-name'; name: string }
  | { tag: 'formula-duplicate-name'; name: string }
  | { tag: 'formula-missing-reading'; name: string }
  | UnitError;

export type UnitError =
  | { tag: 'unit-not-understood'; of: string; unit: string }
  | {
      tag: 'units-differ';
      how: 'add' | 'subtract' | 'compare';
      left: string;
      leftUnit: string;
      right: string;
      rightUnit: string;
    }
  | { tag: 'unit-in-exponent'; text: string; unit: string }
  | { tag: 'unit-to-unknown-power'; text: string; unit: string; power: string }
  | { tag: 'unit-in-function'; name: string; text: string; unit: string }
  | { tag: 'unit-of-result'; found: string; wanted: string };

/** Why a sound formula gives no number for these values. */
export type EvaluationError =
  | { tag: 'value-missing'; name: string }
  | { tag: 'division-by-zero'; text: string }
  /** The root or logarithm of a number that has none among the real numbers. */
  | { tag: 'not-real'; text: string }
  | { tag: 'not-finite'; text: string };
