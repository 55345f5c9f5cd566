import type { Condition } from '../plan.ts';
import { sideOutside } from './check-range.ts';
import type { Finding } from './finding.ts';

/** Returns a finding when a machine setting or the room is outside its window. Checked by: test/core/campaign/checks/check-condition.test.ts */
export function checkCondition(condition: Condition, value: number): Finding | null {
  const side = sideOutside(value, condition.window);
  return side ? { check: 'condition', condition: condition.id, value, side, window: condition.window } : null;
}
