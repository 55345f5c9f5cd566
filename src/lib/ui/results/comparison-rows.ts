import type { PrimaryModel } from '../../core/analysis/observations.ts';
import type { Reason } from '../../core/analysis/reason.ts';
import type { NumberWriter } from '../format/number-writer.ts';
import type { layers as layerTexts } from '../texts/en/layers.ts';
import { modelLines, treatmentName, type ResultView } from './view.ts';

export type Method = 'tukey' | 'holm' | 'none' | 'dunnett' | 'hsu' | 'equivalence' | 'contrasts';

export const methods: readonly Method[] = ['tukey', 'holm', 'none', 'dunnett', 'hsu', 'equivalence', 'contrasts'];

/** One line of a comparison in whatever method. */
export interface ComparisonRow {
  name: string;
  /** Treatments concerned, to filter by. */
  about: number[];
  estimate: number | null;
  se: number | null;
  lower: number | null;
  upper: number | null;
  p: number | null;
  verdict: string;
  /** A difference is shown, or equivalence is. */
  strong: boolean;
}

export type ComparisonTable =
  | { ok: true; rows: ComparisonRow[]; level: number; note: string | null; margin: number | null }
  | { ok: false; reason: Reason };

/** The lines of one method under one model. */
export function comparisonRows(
  view: ResultView,
  model: PrimaryModel,
  method: Method,
  texts: typeof layerTexts,
  write: NumberWriter
): ComparisonTable {
  const t = texts.comparisons;
  const { analysis, input } = view;
  const alpha = analysis.alpha;
  const name = (i: number): string => treatmentName(view, i);
  const table = (
    rows: ComparisonRow[],
    rest: { level?: number; note?: string | null; margin?: number } = {}
  ): ComparisonTable => ({
    ok: true,
    rows,
    level: rest.level ?? 1 - alpha,
    note: rest.note ?? null,
    margin: rest.margin ?? null
  });

  if (method === 'tukey' || method === 'holm' || method === 'none') {
    const lines = modelLines(analysis, model);
    if (lines === null) {
      const section = model === 'fixed' ? analysis.fixed : analysis.random;
      return { ok: false, reason: section.ok ? { tag: 'not-asked' } : section.error };
    }
    const rows = lines.pairs.map((pair): ComparisonRow => {
      const p = method === 'tukey' ? pair.pTukey : method === 'holm' ? pair.pHolm : pair.p;
      const strong = p !== null && p <= alpha;
      return {
        name: t.versus(name(pair.a), name(pair.b)),
        about: [pair.a, pair.b],
        estimate: pair.estimate,
        se: pair.se,
        lower: method === 'tukey' ? pair.lowerTukey : pair.lower,
        upper: method === 'tukey' ? pair.upperTukey : pair.upper,
        p,
        verdict: !pair.estimable ? t.lost : strong ? t.differs : t.same,
        strong
      };
    });
    return table(rows, { note: method === 'holm' ? t.unadjustedInterval : null });
  }

  const section = analysis.comparisons[model];
  if (!section.ok) return { ok: false, reason: section.error };
  const comparisons = section.value;

  if (method === 'dunnett') {
    if (!comparisons.control.ok) return { ok: false, reason: comparisons.control.error };
    const { control, lines, lost, method: way } = comparisons.control.value;
    const rows = lines.map((line): ComparisonRow => {
      const strong = line.pDunnett <= alpha;
      return {
        name: t.versus(name(line.treatment), name(control)),
        about: [line.treatment],
        estimate: line.estimate,
        se: line.se,
        lower: line.lower,
        upper: line.upper,
        p: line.pDunnett,
        verdict: strong ? t.differs : t.same,
        strong
      };
    });
    const gone = lost.map((i): ComparisonRow => ({
      name: t.versus(name(i), name(control)),
      about: [i],
      estimate: null,
      se: null,
      lower: null,
      upper: null,
      p: null,
      verdict: t.lost,
      strong: false
    }));
    const error = Math.max(0, ...lines.map((line) => line.pError));
    return table([...rows, ...gone], {
      note: way === 'quadrature' ? null : t.accuracy(write.significant(error, 1))
    });
  }

  if (method === 'hsu') {
    if (!comparisons.best.ok) return { ok: false, reason: comparisons.best.error };
    return table(
      comparisons.best.value.lines.map((line): ComparisonRow => ({
        name: name(line.treatment),
        about: [line.treatment],
        estimate: null,
        se: null,
        lower: line.lower,
        upper: line.upper,
        p: null,
        verdict: line.isBest ? t.isBest : line.mayBeBest ? t.mayBeBest : t.notBest,
        strong: !line.mayBeBest
      }))
    );
  }

  if (method === 'equivalence') {
    if (!comparisons.equivalence.ok) return { ok: false, reason: comparisons.equivalence.error };
    const { margin, lines } = comparisons.equivalence.value;
    const control = input.control ?? 0;
    return table(
      lines.map((line): ComparisonRow => ({
        name: t.versus(name(line.treatment), name(control)),
        about: [line.treatment],
        estimate: line.estimate,
        se: null,
        lower: line.lower,
        upper: line.upper,
        p: line.p,
        verdict: line.equivalent ? t.equivalent : t.notEquivalent,
        strong: line.equivalent
      })),
      { level: 1 - 2 * alpha, margin }
    );
  }

  if (comparisons.contrasts.length === 0) return { ok: false, reason: { tag: 'not-asked' } };
  return table(
    comparisons.contrasts.map((line): ComparisonRow => {
      const about = line.weights.flatMap((w, i) => (w === 0 ? [] : [i]));
      if (!line.result.ok)
        return {
          name: line.name,
          about,
          estimate: null,
          se: null,
          lower: null,
          upper: null,
          p: null,
          verdict: t.lost,
          strong: false
        };
      const { estimate, se, lower, upper, p } = line.result.value;
      const strong = p <= alpha;
      return { name: line.name, about, estimate, se, lower, upper, p, verdict: strong ? t.differs : t.same, strong };
    })
  );
}
