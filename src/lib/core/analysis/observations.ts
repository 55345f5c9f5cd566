/** What is read into an analysis: plain data that a worker can receive as it is. */

/** Which end of the scale a person wants: the smaller reading, the larger, or the one nearest to a target. */
export type Direction = 'lower' | 'higher' | { target: number };

/** A run that stopped at a limit: its true value is at least (right-censored) or at most (left-censored) what was read. */
export type Limit = 'none' | 'at-least' | 'at-most';

export interface TreatmentRef {
  id: string;
  name: string;
}

export interface SessionRef {
  id: string;
  name: string;
  /** The stretch of work the session belongs to, if known. */
  shift?: string;
  /** The machine on which the whole session ran, if there are several. */
  machine?: string;
}

/** One run, kept or ruined. Indices are zero-based positions in `treatments` and `sessions`. */
export interface ObservationRow {
  treatment: number;
  session: number;
  /** Slot on the machine, zero-based, or null where it was not recorded. */
  slot: number | null;
  /** The measurand; null for a planned run without a reading. */
  y: number | null;
  /** Ruined: must not count; its reading is kept for the comparison "with and without". */
  ruined: boolean;
  limit: Limit;
  runId: string;
  /** Measured property of the specimen (thickness, say), if the campaign adjusts for one. */
  covariate?: number;
  /** Machine of this run where the runs of one session are spread over several machines; else the session's. */
  machine?: string;
}

/** Which further causes of difference the model holds beside treatment and session. */
export interface FactorChoice {
  slot: boolean;
  machine: boolean;
  shift: boolean;
  covariate?: boolean;
}

/** A linear question a person typed: weights on the treatments, in their order. */
export interface ContrastRequest {
  name: string;
  weights: readonly number[];
}

export type PrimaryModel = 'fixed' | 'random';

export interface Observations {
  treatments: readonly TreatmentRef[];
  sessions: readonly SessionRef[];
  rows: readonly ObservationRow[];
  direction: Direction;
  /** Position of the control in `treatments`, or null. */
  control: number | null;
  /** Error probability of tests and intervals, 0 < alpha < 0.5. */
  alpha: number;
  /** Largest difference from the control that is of no importance (in units of y), or null. */
  equivalenceMargin: number | null;
  /** The analysis that was fixed as primary before the first run. */
  primary: PrimaryModel;
  factors: FactorChoice;
  /** `rank`: the readings are ranks or scores, and the rank tests come first. */
  kind: 'number' | 'rank';
  /** Seed of everything that is simulated. */
  seed: number;
  contrasts?: readonly ContrastRequest[];
}
