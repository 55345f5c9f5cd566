import type { Candidate, Construction } from './candidate.ts';
import { listedBaseBlocks } from './constructions/base-blocks.ts';
import { affineGeometry, projectiveGeometry } from './constructions/finite-geometry.ts';
import { hadamardHalves, hadamardSymmetric } from './constructions/hadamard.ts';
import { hyperovalBiplane } from './constructions/hyperoval-biplane.ts';
import { inversivePlane } from './constructions/inversive-plane.ts';
import { kirkmanTriples } from './constructions/kirkman.ts';
import { mcFarland } from './constructions/mcfarland.ts';
import { powerResidues } from './constructions/power-residues.ts';
import { derived, residual } from './constructions/residual-derived.ts';
import { rotationalClasses } from './constructions/rotational-classes.ts';
import { roundRobin } from './constructions/round-robin.ts';
import { completeBlocks, everyCombination } from './constructions/small-constructions.ts';
import { steinerTriples } from './constructions/triple-systems.ts';
import { nonExistence } from './non-existence.ts';
import { differenceSearch } from './orbits/difference-search.ts';
import type { SearchEffort } from './orbits/orbit-search.ts';
import { parametersOf, type Parameters } from './parameters.ts';
import { findResolution } from './resolution/find-resolution.ts';

/** What is asked of the design beyond its parameters. */
export interface Wish {
  resolvable: boolean;
}

/** Constructions that give a design at once. */
const DIRECT: readonly Construction[] = [
  completeBlocks,
  roundRobin,
  everyCombination,
  affineGeometry,
  kirkmanTriples,
  hadamardHalves,
  projectiveGeometry,
  powerResidues,
  hadamardSymmetric,
  mcFarland,
  inversivePlane,
  steinerTriples,
  hyperovalBiplane,
  listedBaseBlocks
];

/** Effort of a search that should not be noticed. */
const QUICK: SearchEffort = { tries: 2, steps: 500 };

/** Search steps for the parallel classes of a finished design. */
const RESOLUTION_STEPS = 20_000;

/**
 * The first design of the given parameters that one of the constructions gives, in a fixed order: constructions that need
 * no search, quick searches, designs made of other designs, longer searches.
 *
 * @param p parameters with 2k ≤ t, or k ≥ t − 1
 * @param wish whether the sessions must fall into groups that hold each treatment once
 *
 * Checked by: test/core/design/catalogue/balanced-design.test.ts
 */
export function construct(p: Parameters, wish: Wish): Candidate | null {
  const constructions: readonly Construction[] = [
    ...(wish.resolvable ? [rotationalClasses] : []),
    ...DIRECT,
    (q) => differenceSearch(q, 'plain', QUICK),
    fromSymmetric,
    (q) => multiple(q, wish),
    (q) => sum(q, wish),
    (q) => differenceSearch(q, 'plain', { tries: 40, steps: 500 }),
    (q) => differenceSearch(q, 'further', { tries: 10, steps: 500 }),
    (q) => differenceSearch(q, 'further', { tries: 40, steps: 2000 }),
    (q) => differenceSearch(q, 'plain', { tries: 80, steps: 2000 })
  ];
  return firstOf(constructions, p, wish);
}

function firstOf(constructions: readonly Construction[], p: Parameters, wish: Wish): Candidate | null {
  for (const construction of constructions) {
    const candidate = construction(p);
    if (!candidate) continue;
    if (!wish.resolvable || candidate.resolution) return candidate;
    const resolution = findResolution(candidate.blocks, p.t, RESOLUTION_STEPS);
    if (resolution) return { ...candidate, resolution };
  }
  return null;
}

/** The residual or derived design of a symmetric one. */
function fromSymmetric(p: Parameters): Candidate | null {
  const direct = (t: number, k: number, lambda: number) =>
    firstOf(DIRECT, { t, b: t, r: k, k, lambda }, { resolvable: false });
  if (p.r === p.k + p.lambda && p.b > p.t) {
    const found = direct(p.t + p.r, p.r, p.lambda);
    if (found) return from('residual', 'what a session and its treatments leave of', residual(found.blocks), found);
  }
  // Derived: t = k', r = k' − 1, k = λ', λ = λ' − 1 of a symmetric design of b + 1 treatments.
  if (p.r === p.t - 1 && p.k === p.lambda + 1) {
    const found = direct(p.b + 1, p.t, p.k);
    if (found)
      return from(
        'derived',
        "the other sessions cut down to one session's treatments of",
        derived(found.blocks),
        found
      );
  }
  return null;
}

function from(id: string, how: string, blocks: Candidate['blocks'], found: Candidate): Candidate {
  return {
    blocks,
    construction: `The ${id} design (${how} the following). ${found.construction}`,
    constructionId: `${id}:${found.constructionId}`,
    source: found.source
  };
}

/** Quick constructions, for the parts of a larger design. */
const part = (p: Parameters, wish: Wish): Candidate | null =>
  nonExistence(p)
    ? null
    : firstOf(
        [...DIRECT, (q) => differenceSearch(q, 'plain', QUICK), fromSymmetric, (q) => multiple(q, wish)],
        p,
        wish
      );

/** A smaller design of the same t and k several times over, the smallest that there is. */
function multiple(p: Parameters, wish: Wish): Candidate | null {
  for (let times = p.lambda; times > 1; times--) {
    const smaller = parametersOf(p.t, p.k, p.r / times);
    const found = smaller && part(smaller, wish);
    if (!found) continue;
    const copies = Array.from({ length: times }, () => found);
    return {
      ...union(copies),
      construction: `The following design ${times} times over. ${found.construction}`,
      constructionId: `multiple:${found.constructionId}`,
      source: found.source
    };
  }
  return null;
}

/** Two different designs of the same t and k put together, the first as large as can be. */
function sum(p: Parameters, wish: Wish): Candidate | null {
  for (let lambda = p.lambda - 1; 2 * lambda > p.lambda; lambda--) {
    const r = (p.r * lambda) / p.lambda;
    const one = parametersOf(p.t, p.k, r);
    const other = parametersOf(p.t, p.k, p.r - r);
    const rest = one && other && part(other, wish);
    const main = rest && part(one, wish);
    if (!main) continue;
    return {
      ...union([main, rest]),
      construction: `Two designs together. The first: ${main.construction} The second: ${rest.construction}`,
      constructionId: `sum:${main.constructionId}+${rest.constructionId}`,
      source: `${main.source}; ${rest.source}`
    };
  }
  return null;
}

/** The blocks of all, and their parallel classes where every one has them. */
function union(parts: readonly Candidate[]): Pick<Candidate, 'blocks' | 'resolution'> {
  const blocks = parts.flatMap((each) => each.blocks);
  if (!parts.every((each) => each.resolution)) return { blocks };
  let shift = 0;
  const resolution = parts.flatMap((each) => {
    const classes = each.resolution!.map((indices) => indices.map((block) => block + shift));
    shift += each.blocks.length;
    return classes;
  });
  return { blocks, resolution };
}
