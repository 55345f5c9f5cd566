import type { Section } from './reason.ts';

/** One line of an analysis of variance. `F` and `p` are null in the total and error lines, or where there is no error. */
export interface AnovaLine {
  df: number;
  ss: number;
  ms: number | null;
  F: number | null;
  p: number | null;
}

/** A source of variation in both orders: alone (unadjusted) and after all others (adjusted). */
export interface AnovaSource {
  source: 'treatment' | 'session' | 'slot' | 'machine' | 'shift' | 'covariate' | 'order';
  adjusted: AnovaLine;
  unadjusted: AnovaLine;
}

export interface Anova {
  sources: AnovaSource[];
  model: AnovaLine;
  error: AnovaLine;
  total: AnovaLine;
}

/** One treatment. Where the design is in parts, an adjusted mean holds inside its part only (`scope: 'part'`). */
export interface MeanLine {
  treatment: number;
  /** Kept readings. */
  n: number;
  plain: number | null;
  estimate: number | null;
  se: number | null;
  df: number | null;
  lower: number | null;
  upper: number | null;
  /** `none`: no kept reading. */
  scope: 'all' | 'part' | 'none';
  part: number | null;
}

/** Difference of the adjusted means of treatment a and treatment b, a − b; all numbers null where it is not estimable. */
export interface PairLine {
  a: number;
  b: number;
  estimable: boolean;
  estimate: number | null;
  se: number | null;
  df: number | null;
  t: number | null;
  /** Unadjusted. */
  p: number | null;
  pHolm: number | null;
  /** Tukey–Kramer over all treatments with readings, also where the design is in parts. */
  pTukey: number | null;
  /** Tukey–Kramer over the treatments of the pair's own part; equals pTukey where the design is connected. */
  pTukeyPart: number | null;
  /** Unadjusted interval of level 1 − alpha. */
  lower: number | null;
  upper: number | null;
  /** Simultaneous interval (Tukey–Kramer). */
  lowerTukey: number | null;
  upperTukey: number | null;
}

/** Handbook workings of the adjusted totals, one line a treatment. */
export interface WorkingsLine {
  treatment: number;
  /** Treatment total T. */
  T: number;
  /** Sum over the runs of the treatment of the mean of their session. */
  sessionMeans: number;
  /** Adjusted total Q = T − sessionMeans. */
  Q: number;
  /** Balanced case only: sum B of the totals of the sessions that hold the treatment, and k·Q. */
  B: number | null;
  kQ: number | null;
  /** Effect, adding to zero in each connected part; null without kept readings. */
  effect: number | null;
}

export interface Workings {
  lines: WorkingsLine[];
  /** Session totals and sizes, in the order of the sessions (null without kept readings). */
  sessions: { session: number; total: number; size: number }[];
  /** Set when the kept runs are balanced: effect = kQ / (λ·t). */
  balanced: { t: number; k: number; r: number; lambda: number } | null;
  /** Set when further factors are in the model: the effects are then not Q-workings by hand. */
  furtherFactors: boolean;
}

export interface FixedFit {
  n: number;
  rank: number;
  grandMean: number;
  /** Standard deviation between runs inside a session; null without error degrees of freedom. */
  sigma: number | null;
  errorSs: number;
  errorDf: number;
  anova: Anova;
  means: MeanLine[];
  pairs: PairLine[];
  pairSummary: PairSummary;
  workings: Workings;
  /** Session offsets from the average session (inside each part), adjusted for the treatments. */
  sessionEffects: { session: number; effect: number | null }[];
  /** Half-width multipliers of the standard error of a difference: t and q/√2. */
  critical: { t: number | null; tukey: number | null };
  /** Coefficient of the specimen covariate, if it is in the model. */
  covariate: { slope: number; se: number | null; t: number | null; df: number; p: number | null } | null;
}

export interface PairSummary {
  total: number;
  estimable: number;
  seMin: number | null;
  seMean: number | null;
  seMax: number | null;
  /** Root mean square standard error of a difference. */
  seRms: number | null;
}

/** Estimate with its own degrees of freedom; `se` of the Kenward–Roger lines includes their inflation. */
export interface FactorTest {
  source: AnovaSource['source'];
  numDf: number;
  denDf: number;
  F: number;
  p: number;
}

export interface RandomMeans {
  means: MeanLine[];
  pairs: PairLine[];
  pairSummary: PairSummary;
  tests: FactorTest[];
}

export interface VarianceComponents {
  /** Ratio session variance / run variance. */
  ratio: number;
  session: number;
  run: number;
  /** Share of the session in the variance of one reading. */
  intraclass: number;
  /** The session variance was estimated as zero: the best fitting value would be negative. */
  boundary: boolean;
  /** Ratio and run variance at the stationary point without the limit at zero; null where none exists. */
  unconstrained: { ratio: number; run: number } | null;
  /** Derivative of the restricted log-likelihood by the ratio, at ratio zero. */
  scoreAtZero: number;
  logLik: number;
  logLikZero: number;
  /** Likelihood-ratio test of no session variance; p is half a chi-square (Self & Liang 1987). */
  test: { statistic: number; p: number };
  iterations: number;
  converged: boolean;
}

export interface RandomFit {
  n: number;
  variance: VarianceComponents;
  kenwardRoger: RandomMeans;
  satterthwaite: RandomMeans;
  /** Predicted session offsets (best linear unbiased predictions) with the spread that is left given the means. */
  sessions: { session: number; estimate: number; sd: number }[];
  /** The fixed factors of the model beside the treatments. */
  factors: AnovaSource['source'][];
  covariate: { slope: number; se: number; df: number; t: number; p: number } | null;
}

export interface ContrastLine {
  name: string;
  weights: number[];
  result: Section<{ estimate: number; se: number; df: number; t: number; p: number; lower: number; upper: number }>;
}
