import { inverse } from 'ml-matrix';
import { expect, test } from 'vitest';
import { crossProduct, momentsOf } from '#lib/core/analysis/model/moments.ts';
import { distance, irregular, modelMatrix, sessionMatrix } from '../dense-model.ts';
import { tableOf } from '../kept-model.ts';

// The other route: the same projections written out n×n with ml-matrix.
const table = tableOf(irregular);
const moments = momentsOf(table);
const X = modelMatrix(table);
const Z = sessionMatrix(table);
const onSessions = Z.mmul(inverse(Z.transpose().mmul(Z))).mmul(Z.transpose());

test('momentsOf(table).within is the cross product of X less its session means', () => {
  const within = X.transpose().mmul(X.clone().sub(onSessions.mmul(X)));
  expect(distance(moments.within, within)).toBeLessThan(1e-14);
});

test('momentsOf(table).bySize holds the session sums of X, size by size', () => {
  expect(moments.bySize.map(({ k, count }) => [k, count])).toEqual([
    [3, 2],
    [4, 2],
    [2, 2]
  ]);
  for (const [at, { k, between }] of moments.bySize.entries()) {
    const sessions = [...moments.sizeOf.keys()].filter((j) => moments.sizeOf[j] === at);
    const sums = Z.transpose().mmul(X).subMatrixRow(sessions);
    expect(distance(between, sums.transpose().mmul(sums).div(k))).toBeLessThan(1e-14);
  }
});

test('crossProduct(moments) is XᵀX, and its diagonal is kept beside it', () => {
  const XX = X.transpose().mmul(X);
  expect(distance(crossProduct(moments), XX)).toBeLessThan(1e-14);
  expect([...moments.diagonal]).toEqual(XX.diagonal());
});
