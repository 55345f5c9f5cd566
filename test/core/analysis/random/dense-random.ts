import { inverse, Matrix } from 'ml-matrix';
import type { RandomModel } from '#lib/core/analysis/random/fit-random.ts';
import { columnsOf, modelMatrix, sessionMatrix } from '../dense-model.ts';

/** The model with sessions random written out n×n, at the ratio that was found: V = σ²(I + γ·ZZᵀ). */
export function writtenOut({ problem, maximum }: RandomModel) {
  const { gamma, sigma2 } = maximum.point;
  const X = columnsOf(modelMatrix(problem.table), [...problem.columns]);
  const Z = sessionMatrix(problem.table);
  const ZZ = Z.mmul(Z.transpose());
  const I = Matrix.eye(problem.n);
  const V = Matrix.add(I, Matrix.mul(ZZ, gamma)).mul(sigma2);
  const Vi = inverse(V);
  const Phi = inverse(X.transpose().mmul(Vi).mmul(X));
  const P = Matrix.sub(Vi, Vi.mmul(X).mmul(Phi).mmul(X.transpose()).mmul(Vi));
  const y = Matrix.columnVector([...problem.table.y]);
  return { X, Vi, Phi, P, y, by: [ZZ, I] as const, sigma2 };
}
