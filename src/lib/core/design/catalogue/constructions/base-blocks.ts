import type { Construction } from '../candidate.ts';
import { develop, type BaseBlock } from '../orbits/develop.ts';
import { generateGroup, scale, shift, type PermutationGroup } from '../orbits/permutation-group.ts';
import { abelianGroup } from '../orbits/abelian-group.ts';
import { affineOnPairsAndPlanes } from '../orbits/affine-line.ts';

/** Base blocks under a group, for parameter sets where finding them takes longer than anybody wants to wait. */
interface Entry {
  t: number;
  k: number;
  lambda: number;
  group: () => PermutationGroup;
  base: readonly BaseBlock[];
  /** Who is known to have found such a design first, or listed them all; cited from memory. */
  source: string;
}

const base = (stabiliser: number, ...block: number[]): BaseBlock => ({ block, stabiliser });

/** Z_n on copies of itself and fixed treatments. */
const translations = (n: number, copies: number, fixed: number) => (): PermutationGroup =>
  generateGroup(
    [shift({ n, copies, fixed })],
    `Z_${n}${copies > 1 ? ` on ${copies} copies of itself` : ''}${fixed > 0 ? ` with ${fixed} fixed ${fixed === 1 ? 'treatment' : 'treatments'}` : ''}`
  );

/** A product of cyclic groups on itself. */
const product = (moduli: readonly number[]) => (): PermutationGroup => {
  const { order, add, name } = abelianGroup(moduli);
  const elements = Array.from({ length: order }, (_, g) => g);
  return { degree: order, elements: elements.map((s) => elements.map((g) => add(g, s))), name };
};

/** The same with a multiplier that may permute the copies and the fixed treatments. */
const withMultiplier =
  (n: number, copies: number, fixed: number, factor: number, copyTo?: readonly number[], fixedTo?: readonly number[]) =>
  (): PermutationGroup =>
    generateGroup(
      [shift({ n, copies, fixed }), scale({ n, copies, fixed }, factor, copyTo, fixedTo)],
      `${translations(n, copies, fixed)().name} and the multiplier ${factor}`
    );

/**
 * The base blocks were found by exact cover or by annealing over the orbits of the group named; each design is counted
 * after it is developed, as all are.
 */
