import type { Construction } from '../candidate.ts';
import { projectiveFlats } from './finite-geometry.ts';

/**
 * The design of 56 treatments, 11 to a session, each pair twice: the projective plane of order 4 has 168 sets of six
 * points no three on a line; they fall into three classes of 56 that meet each other in an even number of points. A
 * session is one such set together with the ten of its class disjoint from it (the Gewirtz graph with loops).
 *
 * Source: M. Hall, R. Lane & D. Wales (1970), Designs derived from permutation groups, J. Combin. Theory 8, 12–22;
 * the graph: A. Gewirtz (1969), Canad. J. Math. 21, 1240–1248.
 * Checked by: test/core/design/catalogue/constructions/families.test.ts
 */
export const hyperovalBiplane: Construction = ({ t, k, lambda }) => {
  if (t !== 56 || k !== 11 || lambda !== 2) return null;
  const lines = projectiveFlats(2, 1, 4)!;
  const onLine = Array.from({ length: 21 }, () => new Array<number>(21).fill(-1));
  lines.forEach((line, n) => {
    for (const x of line) for (const y of line) onLine[x]![y] = n;
  });
  const hyperovals: number[][] = [];
  const grow = (arc: number[]): void => {
    if (arc.length === 6) {
      hyperovals.push([...arc]);
      return;
    }
    const secants = new Set(arc.flatMap((x, i) => arc.slice(i + 1).map((y) => onLine[x]![y]!)));
    for (let point = (arc.at(-1) ?? -1) + 1; point < 21; point++) {
      if ([...secants].every((line) => !lines[line]!.includes(point))) grow([...arc, point]);
    }
  };
  grow([]);
  const common = (a: readonly number[], b: readonly number[]): number => a.filter((x) => b.includes(x)).length;
  const own = hyperovals.filter((hyperoval) => common(hyperoval, hyperovals[0]!) % 2 === 0);
  return {
    blocks: own.map((hyperoval, i) =>
      own.flatMap((other, j) => (i === j || common(hyperoval, other) === 0 ? [j] : []))
    ),
    construction:
      'The 56 hyperovals of one class of the projective plane of order 4: a session holds one of them and the ten disjoint from it.',
    constructionId: 'hyperoval-biplane',
    source: 'M. Hall, R. Lane & D. Wales (1970), Designs derived from permutation groups, J. Combin. Theory 8, 12–22'
  };
};
