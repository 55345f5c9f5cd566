/**
 * Returns the connected parts of a design: treatments in one part can be compared, treatments of two parts cannot.
 *
 * Union–find over the treatment–session graph; a treatment that is in no session is a part by itself.
 *
 * @param blocks treatments of each session
 * @param treatments number of treatments
 * @returns the treatments of each part, ascending, parts ordered by their first treatment
 *
 * **Source**: Tarjan (1975), Efficiency of a good but not linear set union algorithm, JACM 22, 215–225.
 * **Checked by** test/core/design/information.test.ts
 */
export function connectedParts(blocks: readonly (readonly number[])[], treatments: number): number[][] {
  const parent = Int32Array.from({ length: treatments }, (_, i) => i);
  const root = (i: number): number => {
    let at = i;
    while (parent[at] !== at) {
      parent[at] = parent[parent[at]!]!;
      at = parent[at]!;
    }
    return at;
  };
  for (const block of blocks) {
    for (let at = 1; at < block.length; at++) {
      const a = root(block[0]!);
      const b = root(block[at]!);
      if (a !== b) parent[Math.max(a, b)] = Math.min(a, b);
    }
  }
  const parts = new Map<number, number[]>();
  for (let i = 0; i < treatments; i++) {
    const top = root(i);
    const part = parts.get(top);
    if (part) part.push(i);
    else parts.set(top, [i]);
  }
  return [...parts.values()];
}

/** Whether every treatment difference can be estimated. */
export const isConnected = (blocks: readonly (readonly number[])[], treatments: number): boolean =>
  connectedParts(blocks, treatments).length <= 1;
