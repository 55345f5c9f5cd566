import { inverse, Matrix } from 'ml-matrix';
import { expect, test } from 'vitest';
import { momentsOf } from '#lib/core/analysis/model/moments.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import { fitRandom, solveRandom } from '#lib/core/analysis/random/fit-random.ts';
import { kenwardRogerCovariance } from '#lib/core/analysis/random/kenward-roger.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { campaignOf, drawReadings, spreadDesign } from '../../../simulation/simulate-campaign.ts';
import { distance, irregular } from '../dense-model.ts';
import { tableOf } from '../kept-model.ts';
import { writtenOut } from './dense-random.ts';

const spread = campaignOf(spreadDesign(6, 9, 3, seededRandom('kenward')), [4, 9, 10]);
const cases: [string, Observations][] = [
  ['sessions of unequal size', drawReadings(spread, [0, 1, 2, 0, 1, 2], 2, seededRandom('roger'))],
  ['slots in the model, treatments repeated', irregular]
];

// The formulas of M. G. Kenward & J. H. Roger (1997), Biometrics 53, 983–997, written out n×n with ml-matrix:
// P_i = −XᵀV⁻¹V_iV⁻¹X, Q_ij = XᵀV⁻¹V_iV⁻¹V_jV⁻¹X, W the inverse of ½·tr(PV_iPV_j).
test.each(cases)('kenwardRogerCovariance and its F (%s) are those of the formulas written out', (_, input) => {
  const table = tableOf(input);
  const model = solveRandom(table, momentsOf(table));
  if (!model.ok) throw new Error(model.error.tag);
  const { X, Vi, Phi, P, y, by, sigma2 } = writtenOut(model.value);
  const W = inverse(new Matrix(by.map((A) => by.map((B) => P.mmul(A).mmul(P).mmul(B).trace() / 2))));
  const inner = (A: Matrix) => X.transpose().mmul(Vi).mmul(A).mmul(Vi);
  const Pi = by.map((A) => inner(A).mmul(X).mul(-1));
  const sum = Matrix.zeros(Phi.rows, Phi.rows);
  by.forEach((A, i) =>
    by.forEach((B, j) => {
      const Q = inner(A).mmul(B).mmul(Vi).mmul(X);
      sum.add(Matrix.sub(Q, Pi[i]!.mmul(Phi).mmul(Pi[j]!)).mul(W.get(i, j)));
    })
  );
  const adjusted = Matrix.add(Phi, Phi.mmul(sum).mmul(Phi).mul(2));
  const { info } = model.value;
  expect(distance(kenwardRogerCovariance(info, info.expected!), Matrix.mul(adjusted, 1 / sigma2))).toBeLessThan(1e-8);

  // Degrees of freedom and scale of the F test of all treatment differences, p. 987.
  const t = input.treatments.length;
  const r = t - 1;
  const L = Matrix.zeros(r, Phi.rows);
  for (let i = 0; i < r; i++) {
    L.set(i, i + 1, 1);
    L.set(i, 0, -1);
  }
  const Theta = L.transpose()
    .mmul(inverse(L.mmul(Phi).mmul(L.transpose())))
    .mmul(L);
  const TP = Pi.map((own) => Theta.mmul(Phi).mmul(own).mmul(Phi));
  let A1 = 0;
  let A2 = 0;
  TP.forEach((A, i) =>
    TP.forEach((B, j) => {
      A1 += W.get(i, j) * A.trace() * B.trace();
      A2 += W.get(i, j) * A.mmul(B).trace();
    })
  );
  const B = (A1 + 6 * A2) / (2 * r);
  const g = ((r + 1) * A1 - (r + 4) * A2) / ((r + 2) * A2);
  const base = 3 * r + 2 * (1 - g);
  const [c1, c2, c3] = [g / base, (r - g) / base, (r + 2 - g) / base];
  const E = 1 / (1 - A2 / r);
  const V = ((2 / r) * (1 + c1 * B)) / ((1 - c2 * B) ** 2 * (1 - c3 * B));
  const rho = V / (2 * E ** 2);
  const denDf = 4 + (r + 2) / (r * rho - 1);
  const scale = denDf / (E * (denDf - 2));
  const beta = Phi.mmul(X.transpose()).mmul(Vi).mmul(y);
  const Lb = L.mmul(beta);
  const wald = Lb.transpose()
    .mmul(inverse(L.mmul(adjusted).mmul(L.transpose())))
    .mmul(Lb)
    .get(0, 0);
  const fit = fitRandom(model.value, 0.05);
  if (!fit.ok) throw new Error(fit.error.tag);
  const test = fit.value.kenwardRoger.tests.find(({ source }) => source === 'treatment')!;
  expect(test.numDf).toBe(r);
  expect(test.denDf / denDf).toBeCloseTo(1, 7);
  expect(test.F / ((scale * wald) / r)).toBeCloseTo(1, 7);
});
