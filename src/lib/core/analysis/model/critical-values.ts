import { tQuantile } from '../../numerics/distributions/student-t.ts';
import { tukeyUpperQuantile } from '../../numerics/distributions/tukey.ts';

/** Critical values as functions of the degrees of freedom, cheap when thousands of pairs have degrees of their own. */
export interface CriticalValues {
  /** Two-sided t at level alpha. */
  t: (df: number) => number;
  /** q/√2 of Tukey–Kramer at level alpha for `means` means. */
  tukey: (df: number) => number;
}

const NODES = 9;
/** Degrees of freedom closer than this, relatively, are the same (as all pairs have in a balanced design). */
const ROUNDING = 1e-11;

/**
 * Prepares critical values for degrees of freedom in [from, to]. Few values are computed one by one; for many the
 * quantile is interpolated in 1/df at Chebyshev nodes (it is analytic there; the error is below 1e-9 relative).
 *
 * @param many how many pairs will ask
 *
 * Checked by: test/core/analysis/model/critical-values.test.ts (against the quantiles themselves)
 */
export function criticalValues(alpha: number, means: number, from: number, to: number, many: number): CriticalValues {
  const t = (df: number): number => tQuantile(1 - alpha / 2, df);
  const tukey = (df: number): number => (means < 2 ? NaN : tukeyUpperQuantile(alpha, means, df) / Math.SQRT2);
  if (to <= from * (1 + ROUNDING)) return { t: always(t, from), tukey: always(tukey, from) };
  if (many <= 2 * NODES) return { t: remembered(t), tukey: remembered(tukey) };
  return { t: interpolated(t, from, to), tukey: interpolated(tukey, from, to) };
}

function always(f: (df: number) => number, df: number): () => number {
  let value: number | null = null;
  return () => (value ??= f(df));
}

function remembered(f: (df: number) => number): (df: number) => number {
  const known = new Map<number, number>();
  return (df) => {
    let value = known.get(df);
    if (value === undefined) known.set(df, (value = f(df)));
    return value;
  };
}

/** Barycentric interpolation in 1/df; falls back on f itself where the range is wide or below 3. */
function interpolated(f: (df: number) => number, from: number, to: number): (df: number) => number {
  if (from < 3 || to / from > 1.6) return remembered(f);
  const low = 1 / to;
  const high = 1 / from;
  const x = Array.from({ length: NODES }, (_, i) => {
    const c = Math.cos(((2 * i + 1) * Math.PI) / (2 * NODES));
    return (low + high) / 2 + ((high - low) / 2) * c;
  });
  const w = x.map((_, i) => (i % 2 === 0 ? 1 : -1) * Math.sin(((2 * i + 1) * Math.PI) / (2 * NODES)));
  const y = x.map((v) => f(1 / v));
  return (df) => {
    let num = 0;
    let den = 0;
    for (let i = 0; i < NODES; i++) {
      const d = 1 / df - x[i]!;
      if (d === 0) return y[i]!;
      num += (w[i]! / d) * y[i]!;
      den += w[i]! / d;
    }
    return num / den;
  };
}
