import type { OpenCampaign } from '../open-campaign.svelte.ts';

/** Waits so long after the last keystroke before a draft is stored. */
const pause = 400;

/** Keeps a draft on the device as it is typed; what could not be kept is said. */
export class DraftStore {
  #campaign: OpenCampaign;
  #name: string;
  #status = $state<'kept' | 'waiting' | 'failed'>('kept');
  #latest: unknown = null;
  #timer: ReturnType<typeof setTimeout> | undefined;

  constructor(campaign: OpenCampaign, name: string) {
    this.#campaign = campaign;
    this.#name = name;
  }

  get status() {
    return this.#status;
  }

  keep(draft: unknown): void {
    this.#latest = draft;
    this.#status = 'waiting';
    clearTimeout(this.#timer);
    this.#timer = setTimeout(() => void this.flush(), pause);
  }

  /** Stores at once: the page goes out of sight, or the last try failed. */
  async flush(): Promise<void> {
    clearTimeout(this.#timer);
    if (this.#status === 'kept') return;
    const draft = this.#latest;
    const kept = await this.#campaign.setEntryDraft(this.#name, draft);
    if (draft === this.#latest) this.#status = kept.ok ? 'kept' : 'failed';
  }

  /** Nothing more is to be stored under this name. */
  forget(): void {
    clearTimeout(this.#timer);
    this.#status = 'kept';
  }
}
