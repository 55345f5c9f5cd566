import type { Blocks } from '../blocks.ts';

/**
 * Every choice of k of the t treatments, in lexicographic order: C(t, k) sessions, always balanced.
 *
 * @param t number of treatments
 * @param k treatments a session, 0 ≤ k ≤ t
 * Cost: k·C(t, k).
 *
 * Source: D. E. Knuth (2011), The Art of Computer Programming 4A, section 7.2.1.3, algorithm L.
 * Checked by: test/core/design/catalogue/all-combinations.test.ts
 */
export function allCombinations(t: number, k: number): Blocks {
  const blocks: number[][] = [];
  const chosen = Array.from({ length: k }, (_, i) => i);
  for (;;) {
    blocks.push([...chosen]);
    let i = k - 1;
    while (i >= 0 && chosen[i] === t - k + i) i -= 1;
    if (i < 0) return blocks;
    chosen[i]! += 1;
    for (let j = i + 1; j < k; j++) chosen[j] = chosen[j - 1]! + 1;
  }
}

/** C(t, k), the number of ways to choose k of t. */
export function combinationCount(t: number, k: number): number {
  let count = 1;
  for (let i = 1; i <= Math.min(k, t - k); i++) count = (count * (t - i + 1)) / i;
  return Math.round(count);
}
