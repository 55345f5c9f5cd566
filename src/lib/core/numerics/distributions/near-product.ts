import type { BothTails, Sides } from './largest-one-factor.ts';
import { normalDensity, normalUpper } from './normal.ts';

/** Beyond this the expansion has failed, in boxes so far out that they do not count. */
const LARGEST_CORRECTION = 1;

/**
 * P(largest of m correlated standard normals > c) and its complement where the correlations are nearly products
 * λ_i·λ_j: the expansion in the residual correlations ψ to second order, deterministic and quick.
 *
 * Given the factor, ln P = Σ ln e_i + Σ_{i<j} ψ_ij a_i a_j + ½ Σ_{i<j} ψ_ij² (b_i b_j − a_i² a_j²)
 * + ½ Σ_i (b_i − a_i²)(v_i² − Σ_j ψ_ij² a_j²), with e_i the chance of variable i to be inside, a_i = e_i′/e_i and
 * b_i = e_i″/e_i its derivatives by its mean, v_i = Σ_j ψ_ij a_j: exp(Σ_{i<j} ψ_ij ∂_i ∂_j) Π e_i as a cumulant series.
 *
 * @param correlation row-major m×m
 * @param loadings λ of the nearest product form
 * @returns both tails as a function of c, to first and to second order; the second is off by some 1e-4 at most in
 *   unbalanced block designs
 * Cost: about 60·m² operations for each c.
 * Source: the derivative by a correlation is R. L. Plackett (1954), A reduction formula for normal multivariate
 * integrals, Biometrika 41, 351–360; the series to second order is own work from it.
 * Checked by: test/core/numerics/distributions/near-product.test.ts (against simulation and the reference designs)
 */
export function largestNearProduct(
  correlation: Float64Array,
  loadings: Float64Array,
  sides: Sides
): (c: number) => [first: BothTails, second: BothTails] {
  const m = loadings.length;
  const spread = loadings.map((l) => Math.sqrt((1 - l) * (1 + l)));
  const psi = residuals(correlation, loadings, spread);
  const psiSquared = psi.map((v) => v * v);
  const steepest = loadings.reduce((s, l, i) => Math.max(s, Math.abs(l / spread[i]!)), 0);
  const step = Math.min(0.3, 0.5 / Math.sqrt(1 + steepest * steepest));
  const a = new Float64Array(m);
  const b = new Float64Array(m);

  const orders = [0, 0];
  /** ln P of both orders, into `orders`. */
  const logInside = (c: number, x: number): void => {
    let log = 0;
    orders.fill(-Infinity);
    for (let i = 0; i < m; i++) {
      const high = (c - loadings[i]! * x) / spread[i]!;
      const low = sides === 'two' ? (-c - loadings[i]! * x) / spread[i]! : -Infinity;
      const outside = normalUpper(high) + normalUpper(-low);
      const inside = outside < 0.5 ? 1 - outside : Math.abs(normalUpper(low) - normalUpper(high));
      if (!(inside > 1e-250)) return;
      log += outside < 0.5 ? Math.log1p(-outside) : Math.log(inside);
      const atHigh = normalDensity(high);
      const atLow = sides === 'two' ? normalDensity(low) : 0;
      a[i] = (atLow - atHigh) / inside;
      b[i] = ((sides === 'two' ? low * atLow : 0) - high * atHigh) / inside;
    }
    const { first, second } = correction(psi, psiSquared, a, b);
    orders[0] = Math.min(0, log + limited(first));
    orders[1] = Math.min(0, log + limited(first + second));
  };

  return (c) => {
    if (sides === 'two' && c <= 0) return [CERTAIN, CERTAIN];
    const sums = [
      { upper: 0, inside: 0 },
      { upper: 0, inside: 0 }
    ] satisfies [BothTails, BothTails];
    for (let i = -Math.ceil(9 / step); i <= 9 / step; i++) {
      logInside(c, i * step);
      const weight = step * normalDensity(i * step);
      sums.forEach((sum, order) => {
        sum.upper -= weight * Math.expm1(orders[order]!);
        sum.inside += weight * Math.exp(orders[order]!);
      });
    }
    return sums;
  };
}

const CERTAIN: BothTails = { upper: 1, inside: 0 };

function limited(correction: number): number {
  return Math.max(-LARGEST_CORRECTION, Math.min(LARGEST_CORRECTION, correction));
}

function residuals(correlation: Float64Array, loadings: Float64Array, spread: Float64Array): Float64Array {
  const m = loadings.length;
  return correlation.map((rho, at) => {
    const i = Math.floor(at / m);
    const j = at % m;
    return i === j ? 0 : (rho - loadings[i]! * loadings[j]!) / (spread[i]! * spread[j]!);
  });
}

function correction(psi: Float64Array, psiSquared: Float64Array, a: Float64Array, b: Float64Array) {
  const m = a.length;
  let first = 0;
  let second = 0;
  for (let i = 0; i < m; i++) {
    let v = 0;
    let squares = 0;
    let bs = 0;
    const row = i * m;
    for (let j = 0; j < m; j++) {
      const aj = a[j]!;
      const square = psiSquared[row + j]!;
      v += psi[row + j]! * aj;
      squares += square * aj * aj;
      bs += square * b[j]!;
    }
    const ai = a[i]!;
    // Sums over i and j count each pair twice.
    first += 0.5 * ai * v;
    second += 0.25 * (b[i]! * bs - ai * ai * squares) + 0.5 * (b[i]! - ai * ai) * (v * v - squares);
  }
  return { first, second };
}
