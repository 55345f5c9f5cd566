import { describe, expect, it } from 'vitest';
import { observationsOfCase } from '../../../reference-run/reference-case.ts';
import { readCase } from '../../../reference-run/read-case.ts';
import { fixedOf, observations } from '../kept-model.ts';

describe('fitFixed', () => {
  it('fitFixed(catalyst example) gives the published adjusted means and analysis of variance', () => {
    // D. C. Montgomery, Design and Analysis of Experiments: 4 catalysts, 4 batches, 3 a batch.
    const fit = fixedOf(observationsOfCase(readCase('pub_catalyst')));
    [71.375, 71.625, 72, 75].forEach((mean, i) => expect(fit.means[i]!.estimate).toBeCloseTo(mean, 10));
    const treatment = fit.anova.sources.find((line) => line.source === 'treatment')!;
    expect(treatment.adjusted.df).toBe(3);
    expect(treatment.adjusted.ss).toBeCloseTo(22.75, 10);
    expect(treatment.adjusted.F).toBeCloseTo(11.67, 2);
    expect(fit.anova.error.ss).toBeCloseTo(3.25, 10);
    expect(fit.anova.error.df).toBe(5);
  });

  it('fitFixed(rabbit diets) gives the published difference and its standard error', () => {
    // Lentner & Bishop's data as analysed by J. Faraway, Linear Models with R: b − a = −1.74167, standard error 2.24182.
    const fit = fixedOf(observationsOfCase(readCase('pub_rabbit')));
    const ab = fit.pairs.find((pair) => pair.a === 0 && pair.b === 1)!;
    expect(-ab.estimate!).toBeCloseTo(-1.74167, 5);
    expect(ab.se).toBeCloseTo(2.24182, 5);
  });

  it('fitFixed(two treatments in pairs) is the paired t test', () => {
    // By hand: differences 2, 3, 1, 2: mean 2, standard deviation √(2/3), standard error √(2/3)/2.
    const pairs = [
      [5, 3],
      [9, 6],
      [2, 1],
      [6, 4]
    ];
    const fit = fixedOf(observations(pairs.flatMap(([a, b], j) => [[0, j, a!] as const, [1, j, b!] as const])));
    expect(fit.pairs[0]!.estimate).toBeCloseTo(2, 14);
    expect(fit.pairs[0]!.se).toBeCloseTo(Math.sqrt(2 / 3) / 2, 14);
    expect(fit.pairs[0]!.df).toBe(3);
  });

  it('fitFixed without error degrees of freedom gives estimates and no standard error', () => {
    const fit = fixedOf(
      observations([
        [0, 0, 1],
        [1, 0, 3],
        [1, 1, 4],
        [2, 1, 9]
      ])
    );
    expect(fit.errorDf).toBe(0);
    expect(fit.sigma).toBeNull();
    expect(fit.pairs.map((pair) => pair.estimate)).toEqual([-2, -7, -5].map((v) => expect.closeTo(v, 12)));
    expect(fit.pairs.every((pair) => pair.se === null && pair.p === null)).toBe(true);
  });

  it('fitFixed(readings of a perfect additive pattern) has no scatter rather than a tiny one', () => {
    const runs = [0, 1, 2].flatMap((j) => [0, 1, 2].map((i) => [i, j, 0.1 * i + 0.7 * j] as const));
    const fit = fixedOf(observations(runs));
    expect(fit.sigma).toBeNull();
    expect(fit.pairs[0]!.estimate).toBeCloseTo(-0.1, 14);
  });

  it('fitFixed keeps every digit at offset 2^27 and at scales 2^40 and 2^-40', () => {
    const input = observationsOfCase(readCase('sim_cyc_8_3_8'));
    // Readings rounded to 1/64, so that the offset is exact and both inputs hold the same numbers.
    const at = (f: (y: number) => number) =>
      fixedOf({ ...input, rows: input.rows.map((row) => ({ ...row, y: f(Math.round(row.y! * 64) / 64) })) });
    const plain = at((y) => y);
    const offset = at((y) => y + 2 ** 27);
    expect(offset.errorSs).toBe(plain.errorSs);
    for (const scale of [2 ** 40, 2 ** -40]) {
      const scaled = at((y) => y * scale);
      expect(scaled.errorSs / scale ** 2).toBeCloseTo(plain.errorSs, 10);
      scaled.pairs.forEach((pair, i) => expect(pair.p).toBeCloseTo(plain.pairs[i]!.p!, 12));
    }
  });

  it('fitFixed analyses each part of a disconnected design and leaves pairs across parts empty', () => {
    const fit = fixedOf(observationsOfCase(readCase('sim_disc_4_3')));
    const across = fit.pairs.find((pair) => pair.a === 0 && pair.b === 4)!;
    const inside = fit.pairs.find((pair) => pair.a === 0 && pair.b === 1)!;
    expect(across).toMatchObject({ estimable: false, estimate: null, p: null, pTukey: null });
    expect(inside.estimable).toBe(true);
    expect(new Set(fit.means.map((mean) => `${mean.scope} ${mean.part}`))).toEqual(new Set(['part 0', 'part 1']));
    expect(fit.means[0]!.estimate! - fit.means[1]!.estimate!).toBeCloseTo(inside.estimate!, 10);
  });

  it('fitFixed(200 treatments in a chain of pairs) adds differences up along the chain', () => {
    // The worst conditioned connected design: treatment i meets only i − 1 and i + 1, twice.
    const t = 200;
    const runs = Array.from({ length: 2 * (t - 1) }, (_, j) => {
      const i = j % (t - 1);
      return [[i, j, Math.sin(i) + j / 7 + (j % 2)] as const, [i + 1, j, Math.sin(i + 1) + j / 7] as const];
    }).flat();
    const fit = fixedOf(observations(runs));
    const sum = fit.pairs.filter((p) => p.b === p.a + 1).reduce((s, p) => s + p.estimate!, 0);
    const ends = fit.pairs.find((p) => p.a === 0 && p.b === t - 1)!;
    expect(ends.estimate).toBeCloseTo(sum, 10);
    // Each link is seen twice: Var of a link = 2σ²/2, of the whole chain 199σ².
    expect(ends.se).toBeCloseTo(fit.sigma! * Math.sqrt(199), 9);
  });
});