const ENTRIES: readonly Entry[] = [
  {
    t: 25,
    k: 9,
    lambda: 3,
    group: translations(3, 8, 1),
    base: [
      base(1, 0, 4, 5, 10, 13, 14, 15, 18, 24),
      base(1, 0, 1, 2, 5, 6, 10, 12, 17, 21),
      base(1, 1, 6, 8, 13, 15, 16, 20, 21, 24),
      base(1, 1, 4, 6, 12, 13, 18, 19, 22, 23),
      base(1, 2, 10, 11, 12, 15, 16, 18, 20, 23),
      base(1, 2, 4, 8, 10, 11, 19, 21, 22, 24),
      base(1, 5, 7, 8, 9, 10, 12, 13, 16, 22),
      base(1, 2, 3, 5, 6, 8, 9, 15, 18, 19),
      base(3, 3, 4, 5, 15, 16, 17, 21, 22, 23)
    ],
    source: 'R. H. F. Denniston (1982), Enumeration of symmetric designs (25,9,3), Ann. Discrete Math. 15, 111–127'
  },
  {
    t: 31,
    k: 10,
    lambda: 3,
    group: withMultiplier(7, 4, 3, 2, [1, 2, 0, 3], [1, 2, 0]),
    base: [
      base(7, 0, 1, 2, 3, 4, 5, 6, 28, 29, 30),
      base(3, 0, 1, 2, 7, 9, 11, 14, 15, 18, 21),
      base(1, 0, 2, 12, 13, 17, 19, 21, 24, 25, 28)
    ],
    source:
      'E. Spence (1992), A complete classification of symmetric (31,10,3) designs, Des. Codes Cryptogr. 2, 127–136'
  },
  {
    t: 36,
    k: 6,
    lambda: 2,
    group: translations(35, 1, 1),
    base: [
      base(1, 0, 1, 2, 5, 11, 17),
      base(1, 0, 2, 10, 13, 18, 22),
      base(5, 0, 7, 14, 21, 28, 35),
      base(5, 0, 7, 14, 21, 28, 35)
    ],
    source: 'H. Hanani (1975), Balanced incomplete block designs and related designs, Discrete Math. 11, 255–369'
  },
  {
    t: 36,
    k: 15,
    lambda: 6,
    group: product([6, 6]),
    // Elements of the three subgroups (x, 0), (0, x) and (x, −x) other than zero.
    base: [base(1, 1, 2, 3, 4, 5, 6, 12, 18, 24, 30, 11, 16, 21, 26, 31)],
    source:
      'P. Kesava Menon (1962), On difference sets whose parameters satisfy a certain relation, Proc. Amer. Math. Soc. 13, 739–745'
  },
  {
    t: 45,
    k: 5,
    lambda: 1,
    group: product([3, 3, 5]),
    base: [base(1, 0, 1, 11, 21, 25), base(1, 0, 3, 15, 20, 22), base(5, 0, 9, 18, 27, 36)],
    source: 'H. Hanani (1975), Balanced incomplete block designs and related designs, Discrete Math. 11, 255–369'
  },
  {
    t: 43,
    k: 7,
    lambda: 2,
    group: translations(43, 1, 0),
    base: [base(1, 0, 1, 2, 4, 11, 17, 25), base(1, 0, 3, 7, 15, 27, 32, 37)],
    source: 'H. Hanani (1975), Balanced incomplete block designs and related designs, Discrete Math. 11, 255–369'
  },
  {
    t: 66,
    k: 6,
    lambda: 1,
    group: withMultiplier(13, 5, 1, 3, [1, 2, 0, 3, 4]),
    base: [
      base(1, 0, 1, 3, 13, 45, 49),
      base(1, 0, 4, 34, 36, 43, 53),
      base(1, 0, 5, 24, 33, 59, 61),
      base(3, 0, 17, 29, 50, 63, 65),
      base(3, 39, 41, 46, 57, 60, 61)
    ],
    source: 'R. H. F. Denniston (1980), A Steiner system with a maximal arc, Ars Combin. 9, 247–248'
  },
  {
    t: 71,
    k: 15,
    lambda: 3,
    group: affineOnPairsAndPlanes,
    base: [
      base(1, 0, 4, 11, 16, 17, 18, 25, 28, 37, 41, 45, 46, 56, 60, 64),
      base(4, 0, 1, 2, 7, 8, 9, 32, 33, 34, 39, 40, 41, 64, 65, 70),
      base(56, 56, 57, 58, 59, 60, 61, 62, 63, 64, 65, 66, 67, 68, 69, 70)
    ],
    source: 'W. Haemers (1980), Eigenvalue Techniques in Design and Graph Theory, Math. Centre Tracts 121, Amsterdam'
  },
  {
    t: 76,
    k: 6,
    lambda: 1,
    group: withMultiplier(19, 4, 0, 7, [1, 2, 0, 3]),
    base: [
      base(1, 0, 1, 3, 14, 19, 62),
      base(1, 0, 7, 33, 53, 58, 72),
      base(3, 0, 4, 27, 36, 45, 51),
      base(3, 0, 9, 21, 34, 44, 48),
      base(3, 0, 22, 43, 63, 64, 71),
      base(3, 0, 29, 42, 60, 69, 75)
    ],
    source: 'W. H. Mills (1975), Two new block designs, Utilitas Math. 7, 73–75'
  },
  {
    t: 79,
    k: 13,
    lambda: 2,
    group: withMultiplier(11, 7, 2, 3, [1, 2, 3, 4, 0, 5, 6]),
    base: [
      base(1, 2, 7, 21, 24, 26, 27, 29, 37, 38, 56, 60, 70, 74),
      base(5, 1, 10, 14, 19, 24, 31, 38, 39, 48, 51, 55, 66, 77),
      base(5, 4, 7, 12, 21, 25, 30, 35, 42, 49, 50, 55, 66, 78),
      base(55, 55, 56, 57, 58, 59, 60, 61, 62, 63, 64, 65, 77, 78),
      base(55, 66, 67, 68, 69, 70, 71, 72, 73, 74, 75, 76, 77, 78)
    ],
    source: 'M. Aschbacher (1971), On collineation groups of symmetric block designs, J. Combin. Theory A 11, 272–281'
  },
  {
    t: 91,
    k: 7,
    lambda: 1,
    group: withMultiplier(91, 1, 0, 16),
    base: [base(3, 0, 1, 4, 16, 23, 64, 74), base(3, 0, 2, 8, 32, 37, 46, 57), base(21, 0, 13, 26, 39, 52, 65, 78)],
    source: 'W. H. Mills (1975), Two new block designs, Utilitas Math. 7, 73–75'
  }
];

/**
 * Base blocks of the list, developed under their group.
 *
 * Checked by: test/core/design/catalogue/balanced-design.test.ts
 */
export const listedBaseBlocks: Construction = ({ t, k, lambda }) => {
  const entry = ENTRIES.find((each) => each.t === t && each.k === k && each.lambda === lambda);
  if (!entry) return null;
  const group = entry.group();
  return {
    blocks: develop(group, entry.base),
    construction: `Base blocks ${entry.base.map(({ block }) => `{${block.join(', ')}}`).join(' ')} under ${group.name}.`,
    constructionId: 'base-blocks',
    source: entry.source
  };
};
