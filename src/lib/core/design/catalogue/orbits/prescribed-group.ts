import { finiteField } from '../../../numerics/finite-field.ts';
import type { Parameters } from '../parameters.ts';
import { abelianGroup, gcd } from './abelian-group.ts';
import type { OrbitShape } from './orbit-search.ts';
import type { Permutation, PermutationGroup } from './permutation-group.ts';

/** A group x → ax + s to look for designs under, and the ways base blocks may be kept in place by part of it. */
export interface PrescribedGroup {
  group: PermutationGroup;
  /** Number of translations s. */
  translations: number;
  /** Each stabiliser worth trying, the trivial one first. */
  stabilisers: readonly (readonly Permutation[])[];
}

/** Where to look: copies of an abelian group, fixed points, and how many multipliers a. */
export interface GroupRecipe {
  moduli: readonly number[];
  copies: number;
  fixed: number;
  /** Order of the group of multipliers; 1 for none. */
  multipliers: number;
}

/**
 * The group of a recipe, or null when the abelian group has no multipliers of that order: for Z_n units modulo n, for
 * the additive group of GF(q) non-zero elements of GF(q).
 *
 * Checked by: test/core/design/catalogue/orbits/prescribed-group.test.ts
 */
export function prescribedGroup({ moduli, copies, fixed, multipliers }: GroupRecipe): PrescribedGroup | null {
  const translations = abelianGroup(moduli);
  const n = translations.order;
  const factors = multiplications(moduli, n, multipliers);
  if (!factors) return null;
  const degree = copies * n + fixed;
  const element = (multiply: (g: number) => number, s: number): Permutation =>
    Array.from({ length: degree }, (_, point) =>
      point < copies * n ? point - (point % n) + translations.add(multiply(point % n), s) : point
    );
  const elements = factors.flatMap((multiply) => Array.from({ length: n }, (_, s) => element(multiply, s)));
  const subgroups = cyclicSubgroups(translations.add, n);
  const stabilisers = [
    [elements[0]!],
    ...(multipliers > 1 ? [factors.map((multiply) => element(multiply, 0))] : []),
    ...subgroups.flatMap((subgroup) => {
      const closed = subgroup.every((s) => factors.every((multiply) => subgroup.includes(multiply(s))));
      return [
        subgroup.map((s) => element((g) => g, s)),
        ...(multipliers > 1 && closed ? [factors.flatMap((multiply) => subgroup.map((s) => element(multiply, s)))] : [])
      ];
    })
  ];
  const parts = [
    translations.name,
    ...(multipliers > 1 ? [`with ${multipliers} multipliers`] : []),
    ...(copies > 1 ? [`on ${copies} copies of itself`] : []),
    ...(fixed > 0 ? [`with ${fixed} fixed ${fixed === 1 ? 'treatment' : 'treatments'}`] : [])
  ];
  return { group: { degree, elements, name: parts.join(' ') }, translations: n, stabilisers };
}

/** The multiplications by the powers of one element of the given order, the first that is found. */
function multiplications(moduli: readonly number[], n: number, order: number): ((g: number) => number)[] | null {
  if (order === 1) return [(g) => g];
  if (moduli.length === 1) {
    for (let unit = 2; unit < n; unit++) {
      if (gcd(unit, n) !== 1) continue;
      const powers = [1];
      for (let x = unit; x !== 1 && powers.length <= order; x = (x * unit) % n) powers.push(x);
      // Differences of units must be units too, or the multipliers fix more than zero.
      if (powers.length === order && powers.every((x) => x === 1 || gcd(x - 1, n) === 1)) {
        return powers.map((factor) => (g) => (g * factor) % n);
      }
    }
    return null;
  }
  const field = moduli.every((m) => m === moduli[0]) ? finiteField(n) : null;
  if (!field || field.characteristic !== moduli[0] || (n - 1) % order !== 0) return null;
  return Array.from({ length: order }, (_, i) => (g: number) => field.multiply(g, field.power((i * (n - 1)) / order)));
}

/** One cyclic subgroup of each order but 1. */
function cyclicSubgroups(add: (a: number, b: number) => number, n: number): number[][] {
  const ofOrder = new Map<number, number[]>();
  for (let g = 1; g < n; g++) {
    const subgroup = [0];
    for (let x = g; x !== 0; x = add(x, g)) subgroup.push(x);
    if (!ofOrder.has(subgroup.length)) ofOrder.set(subgroup.length, subgroup);
  }
  return [...ofOrder.entries()].sort(([a], [b]) => a - b).map(([, subgroup]) => subgroup);
}

/** At most this many base blocks of a shape may be kept in place by a translation. */
const MOST_SHORT = 3;

/** The ways to make up b blocks from orbits of the group: how many base blocks with which stabiliser, fewest first. */
export function orbitShapes(
  { group, translations, stabilisers }: PrescribedGroup,
  { b, k }: Parameters
): OrbitShape[][] {
  const kinds = stabilisers
    .filter((stabiliser) => canFill(stabiliser, group.degree, k))
    .map((stabiliser) => {
      const length = group.elements.length / stabiliser.length;
      return { stabiliser, length, short: length < translations };
    });
  const found: OrbitShape[][] = [];
  const choose = (i: number, left: number, shortLeft: number, shape: OrbitShape[]): void => {
    if (left === 0) found.push(shape);
    const kind = kinds[i];
    if (!kind || left === 0) return;
    const fits = Math.floor(left / kind.length);
    for (let count = kind.short ? Math.min(fits, shortLeft) : fits; count >= 0; count--) {
      const next = count > 0 ? [...shape, { stabiliser: kind.stabiliser, count }] : shape;
      choose(i + 1, left - count * kind.length, kind.short ? shortLeft - count : shortLeft, next);
    }
  };
  choose(0, b, MOST_SHORT, []);
  const blocks = (shape: OrbitShape[]): number => shape.reduce((sum, { count }) => sum + count, 0);
  return found.sort((x, y) => blocks(x) - blocks(y));
}

/** Whether k treatments can be put together from whole orbits of the stabiliser. */
function canFill(stabiliser: readonly Permutation[], degree: number, k: number): boolean {
  const reachable = new Uint8Array(k + 1);
  reachable[0] = 1;
  const seen = new Set<number>();
  for (let point = 0; point < degree; point++) {
    if (seen.has(point)) continue;
    const orbit = new Set(stabiliser.map((g) => g[point]!));
    orbit.forEach((x) => seen.add(x));
    for (let size = k; size >= orbit.size; size--) if (reachable[size - orbit.size]) reachable[size] = 1;
  }
  return reachable[k] === 1;
}
