import { planRepair, type RepairReport, type RepairRequest } from '#lib/core/design/repair/plan-repair.ts';

export type RepairReply = { ok: true; report: RepairReport } | { ok: false; detail: string };

const reply = (message: RepairReply): void => self.postMessage(message);

self.onmessage = ({ data }: MessageEvent<RepairRequest>) => {
  try {
    reply({ ok: true, report: planRepair(data) });
  } catch (thrown) {
    reply({ ok: false, detail: String(thrown) });
  }
};
