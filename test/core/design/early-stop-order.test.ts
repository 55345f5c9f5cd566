import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { chanceOrder, earlyStop, earlyStopOrder } from '#lib/core/design/early-stop-order.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';

interface OrderCase {
  v: number;
  b: number;
  blocks: number[][];
  earliest_connected_prefix: number;
  upper_bound_sum?: number;
  max_sum: { blocks: number[][]; rel_A_per_prefix: number[]; sum: number };
}
const file = new URL('../../reference/designs/order.json', import.meta.url);
const cases = (JSON.parse(readFileSync(file, 'utf8')) as { cases: Partial<OrderCase>[] }).cases.filter(
  (one): one is OrderCase => one.max_sum !== undefined && one.blocks !== undefined
);

describe('earlyStop', () => {
  test.each(cases)('earlyStop(order of $v in $b) equals the reference per prefix', ({ v, max_sum }) => {
    const stop = earlyStop(max_sum.blocks, v);
    max_sum.rel_A_per_prefix.forEach((value, m) => expect(Math.abs(stop.efficiency[m]! - value)).toBeLessThan(1e-7));
    expect(Math.abs(stop.sum - max_sum.sum)).toBeLessThan(1e-9);
  });
});

describe('earlyStopOrder', () => {
  test.each(cases)('earlyStopOrder($v in $b) connects as early as can be and comes near the best sum', (one) => {
    const order = earlyStopOrder(one.blocks, one.v, null, seededRandom(`${one.v} ${one.b}`));
    expect([...order].sort((a, b) => a - b)).toEqual([...one.blocks.keys()]);
    const stop = earlyStop(
      order.map((at) => one.blocks[at]!),
      one.v
    );
    expect(stop.connectedAfter).toBe(one.earliest_connected_prefix);
    expect(stop.sum).toBeGreaterThan(0.98 * one.max_sum.sum);
    expect(stop.sum).toBeLessThan((one.upper_bound_sum ?? one.b) + 1e-5);
  });

  test('earlyStopOrder(blocks) of a design that is never connected is still an order', () => {
    const order = earlyStopOrder([[0, 1], [2, 3]], 4, null, seededRandom('apart')); // prettier-ignore
    expect([...order].sort()).toEqual([0, 1]);
    expect(earlyStopOrder([], 4, null, seededRandom('none'))).toEqual([]);
  });

  test('chanceOrder(sessions, groups) gives each of the eight grouped orders of four equally often', () => {
    const random = seededRandom('grouped');
    const counts = new Map<string, number>();
    for (let i = 0; i < 8000; i++) {
      const key = chanceOrder(4, [0, 0, 1, 1], random).join('');
      counts.set(key, (counts.get(key) ?? 0) + 1);
    }
    expect(counts.size).toBe(8);
    const chiSquare = [...counts.values()].reduce((sum, count) => sum + (count - 1000) ** 2 / 1000, 0);
    expect(chiSquare).toBeLessThan(24.322); // chi-square, 7 df, upper 0.001 point: any table
  });
});
