import { finiteField } from '../../../numerics/finite-field.ts';
import type { Blocks } from '../../blocks.ts';
import type { Construction } from '../candidate.ts';

/**
 * Power residues of GF(t) as base blocks: the subgroup of k (or, with zero added, k − 1) non-zero elements, multiplied by
 * the first few powers of a primitive element and developed under addition. Quadratic residues give the designs of
 * Paley, fourth powers those of Lehmer, and all cosets together Wilson's families.
 *
 * Source: R. E. A. C. Paley (1933), J. Math. Phys. 12, 311–320; E. Lehmer (1953), Canad. J. Math. 5, 425–432;
 * R. M. Wilson (1972), J. Number Theory 4, 17–47.
 * Checked by: test/core/design/catalogue/constructions/families.test.ts
 */
export const powerResidues: Construction = ({ t, k, b }) => {
  if (b % t !== 0) return null;
  const field = finiteField(t);
  if (!field) return null;
  for (const zero of [false, true]) {
    const size = zero ? k - 1 : k;
    const index = (t - 1) / size;
    if (size < 2 || !Number.isInteger(index) || b / t > index) continue;
    const coset = (shift: number): number[] => [
      ...(zero ? [0] : []),
      ...Array.from({ length: size }, (_, i) => field.power(shift + i * index))
    ];
    // Which cosets to take matters only through their spacing; try even spacings.
    for (let step = 1; step <= index / (b / t) || step === 1; step++) {
      const base = Array.from({ length: b / t }, (_, i) => coset(i * step));
      if (!evenDifferences(base, t, (x, y) => field.add(x, field.negate(y)))) continue;
      const blocks: Blocks = base.flatMap((block) =>
        Array.from({ length: t }, (_, g) => block.map((x) => field.add(x, g)).sort((x, y) => x - y))
      );
      const name = index === 2 ? 'quadratic' : index === 4 ? 'quartic' : `${index}th-power`;
      return {
        blocks,
        construction: `The ${name} residues of GF(${t})${zero ? ' with zero' : ''}${b > t ? ` and ${b / t - 1} of their multiples` : ''}, developed under addition.`,
        constructionId: 'power-residues',
        source:
          index === 2
            ? 'R. E. A. C. Paley (1933), On orthogonal matrices, J. Math. Phys. 12, 311–320'
            : 'E. Lehmer (1953), Canad. J. Math. 5, 425–432; R. M. Wilson (1972), J. Number Theory 4, 17–47'
      };
    }
  }
  return null;
};

/** Whether every non-zero element is a difference within the base blocks equally often. */
function evenDifferences(base: Blocks, t: number, subtract: (x: number, y: number) => number): boolean {
  const times = new Int32Array(t);
  for (const block of base) for (const x of block) for (const y of block) if (x !== y) times[subtract(x, y)]! += 1;
  return times.subarray(1).every((count) => count === times[1]);
}
