import type { Blocks } from '../../blocks.ts';
import type { PermutationGroup } from './permutation-group.ts';

/** A base block and how many elements of the group keep it in place. */
export interface BaseBlock {
  block: readonly number[];
  stabiliser: number;
}

/**
 * The blocks that base blocks give under a group; an image that comes |S| times over, because S keeps the base block in
 * place, is kept once.
 *
 * Source: R. C. Bose (1939), Ann. Eugenics 9, section 4 (method of symmetrically repeated differences).
 * Checked by: test/core/design/catalogue/orbits/orbit-search.test.ts
 */
export function develop(group: PermutationGroup, base: readonly BaseBlock[]): Blocks {
  return base.flatMap(({ block, stabiliser }) => {
    const images = new Map<string, { image: number[]; times: number }>();
    for (const g of group.elements) {
      const image = block.map((point) => g[point]!).sort((a, b) => a - b);
      const known = images.get(image.join());
      if (known) known.times += 1;
      else images.set(image.join(), { image, times: 1 });
    }
    return [...images.values()].flatMap(({ image, times }) => Array.from({ length: times / stabiliser }, () => image));
  });
}
