import { Matrix, pseudoInverse, SingularValueDecomposition } from 'ml-matrix';
import { expect, test } from 'vitest';
import { efficiencyOf } from '#lib/core/analysis/design-summary/efficiency.ts';
import { momentsOf } from '#lib/core/analysis/model/moments.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { campaignOf, spreadDesign } from '../../../simulation/simulate-campaign.ts';
import { irregular, modelMatrix, sessionMatrix } from '../dense-model.ts';
import { tableOf } from '../kept-model.ts';

const of = (input: Parameters<typeof tableOf>[0]) => {
  const table = tableOf(input);
  return { table, efficiency: efficiencyOf(table, momentsOf(table)) };
};

test('efficiencyOf(balanced 7 in 3) is λt/(rk) for every contrast, and each difference has variance 2k/(λt)', () => {
  // F. Yates (1936), Annals of Eugenics 7, 121–140: E = 7/9; variance 6/7.
  const { efficiency } = of(campaignOf(Array.from({ length: 7 }, (_, j) => [0, 1, 3].map((d) => (d + j) % 7))));
  expect(efficiency.canonical).toEqual(new Array(6).fill(expect.closeTo(7 / 9, 12)));
  const { average, min, max, efficiency: pairwise } = efficiency.pairVariance!;
  for (const v of [average, min, max]) expect(v).toBeCloseTo(6 / 7, 12);
  expect(pairwise).toBeCloseTo(7 / 9, 12);
});

test.each([
  ['sessions alone', campaignOf(spreadDesign(9, 11, 4, seededRandom('efficiency')))],
  ['sessions and slots', irregular]
])('efficiencyOf(%s) agrees with singular values and the pseudo-inverse of the matrices written out', (_, input) => {
  const { table, efficiency } = of(input);
  const t = table.terms[0]!.size;
  const X = modelMatrix(table);
  const T = X.subMatrixColumn([...Array(t).keys()]);
  const others = [...Array(table.p - t).keys()].map((c) => t + c);
  const Z = sessionMatrix(table);
  const rest = new Matrix(Z.to2DArray().map((line, i) => [...line, ...others.map((c) => X.get(i, c))]));
  const C = T.transpose().mmul(T.clone().sub(rest.mmul(pseudoInverse(rest)).mmul(T)));
  const r = T.transpose().mmul(T).diagonal();
  const scaled = new Matrix(C.to2DArray().map((line, i) => line.map((v, j) => v / Math.sqrt(r[i]! * r[j]!))));
  const values = new SingularValueDecomposition(scaled).diagonal.sort((a, b) => a - b).slice(1);
  expect(efficiency.canonical).toEqual(values.map((v) => expect.closeTo(v, 10)));
  const V = pseudoInverse(C);
  const variances = r.flatMap((_, i) =>
    r.flatMap((__, j) => (i < j ? [V.get(i, i) + V.get(j, j) - 2 * V.get(i, j)] : []))
  );
  const mean = variances.reduce((s, v) => s + v, 0) / variances.length;
  expect(efficiency.pairVariance!.average).toBeCloseTo(mean, 10);
  expect(efficiency.pairVariance!.min).toBeCloseTo(Math.min(...variances), 10);
  expect(efficiency.pairVariance!.max).toBeCloseTo(Math.max(...variances), 10);
});

test('efficiencyOf(a design in parts) counts a zero for each part and has no pair variance', () => {
  const { efficiency } = of(
    campaignOf([
      [0, 1],
      [2, 3],
      [1, 0],
      [3, 2]
    ])
  );
  expect(efficiency).toMatchObject({ zeros: 2, pairVariance: null });
});
