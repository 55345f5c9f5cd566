import { dot, quadraticForm } from '../../numerics/symmetric-products.ts';
import { fail, ok } from '../../result.ts';
import type { Parts } from '../model/parts.ts';
import type { Section } from '../reason.ts';
import type { FixedModel } from './fit-fixed.ts';
import { estimable } from './intra-projection.ts';

/** Returns a function that estimates contrasts of the treatments with sessions fixed. */
export function fixedContrast(
  { model, solution, sigma }: FixedModel,
  parts: Parts
): (weights: readonly number[]) => Section<{ estimate: number; se: number; df: number }> {
  return (weights) => {
    if (sigma === null) return fail({ tag: 'no-scatter' });
    if (weights.some((w, i) => w !== 0 && parts.ofTreatment[i]! < 0)) {
      return fail({ tag: 'too-few-readings', have: 0, need: 1 });
    }
    const l = new Float64Array(model.table.p);
    weights.forEach((w, i) => (l[i] = w));
    if (!estimable(model.nulls, l)) return fail({ tag: 'disconnected', parts: parts.count });
    return ok({
      estimate: dot(l, solution.beta),
      se: sigma * Math.sqrt(quadraticForm(model.inverse, l)),
      df: model.errorDf
    });
  };
}
