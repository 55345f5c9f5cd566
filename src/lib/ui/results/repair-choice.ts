import type { ResultWords } from '../texts/result-words.ts';

/** One way on after loss, with its price and what it brings. */
export interface RepairChoice {
  key: string;
  kind: 'leave' | 'rerun' | 'extra';
  /** Number of the session that would be run again. */
  session: string | null;
  /** Names of the treatments that would be loaded. */
  treatments: string[];
  sessions: number;
  specimens: number;
  /** Average standard error of a difference afterwards, in units of the measurand; null while in parts. */
  seAfter: number | null;
  connects: boolean;
}

/** What the loss costs and the ways on; while they are being priced only the loss is known. */
export type RepairView =
  | { tag: 'nothing' }
  | { tag: 'computing'; lost: string }
  | { tag: 'failed'; lost: string; detail: string }
  | {
      tag: 'choices';
      lost: string;
      now: number | null;
      planned: number | null;
      choices: RepairChoice[];
      /** The pairs hit hardest, worst first. */
      hit: { pair: string; now: number | null; planned: number | null }[];
    };

/** A way on as a person would call it. */
export function choiceName(choice: RepairChoice, words: ResultWords): string {
  const t = words.layers.repair;
  if (choice.kind === 'leave') return t.leave;
  return choice.kind === 'rerun' ? t.rerun(choice.session ?? '') : t.extra(words.answer.and(choice.treatments));
}
