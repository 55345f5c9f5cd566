import type { Blocks } from '../../blocks.ts';
import { allCombinations, combinationCount } from '../all-combinations.ts';
import type { Construction } from '../candidate.ts';

/** Treatments, sessions and slots more than this are not listed by all combinations. */
const MOST_COMBINATIONS = 20_000;

const repeat = (blocks: Blocks, times: number): Blocks => Array.from({ length: times }, () => blocks).flat();

/** Every treatment in every session. */
export const completeBlocks: Construction = ({ t, k, b }) =>
  k === t
    ? {
        blocks: repeat([Array.from({ length: t }, (_, i) => i)], b),
        construction: 'Every treatment in every session.',
        constructionId: 'complete-blocks',
        source: 'R. A. Fisher (1935), The Design of Experiments, chapter IV',
        resolution: Array.from({ length: b }, (_, i) => [i])
      }
    : null;

/** Every choice of k treatments, as often as the number of sessions allows. */
export const everyCombination: Construction = ({ t, k, b }) => {
  const count = combinationCount(t, k);
  if (count > MOST_COMBINATIONS || b % count !== 0 || b > MOST_COMBINATIONS) return null;
  const times = b / count;
  return {
    blocks: repeat(allCombinations(t, k), times),
    construction: `Every combination of ${k} of the ${t} treatments${times === 1 ? '' : `, each ${times} times`}.`,
    constructionId: 'all-combinations',
    source: 'F. Yates (1936), A new method of arranging variety trials, J. Agric. Sci. 26, 424–455'
  };
};
