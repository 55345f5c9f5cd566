import type { Analysis } from '#lib/core/analysis/analysis-result.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import type { Measurand } from '#lib/core/campaign/plan.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { ok, type Result } from '#lib/core/result.ts';
import { type AnalysisFault, analyseInWorker, type AnalysisOptions } from '#lib/workers/analysis-client.ts';
import type { FormulaError } from '#lib/formula/formula-error.ts';
import { analysisInput, observedRows } from './analysis-input.ts';

/** One measurand with what went into its analysis and what came out. */
export interface MeasurandResult {
  measurand: Measurand;
  input: Observations;
  analysis: Analysis;
}

export type ResultFault = AnalysisFault | FormulaError;

/** The analysis of one measurand, off the screen's thread. */
export async function resultOf(
  state: CampaignState,
  measurand: Measurand,
  options: AnalysisOptions = {}
): Promise<Result<MeasurandResult, ResultFault>> {
  const rows = await observedRows(state, measurand);
  if (!rows.ok) return rows;
  const input = analysisInput(state, measurand, rows.value);
  const made = await analyseInWorker(input, options);
  return made.ok ? ok({ measurand, input, analysis: made.value }) : made;
}

/** The measurands of a plan, the primary first. */
export function primaryFirst({ plan }: CampaignState): Measurand[] {
  const primary = plan?.primary?.measurand;
  return [...(plan?.measurands ?? [])].sort((a, b) => Number(b.id === primary) - Number(a.id === primary));
}

/** The analyses of all measurands that have one, the primary first; those without are left out with their fault. */
export async function allResults(
  state: CampaignState,
  options: AnalysisOptions = {}
): Promise<{ results: MeasurandResult[]; faults: { measurand: Measurand; fault: ResultFault }[] }> {
  const results: MeasurandResult[] = [];
  const faults: { measurand: Measurand; fault: ResultFault }[] = [];
  for (const measurand of primaryFirst(state)) {
    const made = await resultOf(state, measurand, options);
    if (made.ok) results.push(made.value);
    else faults.push({ measurand, fault: made.error });
  }
  return { results, faults };
}
