import { finiteField, type FiniteField } from '../../../numerics/finite-field.ts';
import type { Construction } from '../candidate.ts';
import { consecutiveClasses } from './round-robin.ts';

/**
 * Kirkman triple systems, every pair once, three to a session, in groups that hold every treatment once: t = 3q and
 * t = 2q + 1 for a prime power q ≡ 1 modulo 6.
 *
 * Source: D. K. Ray-Chaudhuri & R. M. Wilson (1971), Solution of Kirkman's schoolgirl problem, Proc. Sympos. Pure Math.
 * 19, 187–203, theorems 5 and 6.
 * Checked by: test/core/design/catalogue/constructions/families.test.ts
 */
export const kirkmanTriples: Construction = ({ t, k, r, lambda }) => {
  if (k !== 3 || lambda !== 1 || t % 6 !== 3) return null;
  const classes = fromField(t / 3, tripled) ?? fromField((t - 1) / 2, doubled);
  if (!classes) return null;
  return {
    blocks: classes.flat().map((block) => block.toSorted((a, b) => a - b)),
    construction: `Kirkman triple system of ${t} treatments from the powers of a primitive element of a finite field.`,
    constructionId: 'kirkman-triples',
    source:
      "D. K. Ray-Chaudhuri & R. M. Wilson (1971), Solution of Kirkman's schoolgirl problem, Proc. Sympos. Pure Math. 19, 187–203",
    resolution: consecutiveClasses(t, k, r)
  };
};

type Classes = number[][][];

function fromField(q: number, build: (field: FiniteField, n: number) => Classes | null): Classes | null {
  const field = q % 6 === 1 ? finiteField(q) : null;
  return field && build(field, (q - 1) / 6);
}

const range = (from: number, to: number): number[] => Array.from({ length: to - from }, (_, i) => from + i);

/** t = 3q on GF(q) × {0, 1, 2}, point (x, level) numbered level·q + x. */
function tripled(field: FiniteField, n: number): Classes {
  const q = field.order;
  const at = (x: number, level: number, g: number): number => level * q + field.add(x, g);
  const x = (i: number): number => field.power(i);
  const across = (i: number, g: number) => [at(x(i), 0, g), at(x(i + 2 * n), 1, g), at(x(i + 4 * n), 2, g)];
  const odd = [...range(n, 2 * n), ...range(3 * n, 4 * n), ...range(5 * n, 6 * n)];
  const even = [...range(0, n), ...range(2 * n, 3 * n), ...range(4 * n, 5 * n)];
  const developed = range(0, q).map((g) => [
    [at(0, 0, g), at(0, 1, g), at(0, 2, g)],
    ...range(0, n).flatMap((i) => [0, 1, 2].map((level) => [0, 2, 4].map((j) => at(x(i + j * n), level, g)))),
    ...odd.map((i) => across(i, g))
  ]);
  return [...developed, ...even.map((i) => range(0, q).map((g) => across(i, g)))];
}

/** t = 2q + 1 on GF(q) × {0, 1} and one more treatment, numbered 2q; x^m is half of 1 + x^n. */
function doubled(field: FiniteField, n: number): Classes | null {
  const q = field.order;
  const half = field.multiply(field.add(1, field.power(n)), field.invert(field.add(1, 1)));
  const m = range(0, q - 1).find((i) => field.power(i) === half);
  if (m === undefined) return null;
  const at = (x: number, level: number, g: number): number => level * q + field.add(x, g);
  const x = (i: number): number => field.power(i);
  const mixed = [...range(0, n), ...range(2 * n, 3 * n), ...range(4 * n, 5 * n)];
  return range(0, q).map((g) => [
    [2 * q, at(0, 0, g), at(0, 1, g)],
    ...mixed.map((i) => [at(x(i), 0, g), at(x(i + n), 0, g), at(x(i + m), 1, g)]),
    ...range(0, n).map((i) => [1, 3, 5].map((j) => at(x(i + m + j * n), 1, g)))
  ]);
}
