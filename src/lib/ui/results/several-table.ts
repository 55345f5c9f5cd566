import type { NumberWriter } from '../format/number-writer.ts';
import type { ResultWords } from '../texts/result-words.ts';
import {
  badness,
  bestFirst,
  countingLines,
  countingModel,
  lettersOf,
  meanDecimals,
  treatmentName,
  withUnit,
  type ResultView
} from './view.ts';

/** The results of all measurands of a plan, the primary first, as far as they are known. */
export type SeveralView =
  | { tag: 'computing'; known: number; all: number }
  | { tag: 'done'; views: ResultView[]; faults: { label: string; why: string }[] };

/** One measurand of the table. */
export interface SeveralColumn {
  id: string;
  label: string;
  unit: string;
  /** Shape beside the words that say which end is better. */
  arrow: '↓' | '↑' | '◎';
  better: string;
  /** Why figures are missing in this column, or null. */
  note: string | null;
}

/** What a measurand says of a treatment; rank 1 is the best, equal means share a rank. */
export interface SeveralCell {
  mean: string;
  letters: string;
  rank: number | null;
}

export interface SeveralRow {
  treatment: number;
  name: string;
  control: boolean;
  /** One a column; null without a mean. */
  cells: (SeveralCell | null)[];
}

export interface SeveralTable {
  columns: SeveralColumn[];
  rows: SeveralRow[];
  /** Treatment that every measurand ranks first and alone; null if they differ, undefined if not all have ranks. */
  first: number | null | undefined;
}

/**
 * Returns the treatments by measurands, best first by the first measurand that has means. Each column is its own analysis
 * under its own model that counts; ranks are only given where all means of a column can be compared.
 *
 * @param views of one campaign: the same treatments in the same order
 * Checked by: test/ui/results/several-table.test.ts
 */
export function severalTable(views: readonly ResultView[], words: ResultWords, write: NumberWriter): SeveralTable {
  const columns = views.map((view) => columnOf(view, words, write));
  const cells = views.map((view) => cellsOf(view, write));
  const leading = views.find((view) => countingLines(view.analysis) !== null) ?? views[0];
  const order = leading ? orderOf(leading) : [];
  const rows = order.map((treatment): SeveralRow => ({
    treatment,
    name: leading ? treatmentName(leading, treatment) : '',
    control: leading?.input.control === treatment,
    cells: cells.map((column) => column.get(treatment) ?? null)
  }));
  return { columns, rows, first: firstOf(cells) };
}

function columnOf(view: ResultView, words: ResultWords, write: NumberWriter): SeveralColumn {
  const { measured, input, analysis } = view;
  const { direction } = input;
  const t = words.results.several.better;
  const aim = typeof direction === 'object' ? write.fixed(direction.target, measured.decimals) : null;
  const names = input.treatments.map(({ name }) => name);
  const lines = countingLines(analysis)?.means ?? null;
  const parts = new Set((lines ?? []).flatMap(({ part }) => (part === null ? [] : [part]))).size;
  const why =
    lines === null
      ? analysis.fixed.ok
        ? null
        : analysis.fixed.error
      : parts > 1
        ? ({ tag: 'disconnected', parts } as const)
        : null;
  return {
    id: measured.id,
    label: measured.label,
    unit: measured.unit,
    arrow: direction === 'lower' ? '↓' : direction === 'higher' ? '↑' : '◎',
    better: typeof direction === 'string' ? t[direction] : t.target(withUnit(aim ?? '', measured.unit)),
    note: why === null ? null : words.reasons.reason(why, names)
  };
}

function cellsOf(view: ResultView, write: NumberWriter): Map<number, SeveralCell> {
  const lines = (countingLines(view.analysis)?.means ?? []).filter(({ estimate }) => estimate !== null);
  const letters = lettersOf(view.analysis, countingModel(view.analysis));
  const decimals = meanDecimals(view);
  const scores = lines.map(({ estimate }) => badness(view, estimate ?? NaN));
  const comparable = lines.every(({ scope }) => scope === 'all');
  return new Map(
    lines.map(({ treatment, estimate }, at) => [
      treatment,
      {
        mean: write.fixed(estimate, decimals),
        letters: letters.get(treatment) ?? '–',
        rank: comparable ? 1 + scores.filter((score) => score < (scores[at] ?? NaN)).length : null
      }
    ])
  );
}

const orderOf = (view: ResultView): number[] => {
  const lines = countingLines(view.analysis)?.means;
  return lines ? bestFirst(view, lines).map(({ treatment }) => treatment) : view.input.treatments.map((_, i) => i);
};

function firstOf(columns: readonly Map<number, SeveralCell>[]): number | null | undefined {
  const firsts = columns.map((cells) => [...cells].filter(([, { rank }]) => rank === 1).map(([i]) => i));
  if (firsts.length === 0 || firsts.some((ones) => ones.length === 0)) return undefined;
  const first = firsts[0]?.[0];
  return firsts.every((ones) => ones.length === 1 && ones[0] === first) ? first : null;
}
