import { finiteField } from '../../../numerics/finite-field.ts';
import type { Blocks } from '../../blocks.ts';
import type { Candidate, Construction } from '../candidate.ts';
import { consecutiveClasses } from './round-robin.ts';
import { subspaces } from './subspaces.ts';

/** (qⁿ − 1)/(q − 1), the number of points of the projective space PG(n − 1, q). */
const pointCount = (q: number, n: number): number => (q ** n - 1) / (q - 1);

/** The Gaussian coefficient [n choose m]_q, the number of m-dimensional subspaces of GF(q)ⁿ. */
function gaussian(n: number, m: number, q: number): number {
  let count = 1;
  for (let i = 0; i < m; i++) count *= (q ** (n - i) - 1) / (q ** (m - i) - 1);
  return Math.round(count);
}

/**
 * The d-dimensional flats of the projective space PG(n, q): points are the one-dimensional subspaces of GF(q)^(n+1),
 * blocks the (d+1)-dimensional ones.
 *
 * Source: R. C. Bose (1939), Ann. Eugenics 9, section 3.
 * Checked by: test/core/design/catalogue/constructions/finite-geometry.test.ts
 */
export function projectiveFlats(n: number, d: number, q: number): Blocks | null {
  const field = finiteField(q);
  if (!field) return null;
  // Each point is named by its vector whose first non-zero coordinate is one.
  const numberOf = new Map<number, number>();
  const code = (vector: readonly number[]): number => vector.reduce((sum, x) => sum * q + x, 0);
  for (let c = 1; c < q ** (n + 1); c++) {
    let lead = c;
    while (lead >= q) lead = Math.floor(lead / q);
    if (lead === 1) numberOf.set(c, numberOf.size);
  }
  return subspaces(field, n + 1, d + 1).map((flat) =>
    flat
      .map((vector) => numberOf.get(code(vector)))
      .filter((point) => point !== undefined)
      .sort((a, b) => a - b)
  );
}

/**
 * The d-dimensional flats of the affine space AG(n, q), parallel ones one after the other: points are the vectors of
 * GF(q)ⁿ, blocks the cosets of the d-dimensional subspaces, and each subspace's cosets form a parallel class.
 *
 * Source: R. C. Bose (1939), Ann. Eugenics 9, section 3.
 * Checked by: test/core/design/catalogue/constructions/finite-geometry.test.ts
 */
export function affineFlats(n: number, d: number, q: number): Blocks | null {
  const field = finiteField(q);
  if (!field) return null;
  const code = (vector: readonly number[]): number => vector.reduce((sum, x) => sum * q + x, 0);
  const whole = subspaces(field, n, n)[0]!;
  return subspaces(field, n, d).flatMap((flat) => {
    const seen = new Set<number>();
    const cosets: number[][] = [];
    for (const shift of whole) {
      if (seen.has(code(shift))) continue;
      const coset = flat.map((vector) => code(vector.map((x, i) => field.add(x, shift[i]!)))).sort((a, b) => a - b);
      coset.forEach((point) => seen.add(point));
      cosets.push(coset);
    }
    return cosets;
  });
}

const SOURCE = 'R. C. Bose (1939), On the construction of balanced incomplete block designs, Ann. Eugenics 9, 353–399';

/** What a flat of dimension d is called. */
const flatName = (d: number, n: number): string =>
  d === 1 ? 'lines' : d === n - 1 ? 'hyperplanes' : d === 2 ? 'planes' : `${d}-dimensional flats`;

/** Points and flats of a projective space, where the parameters are those of one. */
export const projectiveGeometry: Construction = ({ t, k, b }) => {
  for (let q = 2; q < k; q++) {
    for (let n = 2; pointCount(q, n + 1) <= t; n++) {
      if (pointCount(q, n + 1) !== t) continue;
      for (let d = 1; d < n; d++) {
        if (pointCount(q, d + 1) !== k || gaussian(n + 1, d + 1, q) !== b) continue;
        const blocks = projectiveFlats(n, d, q);
        if (blocks) {
          const construction =
            n === 2
              ? `Points and lines of the projective plane of order ${q}.`
              : `Points and ${flatName(d, n)} of the projective space PG(${n}, ${q}).`;
          return {
            blocks,
            construction,
            constructionId: n === 2 ? 'projective-plane' : 'projective-space',
            source: SOURCE
          };
        }
      }
    }
  }
  return null;
};

/** Points and flats of an affine space, with its parallel classes, where the parameters are those of one. */
export const affineGeometry: Construction = ({ t, k, b }): Candidate | null => {
  for (let q = 2; q <= k; q++) {
    for (let n = 2; q ** n <= t; n++) {
      if (q ** n !== t) continue;
      for (let d = 1; d < n; d++) {
        if (q ** d !== k || gaussian(n, d, q) * q ** (n - d) !== b) continue;
        const blocks = affineFlats(n, d, q);
        if (blocks) {
          const resolution = consecutiveClasses(t, k, (b * k) / t);
          const construction =
            n === 2
              ? `Points and lines of the affine plane of order ${q}.`
              : `Points and ${flatName(d, n)} of the affine space AG(${n}, ${q}).`;
          return {
            blocks,
            construction,
            constructionId: n === 2 ? 'affine-plane' : 'affine-space',
            source: SOURCE,
            resolution
          };
        }
      }
    }
  }
  return null;
};
