import { isKnown } from './check-event.ts';
import type { CampaignEvent, UnknownEvent } from './event.ts';
import { isUndoable } from './marks.ts';

/**
 * The last act of a device that can be taken back and has not been; null when there is none. Acts are undone one after
 * the other, newest first. A plan or a written file between them does not stand in the way.
 * @param events of a campaign in the order recorded on this device; read from the end
 * Checked by: test/core/campaign/make-event.test.ts.
 */
export function lastUndoable(events: readonly (CampaignEvent | UnknownEvent)[], device: string): CampaignEvent | null {
  const undone = new Set<string>();
  for (let at = events.length - 1; at >= 0; at--) {
    const event = events[at];
    if (!event || event.device !== device || !isKnown(event)) continue;
    if (event.kind === 'undone') undone.add(event.data.target);
    else if (isUndoable(event) && !undone.has(event.id)) return event;
  }
  return null;
}
