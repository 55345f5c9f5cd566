import { inSentence } from '../../format/unit-text.ts';
import { pIs } from '../p-value.ts';

/** The finding as one sentence a person would say aloud. Values arrive written, with unit. */
export const answer = {
  and: (names: readonly string[]): string =>
    names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`,
  many: (names: string, more: number): string => `${names} and ${more} more`,
  end: {
    lower: { best: 'lowest', better: 'lower', worse: 'higher', less: 'less' },
    higher: { best: 'highest', better: 'higher', worse: 'lower', less: 'more' }
  },
  oneBest: (way: 'lower' | 'higher', name: string, what: string, mean: string) =>
    `${name} has the ${way === 'lower' ? 'lowest' : 'highest'} ${inSentence(what)}: ${mean}.`,
  oneBestGap: (way: 'lower' | 'higher', gap: string, level: string, lower: string, upper: string, next: string) =>
    `That is ${gap} (${level} interval ${lower} to ${upper}) ${way === 'lower' ? 'less' : 'more'} than the next, ${next}.`,
  nearest: (name: string, what: string, target: string, mean: string) =>
    `${name} comes nearest to the target of ${target} in ${inSentence(what)}: ${mean}.`,
  nearestGap: (gap: string, level: string, lower: string, upper: string, next: string) =>
    `It misses by ${gap} (${level} interval ${lower} to ${upper}) less than the next, ${next}.`,
  severalBest: (way: 'lower' | 'higher', leader: string, what: string, mean: string, others: string) =>
    `${leader} has the ${way === 'lower' ? 'lowest' : 'highest'} ${inSentence(what)}, ${mean}, but ${others} cannot be told from it.`,
  severalNearest: (leader: string, what: string, mean: string, others: string) =>
    `${leader} comes nearest to the target in ${inSentence(what)} with ${mean}, but ${others} cannot be told from it.`,
  worse: (way: 'lower' | 'higher', names: string) => `Clearly ${way === 'lower' ? 'higher' : 'lower'}: ${names}.`,
  further: (names: string) => `Clearly further off: ${names}.`,
  noneDiffer: (what: string, p: string | null) =>
    `No difference in ${inSentence(what)} between the treatments is shown${p === null ? '' : ` (${pIs(p)})`}.`,
  noneDifferMore: (leader: string, mean: string) =>
    `${leader} came first with ${mean}. This is no proof that all are equal: see how small a difference these runs could have found.`,
  parts: (parts: number) =>
    `The sessions fall into ${parts} groups without a treatment in common; between the groups nothing can be compared.`,
  part: (names: string, sentence: string) => `Among ${names}: ${sentence}`,
  ranksDiffer: (p: string, order: string) =>
    `The ranks differ between treatments (${pIs(p)}). From best to worst: ${order}.`,
  ranksDoNotDiffer: (p: string) => `The ranks show no difference between treatments (${pIs(p)}).`,
  meansOnly: (order: string) => `Means only, no errors yet. From best to worst: ${order}.`,
  none: 'No answer yet.',
  modelFixed: 'sessions fixed',
  modelRandom: 'sessions random',
  modelCensored: 'readings at a limit allowed for',
  interim: (done: number, planned: number) => `Interim look: ${done} of ${planned} planned runs count so far.`,
  interimCare:
    'The answer can still turn. Stopping because of what an interim look shows makes errors larger than stated; stop where the plan said.'
};
