import { fail, ok } from '../../result.ts';
import { tTwoSided } from '../../numerics/distributions/student-t.ts';
import type { OutlierTest, RowDiagnostics } from '../check-result.ts';
import type { Section } from '../reason.ts';

/** Values that agree to this are ties: small balanced designs make the same residual in several rows. */
const TIE = 1e-8;

/**
 * Tests the largest externally studentised residual against t with errorDf − 1 degrees of freedom, times the number of
 * residuals tested (Bonferroni).
 *
 * Source: R. D. Cook & S. Weisberg (1982), Residuals and Influence in Regression, §2.2.2.
 * Checked by: test/reference-run
 */
export function outlierTest(rows: readonly RowDiagnostics[], errorDf: number): Section<OutlierTest> {
  const df = errorDf - 1;
  const tested = rows.flatMap(({ row, studentized }) => (studentized === null ? [] : [{ row, studentized }]));
  if (df < 1 || tested.length === 0) {
    return fail({ tag: 'no-error-degrees-of-freedom', runs: rows.length, parameters: rows.length - errorDf });
  }
  const largest = tested.reduce((a, b) => (Math.abs(b.studentized) > Math.abs(a.studentized) * (1 + TIE) ? b : a));
  const size = Math.abs(largest.studentized);
  const p = tTwoSided(size, df);
  return ok({
    row: largest.row,
    tiedRows: tested.flatMap(({ row, studentized }) => (Math.abs(studentized) >= size * (1 - TIE) ? [row] : [])),
    studentized: largest.studentized,
    df,
    p,
    pBonferroni: Math.min(1, p * tested.length),
    tests: tested.length
  });
}
