import type { Blocks } from '../../blocks.ts';
import { pairOrbits } from './pair-orbits.ts';
import type { Permutation, PermutationGroup } from './permutation-group.ts';

/** One kind of block orbit to look for: `count` orbits whose blocks are kept in place by exactly the elements listed. */
export interface OrbitShape {
  /** Elements of the group that keep the base block in place, the identity among them. */
  stabiliser: readonly Permutation[];
  count: number;
}

/** A base block and how many elements of the group keep it in place. */
export interface BaseBlock {
  block: readonly number[];
  stabiliser: number;
}

/**
 * Base blocks whose images under the group form a balanced design, or null when none was found within the allowance.
 *
 * A base block B, kept in place by S, brings the pairs of an orbit o together |{pairs of B in o}|·|G|/|S| times in all;
 * the sum over the base blocks must be λ|o| for every o. The search always serves the first pair orbit that still lacks meetings: the next base
 * block may be taken to hold that orbit's first pair.
 *
 * @param group the prescribed automorphisms
 * @param k treatments a session
 * @param lambda meetings of each pair
 * @param shapes how many base blocks of which stabiliser
 * @param allowance search steps before giving up; a count, so that every machine stops at the same place
 * @returns base blocks in the order of the shapes, or null
 *
 * Source: E. S. Kramer & D. M. Mesner (1976), t-designs on hypergraphs, Discrete Math. 15, 263–296.
 * Checked by: test/core/design/catalogue/orbit-search.test.ts
 */
export function orbitSearch(
  group: PermutationGroup,
  k: number,
  lambda: number,
  shapes: readonly OrbitShape[],
  allowance: number
): BaseBlock[] | null {
  const t = group.degree;
  const { orbitOf, size, representative } = pairOrbits(group);
  // Meetings are counted per orbit, not per pair, so that short orbits need no fractions.
  const wanted = size.map((pairs) => lambda * pairs);
  const load = new Int32Array(size.length);
  const kinds = shapes.map((shape) => ({ ...shape, ...partition(shape.stabiliser, t), left: shape.count }));
  const weights = kinds.map((kind) => group.elements.length / kind.stabiliser.length);
  const chosen: BaseBlock[] = [];
  const block: number[] = [];
  let kind = 0;
  let steps = 0;

  /** Adds a part to the block; false when some pair would meet too often. */
  const extend = (part: readonly number[]): boolean => {
    let fits = true;
    for (const point of part) {
      for (const other of block) {
        const orbit = orbitOf[point * t + other]!;
        load[orbit]! += weights[kind]!;
        if (load[orbit]! > wanted[orbit]!) fits = false;
      }
      block.push(point);
    }
    return fits;
  };
  const retract = (part: readonly number[]): void => {
    for (let i = 0; i < part.length; i++) {
      const point = block.pop()!;
      for (const other of block) load[orbitOf[point * t + other]!]! -= weights[kind]!;
    }
  };

  /** Fills the block up to k treatments with parts numbered `from` and up, then goes on to the next base block. */
  const fill = (from: number): boolean => {
    if (block.length === k) return finish();
    const { parts } = kinds[kind]!;
    for (let p = from; p < parts.length; p++) {
      const part = parts[p]!;
      if (block.length + part.length > k || block.includes(part[0]!)) continue;
      if (++steps > allowance) return false;
      if (extend(part) && fill(p + 1)) return true;
      retract(part);
    }
    return false;
  };

  const finish = (): boolean => {
    const whole = block.splice(0);
    const own = kind;
    chosen.push({ block: whole.toSorted((a, b) => a - b), stabiliser: kinds[own]!.stabiliser.length });
    kinds[own]!.left -= 1;
    if (place()) return true;
    kinds[own]!.left += 1;
    chosen.pop();
    block.push(...whole);
    kind = own;
    return false;
  };

  /** Looks for a base block that holds the first pair of the first pair orbit in need. */
  const place = (): boolean => {
    const orbit = load.findIndex((x, o) => x < wanted[o]!);
    if (orbit === -1) return kinds.every((each) => each.left === 0);
    const [x, y] = representative[orbit]!;
    for (let i = 0; i < kinds.length; i++) {
      const { parts, partOf, left } = kinds[i]!;
      if (left === 0) continue;
      kind = i;
      const first = parts[partOf[x]!]!;
      const second = partOf[x] === partOf[y] ? [] : parts[partOf[y]!]!;
      if (first.length + second.length > k) continue;
      if (extend(first) && extend(second)) {
        if (fill(0)) return true;
        retract(second);
      } else if (block.length > first.length) retract(second);
      retract(first);
    }
    return false;
  };

  return place() ? chosen : null;
}

/** The orbits of a few permutations on the points: a block kept in place by all of them is put together from these. */
function partition(stabiliser: readonly Permutation[], t: number): { parts: number[][]; partOf: Int32Array } {
  const parts: number[][] = [];
  const partOf = new Int32Array(t).fill(-1);
  for (let point = 0; point < t; point++) {
    if (partOf[point] !== -1) continue;
    const part = [...new Set(stabiliser.map((g) => g[point]!))];
    part.forEach((x) => (partOf[x] = parts.length));
    parts.push(part);
  }
  return { parts, partOf };
}

/**
 * The blocks that base blocks give under a group; an image that comes |S| times over, because S keeps the base block in
 * place, is kept once.
 *
 * Checked by: test/core/design/catalogue/orbit-search.test.ts
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
