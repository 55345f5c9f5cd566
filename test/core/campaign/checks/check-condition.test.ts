import { expect, it } from 'vitest';
import { checkCondition } from '#lib/core/campaign/checks/check-condition.ts';

const room = { id: 'room', label: 'Room', kind: 'number', unit: '°C', window: { min: 21, max: 25 } } as const;

it('checkCondition(room, 26) says above its window', () => {
  expect(checkCondition(room, 26)).toEqual({
    check: 'condition',
    condition: 'room',
    value: 26,
    side: 'above',
    window: { min: 21, max: 25 }
  });
});

it('checkCondition(room, 20.9) says below its window', () => {
  expect(checkCondition(room, 20.9)?.check).toBe('condition');
});

it('checkCondition(room, 25) is silent on the limit', () => {
  expect(checkCondition(room, 25)).toBeNull();
});
