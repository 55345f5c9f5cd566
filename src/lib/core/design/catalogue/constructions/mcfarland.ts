import { finiteField } from '../../../numerics/finite-field.ts';
import type { Construction } from '../candidate.ts';
import { subspaces } from './subspaces.ts';

/**
 * McFarland's difference sets: in GF(q)^(d+1) × Z_(s+1), where s = (q^(d+1) − 1)/(q − 1), the s hyperplanes through zero
 * are laid at s different levels of Z_(s+1). Gives t = q^(d+1)(s + 1), k = q^d s, λ = q^d (q^d − 1)/(q − 1).
 *
 * Source: R. L. McFarland (1973), A family of difference sets in non-cyclic groups, J. Combin. Theory A 15, 1–10.
 * Checked by: test/core/design/catalogue/constructions/families.test.ts
 */
export const mcFarland: Construction = ({ t, k, b }) => {
  if (b !== t) return null;
  for (let q = 2; q * q < t; q++) {
    for (let d = 1; q ** (d + 1) < t; d++) {
      const s = (q ** (d + 1) - 1) / (q - 1);
      const space = q ** (d + 1);
      if (t !== space * (s + 1) || k !== q ** d * s) continue;
      const field = finiteField(q);
      if (!field) continue;
      const code = (vector: readonly number[]): number => vector.reduce((sum, x) => sum * q + x, 0);
      const hyperplanes = subspaces(field, d + 1, d);
      const vectors = subspaces(field, d + 1, d + 1)[0]!;
      const blocks = Array.from({ length: s + 1 }, (_, level) =>
        vectors.map((shift) =>
          hyperplanes.flatMap((hyperplane, i) =>
            hyperplane.map((x) => code(x.map((c, j) => field.add(c, shift[j]!))) + space * ((i + level) % (s + 1)))
          )
        )
      ).flat();
      return {
        blocks,
        construction: `McFarland's difference set: the ${s} hyperplanes of GF(${q})^${d + 1} at ${s} levels of Z_${s + 1}.`,
        constructionId: 'mcfarland',
        source: 'R. L. McFarland (1973), A family of difference sets in non-cyclic groups, J. Combin. Theory A 15, 1–10'
      };
    }
  }
  return null;
};
