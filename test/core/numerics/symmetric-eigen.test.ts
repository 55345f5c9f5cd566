import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { symmetricEigen } from '#lib/core/numerics/symmetric-eigen.ts';
import { multiplyVector } from '#lib/core/numerics/symmetric-products.ts';

describe('symmetricEigen', () => {
  it('symmetricEigen(I + J) of order 4 gives 1, 1, 1, 5', () => {
    const a = Float64Array.from({ length: 16 }, (_, i) => (i % 5 === 0 ? 2 : 1));
    const { values } = symmetricEigen(a, 4);
    [1, 1, 1, 5].forEach((v, i) => expect(values[i]).toBeCloseTo(v, 13));
  });

  it('symmetricEigen(second differences of order 3) gives 2 − √2, 2 and 2 + √2', () => {
    const { values } = symmetricEigen(Float64Array.of(2, -1, 0, -1, 2, -1, 0, -1, 2), 3);
    [2 - Math.SQRT2, 2, 2 + Math.SQRT2].forEach((v, i) => expect(values[i]).toBeCloseTo(v, 12));
    expect(() => symmetricEigen(new Float64Array(3), 2)).toThrow(RangeError);
  });

  it('symmetricEigen(A) gives orthonormal vectors with A·v = λ·v, ascending', () => {
    const symmetric = fc.integer({ min: 1, max: 7 }).chain((n) =>
      fc.array(fc.double({ min: -10, max: 10, noNaN: true }), { minLength: n * n, maxLength: n * n }).map((v) => ({
        n,
        a: Float64Array.from(v, (_, i) => v[Math.min(i, (i % n) * n + Math.floor(i / n))]!)
      }))
    );
    fc.assert(
      fc.property(symmetric, ({ n, a }) => {
        const { values, vectors } = symmetricEigen(a, n);
        for (let i = 0; i < n; i++) {
          const v = vectors.slice(i * n, (i + 1) * n);
          if (i > 0) expect(values[i]!).toBeGreaterThanOrEqual(values[i - 1]!);
          multiplyVector(a, v).forEach((y, k) => expect(y).toBeCloseTo(values[i]! * v[k]!, 9));
          for (let j = 0; j <= i; j++) {
            const w = vectors.slice(j * n, (j + 1) * n);
            expect(v.reduce((s, y, k) => s + y * w[k]!, 0)).toBeCloseTo(i === j ? 1 : 0, 10);
          }
        }
      })
    );
  });
});
