import { expect, test } from 'vitest';
import { latticeVector } from '#lib/core/numerics/distributions/lattice.ts';

test('latticeVector(n, d) integrates a smooth function of eight variables better than its size would by chance', () => {
  const n = 251;
  const z = latticeVector(n, 8);
  let sum = 0;
  for (let k = 0; k < n; k++) {
    let product = 1;
    for (const zj of z) {
      const x = ((k * zj) % n) / n;
      product *= 1 + 0.2 * Math.cos(2 * Math.PI * x);
    }
    sum += product;
  }
  // The integral is 1; by chance the error would be sqrt((1.02^8 - 1)/251) = 0.026.
  expect(Math.abs(sum / n - 1)).toBeLessThan(1e-3);
});

test('latticeVector(n, d) starts with the vector of fewer dimensions', () => {
  expect([...latticeVector(61, 5).slice(0, 3)]).toEqual([...latticeVector(61, 3)]);
});
