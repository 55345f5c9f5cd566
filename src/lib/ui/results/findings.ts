import type { NumberWriter } from '../format/number-writer.ts';
import type { ResultWords } from '../texts/result-words.ts';
import { diagnosticChecks } from './diagnostic-checks.ts';
import { bestFirst, countingLines, meanDecimals, modelLines, withUnit, type ResultView } from './view.ts';

/** What a layer says before it is opened, and whether it asks for a look. */
export interface Finding {
  text: string;
  look: boolean;
}

const one = (text: string, look = false): Finding => ({ text, look });

const reasonOf = (
  view: ResultView,
  words: ResultWords,
  reason: Parameters<ResultWords['reasons']['reason']>[0]
): Finding =>
  one(
    words.reasons.reason(
      reason,
      view.input.treatments.map((t) => t.name)
    )
  );

export function comparisonsFinding(view: ResultView, words: ResultWords, write: NumberWriter): Finding {
  const lines = countingLines(view.analysis);
  if (lines === null) return view.analysis.fixed.ok ? one('') : reasonOf(view, words, view.analysis.fixed.error);
  const shown = lines.pairs.filter((p) => p.pTukey !== null);
  const different = shown.filter((p) => (p.pTukey ?? 1) <= view.analysis.alpha).length;
  return one(words.layers.comparisons.finding(write.whole(different), write.whole(lines.summary.total)));
}

export function modelsFinding(view: ResultView, words: ResultWords): Finding {
  const fixed = modelLines(view.analysis, 'fixed');
  const random = modelLines(view.analysis, 'random');
  if (fixed === null || random === null) return one(words.results.models.absent);
  const order = (lines: typeof fixed): string =>
    bestFirst(view, lines.means)
      .map((m) => m.treatment)
      .join();
  return one(words.results.models.finding(order(fixed) === order(random)));
}

export function sessionsFinding(view: ResultView, words: ResultWords, write: NumberWriter): Finding {
  const { fixed, random, diagnostics } = view.analysis;
  const offsets = fixed.ok
    ? fixed.value.sessionEffects.flatMap((s) => (s.effect === null ? [] : [s.effect]))
    : random.ok
      ? random.value.sessions.map((s) => s.estimate)
      : [];
  if (offsets.length === 0) return fixed.ok ? one('') : reasonOf(view, words, fixed.error);
  const t = words.layers.sessions;
  const decimals = meanDecimals(view);
  const value = (x: number): string => withUnit(write.signed(x, decimals), view.measured.unit);
  const low = offsets.reduce((a, b) => Math.min(a, b));
  const high = offsets.reduce((a, b) => Math.max(a, b));
  const trend = diagnostics.ok && diagnostics.value.sessionTrend.ok ? diagnostics.value.sessionTrend.value : null;
  const drifts = trend !== null && trend.p <= view.analysis.alpha;
  const said =
    trend === null ? t.noTest : drifts ? t.drift(value(trend.slope), write.p(trend.p)) : t.noDrift(write.p(trend.p));
  return one(t.finding(t.spread(value(low), value(high)), said), drifts);
}

export function workingsFinding(view: ResultView, words: ResultWords, write: NumberWriter): Finding {
  const { fixed } = view.analysis;
  if (!fixed.ok) return reasonOf(view, words, fixed.error);
  return one(words.layers.workings.finding(write.whole(0)));
}

export function precisionFinding(view: ResultView, words: ResultWords, write: NumberWriter): Finding {
  const { fixed } = view.analysis;
  if (!fixed.ok) return reasonOf(view, words, fixed.error);
  const summary = countingLines(view.analysis)?.summary;
  const value = (x: number | null): string => withUnit(write.significant(x, 3), view.measured.unit);
  return one(words.layers.precision.finding(value(fixed.value.sigma), value(summary?.seMean ?? null)));
}

export function diagnosticsFinding(view: ResultView, words: ResultWords): Finding {
  const { diagnostics, alpha } = view.analysis;
  if (!diagnostics.ok) return reasonOf(view, words, diagnostics.error);
  const looks = diagnosticChecks(diagnostics.value, alpha, words.layers.diagnostics).filter((c) => c.look).length;
  return one(words.layers.diagnostics.finding(looks), looks > 0);
}

export function ruinedFinding(view: ResultView, words: ResultWords, write: NumberWriter): Finding {
  const { ruined, counts } = view.analysis;
  const t = words.layers.ruined;
  if (counts.ruined === 0) return one(t.none);
  const runs = t.runs(write.whole(counts.ruined));
  if (!ruined.ok || !ruined.value.faceValue.ok) return one(t.findingBare(runs));
  const turned = ruined.value.turned.length;
  return one(t.finding(runs, write.whole(turned)), turned > 0);
}

export function ranksFinding(view: ResultView, words: ResultWords, write: NumberWriter): Finding {
  const { ranks } = view.analysis;
  if (!ranks.ok) return reasonOf(view, words, ranks.error);
  const { durbin, skillingsMack } = ranks.value;
  if (durbin.ok) return one(words.layers.ranks.finding(write.p(durbin.value.pF)));
  if (skillingsMack.ok) return one(words.layers.ranks.finding(write.p(skillingsMack.value.p)));
  return reasonOf(view, words, skillingsMack.error);
}

export function scaleFinding(view: ResultView, words: ResultWords, write: NumberWriter): Finding {
  const { diagnostics, alpha } = view.analysis;
  if (!diagnostics.ok) return reasonOf(view, words, diagnostics.error);
  const { powerScale } = diagnostics.value;
  if (!powerScale.ok) return reasonOf(view, words, powerScale.error);
  const { lambda, lower, upper, asIs } = powerScale.value;
  const t = words.layers.scale;
  const end = (x: number | null, far: string): string => (x === null ? far : write.fixed(x, 2));
  return one(
    t.finding(write.fixed(lambda, 2), end(lower, t.lower), end(upper, t.upper), asIs.p > alpha),
    asIs.p <= alpha
  );
}

export function limitsFinding(view: ResultView, words: ResultWords, write: NumberWriter): Finding {
  const { censored } = view.analysis;
  if (!censored.ok) return reasonOf(view, words, censored.error);
  return one(words.layers.limits.finding(write.whole(censored.value.limited)));
}
