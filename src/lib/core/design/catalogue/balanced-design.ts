import type { Blocks } from '../blocks.ts';
import type { Candidate } from './candidate.ts';
import { construct } from './construct.ts';
import { complement } from './constructions/residual-derived.ts';
import { isOpen, nonExistence, type NonExistenceTheorem } from './non-existence.ts';
import { parametersOf, smallerOf, type Parameters } from './parameters.ts';
import { isResolution } from './resolution/find-resolution.ts';
import { isResolvabilityOpen, resolvableNonExistence } from './resolution/resolvable-non-existence.ts';
import { verifyBalanced } from './verify-balanced.ts';

/** A balanced design that has been counted, and where it comes from. */
export interface BalancedDesign extends Parameters {
  blocks: Blocks;
  /** How the sessions were made, in words. */
  construction: string;
  /** The construction's tag, for translation; parts joined by `:` and `+`. */
  constructionId: string;
  source: string;
  /** Indices of sessions in each parallel class (a class holds every treatment once), where classes are known. */
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
 * @param options `resolvable`: the sessions must fall into groups (shifts) that hold each treatment once; the design then
 * has a `resolution`
 * @returns `exists` with the counted design; `impossible` with the theorem; `open` where nobody knows; `not-found` where
 * a design may exist but no construction here gives it
 *
 * Source: each design names its own.
 * Checked by: test/core/design/catalogue/balanced-design.test.ts
 */
export function balancedDesign(
  t: number,
  k: number,
  r: number,
  { resolvable = false }: { resolvable?: boolean } = {}
): BalancedAnswer {
  const p = parametersOf(t, k, r);
  if (!p) {
    const why = `With ${t} treatments, ${k} to a session, each ${r} times, the number of sessions rt/k or the meetings of a pair r(k−1)/(t−1) is no whole number.`;
    return { status: 'impossible', theorem: 'divisibility', why };
  }
  const small = smallerOf(p);
  const none = k === t ? null : (nonExistence(small) ?? (resolvable ? resolvableNonExistence(p) : null));
  if (none) return { status: 'impossible', ...none };
  if (isOpen(small) || (resolvable && isResolvabilityOpen(p))) {
    return {
      status: 'open',
      why: 'Whether such a design exists is undecided (Handbook of Combinatorial Designs, 2nd ed. 2007).'
    };
  }
  const found = construct(small, { resolvable });
  if (found) return { status: 'exists', design: counted(p, small === p ? found : complementOf(found, t)) };
  return {
    status: 'not-found',
    why: 'No theorem known here forbids such a design, but none of the constructions here gives it.'
  };
}

/** The design with its parameters, after counting; a construction that miscounts is a bug. */
function counted(p: Parameters, candidate: Candidate): BalancedDesign {
  const found = verifyBalanced(candidate.blocks, p.t);
  if (found?.b !== p.b || found.r !== p.r || found.k !== p.k || found.lambda !== p.lambda) {
    throw new Error(
      `balancedDesign: ${candidate.constructionId} gave no balanced design of t=${p.t}, k=${p.k}, r=${p.r}`
    );
  }
  if (candidate.resolution && !isResolution(candidate.resolution, candidate.blocks, p.t)) {
    throw new Error(
      `balancedDesign: ${candidate.constructionId} gave no parallel classes for t=${p.t}, k=${p.k}, r=${p.r}`
    );
  }
  return { ...found, ...candidate };
}

function complementOf({ blocks, construction, constructionId, source }: Candidate, t: number): Candidate {
  return {
    blocks: complement(blocks, t),
    construction: `Each session runs what a session of the following design leaves out. ${construction}`,
    constructionId: `complement:${constructionId}`,
    source
  };
}
