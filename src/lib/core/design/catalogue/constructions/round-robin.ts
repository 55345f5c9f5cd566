import type { Construction } from '../candidate.ts';

/**
 * All pairs of an even number of treatments, in rounds that hold every treatment once: one treatment stays, the others
 * turn in a circle. As often as the number of sessions allows.
 *
 * Source: E. Lucas (1883), Récréations mathématiques 2, sixth recreation (the round robin).
 * Checked by: test/core/design/catalogue/resolution/resolvable-design.test.ts
 */
export const roundRobin: Construction = ({ t, k, lambda }) => {
  if (k !== 2 || t % 2 === 1) return null;
  const circle = t - 1;
  const rounds = Array.from({ length: circle }, (_, round) =>
    Array.from({ length: t / 2 }, (_, i) =>
      i === 0 ? [round, circle] : [(round + i) % circle, (round - i + circle) % circle].sort((a, b) => a - b)
    )
  );
  return {
    blocks: Array.from({ length: lambda }, () => rounds.flat()).flat(),
    construction: `Every pair of the ${t} treatments${lambda === 1 ? '' : `, each ${lambda} times`}, in the rounds of a round robin.`,
    constructionId: 'all-combinations:round-robin',
    source: 'E. Lucas (1883), Récréations mathématiques, vol. 2',
    resolution: consecutiveClasses(t, k, lambda * circle)
  };
};

/** The parallel classes of blocks that are listed class by class: t/k blocks each. */
export function consecutiveClasses(t: number, k: number, classes: number): number[][] {
  const size = t / k;
  return Array.from({ length: classes }, (_, c) => Array.from({ length: size }, (_, i) => c * size + i));
}
