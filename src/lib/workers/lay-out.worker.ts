import { earlyStop } from '#lib/core/design/early-stop-order.ts';
import { layOutPlan, type LaidOutPlan, type LayoutRequest } from '#lib/core/design/lay-out-plan.ts';

/** A drawn loading order and what an early stop of it would leave. */
export interface Drawn {
  plan: LaidOutPlan;
  /** Information on an average difference after each session, as a share of the whole plan's; 0 before all are tied. */
  kept: number[];
}

export type LayOutReply = { ok: true; drawn: Drawn } | { ok: false; detail: string };

self.onmessage = ({ data }: MessageEvent<LayoutRequest>) => {
  try {
    const plan = layOutPlan(data);
    const place = new Map(data.treatments.map((id, i) => [id, i]));
    const blocks = plan.sessions.map(({ slots }) =>
      slots.flatMap((slot) => (slot === null ? [] : [place.get(slot.treatment) ?? 0]))
    );
    reply({ ok: true, drawn: { plan, kept: shares(blocks, data.treatments.length) } });
  } catch (thrown) {
    reply({ ok: false, detail: String(thrown) });
  }
};

const reply = (message: LayOutReply) => self.postMessage(message);

/** earlyStop gives L(m)/A(m) with L(m) ∝ 1/Σ(k − 1); so 1/A(m) ∝ that times Σ(k − 1). */
function shares(blocks: readonly (readonly number[])[], treatments: number): number[] {
  let information = 0;
  const known = earlyStop(blocks, treatments).efficiency.map((efficiency, m) => {
    information += Math.max(0, (blocks[m]?.length ?? 0) - 1);
    return efficiency * information;
  });
  const whole = known.at(-1) ?? 0;
  return known.map((value) => (whole > 0 ? value / whole : 0));
}
