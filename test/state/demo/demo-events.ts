import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import { makeEvent, type Head } from '#lib/core/campaign/make-event.ts';
import { noHash } from '#lib/core/campaign/seal.ts';
import type { FileMaker } from '#lib/core/exchange/campaign-file.ts';
import { demoActs } from '#lib/state/demo/demo-acts.ts';

const uuid = (last: string): string => `019aa000-0000-7000-8000-${last.padStart(12, '0')}`;

export const demoMaker: FileMaker = {
  campaign: uuid('1'),
  title: 'demo',
  device: uuid('2'),
  at: '2026-01-01T00:00:00Z',
  app: 'test'
};

/** The demo campaign as the events of one device. */
export function demoEvents(): CampaignEvent[] {
  let head: Head = { campaign: demoMaker.campaign, device: demoMaker.device, seq: 0, hash: noHash, tick: 0 };
  const acts = demoActs();
  return acts.map(({ at, ...act }, i) => {
    const random = Uint8Array.from({ length: 10 }, (_, byte) => (byte < 8 ? 1 : byte === 8 ? i >> 8 : i & 255));
    const moment = { now: at, offset: 0, mono: at - (acts[0]?.at ?? 0), run: 'demo', app: 'test', random };
    const made = makeEvent(act as never, head, moment);
    if (!made.ok) throw new Error(JSON.stringify(made.error));
    head = made.value.head;
    return made.value.event;
  });
}
