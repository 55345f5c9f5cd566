import { inverse, Matrix } from 'ml-matrix';
import { expect, test } from 'vitest';
import { momentsOf } from '#lib/core/analysis/model/moments.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import { solveRandom, type RandomModel } from '#lib/core/analysis/random/fit-random.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { campaignOf, drawReadings, spreadDesign } from '../../../simulation/simulate-campaign.ts';
import { distance, irregular } from '../dense-model.ts';
import { tableOf } from '../kept-model.ts';
import { writtenOut } from './dense-random.ts';

function solved(input: Observations): RandomModel {
  const table = tableOf(input);
  const model = solveRandom(table, momentsOf(table));
  if (!model.ok) throw new Error(model.error.tag);
  return model.value;
}
const spread = campaignOf(spreadDesign(6, 9, 3, seededRandom('variance')), [2, 11]);
const cases: [string, Observations][] = [
  ['sessions of unequal size', drawReadings(spread, [0, 1, 2, 0, 1, 2], 2, seededRandom('information'))],
  ['slots in the model, treatments repeated', irregular]
];

test.each(cases)('varianceInformation(%s) is that of the formulas written out n×n', (_, input) => {
  // S. R. Searle, G. Casella & C. E. McCulloch (1992), Variance Components, §6.6: ½·tr(PV_iPV_j) and yᵀPV_iPV_jPy − ½·tr.
  const model = solved(input);
  const { info } = model;
  const { P, y, by, X, Vi, Phi, sigma2 } = writtenOut(model);
  const expected = by.map((A) => by.map((B) => P.mmul(A).mmul(P).mmul(B).trace() / 2));
  const form = (A: Matrix, B: Matrix) => y.transpose().mmul(P).mmul(A).mmul(P).mmul(B).mmul(P).mmul(y).get(0, 0);
  const observed = by.map((A, i) => by.map((B, j) => form(A, B) - expected[i]![j]!));
  const scale = 1 / sigma2 ** 2;
  for (const [own, dense] of [
    [info.expected!, inverse(new Matrix(expected))],
    [info.observed!, inverse(new Matrix(observed))]
  ] as const) {
    const wanted = [dense.get(0, 0), dense.get(0, 1), dense.get(1, 1)].map((v) => v * scale);
    own.forEach((v, i) => expect(v / wanted[i]!).toBeCloseTo(1, 8));
  }
  // G = −Φ·∂(XᵀV⁻¹X)/∂σ_b²·Φ, in units where σ² = 1.
  const G = Phi.mmul(X.transpose()).mmul(Vi).mmul(by[0]).mmul(Vi).mmul(X).mmul(Phi);
  expect(distance(info.G, G)).toBeLessThan(1e-9);
});

test.each(cases)('solveRandom(%s) stands where the restricted likelihood, written out, is highest', (_, input) => {
  const model = solved(input);
  const { P, y, by } = writtenOut(model);
  // Both scores vanish: yᵀPV_iPy = tr(PV_i).
  for (const A of by) {
    const quadratic = y.transpose().mmul(P).mmul(A).mmul(P).mmul(y).get(0, 0);
    expect(quadratic / P.mmul(A).trace()).toBeCloseTo(1, 8);
  }
});
