import { expect, test } from 'vitest';
import { powerScale } from '#lib/core/analysis/diagnostics/power-scale.ts';
import { solveFixed } from '#lib/core/analysis/fixed/fit-fixed.ts';
import { momentsOf } from '#lib/core/analysis/model/moments.ts';
import { partsOf } from '#lib/core/analysis/model/parts.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import { fixedOf, observations, tableOf } from '../kept-model.ts';

function scaleOf(input: Observations) {
  const table = tableOf(input);
  return powerScale(solveFixed(table, momentsOf(table)), partsOf(table), 0.05);
}

// G. E. P. Box & D. R. Cox (1964), survival times (10 h): 4 treatments × 3 poisons × 4 (data set of R's package boot).
const times = [
  [0.31, 0.45, 0.46, 0.43, 0.36, 0.29, 0.4, 0.23, 0.22, 0.21, 0.18, 0.23],
  [0.82, 1.1, 0.88, 0.72, 0.92, 0.61, 0.49, 1.24, 0.3, 0.37, 0.38, 0.29],
  [0.43, 0.45, 0.63, 0.76, 0.44, 0.35, 0.31, 0.4, 0.23, 0.25, 0.24, 0.22],
  [0.45, 0.71, 0.66, 0.62, 0.56, 1.02, 0.71, 0.38, 0.3, 0.36, 0.31, 0.33]
];
const survival = observations(times.flatMap((line, i) => line.map((y, k) => [i, Math.floor(k / 4), y] as const)));

test('powerScale(survival times) finds the published power and interval, and goes on with the reciprocal', () => {
  // Box & Cox: λ̂ = −0.75, taken as −1. R 4.2.2, MASS::boxcox(time ~ poison + treat): −0.7502, 95 % −1.1380 to −0.3561.
  const scale = scaleOf(survival);
  if (!scale.ok) throw new Error(scale.error.tag);
  const { lambda, lower, upper, chosen, refit } = scale.value;
  expect(Math.abs(lambda + 0.7502)).toBeLessThan(1e-4);
  expect(Math.abs(lower! + 1.138)).toBeLessThan(2e-4);
  expect(Math.abs(upper! + 0.3561)).toBeLessThan(2e-4);
  expect(chosen).toBe(-1);
  expect(refit).not.toBeNull();
});

test('powerScale(readings whose logarithms are additive) repeats the analysis on them, and turns the means back', () => {
  const logs = survival.rows.map((_, i) => 3 + Math.sin(7 * i) / 4 + survival.rows[i]!.treatment);
  const raw = { ...survival, rows: survival.rows.map((row, i) => ({ ...row, y: Math.exp(logs[i]!) })) };
  const scale = scaleOf(raw);
  if (!scale.ok || scale.value.refit === null) throw new Error('no refit');
  expect(scale.value.chosen).toBe(0);
  const onLogs = fixedOf({ ...survival, rows: survival.rows.map((row, i) => ({ ...row, y: logs[i]! })) });
  scale.value.refit.fit.pairs.forEach((line, i) => {
    expect(line.estimate).toBeCloseTo(onLogs.pairs[i]!.estimate!, 10);
    expect(line.p).toBeCloseTo(onLogs.pairs[i]!.p!, 10);
  });
  scale.value.refit.back.forEach(({ median, lower, upper }, i) => {
    const { estimate, lower: low, upper: high } = onLogs.means[i]!;
    expect([median, lower, upper]).toEqual([estimate, low, high].map((v) => expect.closeTo(Math.exp(v!), 7)));
  });
});

test('powerScale says why not: a reading that is not positive, readings in a narrow range', () => {
  const at = (change: (y: number, i: number) => number) =>
    scaleOf({ ...survival, rows: survival.rows.map((row, i) => ({ ...row, y: change(row.y!, i) })) });
  expect(at((y, i) => (i === 5 || i === 2 ? 0 : y))).toEqual({
    ok: false,
    error: { tag: 'not-positive', rows: [2, 5] }
  });
  expect(at((y) => 1e6 + y)).toMatchObject({ ok: false, error: { tag: 'narrow-range' } });
  expect(at((_, i) => 1 + survival.rows[i]!.treatment)).toMatchObject({ ok: false, error: { tag: 'no-scatter' } });
});
