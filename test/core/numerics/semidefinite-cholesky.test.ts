import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  factorSemidefinite,
  forwardSemidefinite,
  inverseSemidefinite,
  nullVectors,
  solveSemidefinite
} from '#lib/core/numerics/semidefinite-cholesky.ts';
import { multiply, multiplyVector } from '#lib/core/numerics/symmetric-products.ts';

/** XᵀX of an n×p matrix. */
function gram(x: number[][], p: number): Float64Array {
  const a = new Float64Array(p * p);
  for (const row of x) for (let i = 0; i < p; i++) for (let j = 0; j < p; j++) a[i * p + j]! += row[i]! * row[j]!;
  return a;
}

const matrix = fc.integer({ min: 1, max: 6 }).chain((p) =>
  fc.record({
    p: fc.constant(p),
    x: fc.array(fc.array(fc.integer({ min: -3, max: 3 }), { minLength: p, maxLength: p }), {
      minLength: 1,
      maxLength: 8
    })
  })
);

describe('factorSemidefinite', () => {
  it('factorSemidefinite(A) gives back A as L·Lᵀ for a known matrix', () => {
    // By hand: [[4,2,2],[2,5,3],[2,3,6]] = L·Lᵀ with L = [[2],[1,2],[1,1,2]].
    const { L, rank, logDet } = factorSemidefinite(Float64Array.from([4, 2, 2, 2, 5, 3, 2, 3, 6]), 3);
    expect([...L]).toEqual([2, 0, 0, 1, 2, 0, 1, 1, 2]);
    expect(rank).toBe(3);
    expect(logDet).toBeCloseTo(Math.log(64), 14);
  });

  it('factorSemidefinite(A) leaves out a column that repeats an earlier one', () => {
    const a = gram(
      [
        [1, 1, 0],
        [2, 2, 1],
        [0, 0, 3]
      ],
      3
    );
    const factor = factorSemidefinite(a, 3);
    expect([...factor.kept]).toEqual([1, 0, 1]);
    const [v] = nullVectors(factor);
    expect([...v!]).toEqual([-1, 1, 0]);
  });

  it('solveSemidefinite(factor, A·x) reproduces A·x, whatever the rank', () => {
    fc.assert(
      fc.property(matrix, fc.array(fc.integer({ min: -5, max: 5 }), { minLength: 6, maxLength: 6 }), ({ p, x }, v) => {
        const a = gram(x, p);
        const factor = factorSemidefinite(a, p);
        const b = multiplyVector(a, Float64Array.from(v.slice(0, p)));
        const back = multiplyVector(a, solveSemidefinite(factor, b));
        for (let i = 0; i < p; i++) expect(back[i]).toBeCloseTo(b[i]!, 8);
      })
    );
  });

  it('inverseSemidefinite(factor) satisfies A·G·A = A and G·A·G = G', () => {
    fc.assert(
      fc.property(matrix, ({ p, x }) => {
        const a = gram(x, p);
        const g = inverseSemidefinite(factorSemidefinite(a, p));
        const aga = multiply(multiply(a, g, p), a, p);
        const gag = multiply(multiply(g, a, p), g, p);
        for (let i = 0; i < p * p; i++) {
          expect(aga[i]).toBeCloseTo(a[i]!, 7);
          expect(gag[i]).toBeCloseTo(g[i]!, 7);
        }
      })
    );
  });

  it('nullVectors(factor) are as many as the rank lacks, and A maps each to zero', () => {
    fc.assert(
      fc.property(matrix, ({ p, x }) => {
        const a = gram(x, p);
        const factor = factorSemidefinite(a, p);
        const nulls = nullVectors(factor);
        expect(nulls.length).toBe(p - factor.rank);
        for (const v of nulls) for (const y of multiplyVector(a, v)) expect(Math.abs(y)).toBeLessThan(1e-8);
      })
    );
  });

  it('forwardSemidefinite(factor, Xᵀy) squares to the sequential sums of squares', () => {
    // Two orthogonal columns: each sum of squares is (xᵀy)²/(xᵀx).
    const a = gram(
      [
        [1, 1],
        [1, -1]
      ],
      2
    );
    const z = forwardSemidefinite(factorSemidefinite(a, 2), Float64Array.from([6, 2]));
    expect(z[0]! ** 2).toBeCloseTo(18, 12);
    expect(z[1]! ** 2).toBeCloseTo(2, 12);
  });

  it('factorSemidefinite(A) with a scale treats rounding noise as zero', () => {
    const { rank } = factorSemidefinite(Float64Array.from([1e-15]), 1, Float64Array.from([4]));
    expect(rank).toBe(0);
  });

  it('factorSemidefinite(A, size) throws with both sizes when they do not fit', () => {
    expect(() => factorSemidefinite(new Float64Array(3), 2)).toThrow('expected 2×2 = 4 numbers, got 3');
  });
});
