import { tTwoSided } from '../../numerics/distributions/student-t.ts';
import { tukeyUpper } from '../../numerics/distributions/tukey.ts';
import type { PairLine, PairSummary } from '../fit-result.ts';
import { holm } from './holm.ts';
import { criticalValues } from './critical-values.ts';
import type { Parts } from './parts.ts';

/** What the pairs of treatments are compared with; all functions are called for estimable pairs only. */
export interface PairSource {
  parts: Parts;
  alpha: number;
  estimable: (a: number, b: number) => boolean;
  estimate: (a: number, b: number) => number;
  /** Null without error degrees of freedom. */
  se: ((a: number, b: number) => number) | null;
  df: (a: number, b: number) => number;
}

/**
 * Returns all differences a − b of treatments with readings, in the order (1,2), (1,3), …, with unadjusted, Holm and
 * Tukey–Kramer p-values and intervals. Where the design is in parts, Tukey's family is all treatments with readings
 * (`pTukey`, and the intervals) or those of the pair's part (`pTukeyPart`).
 *
 * Source: C. Y. Kramer (1956), Biometrics 12, 307–310; S. Holm (1979), Scand. J. Statist. 6, 65–70.
 * Checked by: test/reference-run
 */
export function pairLines(source: PairSource): PairLine[] {
  const { parts, alpha } = source;
  const present = [...parts.ofTreatment.keys()].filter((i) => parts.ofTreatment[i]! >= 0);
  const inPart = new Int32Array(parts.count);
  for (const i of present) inPart[parts.ofTreatment[i]!]!++;
  const lines: PairLine[] = [];
  let from = Infinity;
  let to = 0;
  for (let x = 0; x < present.length; x++) {
    for (let y = x + 1; y < present.length; y++) {
      const a = present[x]!;
      const b = present[y]!;
      const estimable = source.estimable(a, b);
      const line = emptyLine(a, b, estimable);
      lines.push(line);
      if (!estimable) continue;
      line.estimate = source.estimate(a, b);
      if (source.se === null) continue;
      const se = source.se(a, b);
      const df = source.df(a, b);
      // Small-sample formulas can fail on a handful of runs; a pair without a usable error has none.
      if (!(se >= 0 && se < Infinity && df > 0 && df < Infinity)) continue;
      line.se = se;
      line.df = df;
      from = Math.min(from, line.df);
      to = Math.max(to, line.df);
    }
  }
  if (to === 0) return lines;
  const critical = criticalValues(alpha, present.length, from, to, lines.length);
  const tested: PairLine[] = [];
  for (const line of lines) {
    if (line.estimate === null || line.se === null || line.df === null || !(line.se > 0)) continue;
    const t = line.estimate / line.se;
    const q = Math.abs(t) * Math.SQRT2;
    line.t = t;
    line.p = tTwoSided(t, line.df);
    line.pTukey = tukeyUpper(q, present.length, line.df);
    const own = inPart[parts.ofTreatment[line.a]!]!;
    const samePart = parts.ofTreatment[line.a] === parts.ofTreatment[line.b];
    line.pTukeyPart = own === present.length || !samePart ? line.pTukey : tukeyUpper(q, own, line.df);
    const half = critical.t(line.df) * line.se;
    line.lower = line.estimate - half;
    line.upper = line.estimate + half;
    const halfTukey = critical.tukey(line.df) * line.se;
    line.lowerTukey = line.estimate - halfTukey;
    line.upperTukey = line.estimate + halfTukey;
    tested.push(line);
  }
  const adjusted = holm(tested.map((line) => line.p!));
  tested.forEach((line, i) => (line.pHolm = adjusted[i]!));
  return lines;
}

function emptyLine(a: number, b: number, estimable: boolean): PairLine {
  return {
    a,
    b,
    estimable,
    estimate: null,
    se: null,
    df: null,
    t: null,
    p: null,
    pHolm: null,
    pTukey: null,
    pTukeyPart: null,
    lower: null,
    upper: null,
    lowerTukey: null,
    upperTukey: null
  };
}

/** Returns number and standard errors of the estimable pairs. */
export function summarisePairs(lines: readonly PairLine[]): PairSummary {
  let estimable = 0;
  let count = 0;
  let min = Infinity;
  let max = 0;
  let sum = 0;
  let squares = 0;
  for (const { estimable: can, se } of lines) {
    if (can) estimable++;
    if (se === null) continue;
    count++;
    min = Math.min(min, se);
    max = Math.max(max, se);
    sum += se;
    squares += se * se;
  }
  const some = count > 0;
  return {
    total: lines.length,
    estimable,
    seMin: some ? min : null,
    seMean: some ? sum / count : null,
    seMax: some ? max : null,
    seRms: some ? Math.sqrt(squares / count) : null
  };
}
