import fc from 'fast-check';
import { Matrix, SingularValueDecomposition } from 'ml-matrix';
import { expect, test } from 'vitest';
import { momentsOf } from '#lib/core/analysis/model/moments.ts';
import { partsOf } from '#lib/core/analysis/model/parts.ts';
import { observations, tableOf } from '../kept-model.ts';

test('partsOf(table) joins treatments that meet through others and numbers parts by their first treatment', () => {
  const table = tableOf(
    observations([
      [0, 0, 1],
      [2, 0, 1],
      [4, 1, 1],
      [1, 1, 1],
      [2, 2, 1],
      [5, 2, 1]
    ])
  );
  const parts = partsOf(table);
  expect(parts.count).toBe(2);
  // Treatment 3 was never run.
  expect([...parts.ofTreatment]).toEqual([0, 1, 0, -1, 1, 0]);
  expect([...parts.ofSession]).toEqual([0, 1, 0]);
});

test('partsOf(table).count is the number of treatments less the rank of the information matrix', () => {
  // Rank by singular values: J. A. John & E. R. Williams (1995), Cyclic and Computer Generated Designs, §1.
  const run = fc.tuple(fc.nat(5), fc.nat(4), fc.constant(0));
  fc.assert(
    fc.property(fc.array(run, { minLength: 1, maxLength: 14 }), (runs) => {
      const table = tableOf(observations(runs));
      const { within, p } = momentsOf(table);
      const present = [...new Set(runs.map(([i]) => i))];
      const C = new Matrix(present.map((i) => present.map((j) => within[i * p + j]!)));
      const rank = new SingularValueDecomposition(C).diagonal.filter((v) => v > 1e-10).length;
      expect(partsOf(table).count).toBe(present.length - rank);
    }),
    { numRuns: 60 }
  );
});
