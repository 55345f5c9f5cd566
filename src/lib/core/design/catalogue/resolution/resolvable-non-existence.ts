import type { NonExistenceTheorem } from '../non-existence.ts';
import type { Parameters } from '../parameters.ts';

/**
 * Why the sessions of no design of these parameters can fall into groups that hold each treatment once, or null where
 * nothing known forbids it: k must divide t; then b ≥ t + r − 1 follows from b ≥ t, and where that is an equality any two
 * sessions of different groups have k²/t treatments in common, so that must be a whole number.
 *
 * @param p parameters with k < t ≤ b
 *
 * Source: R. C. Bose (1942), A note on the resolvability of balanced incomplete block designs, Sankhyā 6, 105–110; b ≥ t + r − 1
 * without resolvability: S. N. Roy (1952), A note on incomplete blocks, Ann. Math. Statist. 23, 295 (from memory).
 * Checked by: test/core/design/catalogue/resolution/resolvable-design.test.ts
 */
export function resolvableNonExistence(p: Parameters): { theorem: NonExistenceTheorem; why: string } | null {
  const { t, b, r, k, lambda } = p;
  if (t % k !== 0) {
    return { theorem: 'divisibility', why: `Sessions of ${k} cannot hold each of ${t} treatments once.` };
  }
  if (b === t + r - 1 && (k * k) % t !== 0) {
    return {
      theorem: 'bose',
      why: `Theorem of Bose: with ${b} = t + r − 1 sessions, any two of different groups would share k²/t = ${k * k}/${t} treatments.`
    };
  }
  if (t === 6 && k === 3 && lambda % 4 !== 0) {
    return {
      theorem: 'equal-halves',
      why: `The ten ways to halve six treatments would all be used equally often, λ/4 = ${lambda}/4 times: their pair counts are linearly independent.`
    };
  }
  if (t === 15 && k === 5 && lambda === 4) {
    return {
      theorem: 'computer-search',
      why: 'An exhaustive computer search found none: P. Kaski & P. R. J. Östergård (2001), There exists no (15,5,4) RBIBD, J. Combin. Des. 9, 357–362.'
    };
  }
  return null;
}

/** Whether it is undecided in print if a design of these parameters can be resolvable: 45 treatments in fives, λ = 1. */
export function isResolvabilityOpen({ t, k, lambda }: Parameters): boolean {
  return t === 45 && k === 5 && lambda === 1;
}
