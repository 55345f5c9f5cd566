import { finiteField } from '../../../numerics/finite-field.ts';
import type { Blocks } from '../../blocks.ts';
import type { Construction } from '../candidate.ts';
import { consecutiveClasses } from './round-robin.ts';

/**
 * A Hadamard matrix of order n (entries ±1, rows orthogonal), or null where none of the three constructions gives one:
 * Paley's first (n − 1 a prime power, 3 modulo 4), his second (n/2 − 1 a prime power, 1 modulo 4), doubling.
 *
 * Source: R. E. A. C. Paley (1933), On orthogonal matrices, J. Math. Phys. 12, 311–320; J. J. Sylvester (1867), Phil.
 * Mag. 34, 461–475 (doubling).
 * Checked by: test/core/design/catalogue/constructions/hadamard.test.ts
 */
export function hadamardMatrix(n: number): number[][] | null {
  if (n === 1) return [[1]];
  if (n === 2) return double([[1]]);
  if (n % 4 !== 0) return null;
  const first = conference(n - 1);
  // H = C + I, with C skew.
  if (first && n % 4 === 0) return first.map((row, i) => row.map((x, j) => (i === j ? 1 : x)));
  const second = n % 8 === 4 ? conference(n / 2 - 1) : null;
  // Each entry of the symmetric conference matrix becomes a 2 × 2 block.
  if (second) {
    return second.flatMap((row, i) => [
      row.flatMap((x, j) => (i === j ? [1, -1] : [x, x])),
      row.flatMap((x, j) => (i === j ? [-1, -1] : [x, -x]))
    ]);
  }
  const half = hadamardMatrix(n / 2);
  return half && double(half);
}

const double = (h: readonly number[][]): number[][] => [
  ...h.map((row) => [...row, ...row]),
  ...h.map((row) => [...row, ...row.map((x) => -x)])
];

/** Paley's conference matrix of order q + 1: skew for q ≡ 3, symmetric for q ≡ 1 modulo 4. */
function conference(q: number): number[][] | null {
  const field = q > 2 ? finiteField(q) : null;
  if (!field || q % 2 === 0) return null;
  const character = new Int8Array(q);
  for (let i = 0; i < q - 1; i++) character[field.power(i)] = i % 2 === 0 ? 1 : -1;
  const sign = q % 4 === 3 ? -1 : 1;
  return [
    [0, ...Array.from({ length: q }, () => 1)],
    ...Array.from({ length: q }, (_, x) => [
      sign,
      ...Array.from({ length: q }, (_, y) => character[field.add(y, field.negate(x))]!)
    ])
  ];
}

/** The matrix with its first row and first column made all ones. */
function normalised(h: readonly number[][]): number[][] {
  const columns = h[0]!;
  return h.map((row) => row.map((x, j) => x * columns[j]! * row[0]! * columns[0]!));
}

const SOURCE = 'R. E. A. C. Paley (1933), J. Math. Phys. 12, 311–320; J. A. Todd (1933), J. Math. Phys. 12, 321–333';

/** The symmetric design of t = 4m − 1 treatments, 2m − 1 to a session, λ = m − 1, of a Hadamard matrix of order 4m. */
export const hadamardSymmetric: Construction = ({ t, k, b }) => {
  if (b !== t || t % 4 !== 3 || 2 * k !== t - 1) return null;
  const matrix = hadamardMatrix(t + 1);
  if (!matrix) return null;
  const blocks: Blocks = normalised(matrix)
    .slice(1)
    .map((row) => row.slice(1).flatMap((x, j) => (x === 1 ? [j] : [])));
  return {
    blocks,
    construction: `Rows of a Hadamard matrix of order ${t + 1} without its border.`,
    constructionId: 'hadamard',
    source: SOURCE
  };
};

/** The halves of t = 4m treatments that the rows of a Hadamard matrix make: 8m − 2 sessions in 4m − 1 groups of two. */
export const hadamardHalves: Construction = ({ t, k, r }) => {
  if (2 * k !== t || t % 4 !== 0 || r !== t - 1) return null;
  const matrix = hadamardMatrix(t);
  if (!matrix) return null;
  const blocks = normalised(matrix)
    .slice(1)
    .flatMap((row) => [1, -1].map((sign) => row.flatMap((x, j) => (x === sign ? [j] : []))));
  return {
    blocks,
    construction: `Both halves of each row of a Hadamard matrix of order ${t}.`,
    constructionId: 'hadamard-halves',
    source: SOURCE,
    resolution: consecutiveClasses(t, k, r)
  };
};
