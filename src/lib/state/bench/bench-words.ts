import type { Finding } from '#lib/core/campaign/checks/finding.ts';
import type { Condition } from '#lib/core/campaign/plan.ts';
import type { EntryWords } from './reading-entry.svelte.ts';

/** The words that are kept with a value, as they were shown; made where the screen's texts are made. */
export interface BenchWords extends EntryWords {
  condition: (finding: Finding, condition: Condition) => string;
}
