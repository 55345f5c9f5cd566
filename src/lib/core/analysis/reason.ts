import type { Result } from '../result.ts';

/** Why a part of the analysis is absent; the screen makes the sentence from the tag. */
export type Reason =
  | { tag: 'not-asked' }
  | { tag: 'no-kept-readings' }
  | { tag: 'one-treatment'; treatment: number }
  | { tag: 'one-session' }
  | { tag: 'no-shared-session' }
  | { tag: 'no-error-degrees-of-freedom'; runs: number; parameters: number }
  | { tag: 'no-scatter' }
  | { tag: 'disconnected'; parts: number }
  | { tag: 'no-control' }
  | { tag: 'control-without-readings' }
  | { tag: 'no-margin' }
  | { tag: 'no-ruined-runs' }
  | { tag: 'no-ruined-readings' }
  | { tag: 'no-limits' }
  | { tag: 'no-slots' }
  | { tag: 'one-level'; factor: string }
  | { tag: 'confounded'; factor: string; with: string }
  | { tag: 'covariate-missing'; rows: readonly number[] }
  | { tag: 'level-missing'; factor: string; rows: readonly number[] }
  | { tag: 'not-balanced' }
  | { tag: 'not-complete' }
  | { tag: 'repeated-in-session' }
  | { tag: 'not-positive'; rows: readonly number[] }
  | { tag: 'narrow-range'; ratio: number }
  | { tag: 'too-few-readings'; have: number; need: number }
  | { tag: 'did-not-converge'; iterations: number }
  | { tag: 'no-maximum'; treatments: readonly number[] }
  | { tag: 'too-large'; have: number; limit: number };

/** One part of the analysis: there, or the reason why not. */
export type Section<T> = Result<T, Reason>;

/** What makes the input itself unusable; nothing is computed. */
export type InputFault =
  | { tag: 'no-treatments' }
  | { tag: 'no-sessions' }
  | { tag: 'no-readings' }
  | { tag: 'not-a-number'; row: number; found: string }
  | { tag: 'unknown-treatment'; row: number; index: number }
  | { tag: 'unknown-session'; row: number; index: number }
  | { tag: 'unknown-control'; index: number }
  | { tag: 'bad-alpha'; alpha: number }
  | { tag: 'bad-margin'; margin: number }
  | { tag: 'bad-target' }
  | { tag: 'bad-contrast'; name: string; need: number; have: number }
  | { tag: 'bad-seed' };
