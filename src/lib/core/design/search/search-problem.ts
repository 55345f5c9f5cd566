/** What an interchange search may change and what it is to bring down. */
export interface SearchProblem {
  /** Number of treatments, 0 … t − 1. */
  t: number;
  /** Treatments in each session. */
  sizes: readonly number[];
  /** Treatments that every session holds and that never move. */
  controls: readonly number[];
  /** Sessions of one group exchange treatments only among themselves; null: all do. A group holds no treatment twice. */
  groupOf: readonly number[] | null;
  /** Least and largest replication of each treatment; controls excepted. */
  replication: { least: readonly number[]; most: readonly number[] };
  /** `forbidden[i·t + l]` is 1 when i and l must not share a session; null when there is no such pair. */
  forbidden: Uint8Array | null;
  /** Weights W of the criterion trace(W C⁺), t·t, rows sum to zero; null for the A-value. */
  weights: Float64Array | null;
}

/**
 * Returns the replications that share n runs as equally as can be: the floor or the ceiling of the mean, less where few
 * specimens are at hand, the rest going to the others.
 *
 * @param runs number of runs to share
 * @param caps most runs of each treatment; their sum is at least `runs`
 * @returns least and largest replication of each treatment
 *
 * **Checked by** test/core/design/search/search-problem.test.ts
 */
export function nearEqualReplication(runs: number, caps: readonly number[]): { least: number[]; most: number[] } {
  let level = 0;
  const used = (height: number): number => caps.reduce((sum, cap) => sum + Math.min(cap, height), 0);
  if (used(Infinity) < runs) throw new RangeError(`nearEqualReplication: ${runs} runs, ${used(Infinity)} specimens`);
  while (used(level + 1) <= runs && level < runs) level++;
  const exact = used(level) === runs;
  return {
    least: caps.map((cap) => Math.min(cap, level)),
    most: caps.map((cap) => Math.min(cap, exact ? level : level + 1))
  };
}

/** Weights of the mean variance of a difference within the given set of pairs, times `factor`, added to `weights`. */
export function addPairWeights(
  weights: Float64Array,
  t: number,
  pairs: readonly (readonly [number, number])[],
  factor: number
): Float64Array {
  const share = factor / pairs.length;
  for (const [i, l] of pairs) {
    weights[i * t + i]! += share;
    weights[l * t + l]! += share;
    weights[i * t + l]! -= share;
    weights[l * t + i]! -= share;
  }
  return weights;
}

/** Pairs of a control and a test treatment, and pairs of two test treatments. */
export function controlPairs(
  t: number,
  controls: readonly number[]
): Record<'testControl' | 'testTest', [number, number][]> {
  const testControl: [number, number][] = [];
  const testTest: [number, number][] = [];
  for (let i = 0; i < t; i++) {
    for (let l = i + 1; l < t; l++) {
      const held = Number(controls.includes(i)) + Number(controls.includes(l));
      if (held === 1) testControl.push([i, l]);
      if (held === 0) testTest.push([i, l]);
    }
  }
  return { testControl, testTest };
}
