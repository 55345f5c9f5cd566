import type { CampaignEvent, DataOf } from '#lib/core/campaign/event.ts';
import type { StorageFault } from '#lib/storage/fault.ts';

/**
 * Acts that could not be written, and why. A failure of the system is part of the record: it is written down as soon as
 * writing works again.
 */
export class OpenCampaignUnwritten {
  #acts = $state.raw<readonly CampaignEvent[]>([]);
  #faults: DataOf<'device-fault'>[] = [];

  /** Oldest first; empty again once a write has completed. */
  get acts(): readonly CampaignEvent[] {
    return this.#acts;
  }

  add(event: CampaignEvent, fault: StorageFault): void {
    this.#acts = [...this.#acts, event];
    const detail = 'detail' in fault ? fault.detail : '';
    const text = `${event.at} ${event.kind} ${detail}`.trim();
    this.#faults.push({ what: fault.tag.slice(0, 80), detail: text.slice(0, 2000) });
  }

  /** Writing works again: what is to be written down of it. */
  clear(): DataOf<'device-fault'>[] {
    this.#acts = [];
    return this.#faults.splice(0);
  }
}
