import type { AnovaLine, FixedFit, PairLine, RowDiagnostics } from '#lib/core/analysis/analysis-result.ts';
import type { Mirrored } from './mirror-case.ts';
import { object, texts, type Branch, type Tree } from './tree.ts';

const NAMES: Record<string, string> = { session: 'block', slot: 'position' };

/** The part `intra` of a case. */
export function mirrorFixed(it: Mirrored): Branch {
  const { fixed } = it.analysis;
  if (!fixed.ok) return { reason: fixed.error.tag };
  const fit = fixed.value;
  return {
    n: fit.n,
    rank: fit.rank,
    residualSS: fit.errorSs,
    residualDf: fit.errorDf,
    sigma: fit.sigma,
    grandMean: fit.grandMean,
    anova: mirrorAnova(fit),
    means: {
      treatment: present(it, fit).map((mean) => it.treatments[mean.treatment]!),
      n: present(it, fit).map((mean) => mean.n),
      rawMean: present(it, fit).map((mean) => mean.plain),
      estimate: present(it, fit).map((mean) => (mean.scope === 'all' ? mean.estimate : null)),
      se: present(it, fit).map((mean) => (mean.scope === 'all' ? mean.se : null)),
      df: fit.errorDf,
      estimable: present(it, fit).map((mean) => mean.scope === 'all' && mean.estimate !== null)
    },
    pairs: mirrorPairs(it, fit),
    dunnett: mirrorDunnett(it, fit),
    critical: { t975: fit.critical.t, tukey95: fit.critical.tukey },
    ...mirrorDiagnostics(it)
  };
}

const present = (_: Mirrored, fit: FixedFit): FixedFit['means'] => fit.means.filter((mean) => mean.n > 0);

function mirrorAnova(fit: FixedFit): Tree {
  const line = ({ df, ss, ms, F, p }: AnovaLine): Tree => ({ df, ss, ms, F, p });
  const side = (which: 'adjusted' | 'unadjusted'): Tree =>
    Object.fromEntries(fit.anova.sources.map((s) => [NAMES[s.source] ?? s.source, line(s[which])]));
  const { total, error, model } = fit.anova;
  return {
    total: { df: total.df, ss: total.ss },
    residual: { df: error.df, ss: error.ss, ms: error.ms },
    adjusted: side('adjusted'),
    unadjusted: side('unadjusted'),
    model: line(model)
  };
}

/** Our lines for the pairs that the file lists, in its order. */
export function listedPairs(it: Mirrored, listed: unknown, pairs: readonly PairLine[]): (PairLine | undefined)[] {
  const known = new Map(pairs.map((line) => [`${it.treatments[line.a]} ${it.treatments[line.b]}`, line]));
  const b = texts(object(listed)['b']);
  return texts(object(listed)['a']).map((a, i) => known.get(`${a} ${b[i]}`));
}

function mirrorPairs(it: Mirrored, fit: FixedFit): Tree {
  const listed = object(it.file['intra'])['pairs'];
  const lines = listedPairs(it, listed, fit.pairs);
  const column = (of: (line: PairLine) => number | null): Branch => lines.map((line) => (line ? of(line) : null));
  const { total, estimable, seMin, seMean, seMax, seRms } = fit.pairSummary;
  return {
    nTotal: total,
    complete: lines.length === total,
    nEstimable: estimable,
    a: lines.map((line) => (line ? it.treatments[line.a]! : null)),
    b: lines.map((line) => (line ? it.treatments[line.b]! : null)),
    estimate: column((line) => line.estimate),
    se: column((line) => line.se),
    df: fit.errorDf,
    t: column((line) => line.t),
    p: column((line) => line.p),
    pTukey: column((line) => line.pTukey),
    pTukeyWithinComponent: column((line) => line.pTukeyPart),
    pHolm: column((line) => line.pHolm),
    seMin,
    seMean,
    seMax,
    rmsSed: seRms
  };
}

function mirrorDunnett(it: Mirrored, fit: FixedFit): Branch {
  const { comparisons } = it.analysis;
  if (!comparisons.fixed.ok || !comparisons.fixed.value.control.ok) return null;
  const { control, lines, critical } = comparisons.fixed.value.control.value;
  const se = (a: number, b: number): number =>
    fit.pairs.find((line) => line.a === Math.min(a, b) && line.b === Math.max(a, b))!.se!;
  const correlations: number[] = [];
  lines.forEach((x, i) =>
    lines.slice(i + 1).forEach((y) => {
      correlations.push((x.se ** 2 + y.se ** 2 - se(x.treatment, y.treatment) ** 2) / (2 * x.se * y.se));
    })
  );
  const range = correlations.length === 0 ? [] : [Math.min(...correlations), Math.max(...correlations)];
  return {
    control: it.treatments[control]!,
    sides: 2,
    treatment: lines.map((line) => it.treatments[line.treatment]!),
    estimate: lines.map((line) => line.estimate),
    se: lines.map((line) => line.se),
    t: lines.map((line) => line.t),
    df: fit.errorDf,
    pUnadjusted: lines.map((line) => line.p),
    p: lines.map((line) => line.pDunnett),
    critical95: critical,
    correlationRange: range,
    equalCorrelationHalf: range.every((rho) => Math.abs(rho - 0.5) < 1e-8)
  };
}

function mirrorDiagnostics(it: Mirrored): Tree {
  const { diagnostics } = it.analysis;
  if (!diagnostics.ok) return {};
  const { rows } = diagnostics.value;
  const byRow = new Map(rows.map((line) => [line.row, line]));
  const column = (of: (line: RowDiagnostics) => number | null): Branch =>
    it.file.data.y.map((_, r) => {
      const line = byRow.get(r);
      return line ? of(line) : null;
    });
  const { outlier } = diagnostics.value;
  const table: Tree = {
    diagnostics: {
      residual: column((line) => line.residual),
      fitted: column((line) => line.fitted),
      leverage: column((line) => line.leverage),
      standardized: column((line) => line.standardized),
      studentizedExternal: column((line) => line.studentized),
      cook: column((line) => line.cook)
    }
  };
  if (!outlier.ok) return table;
  // Among tied rows any is right: ours is told for the file's row where that is one of the tie.
  const theirs = Number(object(object(it.file['intra'])['outlier'])['row']) - 1;
  const row = outlier.value.tiedRows.includes(theirs) ? theirs : outlier.value.row;
  const { df, p, tests, pBonferroni, tiedRows } = outlier.value;
  const label = (r: number): number => it.file.data.row[r]!;
  return {
    ...table,
    outlier: {
      row: label(row),
      tiedRows: tiedRows.map(label).sort((a, b) => a - b),
      rstudent: byRow.get(row)!.studentized,
      df,
      pUnadjusted: p,
      nTests: tests,
      pBonferroni
    }
  };
}
