import { openCampaign, type OpenCampaign, type OpenFault } from './open-campaign.svelte.ts';

/**
 * The campaign that a screen's address names: opened while the screen is there, closed when the address names another
 * one or the screen goes. To be made while a component is set up.
 */
export class Opening {
  #campaign = $state.raw<OpenCampaign | null>(null);
  #fault = $state.raw<OpenFault | null>(null);

  /** @param id the campaign wanted, read reactively; null for none */
  constructor(id: () => string | null) {
    $effect(() => {
      const wanted = id();
      this.#campaign = null;
      this.#fault = null;
      if (wanted === null) return;
      let opened: OpenCampaign | null = null;
      let left = false;
      void openCampaign(wanted).then((result) => {
        if (left) {
          if (result.ok) result.value.close();
        } else if (result.ok) this.#campaign = opened = result.value;
        else this.#fault = result.error;
      });
      return () => {
        left = true;
        opened?.close();
      };
    });
  }

  get campaign(): OpenCampaign | null {
    return this.#campaign;
  }
  /** Why it could not be opened. */
  get fault(): OpenFault | null {
    return this.#fault;
  }
}
