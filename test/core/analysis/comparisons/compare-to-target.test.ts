import { expect, test } from 'vitest';
import { compareToBest } from '#lib/core/analysis/comparisons/compare-to-best.ts';
import { normalQuantile } from '#lib/core/numerics/distributions/normal.ts';
import { tukeyUpperQuantile } from '#lib/core/numerics/distributions/tukey.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { oneWay } from './one-way.ts';

const towards = (means: number[], target: number, replication: number[], df = Infinity) => {
  const source = oneWay(means, 1, replication, df);
  const result = compareToBest(source, { target }, 0.05, source.means);
  if (!result.ok) throw new Error(result.error.tag);
  return result.value.lines;
};

test('compareToBest(source, far target) is Tukey–Kramer of the differences, the target one more mean', () => {
  // All means far above the target: distances differ as the means do.
  const half = (tukeyUpperQuantile(0.05, 4, 20) / Math.SQRT2) * Math.sqrt(2 / 5);
  const [a, b, c] = towards([100, 103, 106], 0, [5, 5, 5], 20);
  expect(a!.lower).toBeCloseTo(-3 - half, 8);
  expect(a!.isBest).toBe(true);
  expect(b!.upper).toBeCloseTo(3 + half, 8);
  expect(b!.mayBeBest).toBe(false);
  expect(c!.upper).toBeCloseTo(6 + half, 8);
});

test('compareToBest(source, target) does not prefer either side of the target', () => {
  const [above, below, off] = towards([51, 49, 60], 50, [9, 9, 9], 24);
  expect(above!.lower).toBeCloseTo(below!.lower, 10);
  expect(above!.upper).toBeCloseTo(below!.upper, 10);
  expect([above!.mayBeBest, below!.mayBeBest, off!.mayBeBest]).toEqual([true, true, false]);
});

test('compareToBest(source, target) covers all true distances in at least 95 % of campaigns', () => {
  const random = seededRandom('coverage of the nearest');
  const truth = [0.2, -0.4, 0.6];
  const replication = [4, 4, 4];
  const campaigns = 300;
  let covered = 0;
  for (let c = 0; c < campaigns; c++) {
    const means = truth.map((m, i) => m + normalQuantile(random.next()) / Math.sqrt(replication[i]!));
    const all = towards(means, 0, replication).every(({ lower, upper }, i) => {
      const others = truth.filter((_, j) => j !== i).map(Math.abs);
      const gap = Math.abs(truth[i]!) - Math.min(...others);
      return gap >= lower && gap <= upper;
    });
    if (all) covered++;
  }
  expect(covered / campaigns).toBeGreaterThan(0.95 - 3 * Math.sqrt((0.95 * 0.05) / campaigns));
});
