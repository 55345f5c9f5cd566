import { tUpper, tUpperQuantile } from '../../numerics/distributions/student-t.ts';
import { fail, ok } from '../../result.ts';
import type { EquivalenceLine } from '../comparison-result.ts';
import type { Section } from '../reason.ts';
import type { DifferenceSource } from './difference-source.ts';

/**
 * Tests for each treatment whether it differs from the control by less than a margin: two one-sided t tests.
 *
 * `pLower` tests difference ≤ −margin, `pUpper` difference ≥ margin; equivalent when both are rejected at alpha, which
 * is when the interval of level 1 − 2·alpha lies inside the margins. Not adjusted for the number of treatments.
 *
 * @param margin largest difference of no importance, above 0
 * @param alpha error probability of each test
 *
 * Source: D. J. Schuirmann (1987), J. Pharmacokinetics and Biopharmaceutics 15, 657–680.
 * Checked by: test/core/analysis/comparisons/test-equivalence.test.ts
 */
export function testEquivalence(
  source: DifferenceSource,
  control: number,
  margin: number,
  alpha: number
): Section<{ margin: number; lines: EquivalenceLine[] }> {
  if (!source.present.includes(control)) return fail({ tag: 'control-without-readings' });
  if (!(margin > 0)) return fail({ tag: 'no-margin' });
  const others = source.present.filter((i) => i !== control && source.estimable(i, control));
  if (others.length === 0) return fail({ tag: 'no-shared-session' });
  if (others.some((i) => !(source.se(i, control) > 0))) return fail({ tag: 'no-scatter' });
  const lines = others.map((treatment): EquivalenceLine => {
    const estimate = source.estimate(treatment, control);
    const se = source.se(treatment, control);
    const df = source.df(treatment, control);
    const pLower = tUpper((estimate + margin) / se, df);
    const pUpper = tUpper((margin - estimate) / se, df);
    const p = Math.max(pLower, pUpper);
    const half = tUpperQuantile(alpha, df) * se;
    return {
      treatment,
      estimate,
      pLower,
      pUpper,
      p,
      lower: estimate - half,
      upper: estimate + half,
      equivalent: p <= alpha
    };
  });
  return ok({ margin, lines });
}
