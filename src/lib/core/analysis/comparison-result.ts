import type { ContrastLine } from './fit-result.ts';
import type { Section } from './reason.ts';

/** Treatment − control with single-step adjustment (Dunnett). */
export interface ControlLine {
  treatment: number;
  estimate: number;
  se: number;
  df: number;
  t: number;
  /** Unadjusted. */
  p: number;
  pDunnett: number;
  /** Stated numerical error of pDunnett. */
  pError: number;
  lower: number;
  upper: number;
}

export interface ControlComparison {
  control: number;
  lines: ControlLine[];
  critical: number;
  method: 'quadrature' | 'quasi-monte-carlo' | 'expansion';
  /** Treatments without an estimable difference to the control. */
  lost: number[];
}

/** Hsu: treatment − best of the others, with the constrained interval; `isBest` when it alone may be the best. */
export interface BestLine {
  treatment: number;
  lower: number;
  upper: number;
  mayBeBest: boolean;
  isBest: boolean;
}

export interface BestComparison {
  lines: BestLine[];
  critical: number;
}

/** Two one-sided tests against the control: `p` is the larger of the two. */
export interface EquivalenceLine {
  treatment: number;
  estimate: number;
  pLower: number;
  pUpper: number;
  p: number;
  /** Interval of level 1 − 2·alpha. */
  lower: number;
  upper: number;
  equivalent: boolean;
}

/** Compact letters: two treatments share a letter when they do not differ (Tukey–Kramer at alpha). */
export interface LettersLine {
  treatment: number;
  letters: string;
}

/** Comparisons under one model (the pairs themselves are in the fit). */
export interface Comparisons {
  letters: Section<LettersLine[]>;
  control: Section<ControlComparison>;
  best: Section<BestComparison>;
  equivalence: Section<{ margin: number; lines: EquivalenceLine[] }>;
  contrasts: ContrastLine[];
}
