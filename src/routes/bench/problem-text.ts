import type { ReadingNotUnderstood } from '#lib/core/campaign/parse-reading.ts';
import { benchPartTexts } from '#lib/ui/texts/bench-parts.ts';

/** Why a text was not taken as a number. */
export function problemText(problem: ReadingNotUnderstood): string {
  const t = benchPartTexts().problem;
  switch (problem.tag) {
    case 'empty':
      return t.empty;
    case 'not-a-number':
      return t.notANumber(problem.at);
    case 'ambiguous':
      return t.ambiguous;
    case 'unfinished':
      return t.unfinished;
    case 'other-unit':
      return t.otherUnit(problem.typed, problem.unit);
    case 'limit-not-allowed':
      return t.limitNotAllowed;
    case 'too-many-digits':
      return t.tooManyDigits;
    case 'too-large-or-small':
      return t.tooLargeOrSmall;
  }
}
