import type { Analysis } from '../../analysis/analysis-result.ts';
import type { Observations } from '../../analysis/observations.ts';
import type { CampaignState } from '../../campaign/state.ts';

/** One measurand with what went into its analysis and what came out. */
export interface PackagedResult {
  measurand: { id: string; label: string; unit: string };
  input: Observations;
  analysis: Analysis;
}

/** Everything a data package is made of. */
export interface PackageInput {
  state: CampaignState;
  /** The campaign file as exported, byte for byte; null when the readings came without one. */
  campaignFile: { name: string; bytes: Uint8Array; sha256: string } | null;
  results: PackagedResult[];
  /** RFC 3339. */
  created: string;
  /** Program version. */
  app: string;
}
