import type { Analysis, MeanLine, PairLine, PairSummary } from '../../core/analysis/analysis-result.ts';
import type { Observations, PrimaryModel } from '../../core/analysis/observations.ts';
import type { Measurand } from '../../core/campaign/plan.ts';
import { decimalsFor } from '../format/number-writer.ts';
import { unitText } from '../format/unit-text.ts';

/** The quantity on the screen. */
export interface Measured {
  id: string;
  label: string;
  unit: string;
  decimals: number;
  /** Smallest difference that matters, if the plan says. */
  difference: number | null;
}

/** The quantity of a plan's measurand, its unit as people write it. */
export const measuredOf = ({ id, label, unit, decimals, difference }: Measurand): Measured => ({
  id,
  label,
  unit: unitText(unit),
  decimals,
  difference
});

/** All a result component needs: what went in, what came out, what it is called. */
export interface ResultView {
  measured: Measured;
  input: Observations;
  analysis: Analysis;
}

/** Means and pairs of one model in one shape; null where that model could not be fitted. */
export interface ModelLines {
  means: MeanLine[];
  pairs: PairLine[];
  summary: PairSummary;
}

export function modelLines(analysis: Analysis, model: PrimaryModel): ModelLines | null {
  if (model === 'fixed') {
    if (!analysis.fixed.ok) return null;
    const { means, pairs, pairSummary: summary } = analysis.fixed.value;
    return { means, pairs, summary };
  }
  if (!analysis.random.ok) return null;
  const { means, pairs, pairSummary: summary } = analysis.random.value.kenwardRoger;
  return { means, pairs, summary };
}

/** The model that counts: the one fixed in the plan, else the other where only that could be fitted. */
export function countingModel(analysis: Analysis): PrimaryModel {
  if (modelLines(analysis, analysis.primary) !== null) return analysis.primary;
  return analysis.primary === 'fixed' && analysis.random.ok ? 'random' : 'fixed';
}

export const countingLines = (analysis: Analysis): ModelLines | null => modelLines(analysis, countingModel(analysis));

export const treatmentName = (view: ResultView, i: number): string => view.input.treatments[i]?.name ?? String(i + 1);
export const sessionName = (view: ResultView, j: number): string => view.input.sessions[j]?.name ?? String(j + 1);

const median = (values: number[]): number | null => {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? null;
};

/** Decimals at which the usual standard error of a mean shows three significant digits. */
export function meanDecimals(view: ResultView): number {
  const lines = countingLines(view.analysis);
  const errors = (lines?.means ?? []).flatMap((line) => (line.se !== null && line.se > 0 ? [line.se] : []));
  return decimalsFor(median(errors), 3, view.measured.decimals + 1);
}

/** How far a mean is from the good end; smaller is better. */
export function badness(view: ResultView, mean: number): number {
  const { direction } = view.input;
  if (direction === 'lower') return mean;
  if (direction === 'higher') return -mean;
  return Math.abs(mean - direction.target);
}

/** Treatments in order, best first; those without an estimate last. Groups that cannot be compared stay together. */
export function bestFirst(view: ResultView, lines: readonly MeanLine[]): MeanLine[] {
  const score = (line: MeanLine): number => {
    const value = line.estimate ?? line.plain;
    return value === null ? Infinity : badness(view, value);
  };
  return [...lines].sort(
    (a, b) =>
      Number(a.scope === 'none') - Number(b.scope === 'none') ||
      (a.part ?? 0) - (b.part ?? 0) ||
      score(a) - score(b) ||
      a.treatment - b.treatment
  );
}

/** Letters of each treatment under a model; empty where there are none. */
export function lettersOf(analysis: Analysis, model: PrimaryModel): Map<number, string> {
  const comparisons = analysis.comparisons[model];
  if (!comparisons.ok || !comparisons.value.letters.ok) return new Map();
  return new Map(comparisons.value.letters.value.map((line) => [line.treatment, line.letters]));
}

/** A value with its unit, held together by a no-break space. */
export const withUnit = (value: string, unit: string): string => (unit === '' ? value : `${value}\u00a0${unit}`);

export const levelOf = (alpha: number): number => 1 - alpha;
