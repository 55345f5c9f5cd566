import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { edgeColouring } from '#lib/core/design/edge-colouring.ts';
import { layOutSlots } from '#lib/core/design/slot-layout.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';

interface PositionCase {
  id: string;
  category: string;
  subkind: string;
  t: number;
  k: number;
  blocks: number[][];
  block_sizes?: number[];
  min_imbalance?: number;
  min_range?: number;
  best_found?: number;
}

const { cases } = JSON.parse(
  readFileSync(new URL('../../reference/designs/efficiency.json', import.meta.url), 'utf8')
) as { cases: PositionCase[] };
const positions = cases.filter((one) => one.category === 'position');

/** Slots 1 … k_j in service in a session of k_j, as the reference cases have it. */
const firstSlots = (blocks: readonly number[][]): boolean[][] => {
  const slots = Math.max(...blocks.map((block) => block.length));
  return blocks.map((block) => Array.from({ length: slots }, (_, slot) => slot < block.length));
};

/** t treatments, b sessions of sizes up to `slots` drawn at random. */
const randomDesign = (seed: number, full: boolean) => {
  const random = seededRandom(`design ${seed}`);
  const t = 2 + random.below(20);
  const slots = 2 + random.below(Math.min(t - 1, 9));
  const blocks = Array.from({ length: 1 + random.below(30) }, () =>
    random.shuffle([...Array(t).keys()]).slice(0, full ? slots : 1 + random.below(slots))
  );
  return { t, slots, blocks };
};

describe('edgeColouring', () => {
  test('edgeColouring(...) refuses fewer colours than the largest degree', () => {
    expect(() => edgeColouring([0, 0], [0, 1], 1, 2, 1, seededRandom('x'))).toThrow(RangeError);
  });

  test('edgeColouring(...) gives edges that meet different colours', () => {
    for (let seed = 0; seed < 50; seed++) {
      const random = seededRandom(seed);
      const n = 1 + random.below(8);
      const pairs = [...Array(n * n).keys()].filter(() => random.below(2) === 0);
      const [left, right] = [pairs.map((pair) => pair % n), pairs.map((pair) => Math.floor(pair / n))];
      const colour = edgeColouring(left, right, n, n, n, random);
      const seen = new Set<string>();
      pairs.forEach((_, edge) => {
        for (const end of [`l${left[edge]}`, `r${right[edge]}`]) {
          expect(colour[edge]! >= 0 && colour[edge]! < n).toBe(true);
          expect(seen.has(`${end} ${colour[edge]}`)).toBe(false);
          seen.add(`${end} ${colour[edge]}`);
        }
      });
    }
  });
});

describe('layOutSlots', () => {
  test('layOutSlots(...) keeps counts within one on 1000 random designs, full or not', () => {
    for (let seed = 0; seed < 1000; seed++) {
      const { t, slots, blocks } = randomDesign(seed, seed % 2 === 0);
      const layout = layOutSlots(
        blocks,
        blocks.map(() => Array<boolean>(slots).fill(true)),
        t,
        seededRandom(seed)
      );
      expect(layout.range).toBeLessThanOrEqual(1);
      layout.rows.forEach((row, j) => {
        const there = row.filter((i) => i !== null).sort((a, b) => a - b);
        expect(there).toEqual([...blocks[j]!].sort((a, b) => a - b));
      });
      const counted = Array.from({ length: t }, (_, i) =>
        Array.from({ length: slots }, (_, p) => layout.rows.filter((row) => row[p] === i).length)
      );
      expect(layout.counts).toEqual(counted);
      expect(Math.max(...counted.map((row) => Math.max(...row) - Math.min(...row)))).toBe(layout.range);
    }
  });

  test('layOutSlots(...) says exact when replication is a multiple of the slots', () => {
    const blocks = [[0, 1], [1, 2], [2, 0]]; // prettier-ignore
    const layout = layOutSlots(
      blocks,
      blocks.map(() => [true, true]),
      3,
      seededRandom('exact')
    );
    expect(layout.balance).toBe('exact');
    expect(layout.counts).toEqual([[1, 1], [1, 1], [1, 1]]); // prettier-ignore
  });

  test('layOutSlots(...) leaves a slot that is out of service empty', () => {
    const layout = layOutSlots([[0, 1], [1, 0]], [[true, false, true], [true, false, true]], 2, seededRandom('gap')); // prettier-ignore
    expect(layout.rows.map((row) => row[1])).toEqual([null, null]);
    expect(layout.balance).toBe('exact');
  });

  test('layOutSlots(...) refuses a session larger than its slots', () => {
    expect(() => layOutSlots([[0, 1, 2]], [[true, true]], 3, seededRandom('x'))).toThrow(RangeError);
  });

  test.each(positions.filter((one) => one.subkind === 'position'))(
    'layOutSlots($id) attains the certified minimum of imbalance',
    (one) => {
      const layout = layOutSlots(one.blocks, firstSlots(one.blocks), one.t, seededRandom(one.id));
      expect(layout.imbalance).toBeCloseTo(one.min_imbalance!, 9);
      expect(layout.range).toBe(one.min_range);
    }
  );

  test.each(positions.filter((one) => one.subkind === 'position-unequal'))(
    'layOutSlots($id) reaches the best known imbalance where slots in service differ',
    (one) => {
      const layout = layOutSlots(one.blocks, firstSlots(one.blocks), one.t, seededRandom(one.id));
      expect(layout.balance).toBe('near');
      expect(layout.imbalance).toBeLessThanOrEqual(one.best_found! + 1e-9);
    }
  );
});
