import { expect, test } from 'vitest';
import type { Plan } from '#lib/core/campaign/plan.ts';
import { replay } from '#lib/core/campaign/replay.ts';
import { runResults } from '#lib/state/bench/run-results.ts';
import { deviceA, issued, plan, Recorder, specimen } from '../../core/campaign/story.ts';

const reading = plan.readings[0]!;
const free = { min: null, max: null };
/** Loss of mass per scrubbed area and density: the arithmetic is done by hand in the tests. Invented values. */
const computed: Plan = {
  ...plan,
  readings: ['before', 'after'].map((id) => ({ ...reading, id, label: `Mass ${id}`, unit: 'g', possible: free })),
  constants: [{ id: 'area', label: 'Area', value: 0.004, unit: 'm^2' }],
  measurands: [{ ...plan.measurands[0]!, id: 'loss', unit: 'g/m^2', formula: '(before - after) / area' }]
};

function with_(values: readonly (readonly [slot: number, id: string, value: number])[], changed = computed) {
  const recorder = new Recorder(deviceA);
  recorder.record('campaign-created', { title: 'Invented wall paints', demo: false });
  recorder.record('plan-issued', { ...issued, plan: changed });
  for (const [slot, id, value] of values)
    recorder.record('reading-recorded', {
      session: 's1',
      slot,
      specimen: specimen(1, slot),
      reading: id,
      repeat: 1,
      raw: String(value),
      value,
      limit: 'none',
      source: 'keyboard',
      readAt: null,
      raised: [],
      because: null
    });
  const state = replay(recorder.events);
  return runResults(state, state.sessions[0]!);
}

test('runResults(state, session) computes the formula of each run', async () => {
  // (44.2 − 44.1) g / 0.004 m² = 25 g/m²
  const [first, second] = await with_([
    [0, 'before', 44.2],
    [0, 'after', 44.1],
    [1, 'before', 44.2]
  ]);
  expect(first).toMatchObject({ slot: 0, measurand: 'loss', limit: 'none', why: null });
  expect(first?.value).toBeCloseTo(25, 9);
  expect(second).toMatchObject({ slot: 1, value: null, why: { tag: 'value-missing', name: 'after' } });
});

test('runResults(state, session) says which part of the formula has no answer', async () => {
  const ratio: Plan = {
    ...computed,
    measurands: [{ ...computed.measurands[0]!, unit: '', formula: 'before / (before - after)' }]
  };
  const [first] = await with_(
    [
      [0, 'before', 44.2],
      [0, 'after', 44.2]
    ],
    ratio
  );
  expect(first).toMatchObject({ value: null, why: { tag: 'division-by-zero' } });
});

test('runResults(state, session) says so when the formula of the plan cannot be used', async () => {
  const broken: Plan = { ...computed, measurands: [{ ...computed.measurands[0]!, formula: 'before - nothing' }] };
  const [first] = await with_([[0, 'before', 44.2]], broken);
  expect(first?.why).toMatchObject({ tag: 'formula-unusable', fault: { tag: 'formula-unknown-name' } });
});

test('runResults(state, session) leaves out a measurand that is one reading as it stands', async () => {
  expect(await with_([[0, reading.id, 4]], plan)).toEqual([]);
});
