import type { Warning } from '../../core/analysis/analysis-result.ts';
import type { NumberWriter } from '../format/number-writer.ts';
import type { reasons as reasonTexts } from '../texts/en/reasons.ts';
import type { results as resultTexts } from '../texts/en/results.ts';
import type { warnings as warningTexts } from '../texts/en/warnings.ts';
import { sessionName, treatmentName, type ResultView } from './view.ts';

export interface WarningWords {
  warnings: typeof warningTexts;
  reasons: typeof reasonTexts;
  results: typeof resultTexts;
}

/** The run of an input row in words. */
export function runName(view: ResultView, row: number, words: Pick<WarningWords, 'results'>): string {
  const found = view.input.rows[row];
  if (found === undefined) return String(row + 1);
  return words.results.runName(
    treatmentName(view, found.treatment),
    words.results.session(sessionName(view, found.session)),
    found.slot === null ? null : String(found.slot + 1)
  );
}

/** What was seen and what to do about it. */
export function warningWords(
  view: ResultView,
  warning: Warning,
  words: WarningWords,
  write: NumberWriter
): { said: string; act: string } {
  const t = words.warnings;
  const names = view.input.treatments.map((x) => x.name);
  switch (warning.tag) {
    case 'parts':
      return t.parts(write.whole(warning.parts));
    case 'lost-pairs':
      return t.lostPairs(write.whole(warning.pairs));
    case 'treatments-without-readings':
      return t.unread(warning.treatments.map((i) => treatmentName(view, i)).join(', '));
    case 'few-error-degrees-of-freedom':
      return t.fewDf(write.whole(warning.df));
    case 'session-variance-zero':
      return t.varianceZero();
    case 'outlier':
      return t.outlier(runName(view, warning.row, words), write.p(warning.p));
    case 'slots-differ':
      return t.slots(write.p(warning.p), warning.inModel);
    case 'session-trend':
      return t.trend(write.p(warning.p));
    case 'scatter-differs':
      return t.scatter(write.p(warning.p));
    case 'nonadditive':
      return t.nonadditive(write.p(warning.p));
    case 'other-scale':
      return t.scale(write.significant(warning.lambda, 2), write.p(warning.p));
    case 'not-normal':
      return t.notNormal(write.p(warning.p));
    case 'ruin-associated':
      return t.ruinAssociated(write.p(warning.p));
    case 'verdict-turns-with-ruined':
      return t.verdictTurns(write.whole(warning.pairs));
    case 'limits-taken-as-values':
      return t.limits(write.whole(warning.runs));
    case 'models-disagree':
      return t.disagree(write.whole(warning.pairs));
    case 'single-run-sessions':
      return t.single(warning.sessions.map((j) => sessionName(view, j)).join(', '));
    case 'factor-left-out':
      return t.factorOut(t.factors[warning.factor] ?? warning.factor, words.reasons.reason(warning.reason, names));
  }
}
