import { seededRandom } from '../../../numerics/random/seeded-random.ts';
import type { BaseBlock } from './develop.ts';
import { pairOrbits } from './pair-orbits.ts';
import type { Permutation, PermutationGroup } from './permutation-group.ts';

/** One kind of block orbit to look for: `count` base blocks that all elements of `stabiliser` keep in place. */
export interface OrbitShape {
  /** A subgroup, the identity among it. */
  stabiliser: readonly Permutation[];
  count: number;
}

/** How long to look: so many tries of so many steps. Counts, not times, so that every machine stops at the same place. */
export interface SearchEffort {
  tries: number;
  steps: number;
}

/**
 * Base blocks whose images under the group form a balanced design, or null when none was found within the effort.
 *
 * A base block B, kept in place by S, brings the pairs of an orbit o together |{pairs of B in o}|·|G|/|S| times in all;
 * the sum over the base blocks must be λ|o| for every o. The search is depth-first and always serves the first pair orbit
 * in need: some image of the next base block holds any given pair of it. Running times are heavy-tailed, so each try
 * after the first starts afresh with points, orbits and pairs in an order drawn from a fixed seed.
 *
 * @param group the prescribed automorphisms
 * @param k treatments a session
 * @param lambda meetings of each pair
 * @param shapes how many base blocks of which stabiliser
 * @returns base blocks, or null
 *
 * Source: E. S. Kramer & D. M. Mesner (1976), t-designs on hypergraphs, Discrete Math. 15, 263–296; restarts: C. P.
 * Gomes, B. Selman & H. Kautz (1998), Boosting combinatorial search through randomization, Proc. AAAI-98, 431–437.
 * Checked by: test/core/design/catalogue/orbits/orbit-search.test.ts
 */
export function orbitSearch(
  group: PermutationGroup,
  k: number,
  lambda: number,
  shapes: readonly OrbitShape[],
  effort: SearchEffort
): BaseBlock[] | null {
  const t = group.degree;
  const { orbitOf, size, representative } = pairOrbits(group);
  const wanted = size.map((pairs) => lambda * pairs);
  const partitions = shapes.map((shape) => partition(shape.stabiliser, t));
  // Only then is a try that ends early a proof that there is nothing to find.
  const exhaustive = shapes.every(({ stabiliser }) => stabiliser.length === 1);

  for (let attempt = 0; attempt < effort.tries; attempt++) {
    const random = seededRandom(attempt);
    const order = size.map((_, orbit) => orbit);
    if (attempt > 0) random.shuffle(order);
    const search = new DepthFirst({
      t,
      k,
      orbitOf,
      wanted,
      kinds: shapes.map(({ stabiliser, count }, i) => {
        const { parts, partOf } = partitions[i]!;
        const weight = group.elements.length / stabiliser.length;
        const sequence = parts.map((_, part) => part);
        if (attempt > 0) random.shuffle(sequence);
        return { parts, partOf, sequence, weight, stabiliser: stabiliser.length, left: count };
      }),
      needs: order.map((orbit) => {
        const [x, y] = representative[orbit]!;
        const g = group.elements[attempt > 0 ? random.below(group.elements.length) : 0]!;
        return { orbit, x: g[x]!, y: g[y]! };
      }),
      steps: effort.steps
    });
    const found = search.run();
    if (found || (exhaustive && !search.gaveUp)) return found;
  }
  return null;
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

interface Kind {
  parts: readonly (readonly number[])[];
  partOf: Int32Array;
  /** The order in which parts are tried. */
  sequence: readonly number[];
  /** What one pair of a block adds to the load of its orbit. */
  weight: number;
  stabiliser: number;
  left: number;
}

interface Problem {
  t: number;
  k: number;
  orbitOf: Int32Array;
  /** Load each pair orbit must reach: λ times its pairs, so that short orbits need no fractions. */
  wanted: readonly number[];
  kinds: Kind[];
  /** A pair of each orbit, in the order in which the orbits are served. */
  needs: readonly { orbit: number; x: number; y: number }[];
  steps: number;
}

/** One depth-first try. */
class DepthFirst {
  gaveUp = false;
  readonly #problem: Problem;
  readonly #load: Int32Array;
  readonly #chosen: BaseBlock[] = [];
  #block: number[] = [];
  #kind: Kind;
  #steps = 0;

  constructor(problem: Problem) {
    this.#problem = problem;
    this.#load = new Int32Array(problem.wanted.length);
    this.#kind = problem.kinds[0]!;
  }

  run(): BaseBlock[] | null {
    return this.#place() ? this.#chosen : null;
  }

  /** Looks for a base block that holds the pair of the first pair orbit in need. */
  #place(): boolean {
    const { needs, wanted, kinds, k } = this.#problem;
    const need = needs.find(({ orbit }) => this.#load[orbit]! < wanted[orbit]!);
    if (!need) return kinds.every(({ left }) => left === 0);
    for (const kind of kinds) {
      if (kind.left === 0) continue;
      this.#kind = kind;
      const first = kind.parts[kind.partOf[need.x]!]!;
      const second = kind.partOf[need.x] === kind.partOf[need.y] ? [] : kind.parts[kind.partOf[need.y]!]!;
      if (first.length + second.length > k) continue;
      if (this.#extend(first)) {
        if (this.#extend(second) && this.#fill(0)) return true;
        this.#retract(second);
      }
      this.#retract(first);
    }
    return false;
  }

  /** Fills the block up to k treatments with parts from `from` on, then goes on to the next base block. */
  #fill(from: number): boolean {
    const { k, steps } = this.#problem;
    if (this.#block.length === k) return this.#finish();
    const { parts, sequence } = this.#kind;
    for (let i = from; i < sequence.length; i++) {
      const part = parts[sequence[i]!]!;
      if (this.#block.length + part.length > k || this.#block.includes(part[0]!)) continue;
      if (++this.#steps > steps) {
        this.gaveUp = true;
        return false;
      }
      if (this.#extend(part) && this.#fill(i + 1)) return true;
      this.#retract(part);
    }
    return false;
  }

  #finish(): boolean {
    const own = this.#kind;
    const whole = this.#block;
    this.#chosen.push({ block: whole.toSorted((a, b) => a - b), stabiliser: own.stabiliser });
    this.#block = [];
    own.left -= 1;
    if (this.#place()) return true;
    own.left += 1;
    this.#block = whole;
    this.#kind = own;
    this.#chosen.pop();
    return false;
  }

  /** Adds a part to the block; false when some pair would meet too often. */
  #extend(part: readonly number[]): boolean {
    const { t, orbitOf, wanted } = this.#problem;
    const load = this.#load;
    const block = this.#block;
    const weight = this.#kind.weight;
    let fits = true;
    for (const point of part) {
      for (let i = 0; i < block.length; i++) {
        const orbit = orbitOf[point * t + block[i]!]!;
        load[orbit]! += weight;
        if (load[orbit]! > wanted[orbit]!) fits = false;
      }
      block.push(point);
    }
    return fits;
  }

  #retract(part: readonly number[]): void {
    const { t, orbitOf } = this.#problem;
    const block = this.#block;
    for (let n = 0; n < part.length; n++) {
      const point = block.pop()!;
      for (let i = 0; i < block.length; i++) this.#load[orbitOf[point * t + block[i]!]!]! -= this.#kind.weight;
    }
  }
}
