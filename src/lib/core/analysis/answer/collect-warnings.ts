import type { Analysis, PairLine, Warning } from '../analysis-result.ts';
import type { LeftOut } from '../model/model-columns.ts';
import type { Observations } from '../observations.ts';

/** Fewer error degrees of freedom than this make every interval wide and every check weak (common practice, no source). */
const FEW = 6;

/**
 * Returns what a reader of the result must know, as tagged data, most serious first. Checks warn at the campaign's alpha.
 *
 * Checked by: test/core/analysis/answer/collect-warnings.test.ts
 */
export function collectWarnings(
  analysis: Omit<Analysis, 'warnings'>,
  observations: Observations,
  leftOut: readonly LeftOut[]
): Warning[] {
  const { alpha, design, fixed, random, diagnostics, ruined, counts } = analysis;
  const warnings: Warning[] = [];
  if (!design.kept.connected) warnings.push({ tag: 'parts', parts: design.kept.parts.length });
  if (design.lostPairs.length > 0) warnings.push({ tag: 'lost-pairs', pairs: design.lostPairs.length });
  const unread = design.kept.replication.flatMap((r, treatment) => (r === 0 ? [treatment] : []));
  if (unread.length > 0) warnings.push({ tag: 'treatments-without-readings', treatments: unread });
  if (fixed.ok && fixed.value.errorDf < FEW) {
    warnings.push({ tag: 'few-error-degrees-of-freedom', df: fixed.value.errorDf });
  }
  if (counts.limited > 0) warnings.push({ tag: 'limits-taken-as-values', runs: counts.limited });
  for (const { factor, reason } of leftOut) warnings.push({ tag: 'factor-left-out', factor, reason });
  if (ruined.ok) {
    const { association, turned } = ruined.value;
    if (association.ok && association.value.p <= alpha) {
      warnings.push({ tag: 'ruin-associated', p: association.value.p });
    }
    if (turned.length > 0) warnings.push({ tag: 'verdict-turns-with-ruined', pairs: turned.length });
  }
  if (diagnostics.ok) warnings.push(...diagnosticWarnings(diagnostics.value, observations, alpha));
  if (random.ok && random.value.variance.boundary) warnings.push({ tag: 'session-variance-zero' });
  if (fixed.ok && random.ok) {
    const pairs = disagreements(fixed.value.pairs, random.value.kenwardRoger.pairs, alpha);
    if (pairs > 0) warnings.push({ tag: 'models-disagree', pairs });
  }
  const single = singleRunSessions(analysis, observations);
  if (single.length > 0) warnings.push({ tag: 'single-run-sessions', sessions: single });
  return warnings;
}

type Checks = Extract<Analysis['diagnostics'], { ok: true }>['value'];

function diagnosticWarnings(checks: Checks, observations: Observations, alpha: number): Warning[] {
  const { outlier, slot, sessionTrend, scatter, nonadditivity, powerScale, normality } = checks;
  const found: Warning[] = [];
  if (outlier.ok && outlier.value.pBonferroni <= alpha) {
    found.push({ tag: 'outlier', row: outlier.value.row, p: outlier.value.pBonferroni });
  }
  if (slot.ok && slot.value.p <= alpha) {
    found.push({ tag: 'slots-differ', p: slot.value.p, inModel: observations.factors.slot });
  }
  if (sessionTrend.ok && sessionTrend.value.p <= alpha) {
    found.push({ tag: 'session-trend', p: sessionTrend.value.p });
  }
  if (scatter.ok && scatter.value.test.ok && scatter.value.test.value.p <= alpha) {
    found.push({ tag: 'scatter-differs', p: scatter.value.test.value.p });
  }
  if (nonadditivity.ok && nonadditivity.value.p <= alpha) {
    found.push({ tag: 'nonadditive', p: nonadditivity.value.p });
  }
  if (powerScale.ok && powerScale.value.chosen !== 1) {
    found.push({ tag: 'other-scale', lambda: powerScale.value.chosen, p: powerScale.value.asIs.p });
  }
  if (normality.ok && normality.value.p <= alpha) found.push({ tag: 'not-normal', p: normality.value.p });
  return found;
}

/** Pairs on which two models differ at alpha (Tukey–Kramer). */
export function disagreements(one: readonly PairLine[], other: readonly PairLine[], alpha: number): number {
  const verdict = new Map(other.map((line) => [`${line.a} ${line.b}`, line.pTukey]));
  return one.filter(({ a, b, pTukey }) => {
    const second = verdict.get(`${a} ${b}`) ?? null;
    return pTukey !== null && second !== null && pTukey <= alpha !== second <= alpha;
  }).length;
}

function singleRunSessions({ design }: Pick<Analysis, 'design'>, observations: Observations): number[] {
  const sizes = new Map<number, number>();
  for (const row of observations.rows) {
    if (!row.ruined && row.y !== null) sizes.set(row.session, (sizes.get(row.session) ?? 0) + 1);
  }
  if (design.kept.sessions < 2) return [];
  return [...sizes].flatMap(([session, size]) => (size === 1 ? [session] : [])).sort((a, b) => a - b);
}
