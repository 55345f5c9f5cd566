/** A permutation: point i goes to `permutation[i]`. */
export type Permutation = readonly number[];

/** A group that moves the treatments of a design, as the list of all its elements, the identity first. */
export interface PermutationGroup {
  /** Number of points it moves. */
  degree: number;
  elements: readonly Permutation[];
  /** How the group is called in a sentence. */
  name: string;
}

/**
 * The group that some permutations generate.
 *
 * @param generators permutations of the same points, at least one
 * @param name how the group is called in a sentence
 * Cost: group order × generators × degree.
 *
 * Checked by: test/core/design/catalogue/orbits/permutation-group.test.ts
 */
export function generateGroup(generators: readonly Permutation[], name: string): PermutationGroup {
  const degree = generators[0]!.length;
  const identity = Array.from({ length: degree }, (_, i) => i);
  const elements: Permutation[] = [identity];
  const known = new Set([identity.join()]);
  // The list grows while it is run through.
  for (let i = 0; i < elements.length; i++) {
    for (const generator of generators) {
      const product = elements[i]!.map((point) => generator[point]!);
      const key = product.join();
      if (known.has(key)) continue;
      known.add(key);
      elements.push(product);
    }
  }
  return { degree, elements, name };
}

/** How copies of Z_n and fixed points lie: point o·n + g is element g of copy o, the fixed points come last. */
export interface Layout {
  n: number;
  copies: number;
  fixed: number;
}

/** Adds one in every copy of Z_n. */
export function shift({ n, copies, fixed }: Layout): Permutation {
  return Array.from({ length: copies * n + fixed }, (_, point) =>
    point < copies * n ? point - (point % n) + ((point + 1) % n) : point
  );
}

/**
 * Multiplies by a unit in every copy of Z_n, and may also permute the copies and the fixed points.
 *
 * @param factor a whole number without a factor in common with n
 * @param copyTo where each copy goes
 * @param fixedTo where each fixed point goes
 */
export function scale(
  { n, copies, fixed }: Layout,
  factor: number,
  copyTo: readonly number[] = Array.from({ length: copies }, (_, o) => o),
  fixedTo: readonly number[] = Array.from({ length: fixed }, (_, i) => i)
): Permutation {
  return Array.from({ length: copies * n + fixed }, (_, point) =>
    point < copies * n
      ? copyTo[Math.floor(point / n)]! * n + (((point % n) * factor) % n)
      : copies * n + fixedTo[point - copies * n]!
  );
}
