import type { Blocks } from '../../blocks.ts';

/** The blocks cut down to some of the points, which are renumbered 0, 1, … in their order. */
function restrict(blocks: Blocks, points: readonly number[]): Blocks {
  const numberOf = new Map(points.map((point, i) => [point, i]));
  return blocks.map((block) => block.map((point) => numberOf.get(point)).filter((point) => point !== undefined));
}

/**
 * The residual of a symmetric design: the first block and its points taken away.
 *
 * Source: R. C. Bose (1939), Ann. Eugenics 9, section 2.
 * Checked by: test/core/design/catalogue/constructions/residual-derived.test.ts
 */
export function residual(symmetric: Blocks): Blocks {
  const first = new Set(symmetric[0]);
  const rest = symmetric.map((_, point) => point).filter((point) => !first.has(point));
  return restrict(symmetric.slice(1), rest);
}

/**
 * The derived design of a symmetric design: the other blocks cut down to the points of the first.
 *
 * Source: R. C. Bose (1939), Ann. Eugenics 9, section 2.
 * Checked by: test/core/design/catalogue/constructions/residual-derived.test.ts
 */
export function derived(symmetric: Blocks): Blocks {
  return restrict(symmetric.slice(1), symmetric[0]!);
}

/** What is left out of each session: the complement of each block. */
export function complement(blocks: Blocks, t: number): Blocks {
  return blocks.map((block) => {
    const inside = new Set(block);
    return Array.from({ length: t }, (_, i) => i).filter((i) => !inside.has(i));
  });
}
