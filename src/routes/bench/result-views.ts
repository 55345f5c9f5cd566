import type { Plan } from '#lib/core/campaign/plan.ts';
import { computedMeasurands, type NoResult, type RunResult } from '#lib/state/bench/run-results.ts';
import type { RunResultView } from '#lib/ui/bench/view.ts';
import { unitText } from '#lib/ui/format/unit-text.ts';
import { writer } from '#lib/ui/format/writer.svelte.ts';
import { benchPartTexts } from '#lib/ui/texts/bench-parts.ts';

/** What a run comes to, written out; `found` is null while it is being computed, and the lines stand there already. */
export function resultViews(plan: Plan | null, found: readonly RunResult[] | null, slot: number): RunResultView[] {
  if (!plan) return [];
  return computedMeasurands(plan).map(({ id, label, unit, decimals }) => {
    const result = found?.find((one) => one.slot === slot && one.measurand === id) ?? null;
    const none = { measurand: id, label, text: null, why: null };
    if (result === null) return none;
    if (result.why !== null) return { ...none, why: noResultText(result.why, plan) };
    if (result.value === null) return none;
    const sign = result.limit === 'at-least' ? '≥ ' : result.limit === 'at-most' ? '≤ ' : '';
    return { ...none, text: `${sign}${writer().fixed(result.value, decimals)} ${unitText(unit)}`.trim() };
  });
}

function noResultText(why: NoResult, plan: Plan): string {
  const t = benchPartTexts().check.noResult;
  switch (why.tag) {
    case 'value-missing':
      return t.missing(plan.readings.find(({ id }) => id === why.name)?.label ?? why.name);
    case 'undecided':
      return t.undecided;
    case 'limits-disagree':
      return t.limits;
    case 'division-by-zero':
      return t.divides(why.text);
    case 'not-real':
      return t.notReal(why.text);
    case 'not-finite':
      return t.notFinite(why.text);
    case 'formula-unusable':
      return t.formula;
    case 'not-loaded':
      return t.notLoaded;
  }
}
