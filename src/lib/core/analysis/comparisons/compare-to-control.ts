import { largestT, type LargestT } from '../../numerics/distributions/dunnett.ts';
import { tTwoSided } from '../../numerics/distributions/student-t.ts';
import { fail, ok } from '../../result.ts';
import type { ControlComparison, ControlLine } from '../comparison-result.ts';
import type { Section } from '../reason.ts';
import { differenceCorrelation, type DifferenceSource } from './difference-source.ts';

/** With more treatments than this the simulation takes too long, and the residual correlations are small. */
const MOST_SIMULATED = 24;
/** A stated error of p up to this is close enough: the next effort is not made. */
const CLOSE = 1e-4;
/** Efforts of the simulation, one after the other until its stated error is close. */
const SHIFTS = 8;
const POINTS = [61, 127, 251];

/**
 * Compares every treatment with the control (treatment − control), two-sided, with Dunnett's single-step adjustment and
 * simultaneous intervals.
 *
 * Where standard errors have degrees of freedom of their own, each line uses its own. Where the correlations are not
 * products, the expansion answers if its stated error is at most 1e-4, else quasi-Monte Carlo in up to three efforts.
 *
 * @param control position of the control
 * @param alpha error probability of the family
 * @param seed of the quasi-Monte Carlo integration, where one is needed
 * @param quick takes the expansion whatever error it states
 * @returns the lines in order of the treatments; `critical` belongs to the line with the fewest degrees of freedom
 *
 * Source: C. W. Dunnett (1955), A multiple comparison procedure for comparing several treatments with a control, JASA
 * 50, 1096–1121; general correlations as in T. Hothorn, F. Bretz & P. Westfall (2008), Biometrical Journal 50, 346–363.
 * Checked by: test/core/analysis/comparisons/compare-to-control.test.ts
 */
export function compareToControl(
  source: DifferenceSource,
  control: number,
  alpha: number,
  seed: string | number,
  quick = false
): Section<ControlComparison> {
  if (!source.present.includes(control)) return fail({ tag: 'control-without-readings' });
  const others = source.present.filter((i) => i !== control && source.estimable(i, control));
  const lost = Array.from({ length: source.treatments }, (_, i) => i).filter(
    (i) => i !== control && !others.includes(i)
  );
  if (others.length === 0) return fail({ tag: 'no-shared-session' });
  if (others.some((i) => !(source.se(i, control) > 0))) return fail({ tag: 'no-scatter' });
  const m = others.length;
  const correlation = differenceCorrelation(source, control, others);
  const efforts = quick || m > MOST_SIMULATED ? [] : POINTS.map((points) => ({ seed, shifts: SHIFTS, points }));
  for (const effort of ['expand' as const, ...efforts]) {
    const compared = compareBy(largestT(correlation, m, 'two', effort), source, control, others, alpha);
    if (compared.error <= CLOSE || effort === (efforts.at(-1) ?? 'expand')) return ok({ ...compared.result, lost });
  }
  throw new Error('compareToControl: no effort was left');
}

function compareBy(
  largest: LargestT,
  source: DifferenceSource,
  control: number,
  others: readonly number[],
  alpha: number
): { result: Omit<ControlComparison, 'lost'>; error: number } {
  const critical = criticalByDf(largest, alpha);
  const lines = others.map((treatment): ControlLine => {
    const estimate = source.estimate(treatment, control);
    const se = source.se(treatment, control);
    const df = source.df(treatment, control);
    const t = estimate / se;
    const { p, error } = largest.upper(Math.abs(t), df);
    const half = critical(df) * se;
    return {
      treatment,
      estimate,
      se,
      df,
      t,
      p: tTwoSided(t, df),
      pDunnett: p,
      pError: error,
      lower: estimate - half,
      upper: estimate + half
    };
  });
  const fewest = Math.min(...lines.map((line) => line.df));
  const atCritical = largest.upper(critical(fewest), fewest).error;
  return {
    result: { control, lines, critical: critical(fewest), method: largest.method },
    error: lines.reduce((most, line) => Math.max(most, line.pError), atCritical)
  };
}

/** Critical values, each computed once for its degrees of freedom. */
export function criticalByDf(largest: LargestT, alpha: number): (df: number) => number {
  const known = new Map<number, number>();
  return (df) => {
    let value = known.get(df);
    if (value === undefined) known.set(df, (value = largest.quantile(alpha, df)));
    return value;
  };
}
