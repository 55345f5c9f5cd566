import { tukeyUpper, tukeyUpperQuantile } from '../../numerics/distributions/tukey.ts';
import type { AnswerModel, CensoredFit, MeanLine, PairLine } from '../analysis-result.ts';

/** What an answer needs of a model, whichever it is: means of the treatments that have one, and verdicts on pairs. */
export interface Verdicts {
  model: AnswerModel;
  means: { treatment: number; estimate: number; part: number }[];
  /** Simultaneous comparison a − b; null where it cannot be made. */
  pair: (a: number, b: number) => { p: number; lower: number; upper: number } | null;
  /** Test of any difference at all. */
  overall: number | null;
}

/** Verdicts by Tukey–Kramer from the lines of a fit. */
export function verdictsOfFit(
  model: AnswerModel,
  means: readonly MeanLine[],
  pairs: readonly PairLine[],
  overall: number | null
): Verdicts {
  const known = new Map(pairs.map((line) => [key(line.a, line.b), line]));
  return {
    model,
    overall,
    means: means.flatMap(({ treatment, estimate, part }) =>
      estimate === null ? [] : [{ treatment, estimate, part: part ?? 0 }]
    ),
    pair: (a, b) => {
      const line = known.get(key(Math.min(a, b), Math.max(a, b)));
      if (!line || line.pTukey === null || line.lowerTukey === null || line.upperTukey === null) return null;
      const { pTukey: p, lowerTukey: lower, upperTukey: upper } = line;
      return a < b ? { p, lower, upper } : { p, lower: -upper, upper: -lower };
    }
  };
}

/** Verdicts from the maximum-likelihood fit with limits: Tukey–Kramer with infinite degrees of freedom. */
export function verdictsOfLimits(fit: CensoredFit, alpha: number): Verdicts {
  const known = new Map(fit.pairs.map((line) => [key(line.a, line.b), line]));
  const means = fit.means.flatMap(({ treatment, estimate }) =>
    estimate === null ? [] : [{ treatment, estimate, part: 0 }]
  );
  const critical = means.length < 2 ? 0 : tukeyUpperQuantile(alpha, means.length, Infinity) / Math.SQRT2;
  return {
    model: 'censored',
    overall: fit.test.ok ? fit.test.value.p : null,
    means,
    pair: (a, b) => {
      const line = known.get(key(Math.min(a, b), Math.max(a, b)));
      if (!line || line.estimate === null || line.se === null || line.z === null) return null;
      const centre = a < b ? line.estimate : -line.estimate;
      const half = critical * line.se;
      const p = tukeyUpper(Math.abs(line.z) * Math.SQRT2, means.length, Infinity);
      return { p, lower: centre - half, upper: centre + half };
    }
  };
}

const key = (a: number, b: number): string => `${a} ${b}`;
