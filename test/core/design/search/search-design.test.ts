import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { aValue } from '#lib/core/design/a-value.ts';
import { isConnected } from '#lib/core/design/connected-parts.ts';
import { concurrenceRange, replications } from '#lib/core/design/concurrence.ts';
import { searchDesign } from '#lib/core/design/search/search-design.ts';
import { nearEqualReplication } from '#lib/core/design/search/search-problem.ts';
import type { SearchProblem } from '#lib/core/design/search/search-problem.ts';

interface EqualCase {
  id: string;
  category: string;
  t: number;
  b: number;
  k: number;
  near_equal: { A_value: number };
  free?: { A_value: number };
}
const { cases } = JSON.parse(
  readFileSync(new URL('../../../reference/designs/efficiency.json', import.meta.url), 'utf8')
) as { cases: EqualCase[] };

const problemOf = (t: number, sizes: number[], free = false): SearchProblem => ({
  t,
  sizes,
  controls: [],
  groupOf: null,
  replication: free
    ? { least: Array<number>(t).fill(1), most: Array<number>(t).fill(sizes.length) }
    : nearEqualReplication(
        sizes.reduce((a, b) => a + b, 0),
        Array<number>(t).fill(sizes.length)
      ),
  forbidden: null,
  weights: null
});

const found = (problem: SearchProblem, steps: number, seed: string, starts: number[][] = []) => {
  const { run, best } = searchDesign(problem, starts, steps, seed);
  for (const progress of run) expect(progress.allowed).toBe(steps);
  return best()!;
};

describe('searchDesign', () => {
  test('searchDesign(...) gives the same design for the same seed and steps', () => {
    const problem = problemOf(12, Array<number>(9).fill(4));
    expect(found(problem, 2000, 'a')).toEqual(found(problem, 2000, 'a'));
    expect(found(problem, 200, 'b').blocks).not.toEqual(found(problem, 200, 'a').blocks);
  });

  test('searchDesign(...) finds the balanced design where there is a small one', () => {
    const outcome = found(problemOf(7, Array<number>(7).fill(3)), 3000, 'plane');
    expect(concurrenceRange(outcome.blocks, 7)).toEqual({ min: 1, max: 1 });
    expect(outcome.value).toBeCloseTo(6 / 7, 10);
  });

  test('searchDesign(...) stopped early tells the best so far, whose value is that of a recount', () => {
    const { run, best } = searchDesign(problemOf(20, Array<number>(25).fill(4)), [], 100000, 'stop');
    let before = Infinity;
    for (let n = 0; n < 5; n++) {
      const { value } = run.next().value!;
      expect(value).toBeLessThanOrEqual(before);
      before = value;
    }
    const outcome = best()!;
    expect(Math.abs(outcome.value / aValue(outcome.blocks, 20) - 1)).toBeLessThan(1e-9);
  });

  test('searchDesign(...) never ends worse than a design it began with', () => {
    // The transversal design with four groups of five: treatment 5g + (x + g y mod 5), y = ∞ being the first group.
    const starts = [0, 1, 2, 3, 4].flatMap((x) => [0, 1, 2, 3, 4].flatMap((y) => [x, 5 + y, 10 + ((x + y) % 5), 15 + ((x + 2 * y) % 5)])); // prettier-ignore
    const outcome = found(problemOf(20, Array<number>(25).fill(4)), 500, 'start', [starts]);
    expect(outcome.value).toBeLessThanOrEqual(0.5122807018 + 1e-9); // reference O028
  });

  test('searchDesign(...) connects a design of just enough runs', () => {
    const outcome = found(problemOf(50, Array<number>(17).fill(4)), 1500, 'tree');
    expect(isConnected(outcome.blocks, 50)).toBe(true);
    const sharp = found(problemOf(16, Array<number>(5).fill(4)), 1500, 'sharp'); // 20 runs = 16 + 5 − 1
    expect(sharp.value).toBeCloseTo(4.4, 9); // reference O024
  });

  test('searchDesign(...) of too few runs finds nothing', () => {
    const { run, best } = searchDesign(problemOf(16, Array<number>(4).fill(4)), [], 1000, 'few');
    expect([...run]).toEqual([]);
    expect(best()).toBeNull();
  });

  test('searchDesign(...) keeps groups whole, controls in place and forbidden pairs apart', () => {
    const groupOf = [0, 0, 0, 1, 1, 1, 2, 2, 2];
    const grouped = found({ ...problemOf(12, Array<number>(9).fill(4)), groupOf }, 2000, 'groups');
    for (const group of [0, 1, 2]) {
      const held = grouped.blocks.filter((_, j) => groupOf[j] === group).flat();
      expect(held.sort((a, b) => a - b)).toEqual([...Array(12).keys()]);
    }
    const forbidden = new Uint8Array(81);
    for (const [i, l] of [[0, 1], [2, 3], [0, 4]]) forbidden[i! * 9 + l!] = forbidden[l! * 9 + i!] = 1; // prettier-ignore
    const apart = found({ ...problemOf(9, Array<number>(12).fill(3)), forbidden }, 2000, 'apart');
    for (const block of apart.blocks) {
      for (const [i, l] of [[0, 1], [2, 3], [0, 4]]) expect(block.includes(i!) && block.includes(l!)).toBe(false); // prettier-ignore
    }
    expect(replications(apart.blocks, 9)).toEqual(Array(9).fill(4));
    const controlled = found({ ...problemOf(7, Array<number>(6).fill(4)), controls: [0], replication: { least: [0, 3, 3, 3, 3, 3, 3], most: [6, 3, 3, 3, 3, 3, 3] } }, 2000, 'control'); // prettier-ignore
    expect(controlled.blocks.every((block) => block[0] === 0)).toBe(true);
    expect(replications(controlled.blocks, 7)).toEqual([6, 3, 3, 3, 3, 3, 3]);
  });

  test.each(cases.filter((one) => one.category === 'equal' && one.t <= 16))(
    'searchDesign($key) comes within 0.3 % of the best known A-value in few steps',
    ({ t, b, k, near_equal, free }) => {
      const near = found(problemOf(t, Array<number>(b).fill(k)), 12000, 'near');
      expect(near.value / near_equal.A_value).toBeLessThan(1.003);
      expect(Math.abs(near.value / aValue(near.blocks, t) - 1)).toBeLessThan(1e-9);
      if (!free) return;
      const any = found(problemOf(t, Array<number>(b).fill(k), true), 12000, 'free');
      expect(any.value / free.A_value).toBeLessThan(1.003);
    }
  );
});
