import type { RandomMeans } from '#lib/core/analysis/analysis-result.ts';
import { listedPairs } from './mirror-fixed.ts';
import type { Mirrored } from './mirror-case.ts';
import { object, type Branch, type Tree } from './tree.ts';

/** The part `reml` of a case. */
export function mirrorRandom(it: Mirrored): Branch {
  const { random } = it.analysis;
  if (!random.ok) return { reason: random.error.tag };
  const fit = random.value;
  const v = fit.variance;
  const means = (which: 'kenwardRoger' | 'satterthwaite'): Tree => {
    const { means: lines, pairs, pairSummary } = fit[which];
    const present = lines.filter((mean) => mean.n > 0);
    const listed = listedPairs(it, object(object(it.file['reml'])[which])['pairs'], pairs);
    const dfs = pairs.flatMap((line) => (line.df === null ? [] : [line.df]));
    return {
      means: {
        treatment: present.map((mean) => it.treatments[mean.treatment]!),
        estimate: present.map((mean) => mean.estimate),
        se: present.map((mean) => mean.se),
        df: present.map((mean) => mean.df)
      },
      pairs: {
        nTotal: pairSummary.total,
        complete: listed.length === pairSummary.total,
        a: listed.map((line) => (line ? it.treatments[line.a]! : null)),
        b: listed.map((line) => (line ? it.treatments[line.b]! : null)),
        estimate: listed.map((line) => line?.estimate ?? null),
        se: listed.map((line) => line?.se ?? null),
        df: listed.map((line) => line?.df ?? null),
        t: listed.map((line) => line?.t ?? null),
        p: listed.map((line) => line?.p ?? null),
        pTukey: listed.map((line) => line?.pTukey ?? null),
        seMin: pairSummary.seMin,
        seMean: pairSummary.seMean,
        seMax: pairSummary.seMax,
        dfMin: Math.min(...dfs),
        dfMax: Math.max(...dfs)
      }
    };
  };
  const tests = ({ tests: lines }: RandomMeans): Tree =>
    Object.fromEntries(
      lines.map(({ source, numDf, denDf, F, p }) => [source === 'slot' ? 'position' : source, { numDf, denDf, F, p }])
    );
  return {
    n: fit.n,
    varianceComponents: {
      theta: Math.sqrt(v.ratio),
      gamma: v.ratio,
      varBlock: v.session,
      varResidual: v.run,
      sdBlock: Math.sqrt(v.session),
      sdResidual: Math.sqrt(v.run),
      boundary: v.boundary,
      icc: v.intraclass,
      // The file gives the derivative of twice the log-likelihood.
      scoreAtZero: 2 * v.scoreAtZero,
      gammaUnconstrained: v.unconstrained?.ratio ?? null,
      sigma2Unconstrained: v.unconstrained?.run ?? null,
      logLikREML: v.logLik,
      logLikZeroVariance: v.logLikZero,
      lme4Default: { varBlock: v.session, varResidual: v.run, logLikREML: v.logLik, singular: v.boundary },
      nlme: { varBlock: v.session, varResidual: v.run, logLik: v.logLik }
    },
    kenwardRoger: means('kenwardRoger'),
    satterthwaite: means('satterthwaite'),
    fTests: { satterthwaite: tests(fit.satterthwaite), kenwardRoger: tests(fit.kenwardRoger) },
    blups: {
      block: fit.sessions.map((line) => it.sessions[line.session]!),
      estimate: fit.sessions.map((line) => line.estimate),
      conditionalSd: fit.sessions.map((line) => line.sd)
    }
  };
}
