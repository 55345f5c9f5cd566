import { describe, expect, it } from 'vitest';
import {
  dot,
  multiply,
  multiplyVector,
  quadraticForm,
  sandwich,
  traceOfProduct
} from '#lib/core/numerics/symmetric-products.ts';

// Small enough to multiply by hand.
const S = Float64Array.from([2, 1, 1, 3]);
const A = Float64Array.from([1, -1, -1, 2]);

describe('symmetric products', () => {
  it('multiply(S, A) gives the matrix product', () => {
    expect([...multiply(S, A, 2)]).toEqual([1, 0, -2, 5]);
  });

  it('sandwich(S, A) gives S·A·S, symmetric', () => {
    expect([...sandwich(S, A, 2)]).toEqual([2, 1, 1, 13]);
  });

  it('traceOfProduct(S, A) gives the trace of the product', () => {
    expect(traceOfProduct(S, A)).toBe(6);
  });

  it('multiplyVector, dot and quadraticForm agree', () => {
    const x = Float64Array.from([3, -2]);
    expect([...multiplyVector(S, x)]).toEqual([4, -3]);
    expect(quadraticForm(S, x)).toBe(dot(x, multiplyVector(S, x)));
    expect(quadraticForm(S, x)).toBe(18);
  });
});
