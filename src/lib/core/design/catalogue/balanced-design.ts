import type { Blocks } from '../blocks.ts';
import type { Candidate, Construction } from './candidate.ts';
import { listedBaseBlocks } from './constructions/base-blocks.ts';
import { hadamardHalves, hadamardSymmetric } from './constructions/hadamard.ts';
import { hyperovalBiplane } from './constructions/hyperoval-biplane.ts';
import { inversivePlane } from './constructions/inversive-plane.ts';
import { kirkmanTriples } from './constructions/kirkman.ts';
import { mcFarland } from './constructions/mcfarland.ts';
import { roundRobin } from './constructions/round-robin.ts';
import { steinerTriples } from './constructions/triple-systems.ts';
import { differenceSearch } from './orbits/difference-search.ts';
import { affineGeometry, projectiveGeometry } from './constructions/finite-geometry.ts';
import { isOpen, nonExistence, type NonExistenceTheorem } from './non-existence.ts';
import { parametersOf, smallerOf, type Parameters } from './parameters.ts';
import { powerResidues } from './constructions/power-residues.ts';
import { complement, derived, residual } from './constructions/residual-derived.ts';
import { completeBlocks, everyCombination } from './constructions/small-constructions.ts';
import { verifyBalanced } from './verify-balanced.ts';

/** A balanced design that has been counted, and where it comes from. */
export interface BalancedDesign extends Parameters {
  blocks: Blocks;
  construction: string;
  constructionId: string;
  source: string;
  resolution?: number[][];
}

export type BalancedAnswer =
  | { status: 'exists'; design: BalancedDesign }
  | { status: 'impossible'; theorem: NonExistenceTheorem; why: string }
  | { status: 'open'; why: string }
  | { status: 'not-found'; why: string };

/**
 * A balanced design for t treatments, k to a session, each r times, or why there is none.
 *
 * Constructions are tried in a fixed order and their result is counted; searches inside them are bounded by steps, not by
 * time, so the same question has the same answer everywhere.
 *
 * @param t number of treatments, from 2
 * @param k treatments a session, 2 ≤ k ≤ t
 * @param r sessions of each treatment
 * @returns `exists` with the counted design; `impossible` with the theorem; `open` where nobody knows; `not-found` where
 * a design may exist but no construction here gives it
 *
 * Source: each design names its own.
 * Checked by: test/core/design/catalogue/balanced-design.test.ts
 */
export function balancedDesign(t: number, k: number, r: number): BalancedAnswer {
  const p = parametersOf(t, k, r);
  if (!p) {
    return {
      status: 'impossible',
      theorem: 'divisibility',
      why: `With ${t} treatments, ${k} to a session, each ${r} times, the number of sessions rt/k or the meetings of a pair r(k−1)/(t−1) is no whole number.`
    };
  }
  const small = smallerOf(p);
  const none = k === t ? null : nonExistence(small);
  if (none) return { status: 'impossible', ...none };
  if (isOpen(small)) {
    const why =
      'Whether such a design exists is undecided (Handbook of Combinatorial Designs, 2nd ed. 2007, table II.1.1).';
    return { status: 'open', why };
  }
  const found = construct(small);
  if (found) return { status: 'exists', design: counted(p, small === p ? found : complementOf(found, t)) };
  return {
    status: 'not-found',
    why: 'No theorem forbids such a design, but none of the constructions here gives it.'
  };
}

/** The design with its parameters, after counting; a construction that miscounts is a bug. */
function counted(p: Parameters, candidate: Candidate): BalancedDesign {
  const { t, b, r, k, lambda } = verifyBalanced(candidate.blocks, p.t) ?? { ...p, b: -1 };
  if (b !== p.b || r !== p.r || k !== p.k || lambda !== p.lambda) {
    throw new Error(
      `balancedDesign: ${candidate.constructionId} gave no balanced design of t=${p.t}, k=${p.k}, r=${p.r}`
    );
  }
  return { t, b, r, k, lambda, ...candidate };
}

function complementOf({ blocks, construction, constructionId, source }: Candidate, t: number): Candidate {
  return {
    blocks: complement(blocks, t),
    construction: `Each session runs what a session of the following design leaves out. ${construction}`,
    constructionId: `complement:${constructionId}`,
    source
  };
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

const ALL: readonly Construction[] = [
  ...DIRECT,
  (p) => differenceSearch(p, 'plain', [1000]),
  (p) => fromSymmetric(p),
  (p) => differenceSearch(p, 'plain', [10_000]),
  (p) => multiple(p),
  (p) => differenceSearch(p, 'further', [1000, 10_000]),
  (p) => differenceSearch(p, 'plain', [200_000])
];

function construct(p: Parameters, constructions = ALL): Candidate | null {
  for (const construction of constructions) {
    const candidate = construction(p);
    if (candidate) return candidate;
  }
  return null;
}

/** The residual or derived design of a symmetric one. */
function fromSymmetric(p: Parameters): Candidate | null {
  if (p.r === p.k + p.lambda && p.b > p.t) {
    const found = construct({ t: p.t + p.r, b: p.t + p.r, r: p.r, k: p.r, lambda: p.lambda });
    if (found) return from('residual', 'what a session and its treatments leave of', residual(found.blocks), found);
  }
  // Derived: t = k', k = λ', r = k' − 1, λ = λ' − 1 of a symmetric design with k'(k' − 1) = λ'(t' − 1).
  if (p.r === p.t - 1 && p.k === p.lambda + 1) {
    const found = construct({ t: p.b + 1, b: p.b + 1, r: p.t, k: p.t, lambda: p.k });
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

function from(id: string, how: string, blocks: Blocks, found: Candidate): Candidate {
  return {
    blocks,
    construction: `The ${id} design (${how} the following). ${found.construction}`,
    constructionId: `${id}:${found.constructionId}`,
    source: found.source
  };
}

/** A smaller design of the same t and k, repeated. */
function multiple(p: Parameters): Candidate | null {
  for (let times = p.lambda; times > 1; times--) {
    const part = parametersOf(p.t, p.k, p.r / times);
    if (!part || nonExistence(part)) continue;
    const found = construct(part);
    if (!found) continue;
    return {
      blocks: Array.from({ length: times }, () => found.blocks).flat(),
      construction: `The following design ${times} times over. ${found.construction}`,
      constructionId: `multiple:${found.constructionId}`,
      source: found.source
    };
  }
  return null;
}
