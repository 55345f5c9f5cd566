import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import { type Head, makeEvent } from '#lib/core/campaign/make-event.ts';
import { noHash } from '#lib/core/campaign/seal.ts';

/** The acts as events of one device, one chain. */
export function sealedActs(acts: readonly { kind: string; data: unknown }[]): CampaignEvent[] {
  let head: Head = {
    campaign: '019aa000-0000-7000-8000-000000000001',
    device: '019aa000-0000-7000-8000-000000000002',
    seq: 0,
    hash: noHash,
    tick: 0
  };
  return acts.map((act, at) => {
    const stamp = { now: 1e12, offset: 0, mono: 0, run: 'r', app: 'test', random: new Uint8Array(10).fill(at) };
    const sealed = makeEvent({ ...act, who: 'Tester' } as Parameters<typeof makeEvent>[0], head, stamp);
    if (!sealed.ok) throw new Error(JSON.stringify(sealed.error));
    head = sealed.value.head;
    return sealed.value.event;
  });
}
