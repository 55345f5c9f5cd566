import type { Blocks } from '../../blocks.ts';

/**
 * The blocks in parallel classes, each class holding every treatment once, or null when the allowance is used up before
 * such a partition is found or when there is none.
 *
 * Depth-first: the first block without a class opens the next class, which is completed at the treatment that the fewest
 * free blocks can still serve.
 *
 * @param blocks b blocks of equal size that divides t
 * @param t number of treatments
 * @param allowance search steps before giving up; a count, so that every machine stops at the same place
 * @returns indices of blocks, class by class
 *
 * Source: D. E. Knuth (2000), Dancing links, arXiv:cs/0011047 (exact cover, smallest choice first).
 * Checked by: test/core/design/catalogue/resolution/find-resolution.test.ts
 */
export function findResolution(blocks: Blocks, t: number, allowance: number): number[][] | null {
  const through = Array.from({ length: t }, () => [] as number[]);
  blocks.forEach((block, i) => block.forEach((point) => through[point]!.push(i)));
  const used = new Uint8Array(blocks.length);
  const covered = new Uint8Array(t);
  const classes: number[][] = [];
  let current: number[] = [];
  let steps = 0;

  const isFree = (i: number): boolean => used[i] === 0 && blocks[i]!.every((point) => covered[point] === 0);
  const take = (i: number): void => {
    used[i] = 1;
    blocks[i]!.forEach((point) => (covered[point] = 1));
    current.push(i);
  };
  const putBack = (i: number): void => {
    used[i] = 0;
    blocks[i]!.forEach((point) => (covered[point] = 0));
    current.pop();
  };

  /** The free blocks through the treatment that fewest of them serve. */
  const narrowest = (): number[] => {
    let best: number[] | null = null;
    for (let point = 0; point < t; point++) {
      if (covered[point] === 1) continue;
      const free = through[point]!.filter(isFree);
      if (!best || free.length < best.length) best = free;
      if (best.length === 0) break;
    }
    return best ?? [];
  };

  const complete = (): boolean => {
    if (++steps > allowance) return false;
    if (current.length * blocks[0]!.length === t) return closeClass();
    for (const i of narrowest()) {
      take(i);
      if (complete()) return true;
      putBack(i);
      if (steps > allowance) return false;
    }
    return false;
  };

  const closeClass = (): boolean => {
    const whole = current;
    classes.push(whole);
    current = [];
    covered.fill(0);
    if (openClass()) return true;
    classes.pop();
    current = whole;
    covered.fill(1);
    return false;
  };

  const openClass = (): boolean => {
    const first = used.indexOf(0);
    if (first === -1) return true;
    take(first);
    if (complete()) return true;
    putBack(first);
    return false;
  };

  return openClass() ? classes : null;
}

/** Whether the classes use each block once and each class holds each of the t treatments once. */
export function isResolution(classes: readonly (readonly number[])[], blocks: Blocks, t: number): boolean {
  const everyBlock = classes.flat().sort((a, b) => a - b);
  if (everyBlock.length !== blocks.length || everyBlock.some((block, i) => block !== i)) return false;
  return classes.every((indices) => {
    const points = indices.flatMap((i) => blocks[i]!);
    return points.length === t && new Set(points).size === t;
  });
}
