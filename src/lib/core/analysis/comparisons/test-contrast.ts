import { tTwoSided, tUpperQuantile } from '../../numerics/distributions/student-t.ts';
import { fail, ok } from '../../result.ts';
import type { ContrastLine } from '../fit-result.ts';
import type { ContrastRequest } from '../observations.ts';
import type { Section } from '../reason.ts';

/**
 * Tests one linear question (Σ weight·mean = 0), unadjusted, two-sided.
 *
 * @param request name and weights
 * @param fitted estimate of the question with standard error and degrees of freedom, or why there is none
 * @param alpha of the interval of level 1 − alpha
 *
 * Source: any textbook of linear models; common practice.
 * Checked by: test/core/analysis/comparisons/test-contrast.test.ts
 */
export function testContrast(
  request: ContrastRequest,
  fitted: Section<{ estimate: number; se: number; df: number }>,
  alpha: number
): ContrastLine {
  const line = { name: request.name, weights: [...request.weights] };
  if (!fitted.ok) return { ...line, result: fitted };
  const { estimate, se, df } = fitted.value;
  if (!(se > 0)) return { ...line, result: fail({ tag: 'no-scatter' }) };
  const t = estimate / se;
  const half = tUpperQuantile(alpha / 2, df) * se;
  return {
    ...line,
    result: ok({ estimate, se, df, t, p: tTwoSided(t, df), lower: estimate - half, upper: estimate + half })
  };
}
