import type { MeanLine } from '../../core/analysis/analysis-result.ts';
import type { PrimaryModel } from '../../core/analysis/observations.ts';
import type { NumberWriter } from '../format/number-writer.ts';
import { intervalRows } from '../plots/interval-rows.ts';
import type { Scene } from '../plots/scene.ts';
import type { results as resultTexts } from '../texts/en/results.ts';
import {
  bestFirst,
  lettersOf,
  levelOf,
  meanDecimals,
  modelLines,
  treatmentName,
  withUnit,
  type ResultView
} from './view.ts';

/** Adjusted means with intervals and letters, plain averages beside; best first. */
export function meansScene(
  view: ResultView,
  model: PrimaryModel,
  t: typeof resultTexts,
  write: NumberWriter,
  width: number
): Scene {
  const { measured, analysis, input } = view;
  const decimals = meanDecimals(view);
  const letters = lettersOf(analysis, model);
  const lines = bestFirst(view, modelLines(analysis, model)?.means ?? []).filter((line) => line.scope !== 'none');
  const fix = (x: number | null): string => write.fixed(x, decimals);
  const full = (x: number | null): string => withUnit(fix(x), measured.unit);
  const level = write.percent(levelOf(analysis.alpha));
  const label = (line: MeanLine): string =>
    line.lower === null
      ? t.pointLabelBare(treatmentName(view, line.treatment), full(line.estimate))
      : t.pointLabel(
          treatmentName(view, line.treatment),
          full(line.estimate),
          fix(line.lower),
          fix(line.upper),
          fix(line.plain)
        );
  const target = typeof input.direction === 'object' ? input.direction.target : null;
  return intervalRows({
    width,
    title: t.picture(measured.label),
    summary: t.pictureSummary(
      level,
      measured.label,
      full(lines[0]?.estimate ?? null),
      full(lines.at(-1)?.estimate ?? null)
    ),
    axisLabel: measured.unit === '' ? measured.label : `${measured.label}, ${measured.unit}`,
    locale: write.locale,
    reference: target,
    band: null,
    letterHead: letters.size > 0 ? t.letters : '',
    rows: lines.map((line) => ({
      name: treatmentName(view, line.treatment),
      estimate: line.estimate,
      lower: line.lower,
      upper: line.upper,
      plain: line.plain,
      letters: letters.get(line.treatment) ?? '',
      weak: false,
      label: label(line)
    })),
    table: () => ({
      columns: [t.table.treatment, t.table.adjusted, t.table.interval(level), t.table.plain, t.table.letters],
      rows: lines.map((line) => [
        treatmentName(view, line.treatment),
        fix(line.estimate),
        line.lower === null ? '–' : `${fix(line.lower)} … ${fix(line.upper)}`,
        fix(line.plain),
        letters.get(line.treatment) ?? ''
      ])
    })
  });
}
