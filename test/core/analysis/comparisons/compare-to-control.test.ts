import { expect, test } from 'vitest';
import { compareToControl } from '#lib/core/analysis/comparisons/compare-to-control.ts';
import { oneWay } from './one-way.ts';

// C. W. Dunnett (1955), JASA 50, 1096-1121, example of blood counts (from memory): control and two drugs.
const readings = [
  [7.4, 8.5, 7.2, 8.24, 9.84, 8.32],
  [9.76, 8.8, 7.68, 9.36],
  [12.8, 9.68, 12.16, 9.2, 10.55]
];
const means = readings.map((r) => r.reduce((s, y) => s + y, 0) / r.length);
const squares = readings.reduce((sum, r, i) => sum + r.reduce((s, y) => s + (y - means[i]!) ** 2, 0), 0);
const bloodCounts = oneWay(
  means,
  Math.sqrt(squares / 12),
  readings.map((r) => r.length),
  12
);

test('compareToControl(source, 0, 0.05) gives the allowances of Dunnett’s example', () => {
  const result = compareToControl(bloodCounts, 0, 0.05, 1);
  if (!result.ok) throw new Error(result.error.tag);
  const { lines, critical, method } = result.value;
  expect(method).toBe('quadrature');
  // Printed: s 1.175, t 2.50 (table for equal numbers), allowances 1.90 and 1.78, so only drug B differs.
  expect(Math.abs(critical - 2.5)).toBeLessThan(0.02);
  expect((lines[0]!.upper - lines[0]!.lower) / 2).toBeCloseTo(1.9, 1);
  expect((lines[1]!.upper - lines[1]!.lower) / 2).toBeCloseTo(1.78, 1);
  expect(lines.map((line) => line.pDunnett < 0.05)).toEqual([false, true]);
});

test('compareToControl(source, …) covers zero exactly when its p exceeds alpha', () => {
  const source = oneWay([0, 1, 2, 3, 1.5, -2], 1, [5, 5, 4, 6, 3, 5], 20);
  const result = compareToControl(source, 0, 0.05, 1);
  if (!result.ok) throw new Error(result.error.tag);
  for (const line of result.value.lines) {
    expect(line.lower > 0 || line.upper < 0).toBe(line.pDunnett < 0.05);
    expect(line.pDunnett).toBeGreaterThanOrEqual(line.p);
  }
});

test('compareToControl(source, …) names the treatments that no shared session joins to the control', () => {
  const source = { ...oneWay([0, 1, 2, 3], 1, [5, 5, 5, 5], 16), present: [0, 1, 3] };
  const parted = { ...source, estimable: (a: number, b: number) => (a === 3) === (b === 3) };
  const result = compareToControl(parted, 0, 0.05, 1);
  if (!result.ok) throw new Error(result.error.tag);
  expect(result.value.lost).toEqual([2, 3]);
  expect(result.value.lines.map((line) => line.treatment)).toEqual([1]);
});

test('compareToControl(source, …) refuses a control without readings and readings without scatter', () => {
  const source = oneWay([0, 1, 2], 1, [5, 5, 5], 12);
  expect(compareToControl({ ...source, present: [1, 2] }, 0, 0.05, 1)).toEqual({
    ok: false,
    error: { tag: 'control-without-readings' }
  });
  expect(compareToControl(oneWay([0, 1, 2], 0, [5, 5, 5], 12), 0, 0.05, 1)).toEqual({
    ok: false,
    error: { tag: 'no-scatter' }
  });
});
