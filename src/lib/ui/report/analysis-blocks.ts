import type { AnovaLine } from '../../core/analysis/analysis-result.ts';
import type { Block } from '../../core/exchange/report/report-document.ts';
import { comparisonRows, type Method } from '../results/comparison-rows.ts';
import { diagnosticChecks } from '../results/diagnostic-checks.ts';
import { residualScene, type ResidualPlot } from '../results/residual-scenes.ts';
import { sessionsScene } from '../results/sessions-scene.ts';
import { countingModel, meanDecimals, modelLines, treatmentName, type ResultView, withUnit } from '../results/view.ts';
import {
  column,
  figure,
  heading,
  numbers,
  PAPER_WIDTH,
  paragraph,
  type ReportContext,
  row,
  table
} from './report-context.ts';

const MOST_PAIRS = 120;

function anovaTable({ words, write }: ReportContext, view: ResultView): Block[] {
  const { fixed } = view.analysis;
  if (!fixed.ok) return [];
  const t = words.layers.precision;
  const line = (name: string, l: AnovaLine) =>
    row(
      name,
      write.whole(l.df),
      write.significant(l.ss, 5),
      write.significant(l.ms, 5),
      l.F === null ? '' : write.fixed(l.F, 2),
      l.p === null ? '' : write.p(l.p)
    );
  const { sources, error, total } = fixed.value.anova;
  return [
    table(
      `${t.anova} (${words.answer.modelFixed})`,
      [column(t.source), numbers(t.df), numbers(t.ss), numbers(t.ms), numbers(t.F), numbers(t.p)],
      [
        ...sources.flatMap((s) => [
          line(`${t.sources[s.source] ?? s.source}, ${t.order.adjusted}`, s.adjusted),
          line(`${t.sources[s.source] ?? s.source}, ${t.order.unadjusted}`, s.unadjusted)
        ]),
        line(t.error, error),
        line(t.total, total)
      ]
    )
  ];
}

function bothModels({ words, write }: ReportContext, view: ResultView): Block[] {
  const fixed = modelLines(view.analysis, 'fixed');
  const random = modelLines(view.analysis, 'random');
  if (fixed === null || random === null) return [];
  const t = words.results;
  const decimals = meanDecimals(view);
  const other = new Map(random.means.map((line) => [line.treatment, line]));
  const mark = (model: 'fixed' | 'random'): string =>
    `${t.models[model]}${model === view.analysis.primary ? ` (${t.primary})` : ''}`;
  return [
    table(
      t.models.caption,
      [
        column(t.table.treatment),
        numbers(mark('fixed')),
        numbers(t.table.se),
        numbers(mark('random')),
        numbers(t.table.se),
        numbers(t.models.df)
      ],
      fixed.means.map((line) => {
        const there = other.get(line.treatment);
        return row(
          treatmentName(view, line.treatment),
          write.fixed(line.estimate, decimals),
          write.fixed(line.se, decimals),
          write.fixed(there?.estimate ?? null, decimals),
          write.fixed(there?.se ?? null, decimals),
          write.fixed(there?.df ?? null, 1)
        );
      })
    )
  ];
}

function comparisons(context: ReportContext, view: ResultView, method: Method): Block[] {
  const { words, write } = context;
  const t = words.layers.comparisons;
  const found = comparisonRows(view, countingModel(view.analysis), method, words.layers, write);
  if (!found.ok) return [];
  const decimals = meanDecimals(view);
  const rows = found.rows.slice(0, MOST_PAIRS);
  return [
    heading(t.title),
    paragraph(`${t.methods[method].name}. ${t.methods[method].when}`, 'soft'),
    ...(found.rows.length > rows.length
      ? [paragraph(t.many(write.whole(rows.length), write.whole(found.rows.length)), 'soft')]
      : []),
    table(
      '',
      [
        column(t.pair),
        numbers(t.difference),
        numbers(t.se),
        numbers(t.interval(write.percent(found.level))),
        numbers(t.p),
        column(t.verdict)
      ],
      rows.map((r) =>
        row(
          r.name,
          write.signed(r.estimate, decimals),
          write.fixed(r.se, decimals),
          r.lower === null ? '–' : `${write.fixed(r.lower, decimals)} … ${write.fixed(r.upper, decimals)}`,
          write.p(r.p),
          r.verdict
        )
      )
    )
  ];
}

