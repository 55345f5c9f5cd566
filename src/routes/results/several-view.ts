import type { SeveralState } from '#lib/state/results-several.svelte.ts';
import type { SeveralView } from '#lib/ui/results/several-table.ts';
import { measuredOf } from '#lib/ui/results/view.ts';
import type { ResultWords } from '#lib/ui/texts/result-words.ts';
import { faultText } from './fault-text.ts';

/** All measurands as the screen shows them; null for a plan with one. */
export function severalView(state: SeveralState, words: ResultWords): SeveralView | null {
  if (state.tag === 'nothing') return null;
  if (state.tag === 'computing') return state;
  return {
    tag: 'done',
    views: state.results.map(({ measurand, input, analysis }) => ({
      measured: measuredOf(measurand),
      input,
      analysis
    })),
    faults: state.faults.map(({ measurand, fault }) => ({ label: measurand.label, why: faultText(fault, words) }))
  };
}
