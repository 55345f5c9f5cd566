import type { ContrastFault } from '../../../core/analysis/comparisons/parse-contrast.ts';

/** A question that a person types on the results about the adjusted means. */
export const question = {
  title: 'A question of your own',
  label: 'Weighted sum of treatments',
  hint: (example: string) =>
    `For example: ${example}. Names as in the table; + − · / ( ) and numbers; the weights must add to zero.`,
  ask: 'Compute',
  computing: 'Computing …',
  care: 'A question chosen after looking at the means is exploratory: its p and interval are those of a question fixed before data, so it may point to the next campaign but does not prove anything here. No allowance is made for how many questions are asked.',
  caption: 'Your questions, the latest first',
  question: 'Question',
  readAs: (sum: string) => `read as ${sum}`,
  estimate: 'Estimate',
  df: 'df',
  t: 't',
  differs: 'differs from zero',
  same: 'not told from zero',
  failed: 'The computation broke off. Nothing was changed; ask again.',
  said: (text: string, estimate: string, lower: string, upper: string) =>
    `${text}: ${estimate}, interval ${lower} to ${upper}`,
  fault(fault: ContrastFault, names: readonly string[], write: (x: number) => string): string {
    switch (fault.tag) {
      case 'empty':
        return 'Type a question first.';
      case 'too-long':
        return `The question is too long; ${fault.limit} characters are the most.`;
      case 'unknown-name':
        return `“${fault.found}” is not the name of a treatment. The names are: ${names.slice(0, 6).join(', ')}${names.length > 6 ? ' …' : ''}.`;
      case 'unexpected':
        return `“${fault.found}” cannot stand at character ${fault.at + 1}.`;
      case 'ended-early':
        return 'The question stops in the middle: a treatment or a number must follow.';
      case 'unclosed':
        return `The bracket at character ${fault.at + 1} is not closed.`;
      case 'product-of-treatments':
        return `Two treatments are multiplied at character ${fault.at + 1}. Multiply treatments by numbers only.`;
      case 'division-by-treatments':
        return `Something is divided by a treatment at character ${fault.at + 1}. Divide by numbers only.`;
      case 'division-by-zero':
        return `Something is divided by zero at character ${fault.at + 1}.`;
      case 'number-without-treatment':
        return `The number ${write(fault.constant)} belongs to no treatment. Numbers only weigh treatments.`;
      case 'weights-do-not-cancel':
        return `The weights add to ${write(fault.sum)} where they must add to zero: what is taken away must weigh as much as what it is taken from.`;
      case 'nothing-left':
        return 'All treatments cancel, so nothing is compared.';
    }
  }
};
