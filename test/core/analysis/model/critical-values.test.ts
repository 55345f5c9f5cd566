import { expect, test } from 'vitest';
import { criticalValues } from '#lib/core/analysis/model/critical-values.ts';
import { tQuantile } from '#lib/core/numerics/distributions/student-t.ts';
import { tukeyUpperQuantile } from '#lib/core/numerics/distributions/tukey.ts';

test.each([
  [12, 12, 3, 3],
  [5.5, 8.4, 7, 400],
  [200, 290, 40, 800],
  [1.2, 9, 4, 100],
  [30, 30 * (1 + 1e-13), 5, 10],
  [8.408100000000006, 8.408100000000008, 7, 21],
  [8.779100000000012, 8.779100000000014, 7, 21],
  [13.9, 13.9 * (1 + 3e-14), 7, 21],
  [13.9, 13.9 * (1 + 2e-11), 7, 21],
  [13.9, 13.9 * (1 + 1e-9), 7, 21]
])('criticalValues for df in [%d, %d] are the quantiles to nine digits', (from, to, means, many) => {
  const critical = criticalValues(0.05, means, from, to, many);
  for (let i = 0; i <= 20; i++) {
    const df = from + ((to - from) * i) / 20;
    expect(Math.abs(critical.t(df) / tQuantile(0.975, df) - 1)).toBeLessThan(1e-9);
    const q = tukeyUpperQuantile(0.05, means, df) / Math.SQRT2;
    expect(Math.abs(critical.tukey(df) / q - 1)).toBeLessThan(1e-9);
  }
});

test('criticalValues are those of printed tables', () => {
  // Textbooks' tables of t and of the studentised range, 5 % (from memory): t 2.228, q(3, 10) 3.88.
  const critical = criticalValues(0.05, 3, 10, 10, 3);
  expect(critical.t(10)).toBeCloseTo(2.228, 3);
  expect(Math.abs(critical.tukey(10) * Math.SQRT2 - 3.88)).toBeLessThan(0.00501);
});
