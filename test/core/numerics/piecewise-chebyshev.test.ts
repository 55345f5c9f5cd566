import { expect, test } from 'vitest';
import { PiecewiseChebyshev } from '#lib/core/numerics/piecewise-chebyshev.ts';

test('PiecewiseChebyshev.at(x) reproduces a smooth function across its pieces', () => {
  const table = new PiecewiseChebyshev((x) => Math.exp(-x) * Math.sin(x), 0, 10, 1.5, 15);
  for (let x = 0; x <= 10; x += 0.0371) {
    expect(Math.abs(table.at(x) - Math.exp(-x) * Math.sin(x))).toBeLessThan(1e-14);
  }
});

test('PiecewiseChebyshev.at(x) computes a piece only when it is asked for', () => {
  let calls = 0;
  const table = new PiecewiseChebyshev((x) => (calls++, x), 0, 10, 1, 3);
  table.at(4.5);
  table.at(4.6);
  expect(calls).toBe(4);
});
