import { dot, quadraticForm } from '../../numerics/symmetric-products.ts';
import { fail, ok } from '../../result.ts';
import { estimable } from '../fixed/intra-projection.ts';
import type { Section } from '../reason.ts';
import type { RandomModel } from './fit-random.ts';
import { kenwardRogerCovariance, singleDf } from './kenward-roger.ts';

/**
 * Returns a function that estimates contrasts of the treatments with sessions random, with Kenward & Roger's standard error and
 * degrees of freedom.
 */
export function randomContrast(
  model: RandomModel
): (weights: readonly number[]) => Section<{ estimate: number; se: number; df: number }> {
  const { problem, info, beta } = model;
  const { point, expected: W, G } = info;
  const adjusted = W === null ? null : kenwardRogerCovariance(info, W);
  return (weights) => {
    if (W === null || adjusted === null) return fail({ tag: 'no-shared-session' });
    const all = new Float64Array(problem.table.p);
    weights.forEach((w, i) => (all[i] = w));
    const missing = weights.findIndex((w, i) => w !== 0 && !(problem.moments.diagonal[i]! > 0));
    if (missing >= 0) return fail({ tag: 'too-few-readings', have: 0, need: 1 });
    if (!estimable(problem.nulls, all)) return fail({ tag: 'disconnected', parts: problem.nulls.length + 1 });
    const l = Float64Array.from(problem.columns, (c) => all[c]!);
    const v = quadraticForm(point.inverse, l);
    return ok({
      estimate: dot(l, beta),
      se: Math.sqrt(point.sigma2 * quadraticForm(adjusted, l)),
      df: singleDf(W, point.gamma, v, quadraticForm(G, l))
    });
  };
}
