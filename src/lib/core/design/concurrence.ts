/** How often each treatment is in the design: r = N1. */
export function replications(blocks: readonly (readonly number[])[], treatments: number): number[] {
  const counts = new Array<number>(treatments).fill(0);
  for (const block of blocks) for (const treatment of block) counts[treatment]! += 1;
  return counts;
}

/**
 * Returns the concurrence matrix N Nᵀ as rows: `[i][j]` counts the sessions in which i and j meet; the diagonal holds
 * the replications (of a design that has no treatment twice in a session).
 *
 * **Checked by** test/core/design/information.test.ts
 */
export function concurrence(blocks: readonly (readonly number[])[], treatments: number): number[][] {
  const meet = Array.from({ length: treatments }, () => new Array<number>(treatments).fill(0));
  for (const block of blocks) for (const i of block) for (const j of block) meet[i]![j]! += 1;
  return meet;
}

/** Smallest and largest off-diagonal concurrence; zeros when there is no pair. */
export function concurrenceRange(
  blocks: readonly (readonly number[])[],
  treatments: number
): { min: number; max: number } {
  const meet = concurrence(blocks, treatments);
  let min = Infinity;
  let max = 0;
  for (let i = 0; i < treatments; i++) {
    for (let j = i + 1; j < treatments; j++) {
      min = Math.min(min, meet[i]![j]!);
      max = Math.max(max, meet[i]![j]!);
    }
  }
  return { min: min === Infinity ? 0 : min, max };
}
