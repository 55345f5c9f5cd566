import type { PlanDraft } from '#lib/core/campaign/draft/plan-draft.ts';
import type { IssuedPlan, Plan } from '#lib/core/campaign/plan.ts';
import type { LaidOutPlan, LayoutRequest, Restriction } from '#lib/core/design/lay-out-plan.ts';
import type { DesignChoice } from '#lib/core/design/propose-types.ts';

/** What the draw is asked for a chosen design. */
export function layoutRequest(
  plan: Plan,
  choice: DesignChoice,
  { order, seed, spares }: { order: PlanDraft['design']['order']; seed: string; spares: number }
): LayoutRequest {
  return {
    treatments: plan.treatments.map(({ id }) => id),
    blocks: choice.blocks,
    machines: plan.machines.map(({ id, slots }) => ({ id, inService: slots.map(({ inService }) => inService) })),
    machineOf: choice.machineOf,
    groupOf: choice.groupOf,
    sessionsPerShift: plan.sessionsPerShift,
    labelClass: choice.labelClass,
    order,
    sparesPerTreatment: spares,
    seed
  };
}

/** Returns the plan to be issued: what was asked, and the loading order that chance gave. */
export function issuedPlan(
  plan: Plan,
  choice: DesignChoice,
  drawn: LaidOutPlan,
  say: (restriction: Restriction) => string
): IssuedPlan {
  return {
    plan,
    design: {
      blocks: choice.blocks.map((block) => [...block]),
      construction: choice.construction.text,
      source: choice.construction.source,
      balanced: choice.balanced,
      randomisation: {
        seed: drawn.seed,
        generator: drawn.generator,
        generatorVersion: drawn.generatorVersion,
        algorithm: drawn.algorithm,
        algorithmVersion: drawn.algorithmVersion,
        restrictions: drawn.restrictions.map(say)
      }
    },
    sessions: drawn.sessions.map(({ number, shift, machine, slots }) => ({
      id: `s${number}`,
      number,
      shift,
      machine,
      slots,
      repeats: null
    })),
    spares: drawn.spares
  };
}

/** Draws a seed a person can read aloud and type: four groups of letters and digits without look-alikes. */
export function drawSeed(): string {
  const alphabet = '23456789abcdefghjkmnpqrstuvwxyz';
  const bytes = new Uint8Array(16);
  crypto.getRandomValues(bytes);
  // 31 signs from 256 values: the small bias costs a hundredth of a bit of nearly 80.
  const signs = Array.from(bytes, (byte) => alphabet[byte % alphabet.length]);
  return [0, 4, 8, 12].map((at) => signs.slice(at, at + 4).join('')).join('-');
}
