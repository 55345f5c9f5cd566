import { seededRandom } from '../../../numerics/random/seeded-random.ts';
import type { Construction } from '../candidate.ts';
import { consecutiveClasses } from './round-robin.ts';

/** Tries before giving up, and steps of each; every try after the first goes in a drawn order. */
const TRIES = 60;
const STEPS = 2000;

/**
 * Resolvable designs with r = t − 1 and λ = k − 1 from one parallel class on Z_(t−1) and a fixed treatment, whose
 * differences meet each non-zero element k − 1 times: turning it t − 1 times gives all classes.
 *
 * Source: R. C. Bose (1939), Ann. Eugenics 9, section 4 (differences with a fixed treatment); classes: I. Anderson (1997),
 * Combinatorial Designs and Tournaments, chapter 5.
 * Checked by: test/core/design/catalogue/constructions/families.test.ts
 */
export const rotationalClasses: Construction = ({ t, k, r, lambda }) => {
  if (k < 3 || t % k !== 0 || lambda !== k - 1) return null;
  const base = baseClass(t - 1, k);
  if (!base) return null;
  const n = t - 1;
  const classes = Array.from({ length: n }, (_, g) =>
    base.map((block) => block.map((x) => (x === n ? n : (x + g) % n)).sort((a, b) => a - b))
  );
  return {
    blocks: classes.flat(),
    construction: `The parallel class ${base.map((block) => `{${block.join(', ')}}`).join(' ')} turned through Z_${n}, treatment ${n} fixed.`,
    constructionId: 'rotational-classes',
    source: 'I. Anderson (1997), Combinatorial Designs and Tournaments, Oxford University Press, chapter 5',
    resolution: consecutiveClasses(t, k, r)
  };
};

/** Z_n and a fixed point n in blocks of k, every non-zero difference k − 1 times, or null when no try finds one. */
function baseClass(n: number, k: number): number[][] | null {
  for (let attempt = 0; attempt < TRIES; attempt++) {
    const order = Array.from({ length: n }, (_, x) => x);
    if (attempt > 0) seededRandom(attempt).shuffle(order);
    const found = depthFirst(n, k, order);
    if (found.blocks || !found.gaveUp) return found.blocks;
  }
  return null;
}

/** One try: blocks are filled one after the other, elements tried in the given order. */
function depthFirst(n: number, k: number, order: readonly number[]): { blocks: number[][] | null; gaveUp: boolean } {
  const times = new Int32Array(n);
  const placed = new Uint8Array(n);
  const blocks: number[][] = [[n]];
  let steps = 0;

  /** Counts the differences of x to the block, `by` one more or one less; false when one comes too often. */
  const count = (x: number, block: readonly number[], by: number): boolean => {
    let fits = true;
    for (const y of block) {
      if (y === n) continue;
      const difference = (x - y + n) % n;
      times[difference]! += by;
      times[n - difference]! += by;
      if (times[difference]! > k - 1) fits = false;
    }
    return fits;
  };

  const open = (): boolean => {
    const next = order.findIndex((x) => placed[x] === 0);
    if (next === -1) return true;
    placed[order[next]!] = 1;
    blocks.push([order[next]!]);
    if (fill(next + 1)) return true;
    blocks.pop();
    placed[order[next]!] = 0;
    return false;
  };

  const fill = (from: number): boolean => {
    const block = blocks.at(-1)!;
    if (block.length === k) return open();
    for (let i = from; i < n; i++) {
      const x = order[i]!;
      if (placed[x] === 1) continue;
      if (++steps > STEPS) return false;
      if (count(x, block, 1)) {
        placed[x] = 1;
        block.push(x);
        if (fill(i + 1)) return true;
        block.pop();
        placed[x] = 0;
      }
      count(x, block, -1);
    }
    return false;
  };
  return fill(0) ? { blocks, gaveUp: false } : { blocks: null, gaveUp: steps > STEPS };
}
