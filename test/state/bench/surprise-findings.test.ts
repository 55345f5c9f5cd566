import { expect, test } from 'vitest';
import type { UnderstoodReading } from '#lib/core/campaign/parse-reading.ts';
import type { Plan } from '#lib/core/campaign/plan.ts';
import { replay } from '#lib/core/campaign/replay.ts';
import type { EntryPlace } from '#lib/state/bench/reading-entry.svelte.ts';
import { allChecksFor } from '#lib/state/bench/reading-checks.ts';
import { deviceA, issued, plan, Recorder, specimen } from '../../core/campaign/story.ts';

const blocks = issued.design.blocks;
/** Invented losses in µm: paint 3, 3.5, 4, 4.5 and a little for session and run. */
const loss = (session: number, slot: number): number =>
  Number(
    (3 + 0.5 * blocks[session - 1]![slot]! + 0.3 * session + 0.1 * (((session * 7 + slot * 5) % 4) - 1.5)).toFixed(2)
  );

function recorded(upTo: number, changed: Plan = plan, values = loss): Recorder {
  const recorder = new Recorder(deviceA);
  recorder.record('campaign-created', { title: 'Invented wall paints', demo: false });
  recorder.record('plan-issued', { ...issued, plan: changed });
  for (let i = 0; i < upTo; i++) {
    const [session, slot] = [Math.floor(i / 3) + 1, i % 3];
    recorder.reading(session, slot, values(session, slot));
  }
  return recorder;
}

/** The plan with a measurand that may be anything. */
const unlimited: Plan = { ...plan, measurands: [{ ...plan.measurands[0]!, expected: { min: null, max: null } }] };

const place = (definition = plan.readings[0]!): EntryPlace => ({
  session: 's4',
  slot: 2,
  specimen: specimen(4, 2),
  reading: definition.id,
  repeat: 1,
  definition
});
const typed = (plain: string): UnderstoodReading => ({ value: Number(plain), plain, limit: 'none' });

test('allChecksFor(state, place, value) is silent about a value like those before it', async () => {
  const state = replay(recorded(11).events);
  expect(await allChecksFor(state, place(), typed(String(loss(4, 2))))).toEqual([]);
});

test('allChecksFor(state, place, value) is surprised inside the expected range, and offers the slip that explains it', async () => {
  const state = replay(recorded(11, unlimited).events);
  const wide = { ...plan.readings[0]!, expected: { min: 0.1, max: 190 } };
  const right = loss(4, 2);
  const odd = await allChecksFor(state, place(wide), typed(String(right * 4)));
  expect(odd.map(({ check }) => check)).toEqual(['surprise']);
  const tenfold = Number((right * 10).toFixed(1));
  const [surprise, slip] = await allChecksFor(state, place(wide), typed(String(tenfold)));
  expect(surprise).toMatchObject({ check: 'surprise', measurand: 'loss', value: tenfold });
  expect(slip).toMatchObject({ check: 'slip', candidates: [{ value: right, how: 'decimal', factor: 0.1 }] });
});

test('allChecksFor(state, place, value) carries the surprise of a formula back to the reading that was typed', async () => {
  const after = plan.readings[0]!;
  const changed: Plan = {
    ...plan,
    constants: [{ id: 'start', label: 'Start', value: 2, unit: 'µm' }],
    measurands: [{ ...unlimited.measurands[0]!, id: 'gain', label: 'Gain', formula: '3 * loss - start' }]
  };
  const state = replay(recorded(11, changed).events);
  const tenfold = Number((loss(4, 2) * 10).toFixed(1));
  const wide = { ...after, expected: { min: 0.1, max: 190 } };
  const [surprise, slip] = await allChecksFor(state, place(wide), typed(String(tenfold)));
  expect(surprise).toMatchObject({ check: 'surprise', measurand: 'gain', value: 3 * tenfold - 2 });
  expect(slip).toMatchObject({ check: 'slip', value: tenfold });
  expect(slip!.check === 'slip' && slip!.candidates[0]!.value).toBeCloseTo(tenfold / 10, 9);
});

test('allChecksFor(state, place, value) leaves ranks and limited readings alone', async () => {
  const rank: Plan = { ...plan, measurands: [{ ...plan.measurands[0]!, kind: 'rank' }] };
  expect(await allChecksFor(replay(recorded(11, rank).events), place(), typed('30'))).toEqual([]);
  const limited = { ...typed('30'), limit: 'at-least' as const };
  expect(await allChecksFor(replay(recorded(11).events), place(), limited)).toEqual([]);
});

test('allChecksFor(state, place, value) names a slip by the sister readings while the model is silent', async () => {
  const wide = { ...plan.readings[0]!, expected: { min: null, max: null } };
  const early = replay(recorded(2).events);
  expect(await allChecksFor(early, place(wide), typed('36'))).toMatchObject([
    { check: 'slip', candidates: [{ value: 3.6, how: 'decimal' }] }
  ]);
  expect(await allChecksFor(early, place(wide), typed('6'))).toEqual([]);
  expect(await allChecksFor(replay(recorded(0).events), place(wide), typed('36'))).toEqual([]);
});

test('allChecksFor(state, place, value) names a measurand outside its own limits', async () => {
  const measurand = { ...plan.measurands[0]!, id: 'gain', formula: 'loss - start', expected: { min: 0, max: 4 } };
  const changed: Plan = {
    ...plan,
    constants: [{ id: 'start', label: 'Start', value: 2, unit: 'µm' }],
    measurands: [{ ...measurand, possible: { min: 0, max: null } }]
  };
  const state = replay(recorded(2, changed).events);
  const wide = { ...plan.readings[0]!, expected: { min: null, max: null } };
  expect(await allChecksFor(state, place(), typed('4.5'))).toEqual([]);
  expect(await allChecksFor(state, place(wide), typed('41.5'))).toMatchObject([
    { check: 'unexpected', value: 39.5, measurand: 'gain' },
    { check: 'slip', candidates: [{ value: 4.15 }] }
  ]);
  expect(await allChecksFor(state, place(), typed('7'))).toMatchObject([
    { check: 'unexpected', value: 5, side: 'above', measurand: 'gain' }
  ]);
  expect(await allChecksFor(state, place(), typed('1.1'))).toMatchObject([
    { check: 'impossible', value: expect.closeTo(-0.9, 9), side: 'below', measurand: 'gain' }
  ]);
});

test('allChecksFor(state, place, value) does not count a ruined run', async () => {
  const spoilt = recorded(11, plan, (session, slot) => (session === 1 && slot === 1 ? 39 : loss(session, slot)));
  spoilt.record('ruined', { session: 's1', slot: 1, reason: 'Film torn', next: null });
  const findings = await allChecksFor(replay(spoilt.events), place(), typed('24'));
  expect(findings.map(({ check }) => check)).toContain('surprise');
});

test('allChecksFor(state, place, value) allows one digit where the readings so far differ by less', async () => {
  const exact = recorded(11, plan, (session, slot) => {
    // Hundredths of scatter: far less than the last digit.
    return 5 + blocks[session - 1]![slot]! + 0.01 * (((session * 7 + slot * 5) % 4) - 1.5);
  });
  const state = replay(exact.events);
  const right = 5 + blocks[3]![2]!;
  expect(await allChecksFor(state, place(), typed(String(right + 0.1)))).toEqual([]);
  expect(await allChecksFor(state, place(), typed(String(right + 0.3)))).toMatchObject([{ check: 'surprise' }]);
});
