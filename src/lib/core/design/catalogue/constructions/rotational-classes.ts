import type { Construction } from '../candidate.ts';
import { consecutiveClasses } from './round-robin.ts';

/** Search steps before giving up. */
const ALLOWANCE = 200_000;

/**
 * Resolvable designs with r = t − 1 and λ = k − 1 from one parallel class on Z_(t−1) and a fixed treatment, whose
 * differences meet each non-zero element k − 1 times: turning it t − 1 times gives all classes.
 *
 * Source: R. C. Bose (1939), Ann. Eugenics 9, section 4 (differences with a fixed treatment); classes: I. Anderson (1997),
 * Combinatorial Designs and Tournaments, chapter 5.
 * Checked by: test/core/design/catalogue/resolution/resolvable-design.test.ts
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

/** Z_n and a fixed point n in blocks of k, every non-zero difference k − 1 times, or null. */
function baseClass(n: number, k: number): number[][] | null {
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

  const fill = (from: number): boolean => {
    const block = blocks.at(-1)!;
    if (block.length === k) {
      const next = placed.indexOf(0);
      if (next === -1) return true;
      placed[next] = 1;
      blocks.push([next]);
      if (fill(next + 1)) return true;
      blocks.pop();
      placed[next] = 0;
      return false;
    }
    for (let x = from; x < n; x++) {
      if (placed[x] === 1) continue;
      if (++steps > ALLOWANCE) return false;
      if (count(x, block, 1)) {
        placed[x] = 1;
        block.push(x);
        if (fill(x + 1)) return true;
        block.pop();
        placed[x] = 0;
      }
      count(x, block, -1);
    }
    return false;
  };
  return fill(0) ? blocks : null;
}
