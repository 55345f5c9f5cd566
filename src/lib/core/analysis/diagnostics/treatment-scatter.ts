import { fUpper } from '../../numerics/distributions/f.ts';
import { fail, ok } from '../../result.ts';
import type { FTest, RowDiagnostics, TreatmentScatter } from '../check-result.ts';
import { treatmentOfRun, type RunTable } from '../model/run-table.ts';
import type { Section } from '../reason.ts';

/**
 * Returns the scatter of each treatment, s_i = √(Σe²/Σ(1 − h)) over its runs, and an analysis of variance of the absolute
 * internally studentised residuals by treatment.
 *
 * The test is approximate: the residuals are correlated. Source: H. Levene (1960), in Contributions to Probability and
 * Statistics, 278–292, applied to residuals (common practice, no source).
 * Checked by: test/core/analysis/diagnostics/treatment-scatter.test.ts
 *
 * @param rows diagnostics in the order of the runs of the table
 */
export function treatmentScatter(table: RunTable, rows: readonly RowDiagnostics[]): TreatmentScatter {
  const t = table.terms[0]!.size;
  const groups = Array.from({ length: t }, () => ({ n: 0, squares: 0, freedom: 0, sizes: [] as number[] }));
  rows.forEach(({ residual, leverage, standardized }, i) => {
    const group = groups[treatmentOfRun(table, i)]!;
    group.n++;
    if (standardized === null) return;
    group.squares += residual ** 2;
    group.freedom += 1 - leverage;
    group.sizes.push(Math.abs(standardized));
  });
  return {
    lines: groups.map(({ n, squares, freedom, sizes }, treatment) => ({
      treatment,
      n,
      sd: sizes.length < 2 ? null : Math.sqrt(squares / freedom)
    })),
    test: oneWay(groups.map(({ sizes }) => sizes).filter((sizes) => sizes.length >= 2))
  };
}

function oneWay(groups: readonly (readonly number[])[]): Section<FTest> {
  const n = groups.reduce((s, group) => s + group.length, 0);
  const df1 = groups.length - 1;
  const df2 = n - groups.length;
  if (df1 < 1) return fail({ tag: 'too-few-readings', have: n, need: 4 });
  const mean = (v: readonly number[]): number => v.reduce((s, x) => s + x, 0) / v.length;
  const grand = mean(groups.flat());
  const between = groups.reduce((s, group) => s + group.length * (mean(group) - grand) ** 2, 0);
  const within = groups.reduce((s, group) => {
    const m = mean(group);
    return s + group.reduce((q, v) => q + (v - m) ** 2, 0);
  }, 0);
  if (!(within > 1e-20 * grand ** 2)) return fail({ tag: 'no-scatter' });
  const F = between / df1 / (within / df2);
  return ok({ df1, df2, F, p: fUpper(F, df1, df2) });
}
