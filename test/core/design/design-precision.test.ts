import { describe, expect, test } from 'vitest';
import { criticalT, pairPower } from '#lib/core/design/detectable-difference.ts';
import { designPrecision } from '#lib/core/design/design-precision.ts';
import { fUpperQuantile } from '#lib/core/numerics/distributions/f.ts';
import { noncentralFUpper } from '#lib/core/numerics/distributions/noncentral-f.ts';

// The catalyst layout (Montgomery, Design and Analysis of Experiments): 4 treatments, 4 sessions of 3, λ = 2.
const CATALYST = [[0, 1, 2], [0, 1, 3], [0, 2, 3], [1, 2, 3]]; // prettier-ignore

describe('designPrecision', () => {
  test('designPrecision(catalyst layout) has 5 error degrees of freedom and the published standard error', () => {
    // Published: error mean square 0.65, standard error of a difference √(2·3·0.65/(2·4)) = 0.698
    const precision = designPrecision(CATALYST, 4, { scatter: Math.sqrt(0.65), difference: null, alpha: 0.05 });
    expect(precision.errorDf).toBe(5);
    expect(precision.sed).toBeCloseTo(Math.sqrt((2 * 3 * 0.65) / (2 * 4)), 12);
    expect(precision.sedMin).toBeCloseTo(precision.sedMax, 12);
    expect(precision.unit).toBe('measurand');
    expect(precision.powerForDifference).toBeNull();
  });

  test('designPrecision(...) gives differences that the test finds with power 0.8 and 0.9', () => {
    const precision = designPrecision(CATALYST, 4, { scatter: null, difference: null, alpha: 0.05 });
    expect(precision.unit).toBe('sigma');
    const t = criticalT(0.05, 5, { tag: 'unadjusted' });
    const range = criticalT(0.05, 5, { tag: 'tukey', means: 4 });
    for (const [found, power] of [
      [precision.power80!, 0.8],
      [precision.power90!, 0.9]
    ] as const) {
      // prettier-ignore
      expect(pairPower(found.unadjusted / precision.sed, t, 5)).toBeCloseTo(power, 9);
      expect(pairPower(found.tukey / precision.sed, range, 5)).toBeCloseTo(power, 9);
      expect(found.tukey).toBeGreaterThan(found.unadjusted);
    }
  });

  test('designPrecision(...) gives the power for the difference that matters, for a pair and overall', () => {
    const precision = designPrecision(CATALYST, 4, { scatter: 2, difference: 5, alpha: 0.05 });
    const t = criticalT(0.05, 5, { tag: 'unadjusted' });
    expect(precision.powerForDifference).toBeCloseTo(pairPower(5 / precision.sed, t, 5), 12);
    // Balanced: C = (λt/k)(I − J/t), so τᵀCτ = (8/3)·δ²/2.
    const ncp = ((8 / 3) * 5 ** 2) / 2 / 2 ** 2;
    expect(precision.overallPower).toBeCloseTo(noncentralFUpper(fUpperQuantile(0.05, 3, 5), 3, 5, ncp), 10);
  });

  test('designPrecision(...) of a design without error degrees of freedom gives no detectable difference', () => {
    const precision = designPrecision([[0, 1], [1, 2]], 3, { scatter: 1, difference: 1, alpha: 0.05 }); // prettier-ignore
    expect(precision).toMatchObject({ errorDf: 0, power80: null, power90: null, powerForDifference: null });
    // The chain 0–1–2: neighbours 2σ², ends 4σ².
    expect([precision.sedMin, precision.sedMax]).toEqual([expect.closeTo(Math.SQRT2, 10), expect.closeTo(2, 10)]);
  });

  test('designPrecision(...) throws when the design is not connected', () => {
    expect(() => designPrecision([[0, 1], [2, 3]], 4, { scatter: null, difference: null, alpha: 0.05 })).toThrow(/connected/); // prettier-ignore
  });
});
