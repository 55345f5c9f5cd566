import { primePower } from '../../numerics/prime-power.ts';
import type { Construction } from './candidate.ts';
import { develop, orbitSearch, type OrbitShape } from './orbit-search.ts';
import type { Parameters } from './parameters.ts';
import { translationGroup, type PermutationGroup } from './permutation-group.ts';

const SOURCE =
  'R. C. Bose (1939), Ann. Eugenics 9, 353–399 (differences); E. S. Kramer & D. M. Mesner (1976), Discrete Math. 15, 263–296 (search)';

/** The ways to make up b blocks from full orbits of Z_n and at most two short ones, fullest first. */
function cyclicShapes(group: PermutationGroup, n: number, { b, k }: Parameters): OrbitShape[][] {
  const stabiliser = (s: number) => group.elements.filter((_, shift) => shift % (n / s) === 0);
  const full = (count: number): OrbitShape[] => (count > 0 ? [{ stabiliser: [group.elements[0]!], count }] : []);
  const fixed = group.degree % n;
  // A block kept in place by s translations is made of cosets of s elements and of fixed points.
  const sizes = Array.from({ length: k }, (_, i) => i + 1).filter((s) => s > 1 && n % s === 0 && k % s <= fixed);
  const shapes: OrbitShape[][] = b % n === 0 ? [full(b / n)] : [];
  for (const s of sizes) {
    for (let count = 1; count <= 2; count++) {
      const rest = b - (count * n) / s;
      if (rest >= 0 && rest % n === 0) shapes.push([{ stabiliser: stabiliser(s), count }, ...full(rest / n)]);
    }
  }
  return shapes;
}

/** The groups worth trying on t treatments, smallest search first. */
function groupsFor(t: number): { group: PermutationGroup; n: number }[] {
  const field = primePower(t);
  return [
    { group: translationGroup([t]), n: t },
    { group: translationGroup([t - 1], 1, 1), n: t - 1 },
    ...(field && field.n > 1 ? [{ group: translationGroup(Array.from({ length: field.n }, () => field.p)), n: t }] : [])
  ];
}

/**
 * Difference families found by a bounded search over Z_t, over Z_{t−1} with a fixed treatment, and over the additive
 * group of GF(t).
 *
 * @param allowance search steps for each group
 */
export const differenceSearch =
  (allowance: number): Construction =>
  (p) => {
    for (const { group, n } of groupsFor(p.t)) {
      const cyclic = group.name.includes('×') ? [] : cyclicShapes(group, n, p);
      const shapes =
        group.name.includes('×') && p.b % n === 0 ? [[{ stabiliser: [group.elements[0]!], count: p.b / n }]] : cyclic;
      for (const shape of shapes) {
        const base = orbitSearch(group, p.k, p.lambda, shape, allowance);
        if (base) {
          const list = base.map(({ block }) => `{${block.join(', ')}}`).join(' ');
          return {
            blocks: develop(group, base),
            construction: `Base blocks ${list} developed under ${group.name}, found by a bounded search for differences.`,
            constructionId: 'difference-family',
            source: SOURCE
          };
        }
      }
    }
    return null;
  };
