import { expect, it } from 'vitest';
import { dueReadings, readingOrder } from '#lib/core/campaign/steps/due-readings.ts';
import type { Plan, ReadingDefinition } from '#lib/core/campaign/plan.ts';
import { loadedRun, mark, session, wallPaintPlan } from '../wall-paint.ts';

const [template] = wallPaintPlan.readings;
if (!template) throw new Error('the plan has readings');
const definition = (id: string, over: Partial<ReadingDefinition>): ReadingDefinition => ({ ...template, id, ...over });
const plan: Plan = {
  ...wallPaintPlan,
  readings: [
    definition('gloss', { when: { kind: 'after' } }),
    definition('at1000', { when: { kind: 'at', point: 1000, unit: 'cycles' } }),
    definition('at500', { when: { kind: 'at', point: 500, unit: 'cycles' } }),
    definition('mass', { when: { kind: 'after' }, repeats: 2 }),
    definition('before', { when: { kind: 'before' } })
  ]
};
const two = session(1, [loadedRun('s1', 0, 'A-1'), loadedRun('s1', 1, 'B-1')]);
const written = (places: { slot: number; reading: string; repeat: number }[]) =>
  places.map((p) => `${p.slot} ${p.reading} ${p.repeat}`);

it('readingOrder(plan) goes before, at rising points, after', () => {
  expect(readingOrder(plan).map(({ id }) => id)).toEqual(['before', 'at500', 'at1000', 'gloss', 'mass']);
});

it('dueReadings(plan, session, all) finishes a moment before the next, and a specimen before the next slot', () => {
  expect(written(dueReadings(plan, two, ['before', 'at', 'after']))).toEqual([
    '0 before 1',
    '1 before 1',
    '0 at500 1',
    '1 at500 1',
    '0 at1000 1',
    '1 at1000 1',
    '0 gloss 1',
    '0 mass 1',
    '0 mass 2',
    '1 gloss 1',
    '1 mass 1',
    '1 mass 2'
  ]);
});

it('dueReadings(plan, session, ["at"]) keeps the moments asked for', () => {
  expect(dueReadings(plan, two, ['at'])).toHaveLength(4);
});

it('dueReadings(plan, session) leaves out what is said to be missing, and ruined runs', () => {
  const missing = { ...mark, reason: 'Panel torn' };
  const one = loadedRun('s1', 0, 'A-1', {
    readings: [{ reading: 'before', repeat: 1, current: null, versions: [], missing, contradiction: null }]
  });
  const ruined = loadedRun('s1', 1, 'B-1', { ruined: { ...mark, reason: 'x', whole: false, next: null } });
  expect(written(dueReadings(plan, session(1, [one, ruined]), ['before', 'at']))).toEqual(['0 at500 1', '0 at1000 1']);
});

it('dueReadings(plan, session) is empty for a ruined session', () => {
  const ruined = { ...two, ruined: { ...mark, reason: 'x', whole: true, next: null } };
  expect(dueReadings(plan, ruined, ['before', 'after'])).toEqual([]);
});
