import type { ContrastLine } from '../../core/analysis/analysis-result.ts';
import type { ContrastFault } from '../../core/analysis/comparisons/parse-contrast.ts';
import type { PrimaryModel } from '../../core/analysis/observations.ts';
import type { Section } from '../../core/analysis/reason.ts';
import type { NumberWriter } from '../format/number-writer.ts';

/** A typed question and its answer under both ways to treat sessions. */
export interface Asked {
  text: string;
  weights: readonly number[];
  models: Record<PrimaryModel, Section<ContrastLine>>;
}

/** What came of asking: an answer, a question not understood, or a computation that broke off. */
export type AskReply =
  { tag: 'answer'; asked: Asked } | { tag: 'not-understood'; fault: ContrastFault } | { tag: 'broke-off' };

/**
 * A question that can be asked of these treatments, as a person would type it: the first against the average of the next
 * two; of two treatments their difference.
 */
export function exampleQuestion(names: readonly string[]): string {
  const [a = 'A', b = 'B', c] = names;
  return c === undefined ? `${a} − ${b}` : `${a} − ½·${b} − ½·${c}`;
}

/** The weighted sum as it was understood, so that a person can check it: "1·A − 0.5·B − 0.5·C". */
export function weightedSum(weights: readonly number[], names: readonly string[], write: NumberWriter): string {
  const terms = weights.flatMap((w, i) => (w === 0 ? [] : [{ w, name: names[i] ?? String(i + 1) }]));
  return terms
    .map(({ w, name }, at) => {
      const size = Math.abs(w) === 1 ? name : `${plain(Math.abs(w), write)}·${name}`;
      if (at === 0) return w < 0 ? `−${size}` : size;
      return `${w < 0 ? '−' : '+'} ${size}`;
    })
    .join(' ');
}

/** A weight with as many decimals as it needs, four at most. */
export function plain(x: number, write: NumberWriter): string {
  const decimals = [0, 1, 2, 3].find((d) => Math.abs(x - Number(x.toFixed(d))) < 1e-9) ?? 4;
  return write.fixed(x, decimals);
}
