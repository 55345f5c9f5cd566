import type { Candidate } from '../candidate.ts';
import type { Parameters } from '../parameters.ts';
import { abelianModuli } from './abelian-group.ts';
import { develop } from './develop.ts';
import { orbitSearch, type OrbitShape, type SearchEffort } from './orbit-search.ts';
import { orbitShapes, prescribedGroup, type GroupRecipe } from './prescribed-group.ts';
import type { PermutationGroup } from './permutation-group.ts';

/** Shapes tried for each group. */
const MOST_SHAPES = 6;

/** Groups without multipliers on all treatments, or on all but one: where difference families are usually found. */
function plainRecipes(t: number): GroupRecipe[] {
  return [0, 1].flatMap((fixed) =>
    abelianModuli(t - fixed).map((moduli) => ({ moduli, copies: 1, fixed, multipliers: 1 }))
  );
}

/** Groups with multipliers, or on two or three copies, where the plain ones gave nothing. */
function furtherRecipes(t: number): GroupRecipe[] {
  const recipes: GroupRecipe[] = [];
  for (const copies of [1, 2, 3]) {
    for (const fixed of [0, 1]) {
      const n = (t - fixed) / copies;
      if (!Number.isInteger(n) || n < 3) continue;
      for (const moduli of abelianModuli(n)) {
        for (const multipliers of [2, 3, 4, 5, 6, 7, 9, 1]) {
          if (copies > 1 || multipliers > 1) recipes.push({ moduli, copies, fixed, multipliers });
        }
      }
    }
  }
  return recipes;
}

/**
 * A design found by a bounded search for base blocks under groups x → ax + s.
 *
 * @param p the parameters of the design
 * @param reach `plain`: translations only; `further`: multipliers and several copies
 * @param effort tries and steps for each group and shape
 *
 * Checked by: test/core/design/catalogue/balanced-design.test.ts
 */
export function differenceSearch(p: Parameters, reach: 'plain' | 'further', effort: SearchEffort): Candidate | null {
  for (const { group, shape } of trials(p, reach)) {
    const base = orbitSearch(group, p.k, p.lambda, shape, effort);
    if (!base) continue;
    const list = base.map(({ block }) => `{${block.join(', ')}}`).join(' ');
    return {
      blocks: develop(group, base),
      construction: `Base blocks ${list} developed under ${group.name}, found by a bounded search for differences.`,
      constructionId: 'difference-family',
      source:
        'R. C. Bose (1939), Ann. Eugenics 9, 353–399 (differences); E. S. Kramer & D. M. Mesner (1976), Discrete Math. 15, 263–296 (search)'
    };
  }
  return null;
}

function* trials(
  p: Parameters,
  reach: 'plain' | 'further'
): Generator<{ group: PermutationGroup; shape: OrbitShape[] }> {
  for (const recipe of reach === 'plain' ? plainRecipes(p.t) : furtherRecipes(p.t)) {
    const prescribed = prescribedGroup(recipe);
    if (!prescribed) continue;
    for (const shape of orbitShapes(prescribed, p).slice(0, MOST_SHAPES)) yield { group: prescribed.group, shape };
  }
}
