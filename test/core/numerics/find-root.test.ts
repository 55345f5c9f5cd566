import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findRoot } from '#lib/core/numerics/find-root.ts';

describe('findRoot', () => {
  it('findRoot(x² − 2, 0, 2) gives √2 to the last digits', () => {
    const { root, converged } = findRoot((x) => x * x - 2, 0, 2);
    expect(root).toBeCloseTo(Math.SQRT2, 15);
    expect(converged).toBe(true);
  });

  it('findRoot finds the root of a cubic inside any bracket that holds it', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -50, max: 50, noNaN: true }),
        fc.double({ min: 1e-6, max: 100, noNaN: true }),
        fc.double({ min: 1e-6, max: 100, noNaN: true }),
        (at, left, right) => {
          const { root } = findRoot((x) => (x - at) * (1 + (x - at) ** 2), at - left, at + right);
          expect(Math.abs(root - at)).toBeLessThan(1e-12 * Math.max(1, Math.abs(at)));
        }
      )
    );
  });

  it('findRoot returns the end of the bracket when it is a root', () => {
    expect(findRoot((x) => x, 0, 5).root).toBe(0);
    expect(findRoot((x) => x - 5, 0, 5).root).toBe(5);
  });

  it('findRoot throws with both values where the sign does not change', () => {
    expect(() => findRoot((x) => x * x + 1, -1, 1)).toThrow('expected a change of sign, got f(-1) = 2');
  });
});
