import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { addSession } from './add-session.ts';
import { isConnected } from './connected-parts.ts';
import { informationMatrix } from './information-matrix.ts';
import { moorePenrose } from './moore-penrose.ts';

/** How well an order of sessions stands an early stop. */
export interface EarlyStop {
  /** After how many sessions every treatment can be compared; null when the whole design is not connected. */
  connectedAfter: number | null;
  /** Efficiency of the first m sessions, m = 1 … b: the least possible A-value of m sessions over theirs; 0 before that. */
  efficiency: number[];
  /** Sum of `efficiency`. */
  sum: number;
}

/**
 * Returns how well an order stands an early stop: `rel_A(m) = L(m)/A(first m)`, where
 * `L(m) = 2(t − 1)/Σ_{j≤m}(k_j − 1)` is below the A-value of every design with those session sizes, since
 * trace C = Σ(k_j − 1) and the harmonic mean of the t − 1 eigenvalues is at most their mean.
 *
 * **Checked by** test/core/design/early-stop-order.test.ts
 */
export function earlyStop(blocks: readonly (readonly number[])[], treatments: number): EarlyStop {
  const efficiency: number[] = [];
  let inverse: Float64Array | undefined;
  let information = 0;
  blocks.forEach((block, at) => {
    information += Math.max(0, block.length - 1);
    if (inverse) addSession(inverse, treatments, block);
    else {
      const first = blocks.slice(0, at + 1);
      if (isConnected(first, treatments)) inverse = moorePenrose(informationMatrix(first, treatments), treatments);
    }
    if (!inverse) {
      efficiency.push(0);
      return;
    }
    let trace = 0;
    for (let i = 0; i < treatments; i++) trace += inverse[i * treatments + i]!;
    efficiency.push((treatments - 1) ** 2 / information / trace);
  });
  const connectedAt = efficiency.findIndex((value) => value > 0);
  const connectedAfter = connectedAt < 0 ? null : connectedAt + 1;
  return { connectedAfter, efficiency, sum: efficiency.reduce((sum, value) => sum + value, 0) };
}

const better = (a: EarlyStop, b: EarlyStop): boolean =>
  (a.connectedAfter ?? Infinity) < (b.connectedAfter ?? Infinity) ||
  (a.connectedAfter === b.connectedAfter && a.sum > b.sum + 1e-12);

/**
 * Returns an order of sessions whose first ones are connected early and efficient: among random orders the best, then
 * improved by random exchanges. Groups (shifts) stay together: groups are ordered as a whole, sessions inside them.
 *
 * @param blocks treatments of each session
 * @param treatments number of treatments
 * @param groupOf shift group of each session when the design is resolvable, else null
 * @returns positions in `blocks` in loading order
 *
 * Cost: a fixed number of tries, so that the same seed gives the same order: about 4e7 steps of a t² k b evaluation, at
 * least 40 tries, at most 3000.
 *
 * **Checked by** test/core/design/early-stop-order.test.ts
 */
export function earlyStopOrder(
  blocks: readonly (readonly number[])[],
  treatments: number,
  groupOf: readonly number[] | null,
  random: SeededRandom
): number[] {
  const runs = blocks.reduce((sum, { length }) => sum + length, 0);
  const tries = Math.min(3000, Math.max(40, Math.floor(4e7 / (runs * treatments ** 2 + 200 * blocks.length + 1))));
  const judge = (order: readonly number[]): EarlyStop =>
    earlyStop(
      order.map((at) => blocks[at]!),
      treatments
    );
  let best = chanceOrder(blocks.length, groupOf, random);
  if (blocks.length < 2) return best;
  let bestStop = judge(best);
  const draws = Math.ceil(tries / 4);
  for (let attempt = 1; attempt < tries; attempt++) {
    const order = attempt < draws ? chanceOrder(blocks.length, groupOf, random) : exchanged(best, groupOf, random);
    const stop = judge(order);
    if (better(stop, bestStop)) [best, bestStop] = [order, stop];
  }
  return best;
}

/** Returns a random order of sessions; groups in random order and random inside when they must stay together. */
export function chanceOrder(sessions: number, groupOf: readonly number[] | null, random: SeededRandom): number[] {
  if (!groupOf) return random.shuffle(Array.from({ length: sessions }, (_, at) => at));
  const groups = new Map<number, number[]>();
  groupOf.forEach((group, at) => groups.set(group, [...(groups.get(group) ?? []), at]));
  return random.shuffle([...groups.values()]).flatMap((group) => random.shuffle(group));
}

/** Two sessions change places; when groups must stay together, two of one group do, or two whole groups. */
function exchanged(order: readonly number[], groupOf: readonly number[] | null, random: SeededRandom): number[] {
  const next = [...order];
  const a = random.below(next.length);
  const b = random.below(next.length);
  if (groupOf && groupOf[next[a]!] !== groupOf[next[b]!]) {
    const groups: number[][] = [];
    for (const at of next) {
      const last = groups[groups.length - 1];
      if (last && groupOf[last[0]!] === groupOf[at]) last.push(at);
      else groups.push([at]);
    }
    const of = (at: number): number => groups.findIndex((group) => groupOf[group[0]!] === groupOf[next[at]!]);
    const [p, q] = [of(a), of(b)];
    [groups[p], groups[q]] = [groups[q]!, groups[p]!];
    return groups.flat();
  }
  [next[a], next[b]] = [next[b]!, next[a]!];
  return next;
}
