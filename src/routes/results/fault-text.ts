import type { ResultFault } from '#lib/state/all-results.ts';
import type { ResultWords } from '#lib/ui/texts/result-words.ts';

/** Why a measurand has no result, and what to do, in one or two sentences. */
export function faultText(fault: ResultFault, words: ResultWords): string {
  if (fault.tag === 'worker-died' || fault.tag === 'aborted') return words.results.failed;
  if (fault.tag.startsWith('formula') || fault.tag.startsWith('unit')) return words.results.formulaFault;
  return words.reasons.fault(fault as Parameters<typeof words.reasons.fault>[0]);
}
