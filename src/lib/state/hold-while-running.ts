import type { CampaignState } from '#lib/core/campaign/state.ts';
import { holdUpdates } from '#lib/pwa/busy.ts';

/** No new version of the program takes over while a session of the campaign runs. */
export class HoldWhileRunning {
  #release: (() => void) | null = null;

  look({ sessions }: CampaignState): void {
    const running = sessions.some(({ status }) => status === 'running' || status === 'reading');
    if (running) this.#release ??= holdUpdates();
    else this.close();
  }

  close(): void {
    this.#release?.();
    this.#release = null;
  }
}
