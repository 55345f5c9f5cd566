import type * as en from './en/all-results.ts';

/** Everything the results say, by the kind of thing said. */
export type ResultWords = typeof en;
