import { expect, test } from 'vitest';
import { compareToBest } from '#lib/core/analysis/comparisons/compare-to-best.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { normalQuantile } from '#lib/core/numerics/distributions/normal.ts';
import { tUpperQuantile } from '#lib/core/numerics/distributions/student-t.ts';
import { oneWay } from './one-way.ts';

const lines = (result: ReturnType<typeof compareToBest>) => {
  if (!result.ok) throw new Error(result.error.tag);
  return result.value.lines;
};

test('compareToBest(source, higher, 0.05) is Hsu’s formula with the printed one-sided Dunnett value', () => {
  // Five means of 5, error df 20: one-sided 5 % value for 4 comparisons, printed 2.30 in Dunnett's table (1955).
  const means = [10, 12, 15, 14.5, 9];
  const result = compareToBest(oneWay(means, 1, [5, 5, 5, 5, 5], 20), 'higher', 0.05);
  if (!result.ok) throw new Error(result.error.tag);
  expect(Math.abs(result.value.critical - 2.3)).toBeLessThan(0.00501);
  const allowance = result.value.critical * Math.sqrt(2 / 5);
  means.forEach((mean, i) => {
    const rest = Math.max(...means.filter((_, j) => j !== i));
    const line = result.value.lines[i]!;
    expect(line.lower).toBeCloseTo(Math.min(0, mean - rest - allowance), 8);
    expect(line.upper).toBeCloseTo(Math.max(0, mean - rest + allowance), 8);
  });
  expect(result.value.lines.map((line) => line.mayBeBest)).toEqual([false, false, true, true, false]);
});

test('compareToBest(source, lower) mirrors higher', () => {
  const means = [3, 4.2, 2.9, 6];
  const down = lines(compareToBest(oneWay(means, 1, [4, 6, 5, 5], 16), 'lower', 0.05));
  const up = lines(
    compareToBest(
      oneWay(
        means.map((m) => -m),
        1,
        [4, 6, 5, 5],
        16
      ),
      'higher',
      0.05
    )
  );
  down.forEach((line, i) => {
    expect(line.lower).toBeCloseTo(-up[i]!.upper, 12);
    expect(line.upper).toBeCloseTo(-up[i]!.lower, 12);
    expect([line.mayBeBest, line.isBest]).toEqual([up[i]!.mayBeBest, up[i]!.isBest]);
  });
});

test('compareToBest(two treatments) is the one-sided t interval', () => {
  const [first, second] = lines(compareToBest(oneWay([5, 3], 1, [6, 6], 10), 'higher', 0.05));
  const half = tUpperQuantile(0.05, 10) * Math.sqrt(2 / 6);
  expect(first!.upper).toBeCloseTo(2 + half, 9);
  expect(first!.lower).toBe(0);
  expect(first!.isBest).toBe(true);
  expect(second!.lower).toBeCloseTo(-2 - half, 9);
  expect(second!.upper).toBe(0);
});

test('compareToBest(source, …) covers all true differences in at least 95 % of campaigns with unequal replication', () => {
  const random = seededRandom('coverage of the best');
  const truth = [0, 0.3, 0.3, -0.5];
  const replication = [3, 6, 4, 8];
  const campaigns = 300;
  let covered = 0;
  for (let c = 0; c < campaigns; c++) {
    const means = truth.map((m, i) => m + normalQuantile(random.next()) / Math.sqrt(replication[i]!));
    const found = lines(compareToBest(oneWay(means, 1, replication, Infinity), 'higher', 0.05));
    const all = found.every(({ lower, upper }, i) => {
      const gap = truth[i]! - Math.max(...truth.filter((_, j) => j !== i));
      return gap >= lower && gap <= upper;
    });
    if (all) covered++;
  }
  // Three standard errors below 95 %.
  expect(covered / campaigns).toBeGreaterThan(0.95 - 3 * Math.sqrt((0.95 * 0.05) / campaigns));
});

test('compareToBest(source, …) refuses a design in parts and a single treatment', () => {
  const source = oneWay([0, 1, 2], 1, [5, 5, 5], 12);
  expect(compareToBest({ ...source, estimable: (a, b) => a === b }, 'lower', 0.05)).toEqual({
    ok: false,
    error: { tag: 'disconnected', parts: 3 }
  });
  expect(compareToBest({ ...source, present: [1] }, 'lower', 0.05)).toEqual({
    ok: false,
    error: { tag: 'one-treatment', treatment: 1 }
  });
});
