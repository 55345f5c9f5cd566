import { seededRandom } from '../random/seeded-random.ts';
import type { BothTails, Sides } from './largest-one-factor.ts';
import { normalDensity, normalQuantile, normalUpper } from './normal.ts';
import { latticeVector } from './lattice.ts';
import type { ResidualFactor } from './residual-factor.ts';

/** How much work the quasi-Monte Carlo integration does, and from which seed. */
export interface QuasiMonteCarlo {
  readonly seed: string | number;
  /** Random shifts of the point set; their scatter is the stated error. */
  readonly shifts: number;
  /** Points of each shift, a prime. */
  readonly points: number;
}

/** A factor node that adds less than this share to the tail is taken as if the residuals were independent. */
const MINOR = 1e-5;

/**
 * P(largest of m correlated standard normals > c) and its complement for any correlations, once for each random shift.
 *
 * The common factor is integrated by a randomly shifted trapezoidal rule; given it, the residuals one after the other by separation of
 * variables on a randomly shifted lattice. Where the residual correlations are small, so is the scatter.
 *
 * @param split the correlations as factor and residual
 * @param sides largest absolute value or largest value
 * @returns one estimate for each shift; the same points at every c, so that each is smooth in c
 * Cost: about 12·shifts·points·m conditional probabilities for each c.
 * Source: A. Genz & F. Bretz (2009), Computation of Multivariate Normal and t Probabilities, sections 4.1 and 4.2.2.
 * Checked by: test/core/numerics/distributions/dunnett.test.ts
 */
export function largestCorrelatedUpper(
  split: ResidualFactor,
  sides: Sides,
  effort: QuasiMonteCarlo
): (c: number) => BothTails[] {
  const m = split.loadings.length;
  const { shifts, points } = effort;
  const dimensions = m - 1;
  const lattice = latticePoints(points, dimensions);
  const random = seededRandom(effort.seed);
  const replicates = Array.from({ length: shifts }, () =>
    factorNodes(split.loadings, random.next()).map((node) => ({
      ...node,
      offset: Float64Array.from({ length: dimensions }, () => random.next())
    }))
  );
  const box = new ConditionalBox(split, sides);
  return (c) =>
    replicates.map((nodes) => {
      const rough = nodes.map(({ x }) => box.middle(c, x));
      const least = (end: keyof BothTails) =>
        MINOR * nodes.reduce((most, node, i) => Math.max(most, node.weight * rough[i]![end]), 0);
      const leastUpper = least('upper');
      const leastInside = least('inside');
      let upper = 0;
      let inside = 0;
      nodes.forEach(({ x, weight, offset }, node) => {
        const share = rough[node]!;
        if (weight * share.upper < leastUpper || weight * share.inside < leastInside) {
          upper += weight * share.upper;
          inside += weight * share.inside;
          return;
        }
        for (let n = 0; n < points; n++) {
          for (let d = 0; d < dimensions; d++) {
            // Shifted, then folded at a half (baker's transform).
            const u = lattice[n * dimensions + d]! + offset[d]!;
            box.uniforms[d] = Math.abs(2 * (u >= 1 ? u - 1 : u) - 1);
          }
          const log = box.logInside(c, x);
          upper -= (weight / points) * Math.expm1(log);
          inside += (weight / points) * Math.exp(log);
        }
      });
      return { upper, inside };
    });
}

function latticePoints(n: number, dimensions: number): Float64Array {
  const vector = latticeVector(n, dimensions);
  return Float64Array.from({ length: n * dimensions }, (_, i) => {
    const point = Math.floor(i / dimensions);
    return ((point * vector[i % dimensions]!) % n) / n;
  });
}

/** The box given factor x, each residual drawn inside it from one of `uniforms` before the next is judged. */
class ConditionalBox {
  readonly uniforms: Float64Array;
  readonly #drawn: Float64Array;
  readonly #split: ResidualFactor;
  readonly #twoSided: boolean;

  constructor(split: ResidualFactor, sides: Sides) {
    this.#split = split;
    this.#twoSided = sides === 'two';
    this.#drawn = new Float64Array(split.loadings.length);
    this.uniforms = new Float64Array(split.loadings.length - 1);
  }

  /** With every residual in the middle of what is left to it. */
  middle(c: number, x: number): BothTails {
    this.uniforms.fill(0.5);
    const log = this.logInside(c, x);
    return { upper: -Math.expm1(log), inside: Math.exp(log) };
  }

  /** Σ ln P(variable i inside | factor, variables before it). */
  logInside(c: number, x: number): number {
    const { loadings, L } = this.#split;
    const drawn = this.#drawn;
    const m = loadings.length;
    let log = 0;
    for (let i = 0; i < m; i++) {
      let centre = loadings[i]! * x;
      const row = i * m;
      for (let j = 0; j < i; j++) centre += L[row + j]! * drawn[j]!;
      const pivot = L[row + i]!;
      if (pivot === 0) {
        if (centre > c || (this.#twoSided && centre < -c)) return -Infinity;
        drawn[i] = 0;
        continue;
      }
      const above = normalUpper((c - centre) / pivot);
      const below = this.#twoSided ? normalUpper((c + centre) / pivot) : 0;
      const inside = insideOf(c, centre, pivot, above, below, this.#twoSided);
      if (!(inside > 1e-300)) return -Infinity;
      log += inside < 0.5 ? Math.log(inside) : Math.log1p(-above - below);
      if (i < m - 1) drawn[i] = between(below, above, inside, this.uniforms[i]!);
    }
    return log;
  }
}

/** 1 − above − below, without cancellation where the box lies in one tail. */
function insideOf(c: number, centre: number, pivot: number, above: number, below: number, two: boolean): number {
  if (above <= 0.5 && below <= 0.5) return 1 - above - below;
  if (!two) return normalUpper((centre - c) / pivot);
  return above > 0.5 ? normalUpper((centre - c) / pivot) - below : normalUpper((-c - centre) / pivot) - above;
}

/** The normal quantile of a point of the box, from the nearer end, and kept finite. */
function between(below: number, above: number, inside: number, u: number): number {
  const lower = below + u * inside;
  if (lower < 0.5) return normalQuantile(Math.max(lower, 1e-300));
  return -normalQuantile(Math.max(above + (1 - u) * inside, 1e-300));
}

/**
 * Trapezoidal nodes of the standard normal factor, shifted by a share of the step; one at zero where there is no common
 * factor. What so wide a step loses depends on the shift, so that it is part of the stated error.
 */
function factorNodes(loadings: Float64Array, shift: number): { x: number; weight: number }[] {
  const largest = loadings.reduce((l, v) => Math.max(l, Math.abs(v)), 0);
  if (largest === 0) return [{ x: 0, weight: 1 }];
  const step = Math.min(0.6, 0.8 * Math.sqrt(1 - largest * largest));
  const nodes = [];
  for (let i = -Math.ceil(8.5 / step); i <= 8.5 / step; i++) {
    const x = (i + shift) * step;
    nodes.push({ x, weight: step * normalDensity(x) });
  }
  return nodes;
}
