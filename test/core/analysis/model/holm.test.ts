import fc from 'fast-check';
import { expect, test } from 'vitest';
import { holm } from '#lib/core/analysis/model/holm.ts';

test('holm(p) gives the values of R', () => {
  // R 4.2.2: p.adjust(c(0.01, 0.04, 0.03, 0.005, 0.2), "holm").
  [0.04, 0.09, 0.09, 0.025, 0.2].forEach((p, i) => expect(holm([0.01, 0.04, 0.03, 0.005, 0.2])[i]).toBeCloseTo(p, 15));
  expect(holm([])).toEqual([]);
  expect(holm([0.3])).toEqual([0.3]);
});

test('holm(p) rejects at every alpha what the step-down procedure rejects', () => {
  // S. Holm (1979): reject in ascending order while p_(j) ≤ alpha/(m − j + 1).
  const p = fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 1, maxLength: 8 });
  fc.assert(
    fc.property(p, fc.double({ min: 0.001, max: 0.999, noNaN: true }), (values, alpha) => {
      const order = values.map((_, i) => i).sort((a, b) => values[a]! - values[b]!);
      const stop = order.findIndex((i, step) => (values.length - step) * values[i]! > alpha);
      const rejected = new Set(stop < 0 ? order : order.slice(0, stop));
      holm(values).forEach((adjusted, i) => expect(adjusted <= alpha).toBe(rejected.has(i)));
    })
  );
});
