import { canonicalJson, sha256OfText } from './seal.ts';
import type { CampaignState } from './state.ts';

/**
 * SHA-256 over everything that a campaign says about the test: equal on two devices that hold the same acts. What a
 * device notes about itself (its exports, imports and the count of events) is left out.
 * Checked by: test/core/campaign/replay.property.test.ts.
 */
export function stateHash(state: CampaignState): string {
  const { devices: _devices, flags: _flags, events: _events, ...said } = state;
  return sha256OfText(canonicalJson(said));
}
