import { noncentralFUpper } from '#lib/core/numerics/distributions/noncentral-f.ts';
import { fUpperQuantile } from '#lib/core/numerics/distributions/f.ts';
import { pairVariance } from './a-value.ts';
import { criticalT, detectableRatio, pairPower } from './detectable-difference.ts';
import { informationMatrix } from './information-matrix.ts';
import { moorePenrose } from './moore-penrose.ts';
import type { Detectable, Precision } from './propose-types.ts';

/** What precision is asked for. */
export interface PrecisionRequest {
  /** Scatter σ between runs in one session; null: results are in units of σ. */
  scatter: number | null;
  /** Smallest difference that matters, in the measurand's unit; null when not said. */
  difference: number | null;
  alpha: number;
}

const ratios = new Map<string, { unadjusted: [number, number]; tukey: [number, number]; critical: number }>();

/** Detectable ratios at power 0.8 and 0.9; many choices share their degrees of freedom. */
function detectableRatios(alpha: number, df: number, means: number) {
  const key = `${alpha} ${df} ${means}`;
  let known = ratios.get(key);
  if (!known) {
    const critical = criticalT(alpha, df, { tag: 'unadjusted' });
    const range = criticalT(alpha, df, { tag: 'tukey', means });
    known = {
      critical,
      unadjusted: [detectableRatio(critical, df, 0.8), detectableRatio(critical, df, 0.9)],
      tukey: [detectableRatio(range, df, 0.8), detectableRatio(range, df, 0.9)]
    };
    if (ratios.size > 500) ratios.clear();
    ratios.set(key, known);
  }
  return known;
}

/**
 * Returns the precision of a connected design before the first run, for the analysis with fixed sessions.
 *
 * Error degrees of freedom `n − b − t + 1`; standard error of a difference `σ √(2 tr C⁺/(t − 1))` (root of the mean
 * variance; least and largest over pairs beside it); detectable differences by the non-central t distribution; power of
 * the F test by the non-central F distribution with `ncp = δ²/(4σ²)·2 tr C/(t − 1)`, the mean over pairs of τᵀCτ/σ² when one
 * pair lies δ apart and all others half-way.
 *
 * @param blocks treatments of each session
 * @param treatments number of treatments t
 *
 * Errors: throws when the design is not connected.
 *
 * **Source**: John & Williams (1995), Cyclic and Computer Generated Designs, sections 1.4 and 2.3; Johnson, Kotz &
 * Balakrishnan (1995), Continuous Univariate Distributions 2, chapters 30 and 31.
 * **Checked by** test/core/design/design-precision.test.ts
 */
export function designPrecision(
  blocks: readonly (readonly number[])[],
  treatments: number,
  { scatter, difference, alpha }: PrecisionRequest
): Precision {
  const c = informationMatrix(blocks, treatments);
  const inverse = moorePenrose(c, treatments);
  if (!inverse) throw new Error('designPrecision: the design is not connected');
  const sigma = scatter ?? 1;
  const runs = blocks.reduce((sum, block) => sum + block.length, 0);
  const errorDf = runs - blocks.length - treatments + 1;
  let [trace, least, most, sum] = [0, Infinity, 0, 0];
  for (let i = 0; i < treatments; i++) {
    trace += c[i * treatments + i]!;
    for (let l = 0; l < i; l++) {
      const variance = pairVariance(inverse, treatments, i, l);
      least = Math.min(least, variance);
      most = Math.max(most, variance);
      sum += variance;
    }
  }
  const sed = sigma * Math.sqrt(sum / ((treatments * (treatments - 1)) / 2));
  const precision: Precision = {
    errorDf,
    sed,
    sedMin: sigma * Math.sqrt(least),
    sedMax: sigma * Math.sqrt(most),
    power80: null,
    power90: null,
    powerForDifference: null,
    overallPower: null,
    unit: scatter === null ? 'sigma' : 'measurand'
  };
  if (errorDf < 1) return precision;
  const { critical, unadjusted, tukey } = detectableRatios(alpha, errorDf, treatments);
  const detectable = (at: 0 | 1): Detectable => ({ unadjusted: sed * unadjusted[at], tukey: sed * tukey[at] });
  precision.power80 = detectable(0);
  precision.power90 = detectable(1);
  if (scatter !== null && difference !== null) {
    precision.powerForDifference = pairPower(difference / sed, critical, errorDf);
    const ncp = ((difference / sigma) ** 2 / 4) * ((2 * trace) / (treatments - 1));
    const f = fUpperQuantile(alpha, treatments - 1, errorDf);
    precision.overallPower = noncentralFUpper(f, treatments - 1, errorDf, ncp);
  }
  return precision;
}
