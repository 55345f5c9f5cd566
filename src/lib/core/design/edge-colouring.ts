import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';

/**
 * Returns a proper edge colouring of a bipartite graph: no two edges that meet have the same colour.
 *
 * Every edge takes a colour free at both ends; where there is none, the path of alternating colours from its right end
 * is exchanged first, which cannot reach its left end in a bipartite graph. So as many colours as the largest degree
 * always do (König). Edges are taken and colours chosen at random.
 *
 * @param left vertex of each edge on the left side, 0 … nLeft − 1
 * @param right vertex of each edge on the right side, 0 … nRight − 1
 * @param colours number of colours, at least the largest degree
 * @returns the colour of each edge, 0 … colours − 1
 *
 * Cost: O(edges × (nLeft + nRight)).
 *
 * **Source**: König (1916), Über Graphen und ihre Anwendung auf Determinantentheorie und Mengenlehre, Mathematische
 * Annalen 77, 453–465.
 * **Checked by** test/core/design/slot-layout.test.ts
 */
export function edgeColouring(
  left: readonly number[],
  right: readonly number[],
  nLeft: number,
  nRight: number,
  colours: number,
  random: SeededRandom
): Int32Array {
  const colourOf = new Int32Array(left.length).fill(-1);
  const atLeft = new Int32Array(nLeft * colours).fill(-1);
  const atRight = new Int32Array(nRight * colours).fill(-1);

  const drawFree = (isFree: (colour: number) => boolean): number => {
    let chosen = -1;
    let seen = 0;
    for (let colour = 0; colour < colours; colour++) {
      if (isFree(colour) && random.below(++seen) === 0) chosen = colour;
    }
    return chosen;
  };

  const paint = (edge: number, colour: number): void => {
    colourOf[edge] = colour;
    atLeft[left[edge]! * colours + colour] = edge;
    atRight[right[edge]! * colours + colour] = edge;
  };

  /** Exchanges colours a and b along the alternating path that leaves right vertex `v` by colour a. */
  const exchange = (v: number, a: number, b: number): void => {
    const path: number[] = [];
    let onRight = true;
    let vertex = v;
    let colour = a;
    for (;;) {
      const edge: number = (onRight ? atRight : atLeft)[vertex * colours + colour]!;
      if (edge < 0) break;
      path.push(edge);
      vertex = onRight ? left[edge]! : right[edge]!;
      onRight = !onRight;
      colour = colour === a ? b : a;
    }
    for (const edge of path) {
      atLeft[left[edge]! * colours + colourOf[edge]!] = -1;
      atRight[right[edge]! * colours + colourOf[edge]!] = -1;
    }
    for (const edge of path) paint(edge, colourOf[edge] === a ? b : a);
  };

  const order = random.shuffle(Array.from(left.keys()));
  for (const edge of order) {
    const u = left[edge]!;
    const v = right[edge]!;
    const freeLeft = (colour: number): boolean => atLeft[u * colours + colour]! < 0;
    const freeRight = (colour: number): boolean => atRight[v * colours + colour]! < 0;
    let colour = drawFree((c) => freeLeft(c) && freeRight(c));
    if (colour < 0) {
      colour = drawFree(freeLeft);
      const other = drawFree(freeRight);
      if (colour < 0 || other < 0) throw new RangeError(`edgeColouring: a vertex has more than ${colours} edges`);
      exchange(v, colour, other);
    }
    paint(edge, colour);
  }
  return colourOf;
}
