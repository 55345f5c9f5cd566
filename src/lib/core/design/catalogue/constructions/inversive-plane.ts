import { finiteField, type FiniteField } from '../../../numerics/finite-field.ts';
import type { Blocks } from '../../blocks.ts';
import type { Construction } from '../candidate.ts';

/**
 * Circles of the inversive plane of order q: points are GF(q²) and ∞ (numbered q²), circles the images of GF(q) ∪ {∞}
 * under x → (ax + b)/(cx + d). All circles give λ = q + 1. For odd q the maps of square determinant reach only half of
 * them; they move every pair of points to every other, so the half is balanced too, with λ = (q + 1)/2.
 *
 * Source: D. R. Hughes & F. C. Piper (1985), Design Theory, section 3.7 (inversive planes); the half: orbits of
 * PSL(2, q²), which is doubly transitive.
 * Checked by: test/core/design/catalogue/constructions/families.test.ts
 */
export const inversivePlane: Construction = ({ t, k, lambda }) => {
  const q = k - 1;
  if (t !== q * q + 1) return null;
  const half = q % 2 === 1 && 2 * lambda === q + 1;
  const field = half || lambda === q + 1 ? finiteField(q * q) : null;
  if (!field) return null;
  return {
    blocks: circles(field, q, half),
    construction: `${half ? 'Half of the circles' : 'The circles'} of the inversive plane of order ${q}${half ? ' (one orbit of the maps of square determinant)' : ''}.`,
    constructionId: half ? 'half-inversive-plane' : 'inversive-plane',
    source: 'D. R. Hughes & F. C. Piper (1985), Design Theory, Cambridge University Press, section 3.7'
  };
};

function circles(field: FiniteField, q: number, half: boolean): Blocks {
  const infinity = q * q;
  const factor = field.power(half ? 2 : 1);
  const generators: ((x: number) => number)[] = [
    (x) => (x === infinity ? x : field.add(x, 1)),
    (x) => (x === infinity ? x : field.multiply(x, factor)),
    // −1/x has determinant one.
    (x) => (x === infinity ? 0 : x === 0 ? infinity : field.negate(field.invert(x)))
  ];
  // GF(q) inside GF(q²): zero and the powers of the (q+1)th power of a primitive element.
  const line = [0, ...Array.from({ length: q - 1 }, (_, i) => field.power(i * (q + 1))), infinity];
  const sorted = (block: number[]): number[] => block.sort((a, b) => a - b);
  const found = [sorted(line)];
  const known = new Set([found[0]!.join()]);
  for (let i = 0; i < found.length; i++) {
    for (const map of generators) {
      const image = sorted(found[i]!.map(map));
      if (known.has(image.join())) continue;
      known.add(image.join());
      found.push(image);
    }
  }
  return found;
}
