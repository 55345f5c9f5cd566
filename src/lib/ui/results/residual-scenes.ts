import type { Diagnostics } from '../../core/analysis/analysis-result.ts';
import type { NumberWriter } from '../format/number-writer.ts';
import type { Scene } from '../plots/scene.ts';
import { scatter, type ScatterOptions } from '../plots/scatter.ts';
import type { ResultWords } from '../texts/result-words.ts';
import { treatmentName, type ResultView } from './view.ts';
import { runName } from './warning-words.ts';

export type ResidualPlot = 'fitted' | 'session' | 'slot' | 'treatment' | 'normal';

/** Two-sided limit beyond which a studentised residual is ringed: common practice, no source. */
const RING = 3;

/** One residual plot. Points without a studentised residual (leverage 1) are left out. */
export function residualScene(
  view: ResultView,
  diagnostics: Diagnostics,
  kind: ResidualPlot,
  words: ResultWords,
  write: NumberWriter,
  width: number
): Scene {
  const t = words.layers.diagnostics;
  const rows = view.input.rows;
  const label = (row: number, residual: number): string =>
    t.label(
      runName(view, row, words),
      write.fixed(rows[row]?.y ?? null, view.measured.decimals),
      write.signed(residual, 2)
    );
  const common = {
    width,
    height: Math.round(Math.max(220, Math.min(320, width * 0.6))),
    locale: write.locale,
    reference: 0
  };
  const table = (points: ScatterOptions['points'], x: string) => () => ({
    columns: [t.run, x, t.residual],
    rows: points
      .slice(0, 1000)
      .map((p) => [p.label.split(':')[0] ?? '', write.significant(p.x, 4), write.signed(p.y, 2)])
  });

  if (kind === 'normal') {
    const plot = diagnostics.normalPlot.ok ? diagnostics.normalPlot.value : null;
    const points = (plot?.points ?? []).map((p) => ({
      x: p.theoretical,
      y: p.observed,
      label: label(p.row, p.observed),
      flagged: p.observed < p.lower || p.observed > p.upper
    }));
    return scatter({
      ...common,
      reference: null,
      title: t.normal,
      summary: t.normalSummary(write.percent(plot?.level ?? null), write.whole(plot?.draws ?? null)),
      xLabel: t.theoretical,
      yLabel: t.residual,
      points,
      band: (plot?.points ?? []).map((p) => ({ x: p.theoretical, lower: p.lower, upper: p.upper })),
      table: table(points, t.theoretical)
    });
  }

  const place = (row: number, fitted: number): number => {
    const run = rows[row];
    if (kind === 'fitted') return fitted;
    if (kind === 'session') return (run?.session ?? 0) + 1;
    if (kind === 'slot') return (run?.slot ?? 0) + 1;
    return (run?.treatment ?? 0) + 1;
  };
  const points = diagnostics.rows.flatMap((line) =>
    line.studentized === null
      ? []
      : [
          {
            x: place(line.row, line.fitted),
            y: line.studentized,
            label: label(line.row, line.studentized),
            flagged: Math.abs(line.studentized) > RING
          }
        ]
  );
  const heads = {
    fitted: [t.byFitted, `${t.fitted}${view.measured.unit === '' ? '' : `, ${view.measured.unit}`}`],
    session: [t.bySession, t.session],
    slot: [t.bySlot, t.slot],
    treatment: [t.byTreatment, t.treatment]
  } as const;
  const [title, xLabel] = heads[kind];
  const few = view.input.treatments.length <= Math.max(4, Math.floor(width / 90));
  return scatter({
    ...common,
    title,
    summary: t.summary(write.whole(points.length)),
    xLabel,
    yLabel: t.residual,
    points,
    table: table(points, xLabel),
    ...(kind === 'session' || kind === 'slot' || (kind === 'treatment' && !few) ? { xWhole: true } : {}),
    ...(kind === 'treatment' && few
      ? {
          xNames: view.input.treatments.map((_, i) => {
            const name = treatmentName(view, i);
            return { at: i + 1, name: name.length > 12 ? `${name.slice(0, 11)}…` : name };
          })
        }
      : {})
  });
}
