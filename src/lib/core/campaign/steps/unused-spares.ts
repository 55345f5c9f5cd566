import type { CampaignState } from '../state.ts';

/**
 * Returns the codes of spare specimens of a treatment that no slot has had and no session is planned with, in the order they were
 * issued.
 * Checked by: test/core/campaign/steps/repeat-session.test.ts
 */
export function unusedSpares(state: CampaignState, treatment: string): string[] {
  const taken = new Set<string>();
  for (const { runs, status } of state.sessions)
    for (const run of runs.flatMap((one) => [one, ...one.earlier])) {
      if (status !== 'dropped') taken.add(run.planned.specimen);
      if (run.loaded) taken.add(run.loaded.specimen);
    }
  const spares = state.issued?.spares ?? [];
  return spares
    .filter((one) => one.treatment === treatment && !taken.has(one.specimen))
    .map(({ specimen }) => specimen);
}
