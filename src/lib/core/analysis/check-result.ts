import type { FixedFit } from './fit-result.ts';
import type { Section } from './reason.ts';

/** Diagnostics of one kept reading; null where leverage 1 leaves nothing to judge. */
export interface RowDiagnostics {
  /** Position in the input rows. */
  row: number;
  fitted: number;
  residual: number;
  leverage: number;
  /** Internally studentised. */
  standardized: number | null;
  /** Externally studentised. */
  studentized: number | null;
  cook: number | null;
}

export interface OutlierTest {
  row: number;
  /** All rows that reach the largest value (ties are common in small balanced designs). */
  tiedRows: number[];
  studentized: number;
  df: number;
  p: number;
  pBonferroni: number;
  tests: number;
}

export interface NormalPlot {
  points: { row: number; theoretical: number; observed: number; lower: number; upper: number }[];
  level: number;
  draws: number;
  seed: number;
}

export interface FTest {
  df1: number;
  df2: number;
  F: number;
  p: number;
}

/** A straight-line trend; per slot or per session. */
export interface TrendTest {
  slope: number;
  se: number;
  t: number;
  df: number;
  p: number;
}

export interface TreatmentScatter {
  lines: { treatment: number; n: number; sd: number | null }[];
  /** Analysis of variance of |standardised residual| by treatment (Levene's idea on residuals): an approximate test. */
  test: Section<FTest>;
}

export interface PowerScale {
  lambda: number;
  atLimit: boolean;
  logLik: number;
  /** Null where the end lies outside the search interval. */
  lower: number | null;
  upper: number | null;
  /** Likelihood-ratio statistic and p for the scale as it is (lambda 1). */
  asIs: { statistic: number; p: number };
  grid: { lambda: number; logLik: number }[];
  /** The handy power inside the interval (…, −1, −½, 0 = log, ½, 1, …) on which the analysis was repeated. */
  chosen: number;
  /** Refit on the chosen scale; null when that is 1. Means and limits are transformed back (medians, not means). */
  refit: {
    fit: FixedFit;
    back: { treatment: number; median: number | null; lower: number | null; upper: number | null }[];
  } | null;
}

export interface Diagnostics {
  rows: RowDiagnostics[];
  outlier: Section<OutlierTest>;
  normalPlot: Section<NormalPlot>;
  /** Royston's approximation on the raw residuals. */
  normality: Section<{ W: number; p: number; n: number }>;
  slot: Section<FTest>;
  slotTrend: Section<TrendTest>;
  sessionTrend: Section<TrendTest>;
  scatter: Section<TreatmentScatter>;
  nonadditivity: Section<{ ss: number; coefficient: number } & FTest>;
  powerScale: Section<PowerScale>;
}

/** What the ruined runs cost and what they would have said. */
export interface RuinedAnalysis {
  runs: number;
  withReading: number;
  byTreatment: { treatment: number; ruined: number; kept: number }[];
  /** Is ruin spread over the treatments as chance would do it? */
  association: Section<{ p: number; method: 'exact' | 'simulated'; error: number }>;
  /** Analysis with the ruined readings taken at face value. */
  faceValue: Section<FixedFit>;
  /** Mean without − mean with, for each treatment. */
  changes: { treatment: number; without: number | null; with: number | null; change: number | null }[];
  /** Pairs whose verdict at alpha (Tukey–Kramer) turns. */
  turned: { a: number; b: number; without: boolean; with: boolean }[];
}

/** Normal model with sessions fixed for readings that stopped at a limit, by maximum likelihood. */
export interface CensoredFit {
  n: number;
  limited: number;
  logLik: number;
  /** Maximum-likelihood standard deviation (not corrected for degrees of freedom). */
  sigma: number;
  sigmaSe: number;
  iterations: number;
  means: {
    treatment: number;
    estimate: number | null;
    se: number | null;
    lower: number | null;
    upper: number | null;
  }[];
  pairs: { a: number; b: number; estimate: number | null; se: number | null; z: number | null; p: number | null }[];
  test: Section<{ statistic: number; df: number; p: number }>;
}

/** Rank tests; pairs are differences of rank sums. */
export interface RankAnalysis {
  durbin: Section<{
    rankSum: number[];
    A: number;
    C: number;
    T1: number;
    df: number;
    p: number;
    T2: number;
    df1: number;
    df2: number;
    pF: number;
    ties: boolean;
    pairSe: number;
    pairs: { a: number; b: number; difference: number; t: number; p: number }[];
  }>;
  skillingsMack: Section<{
    A: number[];
    covarianceDiagonal: number[];
    statistic: number;
    df: number;
    p: number;
    sessionsUsed: number;
  }>;
  friedman: Section<{ statistic: number; df: number; p: number }>;
}
