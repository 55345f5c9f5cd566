import { expect, test } from 'vitest';
import { testEquivalence } from '#lib/core/analysis/comparisons/test-equivalence.ts';
import { tUpperQuantile } from '#lib/core/numerics/distributions/student-t.ts';
import { oneWay } from './one-way.ts';

test('testEquivalence(source, control, margin, alpha) is equivalent when the 1 − 2 alpha interval lies inside', () => {
  const source = oneWay([10, 10.2, 10.9, 9.1, 8], 0.5, [6, 6, 6, 6, 6], 25);
  const result = testEquivalence(source, 0, 1, 0.05);
  if (!result.ok) throw new Error(result.error.tag);
  expect(result.value.lines.map((line) => line.equivalent)).toEqual([true, false, false, false]);
  for (const line of result.value.lines) {
    expect(line.equivalent).toBe(line.lower >= -1 && line.upper <= 1);
    expect(line.p).toBe(Math.max(line.pLower, line.pUpper));
  }
});

test('testEquivalence(source, …) rejects at alpha exactly at the printed t value', () => {
  // One-sided 5 % point of t with 10 df: 1.812 in every handbook.
  const se = Math.sqrt(2 / 6);
  const source = oneWay([0, 1 - 1.812461 * se], 1, [6, 6], 10);
  const result = testEquivalence(source, 0, 1, 0.05);
  if (!result.ok) throw new Error(result.error.tag);
  expect(result.value.lines[0]!.pUpper).toBeCloseTo(0.05, 6);
  expect(tUpperQuantile(0.05, 10)).toBeCloseTo(1.812461, 6);
});

test('testEquivalence(source, …) refuses a margin that is none', () => {
  const source = oneWay([0, 1], 1, [6, 6], 10);
  expect(testEquivalence(source, 0, 0, 0.05)).toEqual({ ok: false, error: { tag: 'no-margin' } });
});
