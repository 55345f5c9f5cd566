/**
 * What the planner asks and what it is offered. Treatments are numbered 0 … t − 1 in the person's order; all numbers are
 * plain data that survive a worker's message and JSON.
 */

/** One machine: how many slots are in service. */
export interface MachineRequest {
  slots: number;
}

/** Several treatments that stand for what is compared with: each is in every session. */
export interface ControlRequest {
  treatments: readonly number[];
  /**
   * Which variance counts: of test against control, of test against test, or half of each. All three are shown in any
   * case.
   */
  weigh: 'test-control' | 'test-test' | 'half';
}

export interface DesignRequest {
  /** Number of treatments t, controls included; 2 to 100. */
  treatments: number;
  /** Machines that work side by side; at least one. A session is one loading of one machine. */
  machines: readonly MachineRequest[];
  /** Most sessions that can be afforded; null when the planner is to propose a number. */
  maxSessions: number | null;
  /**
   * Sizes of the sessions when they are given one by one (a slot out of service on some days); then these sessions are
   * planned, no more and no fewer, and `maxSessions` does not matter.
   */
  sessionSizes: readonly number[] | null;
  /** Specimens at hand of each treatment; null where there are enough; the whole list may be null. */
  specimens: readonly (number | null)[] | null;
  /** Sessions one machine does in one shift; null when shifts do not matter. */
  sessionsPerShift: number | null;
  /** Whether each shift (or run of shifts) is to hold every treatment once. */
  resolvable: boolean;
  control: ControlRequest | null;
  /** Pairs that must not share a session. */
  forbiddenPairs: readonly (readonly [number, number])[];
  /** Expected scatter σ between runs in one session, in the measurand's unit; null: results are in units of σ. */
  scatter: number | null;
  /** Smallest difference that matters, in the measurand's unit; null when not said. */
  difference: number | null;
  /** Error probability α of a two-sided test. */
  alpha: number;
  /** Which detectable difference the recommendation goes by; Tukey's when nothing is said. */
  adjustment?: 'unadjusted' | 'tukey' | undefined;
  /** Minutes of one session; null when not known. */
  minutesPerSession: number | null;
  /** Any text; the same request gives the same choices, on every device. */
  seed: string;
  /** How many search steps are spent; a fixed number each, never a time. */
  effort: 'quick' | 'normal' | 'thorough';
}

/** Where a design comes from. */
export interface Construction {
  /** `catalogue`: a balanced design by construction; `search`: interchange search; `all-combinations`; `complete`. */
  kind: 'catalogue' | 'all-combinations' | 'complete' | 'search';
  /** Tag of the construction for translation, such as `projective-geometry` or `interchange-search`. */
  id: string;
  /** One English sentence. */
  text: string;
  /** Publication of the method. */
  source: string;
  /**
   * Steps (of a thousand elementary operations) that were spent and allowed when it was searched for: the same request with
   * the same seed gives the same design.
   */
  search: { seed: string; steps: number; allowed: number; version: number } | null;
}

/**
 * A bound that no design of these sizes can pass. With controls it bounds the variance that counts (see ControlRequest)
 * instead of the A-value.
 */
export interface Bound {
  /** Least possible value. */
  aValue: number;
  /** Which argument gives it; the largest of those that apply is shown. */
  by: 'mean' | 'concurrence' | 'dual' | 'resolvable' | 'control';
  source: string;
}

/** Smallest true difference that is found with the given probability. */
export interface Detectable {
  /** t test of one pair without adjustment. */
  unadjusted: number;
  /** With Tukey's adjustment for all pairs. */
  tukey: number;
}

/** All lengths are in the measurand's unit when the scatter is known, else in units of σ. */
export interface Precision {
  /** Error degrees of freedom n − b − t + 1 of the sessions-fixed analysis. */
  errorDf: number;
  /** Standard error of a difference: root of the mean variance, least and largest over pairs. */
  sed: number;
  sedMin: number;
  sedMax: number;
  /** Detectable differences at power 0.8 and 0.9 for the mean variance; null when there are no error degrees of freedom. */
  power80: Detectable | null;
  power90: Detectable | null;
  /** Power to find `difference` in one pair, unadjusted; null when it is not said or there are no degrees of freedom. */
  powerForDifference: number | null;
  /** Power of the overall F test when two treatments lie `difference` apart and the others half-way. */
  overallPower: number | null;
  /** Whether numbers are in the measurand's unit or in units of σ. */
  unit: 'measurand' | 'sigma';
}

export interface DesignChoice {
  /** Stable name inside one answer. */
  id: string;
  /** Treatments of each session. */
  blocks: number[][];
  /** Machine (index) of each session. */
  machineOf: number[];
  /** Shift group of each session when the design is resolvable, else null. */
  groupOf: number[] | null;
  /** Classes of alike treatments for randomisation; see layOutPlan. */
  labelClass: number[];
  construction: Construction;
  sessions: number;
  specimens: number;
  sessionSize: { min: number; max: number };
  replication: { min: number; max: number };
  /** Smallest and largest number of sessions in which a pair meets. */
  concurrence: { min: number; max: number };
  /** By counting: equal sessions, equal replication, equal concurrence, nothing twice in a session. */
  balanced: boolean;
  connected: boolean;
  /** Harmonic mean of the canonical efficiency factors. */
  efficiency: number;
  /** Average variance of a difference in units of σ². */
  aValue: number;
  bound: Bound;
  /** Bound divided by what it bounds, at most 1; 1 is proven best. */
  ofBound: number;
  /** With controls: average variances in units of σ², apart. */
  control: { testControl: number; testTest: number } | null;
  /** Machines whose own sessions are connected; equal to the number of machines when all are. */
  connectedMachines: number;
  precision: Precision;
  time: {
    /** Loadings one after the other when the machines work side by side. */
    rounds: number;
    /** Minutes of machine work; null when the minutes of a session are not known. */
    machineMinutes: number | null;
    shifts: number | null;
  };
  /** Whether it keeps to what the laboratory has. */
  fits: { sessions: boolean; specimens: boolean };
}

/** Why a choice is recommended; the screen makes a sentence of it. */
export type Reason =
  | { tag: 'finds-difference'; sessions: number; detectable: number; difference: number }
  | { tag: 'most-precise-in-budget'; sessions: number; detectable: number }
  | { tag: 'balanced-in-budget'; sessions: number; meets: number }
  | { tag: 'only-choice'; sessions: number };

/** What the search is doing now. */
export interface Progress {
  /** 0 … 1 of the allowed steps of the whole answer. */
  done: number;
  /** Choices known so far, best version of each. */
  choices: DesignChoice[];
  recommended: { id: string; reason: Reason } | null;
}

/** Why nothing can be proposed. */
export type ProposeError =
  | { tag: 'bad-request'; path: string; why: string }
  | { tag: 'too-few-sessions'; needed: number; sessions: number }
  | { tag: 'too-few-specimens'; treatment: number }
  | { tag: 'constraints-contradict'; why: string };

export interface Proposal {
  choices: DesignChoice[];
  recommended: { id: string; reason: Reason } | null;
  /** The smallest balanced design for these treatments and slots, whatever it costs; null when none is known. */
  smallestBalanced: { sessions: number; replication: number; meets: number } | null;
  /** Whether the search was stopped before its allowed steps; what is shown is the best so far. */
  cancelled: boolean;
}
