import type { CampaignEvent, UnknownEvent } from './event.ts';
import { instantOf } from './rfc3339.ts';

type Any = CampaignEvent | UnknownEvent;

const tickOf = (event: Any): number => event.tick ?? instantOf(event.at);
const text = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);

/**
 * The same events in the one order that every device gives them: what a device knew comes before what it then recorded,
 * a device's own events by sequence number even when its clock jumped back, the rest by tick, then device, then id.
 * Depends on the set alone. Cost n log n in the number of events given.
 * Checked by: test/core/campaign/make-event.test.ts.
 */
export function inOrder<T extends Any>(events: readonly T[]): T[] {
  if (events.length < 2) return [...events];
  const bySeq = [...events].sort((a, b) => text(a.device, b.device) || a.seq - b.seq || text(a.id, b.id));
  let highest = 0;
  let device = '';
  const keyed = bySeq.map((event, index) => {
    if (event.device !== device) highest = 0;
    device = event.device;
    highest = Math.max(highest, tickOf(event));
    return { event, key: highest, index };
  });
  return keyed.sort((a, b) => a.key - b.key || a.index - b.index).map(({ event }) => event);
}
