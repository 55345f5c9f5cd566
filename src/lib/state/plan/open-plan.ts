import { isKnown } from '#lib/core/campaign/check-event.ts';
import { replay } from '#lib/core/campaign/replay.ts';
import type { Plan } from '#lib/core/campaign/plan.ts';
import { load } from '#lib/storage/journal.ts';
import { connection } from '../database.svelte.ts';

/** The plan of another campaign on this device as it stands; null when there is none or it cannot be read. */
export async function openPlan(id: string): Promise<Plan | null> {
  const loaded = await load(connection, id);
  return loaded.ok ? replay(loaded.value.events.filter(isKnown), id).plan : null;
}
