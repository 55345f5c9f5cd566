import type { Diagnostics } from '../../core/analysis/analysis-result.ts';
import type { Reason, Section } from '../../core/analysis/reason.ts';
import type { layers as layerTexts } from '../texts/en/layers.ts';

type Texts = (typeof layerTexts)['diagnostics'];

export interface Check {
  name: string;
  p: number | null;
  /** Why there is no p, if there is none. */
  reason: Reason | null;
  look: boolean;
}

/** The tests of the assumptions in one list; each asks for a look below the level. */
export function diagnosticChecks(diagnostics: Diagnostics, alpha: number, t: Texts): Check[] {
  const check = <T>(name: string, section: Section<T>, p: (value: T) => number): Check => {
    if (!section.ok) return { name, p: null, reason: section.error, look: false };
    const value = p(section.value);
    return { name, p: value, reason: null, look: value <= alpha };
  };
  return [
    check(t.names.outlier, diagnostics.outlier, (x) => x.pBonferroni),
    check(t.names.normality, diagnostics.normality, (x) => x.p),
    check(t.names.slot, diagnostics.slot, (x) => x.p),
    check(t.names.slotTrend, diagnostics.slotTrend, (x) => x.p),
    check(t.names.sessionTrend, diagnostics.sessionTrend, (x) => x.p),
    scatterCheck(diagnostics, alpha, t),
    check(t.names.nonadditivity, diagnostics.nonadditivity, (x) => x.p)
  ];
}

function scatterCheck(diagnostics: Diagnostics, alpha: number, t: Texts): Check {
  const { scatter } = diagnostics;
  if (!scatter.ok) return { name: t.names.scatter, p: null, reason: scatter.error, look: false };
  const { test } = scatter.value;
  if (!test.ok) return { name: t.names.scatter, p: null, reason: test.error, look: false };
  return { name: t.names.scatter, p: test.value.p, reason: null, look: test.value.p <= alpha };
}
