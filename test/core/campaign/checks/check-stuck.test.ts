import { expect, it } from 'vitest';
import { checkStuck, probabilityOfEqual } from '#lib/core/campaign/checks/check-stuck.ts';

/** Exact: sum over the steps k of (probability of step k)^n, by numerical integration of the normal density over each step. */
function exact(n: number, d: number, s: number): number {
  const density = (x: number) => Math.exp(-0.5 * (x / s) ** 2) / (s * Math.sqrt(2 * Math.PI));
  let sum = 0;
  for (let k = -400; k <= 400; k++) {
    let p = 0;
    for (let i = 0; i < 20; i++) p += (density(k * d + ((i + 0.5) / 20 - 0.5) * d) * d) / 20;
    sum += p ** n;
  }
  return sum;
}

it.each([
  [2, 0.1, 1],
  [3, 0.1, 1],
  [4, 0.2, 1],
  [3, 0.0001, 0.002]
])('probabilityOfEqual(%d, %d, %d) agrees with the sum over all steps', (n, d, s) => {
  expect(probabilityOfEqual(n, d, s)).toBeCloseTo(exact(n, d, s), 4);
  expect(probabilityOfEqual(n, d, s) / exact(n, d, s)).toBeCloseTo(1, 2);
});

it('probabilityOfEqual(n, d, 0) is 1 and no probability passes 1', () => {
  expect(probabilityOfEqual(5, 1, 0)).toBe(1);
  expect(probabilityOfEqual(3, 100, 1)).toBe(1);
});

it('checkStuck(value, before) speaks when a fine instrument repeats itself', () => {
  expect(checkStuck(84.2131, [84.2131, 84.2131], 0.0001, 0.5)).toEqual({ check: 'stuck', value: 84.2131, times: 3 });
});

it('checkStuck(value, before) is silent when the step is coarse against the scatter', () => {
  expect(checkStuck(84, [84, 84], 1, 0.5)).toBeNull();
});

it('checkStuck(value, before) is silent at two in a row, and after another value between', () => {
  expect(checkStuck(84.2131, [84.2131], 0.0001, 0.5)).toBeNull();
  expect(checkStuck(84.2131, [84.2131, 84.2131, 84.5, 84.2131], 0.0001, 0.5)).toBeNull();
});

it('checkStuck(value, before) takes the scatter from readings that differ, from four on', () => {
  const differing = [84.1, 85.2, 83.7, 84.9];
  expect(checkStuck(84.2, [...differing, 84.2, 84.2], 0.001, null)?.check).toBe('stuck');
  expect(checkStuck(84.2, [...differing.slice(1), 84.2, 84.2], 0.001, null)).toBeNull();
});

it('checkStuck(value, before) is silent where the resolution is not known', () => {
  expect(checkStuck(84.2, [84.2, 84.2, 84.2], null, 0.5)).toBeNull();
});
