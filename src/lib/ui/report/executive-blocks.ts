import type { Block } from '../../core/exchange/report/report-document.ts';
import { answerSentence } from '../results/answer-sentence.ts';
import { meansScene } from '../results/means-scene.ts';
import {
  bestFirst,
  countingLines,
  countingModel,
  lettersOf,
  levelOf,
  meanDecimals,
  modelLines,
  treatmentName,
  type ResultView
} from '../results/view.ts';
import { warningWords } from '../results/warning-words.ts';
import { column, figure, numbers, PAPER_WIDTH, paragraph, type ReportContext, row, table } from './report-context.ts';

/** Adjusted means of the model that counts. */
export function meansTable(context: ReportContext, view: ResultView): Block {
  const { words, write } = context;
  const t = words.results.table;
  const model = countingModel(view.analysis);
  const letters = lettersOf(view.analysis, model);
  const decimals = meanDecimals(view);
  const level = write.percent(levelOf(view.analysis.alpha));
  const lines = bestFirst(view, modelLines(view.analysis, model)?.means ?? []);
  return table(
    t.caption(view.measured.label, view.measured.unit),
    [
      column(t.treatment),
      numbers(t.adjusted),
      numbers(t.se),
      numbers(t.interval(level)),
      column(t.letters),
      numbers(t.plain),
      numbers(t.runs)
    ],
    lines.map((line) =>
      row(
        `${treatmentName(view, line.treatment)}${view.input.control === line.treatment ? ` (${t.control})` : ''}`,
        line.scope === 'none' ? t.none : write.fixed(line.estimate, decimals),
        write.fixed(line.se, decimals),
        line.lower === null ? '–' : `${write.fixed(line.lower, decimals)} … ${write.fixed(line.upper, decimals)}`,
        letters.get(line.treatment) ?? '–',
        write.fixed(line.plain, decimals),
        write.whole(line.n)
      )
    )
  );
}

/** The first page: question, answer, one picture, one table, what must be considered. */
export function executiveBlocks(context: ReportContext, view: ResultView): Block[] {
  const { words, write, report: t, campaign } = context;
  const spoken = answerSentence(view, words, write);
  const { analysis, input } = view;
  const model = countingModel(analysis);
  const modelName = model === 'fixed' ? words.answer.modelFixed : words.answer.modelRandom;
  const blocks: Block[] = [];
  if (campaign.plan?.question) blocks.push(paragraph(campaign.plan.question, 'lead'));
  blocks.push(paragraph(spoken.headline, 'answer'), ...spoken.rest.map((text) => paragraph(text, 'lead')));
  const running = campaign.sessions.some((s) => s.status !== 'closed' && s.status !== 'dropped');
  if (running)
    blocks.push(paragraph(t.interim(write.whole(analysis.counts.kept), write.whole(analysis.counts.runs)), 'caution'));
  if (countingLines(analysis) !== null) {
    const scene = meansScene(view, model, words.results, write, PAPER_WIDTH);
    if (scene.height <= 620)
      blocks.push(figure(scene, t.pictureCaption(write.percent(levelOf(analysis.alpha)), modelName)));
    const short = input.treatments.length <= 16;
    if (short) blocks.push(meansTable(context, view));
  }
  blocks.push(
    paragraph(
      t.howText(
        write.whole(analysis.counts.kept),
        write.whole(analysis.design.kept.sessions),
        write.whole(input.treatments.length),
        modelName
      ),
      'soft'
    )
  );
  const warnings = analysis.warnings.map((warning) => {
    const { said, act } = warningWords(view, warning, words, write);
    return `${said} ${act}`;
  });
  if (warnings.length > 0)
    blocks.push({ kind: 'heading', level: 3, text: t.cautions }, { kind: 'list', items: warnings });
  return blocks;
}
