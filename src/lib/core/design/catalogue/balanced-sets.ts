import { isOpen, nonExistence } from './non-existence.ts';
import { parametersOf, smallerOf, type Parameters } from './parameters.ts';

/** A parameter set that satisfies bk = rt and λ(t−1) = r(k−1), and what is known of it without constructing anything. */
export interface BalancedSet extends Parameters {
  /** `admissible`: nothing forbids it. */
  status: 'admissible' | 'impossible' | 'open';
}

/**
 * The parameter sets for t treatments, k to a session, smallest first. Nothing is constructed: ask `balancedDesign`.
 *
 * @param t number of treatments
 * @param k treatments a session, 2 ≤ k < t
 * @param maxReplication largest r listed
 *
 * Source: see `parametersOf` and `nonExistence`.
 * Checked by: test/core/design/catalogue/balanced-sets.test.ts
 */
export function balancedSets({
  t,
  k,
  maxReplication
}: {
  t: number;
  k: number;
  maxReplication: number;
}): BalancedSet[] {
  const sets: BalancedSet[] = [];
  for (let r = 1; r <= maxReplication; r++) {
    const p = k < t ? parametersOf(t, k, r) : null;
    if (!p) continue;
    const small = smallerOf(p);
    sets.push({ ...p, status: nonExistence(small) ? 'impossible' : isOpen(small) ? 'open' : 'admissible' });
  }
  return sets;
}
