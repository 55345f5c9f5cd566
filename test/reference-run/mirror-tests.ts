import type { Mirrored } from './mirror-case.ts';
import { object, type Branch, type Tree } from './tree.ts';
import { tQuantile } from '#lib/core/numerics/distributions/student-t.ts';

/** The part `tests` of a case. */
export function mirrorTests(it: Mirrored): Tree {
  const { ranks, diagnostics } = it.analysis;
  return {
    ...(ranks.ok ? mirrorRanks(it, ranks.value) : {}),
    ...(diagnostics.ok ? mirrorChecks(it, diagnostics.value) : {})
  };
}

type Ok<T> = T extends { ok: true; value: infer V } ? V : never;

function mirrorRanks(it: Mirrored, ranks: Ok<Mirrored['analysis']['ranks']>): Tree {
  const { durbin, skillingsMack, friedman } = ranks;
  const kept = it.analysis.design.kept.replication;
  const present = <T>(values: readonly T[]): T[] => values.filter((_, i) => kept[i]! > 0);
  let rank: Branch = null;
  if (durbin.ok) {
    const { rankSum, A, C, T1, df, p, T2, df1, df2, pF, ties, pairSe } = durbin.value;
    const pairT975 = tQuantile(0.975, df2);
    rank = { rankSum: present(rankSum), A, C, T1, df, p, T2, df1, df2, pF, ties, pairSe, pairT975 };
  }
  let mack: Branch = null;
  if (skillingsMack.ok) {
    const { A, covarianceDiagonal, statistic, df, p, sessionsUsed } = skillingsMack.value;
    mack = {
      A: present(A),
      covarianceDiagonal: present(covarianceDiagonal),
      statistic,
      df,
      p,
      nBlocksUsed: sessionsUsed
    };
  }
  return {
    durbin: rank,
    skillingsMack: mack,
    friedman: friedman.ok ? { ...friedman.value } : null
  };
}

function mirrorChecks(it: Mirrored, checks: Ok<Mirrored['analysis']['diagnostics']>): Tree {
  const { nonadditivity, powerScale, normality } = checks;
  const out: Tree = {};
  if (nonadditivity.ok) {
    const { ss, coefficient, df1, df2, F, p } = nonadditivity.value;
    out['nonadditivity'] = { ss, coefficient, df1, df2, F, p };
  }
  const skipped = object(object(it.file['tests'])['boxCox'])['skipped'];
  if (powerScale.ok) {
    const { lambda, atLimit, logLik, lower, upper, asIs, grid } = powerScale.value;
    out['boxCox'] = {
      lambda,
      atLimit,
      logLik,
      ci95: [lower, upper],
      gridLambda: grid.map((point) => point.lambda),
      gridLogLik: grid.map((point) => point.logLik),
      lrLambda1: asIs.statistic,
      pLambda1: asIs.p
    };
  } else if (typeof skipped === 'string') out['boxCox'] = { skipped };
  if (normality.ok) out['shapiroWilk'] = { ...normality.value };
  return out;
}
