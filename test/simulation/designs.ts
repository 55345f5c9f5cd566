import type { Observations } from '#lib/core/analysis/observations.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { campaignOf, spreadDesign } from './simulate-campaign.ts';

/** A design whose campaigns are simulated; treatment 0 is the control. */
export interface SimulatedDesign {
  name: string;
  input: Observations;
}

const cyclic = Array.from({ length: 7 }, (_, j) => [0, 1, 3].map((d) => (d + j) % 7));

/** Three designs a laboratory runs: balanced; not balanced, with unequal replication; with runs lost. */
export const DESIGNS: readonly SimulatedDesign[] = [
  { name: 'balanced: 7 treatments, 7 sessions of 3', input: campaignOf(cyclic) },
  {
    name: 'unbalanced: 8 treatments, 13 sessions of 3',
    input: campaignOf(spreadDesign(8, 13, 3, seededRandom('design')))
  },
  {
    name: 'missing: 7 treatments, 14 sessions of 3, three runs lost',
    input: campaignOf([...cyclic, ...cyclic], [0, 7, 20])
  }
];
