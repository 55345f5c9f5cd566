import { compactLetters } from './comparisons/compact-letters.ts';
import { compareToBest } from './comparisons/compare-to-best.ts';
import { compareToControl } from './comparisons/compare-to-control.ts';
import type { MeanSource } from './comparisons/compare-to-target.ts';
import type { DifferenceSource } from './comparisons/difference-source.ts';
import { testContrast } from './comparisons/test-contrast.ts';
import { testEquivalence } from './comparisons/test-equivalence.ts';
import type { Comparisons } from './comparison-result.ts';
import type { MeanLine, PairLine } from './fit-result.ts';
import type { Observations } from './observations.ts';
import { fail } from '../result.ts';
import type { Section } from './reason.ts';

/** Estimate, standard error and degrees of freedom of a contrast of the treatments, or why there is none. */
export type ContrastFit = (weights: readonly number[]) => Section<{ estimate: number; se: number; df: number }>;

/**
 * Returns all comparisons beyond the pairs under one model: letters, against the control, against the best, equivalence,
 * typed questions.
 *
 * @param means,pairs lines of a fit with error degrees of freedom
 * @param quick the quick expansion for Dunnett's distribution, for the model that is not the primary one
 */
export function compareTreatments(
  observations: Observations,
  means: readonly MeanLine[],
  pairs: readonly PairLine[],
  contrast: ContrastFit,
  quick: boolean
): Comparisons {
  const { control, alpha, equivalenceMargin, direction, seed } = observations;
  const source = differenceSource(observations.treatments.length, means, pairs);
  const at = (treatment: number): MeanLine => means[treatment]!;
  const meanSource: MeanSource = {
    estimate: (i) => at(i).estimate!,
    se: (i) => at(i).se!,
    df: (i) => at(i).df!
  };
  const pTukey = new Map(pairs.map((line) => [`${line.a} ${line.b}`, line.pTukey]));
  const differs = (a: number, b: number): boolean => (pTukey.get(`${Math.min(a, b)} ${Math.max(a, b)}`) ?? 1) <= alpha;
  const cost = (i: number): number => {
    const m = at(i).estimate ?? 0;
    return direction === 'lower' ? m : direction === 'higher' ? -m : Math.abs(m - direction.target);
  };
  const ordered = [...source.present].sort((a, b) => cost(a) - cost(b) || a - b);
  const parts = new Set(means.flatMap(({ part }) => (part === null ? [] : [part]))).size;
  return {
    letters: parts > 1 ? fail({ tag: 'disconnected', parts }) : compactLetters(ordered, differs),
    control: control === null ? fail({ tag: 'no-control' }) : compareToControl(source, control, alpha, seed, quick),
    best: compareToBest(source, direction, alpha, meanSource),
    equivalence:
      control === null
        ? fail({ tag: 'no-control' })
        : equivalenceMargin === null
          ? fail({ tag: 'no-margin' })
          : testEquivalence(source, control, equivalenceMargin, alpha),
    contrasts: (observations.contrasts ?? []).map((request) => testContrast(request, contrast(request.weights), alpha))
  };
}

/** Differences looked up in the lines of the pairs. */
export function differenceSource(
  treatments: number,
  means: readonly MeanLine[],
  pairs: readonly PairLine[]
): DifferenceSource {
  const lines = new Array<PairLine | undefined>(treatments * treatments);
  for (const line of pairs) lines[line.a * treatments + line.b] = line;
  const find = (a: number, b: number): PairLine => lines[Math.min(a, b) * treatments + Math.max(a, b)]!;
  return {
    treatments,
    present: means.flatMap(({ treatment, n }) => (n > 0 ? [treatment] : [])),
    estimable: (a, b) => a === b || find(a, b).estimable,
    estimate: (a, b) => (a < b ? find(a, b).estimate! : -find(a, b).estimate!),
    se: (a, b) => find(a, b).se!,
    df: (a, b) => find(a, b).df!
  };
}
