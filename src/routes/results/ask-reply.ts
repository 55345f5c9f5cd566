import type { Result } from '#lib/core/result.ts';
import type { AnsweredQuestion, QuestionFault } from '#lib/state/results-question.ts';
import type { AskReply } from '#lib/ui/results/question-row.ts';

/** Sets apart what a person can put right in the question from a computation that broke off. */
export function askReply(made: Result<AnsweredQuestion, QuestionFault>): AskReply {
  if (made.ok) return { tag: 'answer', asked: made.value };
  const { error } = made;
  switch (error.tag) {
    case 'empty':
    case 'too-long':
    case 'unknown-name':
    case 'unexpected':
    case 'ended-early':
    case 'unclosed':
    case 'product-of-treatments':
    case 'division-by-treatments':
    case 'division-by-zero':
    case 'number-without-treatment':
    case 'weights-do-not-cancel':
    case 'nothing-left':
      return { tag: 'not-understood', fault: error };
    default:
      return { tag: 'broke-off' };
  }
}
