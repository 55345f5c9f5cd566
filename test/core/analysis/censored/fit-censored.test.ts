import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { fitCensored } from '#lib/core/analysis/censored/fit-censored.ts';
import type { CensoredFit } from '#lib/core/analysis/analysis-result.ts';
import type { Limit, Observations } from '#lib/core/analysis/observations.ts';
import { fixedOf, observations } from '../kept-model.ts';

interface LimitCase {
  id: string;
  data: { treatment: number[]; session: number[]; y: number[]; limit: Limit[] };
  logLik: number;
  sigma: number;
  sigmaSe: number;
  means: { estimate: number[]; se: number[] };
  pairs: { a: number[]; b: number[]; estimate: number[]; se: number[] };
  lr: number;
  df: number;
}

const file = JSON.parse(readFileSync(new URL('../../../reference/limits/limits.json', import.meta.url), 'utf8')) as {
  source: string;
  cases: LimitCase[];
};

const withLimits = ({ treatment, session, y, limit }: LimitCase['data']): Observations => {
  const base = observations(y.map((v, i) => [treatment[i]!, session[i]!, v]));
  return { ...base, rows: base.rows.map((row, i) => ({ ...row, limit: limit[i]! })) };
};

const fitOf = (input: Observations): CensoredFit => {
  const fit = fitCensored(input, [...input.rows.keys()]);
  if (!fit.ok) throw new Error(fit.error.tag);
  return fit.value;
};

/** survreg stops at a relative change of 1e-15 of the likelihood, which leaves 1e-8 in its parameters. */
const near = (actual: number | null, expected: number): void =>
  expect(Math.abs(actual! - expected)).toBeLessThan(1e-7 * Math.max(1, Math.abs(expected)));

describe('fitCensored', () => {
  it.each(file.cases)('fitCensored($id) agrees with survreg of R', (reference) => {
    const fit = fitOf(withLimits(reference.data));
    near(fit.logLik, reference.logLik);
    near(fit.sigma, reference.sigma);
    near(fit.sigmaSe, reference.sigmaSe);
    fit.means.forEach((line, i) => {
      near(line.estimate, reference.means.estimate[i]!);
      near(line.se, reference.means.se[i]!);
    });
    fit.pairs.forEach((line, i) => {
      near(line.estimate, reference.pairs.estimate[i]!);
      near(line.se, reference.pairs.se[i]!);
    });
    if (!fit.test.ok) throw new Error(fit.test.error.tag);
    near(fit.test.value.statistic, reference.lr);
    expect(fit.test.value.df).toBe(reference.df);
  });

  it('fitCensored(limits out of sight) is the ordinary fit with n in place of the degrees of freedom', () => {
    const { data } = file.cases[0]!;
    const all = withLimits({ ...data, limit: data.limit.map(() => 'none') });
    const least = Math.min(...data.y);
    // One more run of a treatment and session that are there, known only to be at least far below everything.
    const far = { ...all.rows[0]!, y: least - 1e3, limit: 'at-least' as const, runId: 'far' };
    const fit = fitOf({ ...all, rows: [...all.rows, far] });
    const ordinary = fixedOf(all);
    near(fit.sigma, Math.sqrt(ordinary.errorSs / ordinary.n));
    fit.pairs.forEach((line, i) => near(line.estimate, ordinary.pairs[i]!.estimate!));
  });

  it('fitCensored(a treatment whose runs all stopped) gives it no mean and still compares the others', () => {
    const { data } = file.cases[0]!;
    const fit = fitOf(
      withLimits({ ...data, limit: data.limit.map((l, i) => (data.treatment[i] === 2 ? 'at-least' : l)) })
    );
    expect(fit.means[2]).toMatchObject({ estimate: null, se: null });
    expect(fit.means[0]!.estimate).not.toBeNull();
    expect(fit.pairs.find((pair) => pair.a === 0 && pair.b === 1)!.se).toBeGreaterThan(0);
  });

  it('fitCensored(no limits) is not needed', () => {
    const { data } = file.cases[0]!;
    const input = withLimits({ ...data, limit: data.limit.map(() => 'none') });
    expect(fitCensored(input, [...input.rows.keys()])).toEqual({ ok: false, error: { tag: 'no-limits' } });
  });

  it('fitCensored(every run stopped) says that there is no maximum', () => {
    const { data } = file.cases[0]!;
    const input = withLimits({ ...data, limit: data.limit.map(() => 'at-most') });
    const fit = fitCensored(input, [...input.rows.keys()]);
    expect(fit.ok ? 'fit' : fit.error.tag).toBe('no-maximum');
  });
});
