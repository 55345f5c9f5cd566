import { expect, test } from 'vitest';
import { hadamardMatrix } from '#lib/core/design/catalogue/constructions/hadamard.ts';

test.each([1, 2, 4, 8, 12, 16, 20, 24, 28, 32, 36, 40, 44, 48, 52, 56, 60, 64, 100])(
  'hadamardMatrix(%i) has entries ±1 and orthogonal rows',
  (n) => {
    const h = hadamardMatrix(n)!;
    const products = h.map((x) => h.map((y) => x.reduce((sum, value, i) => sum + value * y[i]!, 0)));
    expect(h.flat().every((x) => x === 1 || x === -1)).toBe(true);
    expect(products).toEqual(h.map((_, i) => h.map((__, j) => (i === j ? n : 0))));
  }
);

test('hadamardMatrix(n) gives null where n is not 1, 2 or a multiple of 4, and for 92, which needs other means', () => {
  // Baumert, Golomb & Hall (1962), Bull. Amer. Math. Soc. 68, 237: 92 was the smallest order beyond Paley's methods.
  expect([3, 6, 10, 18, 92].map(hadamardMatrix)).toEqual([null, null, null, null, null]);
});
