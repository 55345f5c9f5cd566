import { informationMatrix } from './information-matrix.ts';
import { moorePenrose } from './moore-penrose.ts';

/**
 * Returns the A-value of a design: the average variance of a treatment difference in units of σ²,
 * `2·trace(C⁺)/(t − 1)`. Infinite when some difference cannot be estimated.
 *
 * @param blocks treatments of each session
 * @param treatments number of treatments, at least 2
 *
 * Cost: t³.
 *
 * **Source**: John & Williams (1995), Cyclic and Computer Generated Designs, 2nd ed., section 2.4.
 * **Checked by** test/core/design/information.test.ts
 */
export function aValue(blocks: readonly (readonly number[])[], treatments: number): number {
  const inverse = moorePenrose(informationMatrix(blocks, treatments), treatments);
  if (!inverse) return Infinity;
  let trace = 0;
  for (let i = 0; i < treatments; i++) trace += inverse[i * treatments + i]!;
  return (2 * trace) / (treatments - 1);
}

/** Variance of the difference between treatments i and j in units of σ², from C⁺. */
export const pairVariance = (inverse: Float64Array, t: number, i: number, j: number): number =>
  inverse[i * t + i]! + inverse[j * t + j]! - 2 * inverse[i * t + j]!;
