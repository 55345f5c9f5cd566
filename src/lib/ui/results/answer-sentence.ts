import type { Answer } from '../../core/analysis/analysis-result.ts';
import { decimalsFor, type NumberWriter } from '../format/number-writer.ts';
import type { answer as answerTexts } from '../texts/en/answer.ts';
import type { reasons as reasonTexts } from '../texts/en/reasons.ts';
import { countingLines, levelOf, treatmentName, withUnit, type ResultView } from './view.ts';

export interface AnswerWords {
  answer: typeof answerTexts;
  reasons: typeof reasonTexts;
}

/** The answer in words: what is found, and what else must be said with it. */
export interface Spoken {
  headline: string;
  rest: string[];
}

const MOST_NAMES = 8;

/** Turns the finding into sentences. Figures are rounded so that the standard error keeps two digits. */
export function answerSentence(view: ResultView, words: AnswerWords, write: NumberWriter): Spoken {
  const t = words.answer;
  const { measured, input, analysis } = view;
  const se = countingLines(analysis)?.means.find((line) => line.se !== null)?.se ?? null;
  const decimals = decimalsFor(se, 2, measured.decimals);
  const value = (x: number): string => withUnit(write.fixed(x, decimals), measured.unit);
  const bare = (x: number): string => write.fixed(x, decimals);
  const name = (i: number): string => treatmentName(view, i);
  const names = (list: readonly number[]): string => {
    const shown = list.slice(0, MOST_NAMES).map(name);
    return list.length > MOST_NAMES ? t.many(shown.join(', '), list.length - MOST_NAMES) : t.and(shown);
  };
  const order = (list: readonly number[]): string => {
    const shown = list.slice(0, MOST_NAMES).map(name).join(', ');
    return list.length > MOST_NAMES ? t.many(shown, list.length - MOST_NAMES) : shown;
  };
  const level = write.percent(levelOf(analysis.alpha));
  const way = input.direction === 'higher' ? 'higher' : 'lower';
  const target = typeof input.direction === 'object' ? input.direction.target : null;

  const speak = (a: Answer): Spoken => {
    switch (a.tag) {
      case 'one-best': {
        const gap = [value(a.gap), level, bare(a.lower), bare(a.upper), name(a.next)] as const;
        return target === null
          ? {
              headline: t.oneBest(way, name(a.treatment), measured.label, value(a.mean)),
              rest: [t.oneBestGap(way, ...gap)]
            }
          : {
              headline: t.nearest(name(a.treatment), measured.label, value(target), value(a.mean)),
              rest: [t.nearestGap(...gap)]
            };
      }
      case 'several-best': {
        const leader = a.order[0] ?? a.leaders[0] ?? 0;
        const others = names(a.leaders.filter((i) => i !== leader));
        const headline =
          target === null
            ? t.severalBest(way, name(leader), measured.label, value(a.leaderMean), others)
            : t.severalNearest(name(leader), measured.label, value(a.leaderMean), others);
        const worse = names(a.worse);
        return {
          headline,
          rest: a.worse.length === 0 ? [] : [target === null ? t.worse(way, worse) : t.further(worse)]
        };
      }
      case 'none-differ':
        return {
          headline: t.noneDiffer(measured.label, a.p === null ? null : write.p(a.p)),
          rest: [t.noneDifferMore(name(a.leader), value(a.leaderMean))]
        };
      case 'parts':
        return {
          headline: t.parts(a.parts.length),
          rest: a.parts.map((part) => {
            const inner = speak(part.answer);
            return t.part(names(part.treatments), [inner.headline, ...inner.rest].join(' '));
          })
        };
      case 'ranks-differ':
        return { headline: t.ranksDiffer(write.p(a.p), order(a.order)), rest: [] };
      case 'ranks-do-not-differ':
        return { headline: t.ranksDoNotDiffer(write.p(a.p)), rest: [] };
      case 'means-only':
        return {
          headline: t.meansOnly(order(a.order)),
          rest: [
            words.reasons.reason(
              a.reason,
              input.treatments.map((x) => x.name)
            )
          ]
        };
      case 'none':
        return {
          headline: t.none,
          rest: [
            words.reasons.reason(
              a.reason,
              input.treatments.map((x) => x.name)
            )
          ]
        };
    }
  };
  return speak(analysis.answer);
}
