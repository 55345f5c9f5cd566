import { symmetricEigen } from '#lib/core/numerics/symmetric-eigen.ts';
import { connectedParts } from './connected-parts.ts';
import { replications } from './concurrence.ts';
import { informationMatrix } from './information-matrix.ts';

/** Canonical efficiency factors of a design and their harmonic mean. */
export interface EfficiencyFactors {
  /** Non-zero eigenvalues of R^(−1/2) C R^(−1/2), ascending. */
  factors: number[];
  /** Harmonic mean E; 0 when the design is not connected. */
  mean: number;
}

/**
 * Returns the canonical efficiency factors: the non-zero eigenvalues of `R^(−1/2) C R^(−1/2)`. As many eigenvalues as
 * the design has connected parts are zero (the smallest ones); no tolerance decides it.
 *
 * @param blocks treatments of each session
 * @param treatments number of treatments; one that is in no session counts as a part by itself
 *
 * **Source**: James & Wilkinson (1971), Biometrika 58, 279–294; John & Williams (1995), section 2.3.
 * **Checked by** test/core/design/information.test.ts
 */
export function efficiencyFactors(blocks: readonly (readonly number[])[], treatments: number): EfficiencyFactors {
  const c = informationMatrix(blocks, treatments);
  const scale = replications(blocks, treatments).map((r) => (r > 0 ? 1 / Math.sqrt(r) : 0));
  for (let i = 0; i < treatments; i++) {
    for (let j = 0; j < treatments; j++) c[i * treatments + j]! *= scale[i]! * scale[j]!;
  }
  const parts = connectedParts(blocks, treatments).length;
  const factors = [...symmetricEigen(c, treatments).values].slice(parts);
  const mean = parts === 1 && factors.length > 0 ? factors.length / factors.reduce((sum, e) => sum + 1 / e, 0) : 0;
  return { factors, mean };
}
