/** The slots of one session: `slots[p]` is the treatment in slot p, or null where the slot stays empty. */
export type SlotRow = readonly (number | null)[];

/**
 * Returns how often each treatment visits each slot: `counts[i][p]`.
 *
 * @param rows one row a session
 * @param treatments number of treatments
 * @param slots number of slots
 *
 * **Checked by** test/core/design/slot-layout.test.ts
 */
export function slotCounts(rows: readonly SlotRow[], treatments: number, slots: number): number[][] {
  const counts = Array.from({ length: treatments }, () => new Array<number>(slots).fill(0));
  for (const row of rows) {
    row.forEach((treatment, slot) => {
      if (treatment !== null) counts[treatment]![slot]! += 1;
    });
  }
  return counts;
}

/**
 * Returns the counts that a fair chance would give on average: a specimen lies in each of the m slots in service in its
 * session with probability 1/m.
 *
 * @param inService for each session, whether each slot is in service
 */
export function expectedSlotCounts(
  blocks: readonly (readonly number[])[],
  inService: readonly (readonly boolean[])[],
  treatments: number,
  slots: number
): number[][] {
  const expected = Array.from({ length: treatments }, () => new Array<number>(slots).fill(0));
  blocks.forEach((block, j) => {
    const usable = inService[j]!.filter(Boolean).length;
    for (const treatment of block) {
      for (let slot = 0; slot < slots; slot++) if (inService[j]![slot]) expected[treatment]![slot]! += 1 / usable;
    }
  });
  return expected;
}

/** Σ (count − expected)², the imbalance of slot counts. */
export function slotImbalance(
  counts: readonly (readonly number[])[],
  expected: readonly (readonly number[])[]
): number {
  let sum = 0;
  counts.forEach((row, i) => row.forEach((count, p) => (sum += (count - expected[i]![p]!) ** 2)));
  return sum;
}
