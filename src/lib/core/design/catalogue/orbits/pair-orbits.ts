import type { PermutationGroup } from './permutation-group.ts';

/** The orbits of a group on the unordered pairs of its points. */
export interface PairOrbits {
  /** Orbit number of {x, y} at x·degree + y; −1 on the diagonal. */
  orbitOf: Int32Array;
  /** Pairs in each orbit. */
  size: readonly number[];
  /** One pair of each orbit. */
  representative: readonly (readonly [number, number])[];
}

/**
 * The orbits of the group on unordered pairs, numbered in the order of their smallest pair.
 * Cost: degree² + orbits × group order.
 *
 * Checked by: test/core/design/catalogue/orbits/orbit-search.test.ts
 */
export function pairOrbits(group: PermutationGroup): PairOrbits {
  const t = group.degree;
  const orbitOf = new Int32Array(t * t).fill(-1);
  const size: number[] = [];
  const representative: (readonly [number, number])[] = [];
  for (let x = 0; x < t; x++) {
    for (let y = x + 1; y < t; y++) {
      if (orbitOf[x * t + y] !== -1) continue;
      const orbit = size.length;
      let count = 0;
      for (const g of group.elements) {
        const a = g[x]!;
        const b = g[y]!;
        if (orbitOf[a * t + b] !== -1) continue;
        orbitOf[a * t + b] = orbit;
        orbitOf[b * t + a] = orbit;
        count += 1;
      }
      size.push(count);
      representative.push([x, y]);
    }
  }
  return { orbitOf, size, representative };
}
