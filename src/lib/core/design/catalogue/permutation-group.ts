import { abelianGroup } from './abelian-group.ts';

/** A permutation: point i goes to `permutation[i]`. */
export type Permutation = readonly number[];

/** A group that moves the treatments of a design to be found, as the list of all its elements, the identity first. */
export interface PermutationGroup {
  degree: number;
  elements: readonly Permutation[];
  /** How the group is called in a sentence. */
  name: string;
}

/**
 * An abelian group, with optional multipliers, acting on some copies of itself and on fixed points. Point o·n + g is
 * element g of copy o (n the group's order); the fixed points come last.
 *
 * @param moduli orders of the cyclic factors
 * @param orbits number of copies
 * @param fixed number of fixed points
 * @param multiplier maps of the group onto itself that act on every copy alike; they must form a group with the identity
 *
 * Checked by: test/core/design/catalogue/orbit-search.test.ts
 */
export function translationGroup(
  moduli: readonly number[],
  orbits = 1,
  fixed = 0,
  multiplier: readonly ((g: number) => number)[] = [(g) => g]
): PermutationGroup {
  const group = abelianGroup(moduli);
  const n = group.order;
  const degree = orbits * n + fixed;
  const elements: Permutation[] = [];
  for (const multiply of multiplier) {
    for (let shift = 0; shift < n; shift++) {
      elements.push(
        Array.from({ length: degree }, (_, point) =>
          point < orbits * n ? point - (point % n) + group.add(multiply(point % n), shift) : point
        )
      );
    }
  }
  const copies = orbits === 1 ? '' : ` on ${orbits} copies of itself`;
  const still = fixed === 0 ? '' : ` with ${fixed} fixed ${fixed === 1 ? 'treatment' : 'treatments'}`;
  const factors = multiplier.length === 1 ? '' : ` with ${multiplier.length} multipliers`;
  return { degree, elements, name: `${moduli.map((m) => `Z_${m}`).join(' × ')}${factors}${copies}${still}` };
}

/** The multiplications by 1, u, u², … in Z_n; u must have no factor in common with n. */
export function multipliers(n: number, u: number): ((g: number) => number)[] {
  const factors = [1];
  for (let x = u % n; x !== 1; x = (x * u) % n) {
    if (factors.length > n) throw new Error(`multipliers: ${u} is no unit modulo ${n}`);
    factors.push(x);
  }
  return factors.map((factor) => (g) => (g * factor) % n);
}
