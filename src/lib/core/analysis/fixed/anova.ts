import { fUpper } from '../../numerics/distributions/f.ts';
import { factorSemidefinite, forwardSemidefinite, solveSemidefinite } from '../../numerics/semidefinite-cholesky.ts';
import type { Anova, AnovaLine, AnovaSource } from '../fit-result.ts';
import { crossProduct } from '../model/moments.ts';
import type { RunTable, Term } from '../model/run-table.ts';
import {
  fittedBy,
  lessSessionMeans,
  sessionMeans,
  spread,
  sumOfSquares,
  transposeTimes
} from '../model/run-vectors.ts';
import type { IntraModel, IntraSolution } from './intra-projection.ts';

interface SumOfSquares {
  df: number;
  ss: number;
}

/**
 * Returns the analysis of variance both ways: each source alone (unadjusted) and after all others (adjusted), every F on
 * the error of the full model.
 *
 * Source: D. C. Montgomery, Design and Analysis of Experiments, the balanced incomplete block design; for unbalanced data the
 * adjusted sums are those of dropping the source from the full model.
 * Checked by: test/core/analysis/fixed/fit-fixed.test.ts, test/reference-run
 */
export function anovaOf(model: IntraModel, solution: IntraSolution): Anova {
  const { table, errorDf } = model;
  const errorSs = solution.errorSs;
  const line = ({ df, ss }: SumOfSquares): AnovaLine => {
    const ms = df > 0 ? ss / df : null;
    const usable = ms !== null && errorDf > 0 && errorSs > 0;
    const F = usable ? ms / (errorSs / errorDf) : null;
    return { df, ss, ms, F, p: F === null ? null : fUpper(F, df, errorDf) };
  };
  const mean = table.y.reduce((s, v) => s + v, 0) / table.n;
  const aboutMean = table.y.map((v) => v - mean);
  const sources: AnovaSource[] = [
    {
      source: 'session',
      adjusted: line(sessionsAdjusted(model, solution)),
      unadjusted: line(sessionsAlone(table, aboutMean))
    }
  ];
  // Treatments last, as a reader expects.
  for (const term of [...table.terms.slice(1), table.terms[0]!]) {
    sources.push({
      source: term.name,
      adjusted: line(termAdjusted(model, term)),
      unadjusted: line(termAlone(table, term, aboutMean))
    });
  }
  const total = { df: table.n - 1, ss: sumOfSquares(aboutMean), ms: null, F: null, p: null };
  const fitted = aboutMean.map((v, i) => v - solution.residual[i]!);
  return {
    sources,
    model: line({ df: model.rank - 1, ss: sumOfSquares(fitted) }),
    error: { df: errorDf, ss: errorSs, ms: errorDf > 0 ? errorSs / errorDf : null, F: null, p: null },
    total
  };
}

/** Sum of squares of one term after sessions and all other terms: its columns go last and their rotated effects count. */
export function termAdjusted(model: IntraModel, term: Term, y: Float64Array = model.table.y): SumOfSquares {
  const { table, moments } = model;
  const { p } = table;
  const inTerm = (c: number): boolean => c >= term.start && c < term.start + term.size;
  const order = [...Array(p).keys()].filter((c) => !inTerm(c));
  const last = order.length;
  for (let c = term.start; c < term.start + term.size; c++) order.push(c);
  const a = new Float64Array(p * p);
  const scale = new Float64Array(p);
  const b = transposeTimes(table, lessSessionMeans(table, y));
  const rhs = new Float64Array(p);
  for (let i = 0; i < p; i++) {
    const from = order[i]! * p;
    scale[i] = moments.diagonal[order[i]!]!;
    rhs[i] = b[order[i]!]!;
    for (let j = 0; j < p; j++) a[i * p + j] = moments.within[from + order[j]!]!;
  }
  const factor = factorSemidefinite(a, p, scale);
  const z = forwardSemidefinite(factor, rhs);
  let df = 0;
  let ss = 0;
  for (let i = last; i < p; i++) {
    df += factor.kept[i]!;
    ss += z[i]! * z[i]!;
  }
  return { df, ss };
}

/** Sum of squares of the sessions after all other terms: what the session offsets keep when X is taken out. */
function sessionsAdjusted(model: IntraModel, solution: IntraSolution): SumOfSquares {
  const { table, moments } = model;
  const factor = factorSemidefinite(crossProduct(moments), table.p, moments.diagonal);
  const fit = fittedBy(table, solution.beta);
  let offsets = spread(
    table,
    sessionMeans(
      table,
      table.y.map((v, i) => v - fit[i]!)
    )
  );
  for (let pass = 0; pass < 2; pass++) {
    const step = fittedBy(table, solveSemidefinite(factor, transposeTimes(table, offsets)));
    offsets = offsets.map((v, i) => v - step[i]!);
  }
  return { df: model.rank - factor.rank, ss: sumOfSquares(offsets) };
}

function sessionsAlone(table: RunTable, aboutMean: Float64Array): SumOfSquares {
  return { df: table.b - 1, ss: sumOfSquares(spread(table, sessionMeans(table, aboutMean))) };
}

function termAlone(table: RunTable, term: Term, aboutMean: Float64Array): SumOfSquares {
  const f = table.terms.indexOf(term);
  const totals = new Float64Array(term.size);
  const weights = new Float64Array(term.size);
  for (let i = 0; i < table.n; i++) {
    const e = i * table.width + f;
    const c = table.column[e]! - term.start;
    totals[c]! += aboutMean[i]! * table.value[e]!;
    weights[c]! += table.value[e]! * table.value[e]!;
  }
  let ss = 0;
  let levels = 0;
  for (let c = 0; c < term.size; c++) {
    if (weights[c] === 0) continue;
    levels++;
    ss += (totals[c]! * totals[c]!) / weights[c]!;
  }
  return { df: term.scaling === null ? levels - 1 : 1, ss };
}
