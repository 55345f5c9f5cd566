import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { criticalT, detectableRatio, pairPower } from '#lib/core/design/detectable-difference.ts';
import { noncentralTCdf } from '#lib/core/numerics/distributions/noncentral-t.ts';
import { tUpper } from '#lib/core/numerics/distributions/student-t.ts';

const columns = (
  JSON.parse(readFileSync(new URL('../../reference/tables/table_t_noncentral.json', import.meta.url), 'utf8')) as {
    columns: { q: number[]; df: number[]; ncp: number[]; lower: number[]; upper: number[] };
  }
).columns;
const rows = columns.q.map((q, at) => ({
  q,
  df: columns.df[at]!,
  ncp: columns.ncp[at]!,
  lower: columns.lower[at]!,
  upper: columns.upper[at]!
}));
/** P(T ≤ −q): from the table where it has the row, else computed; it is the small part of the power. */
const far = ({ q, df, ncp }: (typeof rows)[number]): number =>
  rows.find((row) => row.q === -q && row.df === df && row.ncp === ncp)?.lower ?? noncentralTCdf(-q, df, ncp);

describe('detectableRatio', () => {
  const usable = rows.filter((row) => row.q > 0 && row.ncp >= 2.5 && row.upper > 0.3 && row.upper < 0.999);

  test.each(usable)('detectableRatio(q $q, df $df) finds the non-centrality $ncp of the reference table', (row) => {
    const alpha = 2 * tUpper(row.q, row.df);
    expect(criticalT(alpha, row.df, { tag: 'unadjusted' })).toBeCloseTo(row.q, 9);
    const power = row.upper + far(row);
    expect(Math.abs(detectableRatio(row.q, row.df, power) / row.ncp - 1)).toBeLessThan(1e-6);
    expect(Math.abs(pairPower(row.ncp, row.q, row.df) - power)).toBeLessThan(1e-6);
  });

  test('the table has enough such rows', () => expect(usable.length).toBeGreaterThan(15));

  test('detectableRatio(critical, df, power) comes near the normal value for many degrees of freedom', () => {
    // z(0.975) + z(0.8) = 1.959964 + 0.841621, any normal table
    expect(detectableRatio(1.959963985, 1e7, 0.8)).toBeCloseTo(2.801585, 4);
  });

  test('detectableRatio(critical, df, power) is zero when chance alone gives the power, and grows with it', () => {
    const critical = criticalT(0.05, 10, { tag: 'unadjusted' });
    expect(detectableRatio(critical, 10, 0.05 - 1e-9)).toBe(0);
    expect(detectableRatio(critical, 10, 0.9)).toBeGreaterThan(detectableRatio(critical, 10, 0.8));
    expect(() => detectableRatio(critical, 10, 1)).toThrow(RangeError);
  });

  test('criticalT(alpha, df, tukey) is q/√2 of the range table, and that of Student for two means', () => {
    // q(0.05; 4 means, 5 df) = 5.22, any table of the studentised range
    expect(criticalT(0.05, 5, { tag: 'tukey', means: 4 })).toBeCloseTo(5.218 / Math.SQRT2, 2);
    expect(criticalT(0.05, 7, { tag: 'tukey', means: 2 })).toBeCloseTo(criticalT(0.05, 7, { tag: 'unadjusted' }), 8);
  });
});
