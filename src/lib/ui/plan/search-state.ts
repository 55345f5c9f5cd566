import type { DesignChoice, ProposeError, Proposal, Reason } from '#lib/core/design/propose-types.ts';

/** Where the search for designs stands; what it has found so far is in `choices`. */
export interface SearchState {
  status: 'idle' | 'running' | 'done' | 'cancelled' | 'failed';
  /** 0 … 1 */
  done: number;
  choices: readonly DesignChoice[];
  recommended: { id: string; reason: Reason } | null;
  smallestBalanced: Proposal['smallestBalanced'];
  error: ProposeError | null;
}

/** What chance would make of the chosen design: how slots come out and what an early stop would leave. */
export interface Preview {
  balance: 'exact' | 'within-one' | 'near';
  connectedAfter: number | null;
  sessions: number;
  /** Information after each session as a share of the whole plan's. */
  kept: readonly number[];
}