function diagnostics(context: ReportContext, view: ResultView): Block[] {
  const { words, write } = context;
  const t = words.layers.diagnostics;
  if (!view.analysis.diagnostics.ok) return [];
  const found = view.analysis.diagnostics.value;
  const names = view.input.treatments.map((x) => x.name);
  const plots: ResidualPlot[] = ['fitted', 'session', ...(found.normalPlot.ok ? (['normal'] as const) : [])];
  return [
    heading(t.title),
    table(
      t.tests,
      [column(t.check), numbers(t.p), column(t.meaning)],
      diagnosticChecks(found, view.analysis.alpha, t).map((check) =>
        row(
          check.name,
          write.p(check.p),
          check.reason !== null ? words.reasons.reason(check.reason, names) : check.look ? t.look : t.fine
        )
      )
    ),
    ...plots.map((kind) => {
      const scene = residualScene(view, found, kind, words, write, PAPER_WIDTH);
      return figure(scene, `${scene.title}. ${scene.summary}`);
    })
  ];
}

function ruined(context: ReportContext, view: ResultView): Block[] {
  const { words, write } = context;
  const found = view.analysis.ruined;
  if (!found.ok || !found.value.faceValue.ok) return [];
  const t = words.layers.ruined;
  const decimals = meanDecimals(view);
  const { changes, turned, association } = found.value;
  const c = words.layers.comparisons;
  return [
    heading(t.title),
    table(
      '',
      [column(t.treatment), numbers(t.without), numbers(t.with), numbers(t.change)],
      changes.map((line) =>
        row(
          treatmentName(view, line.treatment),
          write.fixed(line.without, decimals),
          write.fixed(line.with, decimals),
          write.signed(line.change, decimals)
        )
      )
    ),
    ...(association.ok ? [paragraph(t.association(write.p(association.value.p)))] : []),
    ...(turned.length > 0
      ? [
          heading(t.turned),
          {
            kind: 'list' as const,
            items: turned.map(
              (pair) =>
                `${c.versus(treatmentName(view, pair.a), treatmentName(view, pair.b))}: ${t.without} ${pair.without ? c.differs : c.same}, ${t.with} ${pair.with ? c.differs : c.same}`
            )
          }
        ]
      : [])
  ];
}

/** All that stands behind the answer of one measurand. */
export function analysisBlocks(context: ReportContext, view: ResultView, method: Method): Block[] {
  const { words, write, report } = context;
  const { how } = words;
  const { fixed, random } = view.analysis;
  const used = [
    how.means,
    ...(random.ok ? [how.random] : []),
    how[method === 'none' ? 'unadjusted' : method],
    how.letters
  ];
  const offsets = sessionsScene(view, words, write, PAPER_WIDTH);
  return [
    heading(`${report.analysis}: ${view.measured.label}`, 2),
    heading(report.method),
    { kind: 'list', items: used.map((h) => `${h.words} ${h.formula}. ${how.from}: ${h.source}.`) },
    ...anovaTable(context, view),
    ...(fixed.ok && fixed.value.sigma !== null
      ? [
          paragraph(
            words.layers.precision.finding(
              withUnit(write.significant(fixed.value.sigma, 3), view.measured.unit),
              withUnit(write.significant(fixed.value.pairSummary.seMean, 3), view.measured.unit)
            )
          )
        ]
      : []),
    ...bothModels(context, view),
    ...comparisons(context, view, method),
    ...(offsets.points.length > 1
      ? [heading(words.layers.sessions.title), figure(offsets, words.layers.sessions.pictureSummary)]
      : []),
    ...diagnostics(context, view),
    ...ruined(context, view)
  ];
}
