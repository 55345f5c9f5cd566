import { describe, expect, it } from 'vitest';
import { observationsOfCase } from '../../../reference-run/reference-case.ts';
import { readCase } from '../../../reference-run/read-case.ts';
import { observations, randomOf } from '../kept-model.ts';

describe('fitRandom', () => {
  it('fitRandom(partially balanced design of 15) gives the published variance components and F', () => {
    // W. G. Cochran & G. M. Cox (1957), plan of 15 treatments in 15 blocks of 4; REML 0.04652 and 0.08556, F 1.53 in Littell
    // et al., SAS System for Mixed Models (recalled; see test/reference/cases/pub_pbib15.json).
    const fit = randomOf(observationsOfCase(readCase('pub_pbib15')));
    expect(fit.variance.session).toBeCloseTo(0.04652, 5);
    expect(fit.variance.run).toBeCloseTo(0.08556, 5);
    expect(fit.satterthwaite.tests[0]!.F).toBeCloseTo(1.53, 2);
  });

  it('fitRandom(complete blocks) gives the analysis-of-variance estimates and error degrees of freedom', () => {
    // With complete blocks REML equals the method of moments: σ² = MSE, σ_b² = (MS sessions − MSE)/t.
    const y = [
      [12, 15, 19],
      [14, 18, 20],
      [9, 13, 15],
      [20, 21, 27]
    ];
    const fit = randomOf(observations(y.flatMap((line, j) => line.map((v, i) => [i, j, v] as const))));
    const mean = (v: number[]): number => v.reduce((s, x) => s + x, 0) / v.length;
    const grand = mean(y.flat());
    const session = y.map(mean);
    const treatment = [0, 1, 2].map((i) => mean(y.map((line) => line[i]!)));
    const msSession = (3 * session.reduce((s, v) => s + (v - grand) ** 2, 0)) / 3;
    const residuals = y.flatMap((line, j) => line.map((v, i) => v - session[j]! - treatment[i]! + grand));
    const mse = residuals.reduce((s, v) => s + v * v, 0) / 6;
    expect(fit.variance.run).toBeCloseTo(mse, 10);
    expect(fit.variance.session).toBeCloseTo((msSession - mse) / 3, 10);
    for (const pair of fit.kenwardRoger.pairs) expect(pair.df).toBeCloseTo(6, 8);
    expect(fit.kenwardRoger.tests[0]!.denDf).toBeCloseTo(6, 8);
  });

  it('fitRandom returns a zero session variance when sessions do not differ', () => {
    const fit = randomOf(observationsOfCase(readCase('sim_zero_7_3_7')));
    expect(fit.variance).toMatchObject({ session: 0, ratio: 0, boundary: true });
    expect(fit.variance.scoreAtZero).toBeLessThan(0);
    expect(fit.variance.unconstrained!.ratio).toBeLessThan(0);
    expect(fit.variance.test).toEqual({ statistic: 0, p: 1 });
    expect(fit.sessions.every((line) => line.estimate === 0 && line.sd === 0)).toBe(true);
  });
});
