import { expect, test } from 'vitest';
import { bruckRyserChowla } from '#lib/core/design/catalogue/bruck-ryser-chowla.ts';

test('bruckRyserChowla(t, k, λ) excludes the symmetric sets that the theorem is known to exclude', () => {
  // Lander (1983), Symmetric Designs: An Algebraic Approach, appendix (from memory); planes of order 6, 14, 21, 22.
  const excluded = [
    [22, 7, 2], [29, 8, 2], [34, 12, 4], [43, 7, 1], [43, 15, 5], [46, 10, 2], [53, 13, 3], [67, 12, 2], [92, 14, 2],
    [106, 15, 2], [211, 15, 1], [463, 22, 1], [507, 23, 1]
  ] as const; // prettier-ignore
  expect(excluded.filter(([t, k, lambda]) => bruckRyserChowla(t, k, lambda) === null)).toEqual([]);
});

test('bruckRyserChowla(t, k, λ) lets pass symmetric sets that have designs, and the plane of order 10', () => {
  const passing = [
    [7, 3, 1], [11, 5, 2], [13, 4, 1], [15, 7, 3], [16, 6, 2], [19, 9, 4], [25, 9, 3], [31, 10, 3], [36, 15, 6],
    [37, 9, 2], [40, 13, 4], [45, 12, 3], [56, 11, 2], [71, 15, 3], [79, 13, 2], [91, 10, 1], [111, 11, 1]
  ] as const; // prettier-ignore
  expect(passing.map(([t, k, lambda]) => bruckRyserChowla(t, k, lambda))).toEqual(passing.map(() => null));
});

test('bruckRyserChowla(t, k, λ) never excludes a set whose equation has a solution that can be listed', () => {
  let solvable = 0;
  for (let lambda = 1; lambda <= 6; lambda++) {
    for (let k = lambda + 2; k <= 24; k++) {
      const t = 1 + (k * (k - 1)) / lambda;
      if (!Number.isInteger(t) || t % 2 === 0) continue;
      const sign = ((t - 1) / 2) % 2 === 0 ? 1 : -1;
      const hasSolution = Array.from({ length: 31 }, (_, y) => y).some((y) =>
        Array.from({ length: 31 }, (_, z) => z).some((z) => {
          const square = (k - lambda) * y * y + sign * lambda * z * z;
          return y + z > 0 && square >= 0 && Number.isInteger(Math.sqrt(square));
        })
      );
      // A quadratic form this small that can be solved at all has a solution this small (Holzer's theorem).
      expect([t, k, lambda, bruckRyserChowla(t, k, lambda) === null]).toEqual([t, k, lambda, hasSolution]);
      if (hasSolution) solvable += 1;
    }
  }
  expect(solvable).toBeGreaterThan(20);
});
