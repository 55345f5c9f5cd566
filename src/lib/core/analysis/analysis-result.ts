import type { CensoredFit, Diagnostics, RankAnalysis, RuinedAnalysis } from './check-result.ts';
import type { Comparisons } from './comparison-result.ts';
import type { FixedFit, RandomFit } from './fit-result.ts';
import type { PrimaryModel } from './observations.ts';
import type { Reason, Section } from './reason.ts';

export type * from './check-result.ts';
export type * from './comparison-result.ts';
export type * from './fit-result.ts';
export type { Reason, Section } from './reason.ts';

/** Replication, meetings and efficiency of one set of runs. */
export interface DesignCounts {
  treatments: number;
  sessions: number;
  runs: number;
  replication: number[];
  sessionSize: number[];
  binary: boolean;
  equireplicate: boolean;
  proper: boolean;
  balanced: boolean;
  complete: boolean;
  lambda: number | null;
  /** Sessions in which a pair of treatments meets → number of pairs. */
  concurrenceCounts: { meetings: number; pairs: number }[];
  /** concurrence[i][j]: sum over sessions of the product of counts. */
  concurrence: number[][];
  parts: { treatments: number[]; sessions: number[] }[];
  connected: boolean;
  efficiency: Efficiency;
}

/** Canonical efficiency factors (ascending, zeros left out) and variances of differences in units of the run variance. */
export interface Efficiency {
  eliminated: string[];
  canonical: number[];
  zeros: number;
  average: number | null;
  min: number | null;
  max: number | null;
  /** Null when the design is in parts. */
  pairVariance: { average: number; min: number; max: number; efficiency: number } | null;
}

export interface DesignSummary {
  /** All runs handed in, ruined and unread ones included. */
  planned: DesignCounts;
  /** The runs that count. */
  kept: DesignCounts;
  /** With the further factors inside sessions eliminated as well; null where there are none. */
  keptAllFactors: Efficiency | null;
  /** Pairs that could be compared as planned and cannot any more. */
  lostPairs: { a: number; b: number }[];
}

/** The finding, as data; the screen writes the sentence. Gaps are positive: by how much the first is better. */
export type Answer =
  | {
      tag: 'one-best';
      model: AnswerModel;
      treatment: number;
      mean: number;
      next: number;
      gap: number;
      /** Simultaneous interval of the gap at level 1 − alpha. */
      lower: number;
      upper: number;
      /** Treatments in order, best first. */
      order: number[];
    }
  | { tag: 'several-best'; model: AnswerModel; leaders: number[]; leaderMean: number; worse: number[]; order: number[] }
  | { tag: 'none-differ'; model: AnswerModel; p: number | null; order: number[]; leader: number; leaderMean: number }
  | { tag: 'parts'; model: AnswerModel; parts: { treatments: number[]; answer: Answer }[] }
  | { tag: 'ranks-differ'; p: number; order: number[] }
  | { tag: 'ranks-do-not-differ'; p: number; order: number[] }
  | { tag: 'means-only'; order: number[]; reason: Reason }
  | { tag: 'none'; reason: Reason };

export type AnswerModel = PrimaryModel | 'censored';

export type Warning =
  | { tag: 'parts'; parts: number }
  | { tag: 'lost-pairs'; pairs: number }
  | { tag: 'treatments-without-readings'; treatments: number[] }
  | { tag: 'few-error-degrees-of-freedom'; df: number }
  | { tag: 'session-variance-zero' }
  | { tag: 'outlier'; row: number; p: number }
  | { tag: 'slots-differ'; p: number; inModel: boolean }
  | { tag: 'session-trend'; p: number }
  | { tag: 'scatter-differs'; p: number }
  | { tag: 'nonadditive'; p: number }
  | { tag: 'other-scale'; lambda: number; p: number }
  | { tag: 'not-normal'; p: number }
  | { tag: 'ruin-associated'; p: number }
  | { tag: 'verdict-turns-with-ruined'; pairs: number }
  | { tag: 'limits-taken-as-values'; runs: number }
  | { tag: 'models-disagree'; pairs: number }
  | { tag: 'single-run-sessions'; sessions: number[] }
  | { tag: 'factor-left-out'; factor: string; reason: Reason };

export interface Analysis {
  /** Changes whenever the same input may give other numbers. */
  algorithm: string;
  primary: PrimaryModel;
  alpha: number;
  counts: { runs: number; kept: number; ruined: number; unread: number; limited: number };
  design: DesignSummary;
  fixed: Section<FixedFit>;
  random: Section<RandomFit>;
  /** Letters, control, best, equivalence, typed contrasts: under each model. */
  comparisons: Record<PrimaryModel, Section<Comparisons>>;
  diagnostics: Section<Diagnostics>;
  ruined: Section<RuinedAnalysis>;
  censored: Section<CensoredFit>;
  ranks: Section<RankAnalysis>;
  answer: Answer;
  warnings: Warning[];
}
