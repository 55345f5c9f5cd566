import { expect, test } from 'vitest';
import { rowDiagnostics } from '#lib/core/analysis/diagnostics/row-diagnostics.ts';
import { treatmentScatter } from '#lib/core/analysis/diagnostics/treatment-scatter.ts';
import { solveFixed } from '#lib/core/analysis/fixed/fit-fixed.ts';
import { momentsOf } from '#lib/core/analysis/model/moments.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import { observations, tableOf } from '../kept-model.ts';

const groups = [
  [12, 15, 11, 14],
  [22, 20, 27, 19, 25],
  [8, 8.5, 9, 7, 7.5, 8.2]
];
/** All in one session: the model is then the one-way layout. */
const oneWay = observations(groups.flatMap((group, i) => group.map((y) => [i, 0, y] as const)));

function scatterOf(input: Observations) {
  const table = tableOf(input);
  const fixed = solveFixed(table, momentsOf(table));
  return treatmentScatter(table, rowDiagnostics(fixed));
}

test('treatmentScatter of a one-way layout gives each group’s standard deviation and R’s F', () => {
  // R 4.2.2: tapply(y, g, sd); anova(lm(abs(rstandard(lm(y ~ g))) ~ g)).
  const { lines, test: tested } = scatterOf(oneWay);
  [1.8257418583505538, 3.3615472627943221, 0.71180521680208741].forEach((sd, i) =>
    expect(lines[i]!.sd).toBeCloseTo(sd, 12)
  );
  expect(lines.map((line) => line.n)).toEqual([4, 5, 6]);
  if (!tested.ok) throw new Error(tested.error.tag);
  expect(tested.value).toMatchObject({ df1: 2, df2: 12 });
  expect(tested.value.F).toBeCloseTo(7.84937, 5);
  expect(tested.value.p).toBeCloseTo(0.0066119, 7);
});

test('treatmentScatter does not test where fewer than two treatments have two residuals', () => {
  const { lines, test: tested } = scatterOf(
    observations([
      [0, 0, 1],
      [0, 0, 3],
      [0, 0, 4],
      [1, 0, 2]
    ])
  );
  expect(lines.map((line) => line.sd === null)).toEqual([false, true]);
  expect(tested).toMatchObject({ ok: false, error: { tag: 'too-few-readings' } });
});
