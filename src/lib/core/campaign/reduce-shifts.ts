import type { CampaignEvent } from './event.ts';
import { markOf } from './marks.ts';
import type { ShiftState } from './state.ts';

/**
 * The shifts as they were worked: each opening begins one, the next closing of that shift by the same device, else by
 * any, ends it.
 * @param events shift events that stand, in order
 */
export function reduceShifts(events: readonly CampaignEvent[]): ShiftState[] {
  const shifts: ShiftState[] = [];
  for (const event of events) {
    if (event.kind === 'shift-opened')
      shifts.push({ shift: event.data.shift, operator: event.data.operator, opened: markOf(event), closed: null });
    else if (event.kind === 'shift-closed') {
      const open = shifts.filter((one) => one.shift === event.data.shift && !one.closed);
      const mine = open.findLast((one) => one.opened.device === event.device) ?? open.at(-1);
      const closed = { ...markOf(event), handOver: event.data.handOver };
      if (mine) mine.closed = closed;
      else shifts.push({ shift: event.data.shift, operator: event.data.operator, opened: markOf(event), closed });
    }
  }
  return shifts;
}
