import type { Page } from '@playwright/test';
import type { DataOf } from '#lib/core/campaign/event.ts';
import type { IssuedPlan } from '#lib/core/campaign/plan.ts';
import { demoTruth } from '#lib/state/demo/demo-plan.ts';
import { expect, test } from './app.ts';
import { Desk, enter, eventsOf, issuedPlan, openBench } from './bench-campaign.ts';
import { recordSession, type ReadingOf, type Until } from './bench-record.ts';

type Reading = DataOf<'reading-recorded'>;

/** Invented masses that differ from specimen to specimen, in grams. */
const mass = (session: number, slot: number): number => 42 + ((session * 7919 + slot * 104729) % 30000) / 10000;

/** A desk on which the sessions before one are closed and that one has come so far. */
function deskAt(issued: IssuedPlan, session: number, until: Until, valueOf: (session: number) => ReadingOf): Desk {
  const desk = new Desk(issued);
  for (const planned of issued.sessions.slice(0, session))
    recordSession(
      desk,
      issued.plan.readings,
      planned,
      planned.number < session ? 'closed' : until,
      valueOf(planned.number)
    );
  return desk;
}
const plainMasses =
  (session: number): ReadingOf =>
  (slot, { id }) =>
    (mass(session, slot) - (id === 'after' ? 0.04 : 0)).toFixed(4);

const plain = (change: Parameters<typeof issuedPlan>[0] = {}) => issuedPlan({ conditions: [], ...change });
const alert = (page: Page) => page.locator('.bench [role=alert]');
const say = (page: Page) => page.locator('.bench h1');
const act = (page: Page) => page.locator('.bench .act button');
const saved = (page: Page, text: string) => expect(page.locator('[data-saved]')).toContainText(text);
/** Readings that the page itself recorded, the last one first. */
async function recorded(page: Page): Promise<Reading[]> {
  const events = await eventsOf(page);
  return events
    .filter(({ who }) => who === 'Test person')
    .flatMap((event) => (event.kind === 'reading-recorded' ? [event.data] : []))
    .reverse();
}

test('missing at close: a reading left out is asked for, one that cannot be had takes a reason, a whole session is asked nothing', async ({
  page,
  app
}) => {
  const issued = plain();
  const desk = deskAt(
    issued,
    1,
    'read',
    (session) => (slot, reading, repeat) =>
      slot === 1 && reading.id === 'after' ? null : plainMasses(session)(slot, reading, repeat)
  );
  const [, second] = issued.sessions;
  await openBench(page, app.origin, desk);
  await expect(say(page)).toContainText('Track 2: enter panel mass after');
  await expect(page.getByRole('button', { name: 'Close session 1' })).toHaveCount(0);
  await page.getByRole('button', { name: new RegExp(issued.sessions[0]?.slots[1]?.specimen ?? '') }).click();
  await page.locator('dialog[open]').getByRole('button', { name: 'There is none …' }).click();
  await page.locator('dialog[open]').getByRole('button', { name: 'Instrument failed' }).click();
  await expect(page.getByRole('button', { name: 'Close session 1' })).toBeVisible();
  await expect(page.locator('.check')).toContainText('missing');
  const missing = (await eventsOf(page)).flatMap((event) => (event.kind === 'reading-missing' ? [event.data] : []));
  expect(missing).toEqual([{ session: 's1', slot: 1, reading: 'after', repeat: 1, reason: 'Instrument failed' }]);
  await act(page).click();
  await expect(page.locator('.strip')).toContainText('Session 2 of 12');

  // The rest of session 2 comes from the other device; now nothing is missing.
  if (!second) throw new Error('twelve sessions are planned');
  recordSession(desk, issued.plan.readings, second, 'read', plainMasses(2));
  await openBench(page, app.origin, desk);
  await expect(page.getByRole('button', { name: 'Close session 2' })).toBeVisible();
  await expect(page.locator('.check')).toContainText('Nothing was flagged');
  await expect(page.locator('.check')).not.toContainText('missing');
});

test('range: outside what is possible and outside what is expected are two warnings; the limits themselves are none', async ({
  page,
  app
}) => {
  await openBench(page, app.origin, deskAt(plain(), 1, 'loaded', plainMasses));
  await enter(page, '250');
  await expect(alert(page)).toContainText('250 g cannot be: it is above what is possible (1 to 200 g).');
  await page.getByRole('button', { name: 'Enter again' }).click();
  await expect(alert(page)).toHaveCount(0);
  await enter(page, '33.3');
  await expect(alert(page)).toContainText('33.3 g is below what was expected (35 to 55 g).');
  expect(await recorded(page), 'nothing is written before the reason').toEqual([]);
  await page.getByRole('button', { name: 'The specimen looks different' }).click();
  await expect(say(page)).toContainText('Track 2');
  expect((await recorded(page))[0]).toMatchObject({
    slot: 0,
    value: 33.3,
    because: 'The specimen looks different',
    raised: [{ check: 'unexpected' }]
  });
  for (const [slot, limit] of [
    [1, '35'],
    [2, '55']
  ] as const) {
    await enter(page, limit);
    await expect(say(page)).not.toContainText(`Track ${slot + 1}`);
    await expect(alert(page)).toHaveCount(0);
    expect((await recorded(page))[0]).toMatchObject({ slot, value: Number(limit), raised: [], because: null });
  }
});

test('specimen: a wrong, a used, a misread and an unknown code are refused with a way out; the right one is not', async ({
  page,
  app
}) => {
  const issued = plain();
  const used = issued.sessions[0]?.slots[0]?.specimen ?? '';
  const [here, neighbour, third] = issued.sessions[1]?.slots.map((slot) => slot?.specimen ?? '') ?? [];
  const later = issued.sessions[3]?.slots[2]?.specimen ?? '';
  if (!here || !neighbour || !third) throw new Error('three specimens a session');
  await openBench(page, app.origin, deskAt(issued, 2, 'prepared', plainMasses));
  const loads = async () =>
    (await eventsOf(page)).filter(({ kind, who }) => kind === 'specimen-loaded' && who === 'Test person').length;
  const aside = page.getByRole('button', { name: `Put aside, take ${here}` });
  const swapped = `${here.slice(1, 2)}${here.slice(0, 1)}${here.slice(2)}`;
  const wrong: [string, string][] = [
    [later, `${later} belongs in session 4, Track 3`],
    [used, `${used} was already tested: session 1, Track 1. A specimen counts once.`],
    [swapped === here ? `${here}3` : swapped, 'its check character is wrong']
  ];
  for (const [code, told] of wrong) {
    await enter(page, code);
    await expect(alert(page), code).toContainText(told);
    await aside.click();
    await expect(alert(page)).toHaveCount(0);
    await expect(say(page)).toContainText(`Put specimen ${here} into Track 1`);
  }
  expect(await loads(), 'nothing is written before a person has said what is so').toBe(0);
  // Used twice: no button lets it count a second time.
  await enter(page, used);
  await expect(alert(page)).toContainText('Take ' + here);
  await expect(page.getByRole('button', { name: /really/ })).toHaveCount(0);
  await aside.click();
  // Right session, wrong track: it goes where it belongs by one tap.
  await enter(page, neighbour);
  await expect(alert(page)).toContainText(`${neighbour} belongs in Track 2. You are loading Track 1.`);
  await page.getByRole('button', { name: 'It goes into Track 2 now' }).click();
  await expect(alert(page)).toHaveCount(0);
  await expect(say(page)).toContainText(`Put specimen ${here} into Track 1`);
  // The right ones, typed in small letters and tapped, are asked nothing.
  await enter(page, here.toLowerCase());
  await expect(say(page)).toContainText(`Put specimen ${third} into Track 3`);
  await expect(alert(page)).toHaveCount(0);
  // Another specimen really is in: the record says so and why, and the analysis counts it.
  await enter(page, later);
  await page.getByRole('button', { name: 'Found loaded so' }).click();
  await expect(say(page)).toContainText('Track 1: enter panel mass before');
  const events = await eventsOf(page);
  const own = events.flatMap((e) => (e.kind === 'specimen-loaded' && e.who === 'Test person' ? [e.data] : []));
  expect(own).toEqual([
    { session: 's2', slot: 1, specimen: neighbour, how: 'typed', because: null },
    { session: 's2', slot: 0, specimen: here, how: 'typed', because: null },
    { session: 's2', slot: 2, specimen: later, how: 'typed', because: 'Found loaded so' }
  ]);
});

test('slip: a decimal sign, inch for millimetre and two swapped digits are offered as one tap; nothing is guessed where none explains it', async ({
  page,
  app
}) => {
  await openBench(page, app.origin, deskAt(plain(), 1, 'loaded', plainMasses));
  // 1 in = 25.4 mm exactly: 1.75 × 25.4 = 44.45.
  const slips: [string, string, number][] = [
    ['442.131', 'A slip of the decimal sign? 44.2131 g would be expected.', 44.2131],
    ['1.75', 'Inch and millimetre confused? 44.45 g would be expected.', 44.45],
    ['24.91', 'Two digits swapped? 42.91 g would be expected.', 42.91]
  ];
  for (const [typed, told, meant] of slips) {
    await enter(page, typed);
    await expect(alert(page)).toContainText(told);
    await page.getByRole('button', { name: `${meant.toFixed(4)} g was meant` }).click();
    await expect(alert(page)).toHaveCount(0);
    await expect.poll(async () => (await recorded(page))[0]?.value).toBe(meant);
    const [last] = await recorded(page);
    expect(last).toMatchObject({ because: null, raised: [{ check: 'slip' }] });
    expect(last?.raised[0]?.said, 'what was typed is kept').toContain(`${typed} was typed`);
  }
  await expect(say(page)).toContainText('All is loaded');
});

test('slip: an odd value that no slip explains is not guessed at, and a good one is asked nothing', async ({
  page,
  app
}) => {
  await openBench(page, app.origin, deskAt(plain(), 1, 'loaded', plainMasses));
  await enter(page, '33.3');
  await expect(alert(page)).toContainText('below what was expected');
  await expect(alert(page)).not.toContainText('?');
  await expect(page.getByRole('button', { name: /was meant/ })).toHaveCount(0);
  await page.getByRole('button', { name: 'Enter again' }).click();
  await enter(page, '44.2131');
  await saved(page, '44.2131 g, Track 1');
  await expect(alert(page)).toHaveCount(0);
});

test('stuck: the same reading three times in a row is doubted, twice is not', async ({ page, app }) => {
  await openBench(page, app.origin, deskAt(plain(), 3, 'loaded', plainMasses));
  await enter(page, '43.9002');
  await saved(page, '43.9002 g, Track 1');
  await enter(page, '43.9002');
  await saved(page, '43.9002 g, Track 2');
  await expect(alert(page)).toHaveCount(0);
  await enter(page, '43.9002');
  await expect(alert(page)).toContainText('43.9002 g came 3 times in a row');
  await page.getByRole('button', { name: 'I have read it again: it is so' }).click();
  await expect(say(page)).toContainText('All is loaded');
  expect((await recorded(page)).map(({ raised }) => raised.map(({ check }) => check))).toEqual([['stuck'], [], []]);
});

test('surprise: far from what the kept readings predict is doubted, near it is not', async ({ page, app }) => {
  const issued = plain();
  /** 1 µm of film is 0.004 m² · 1.5 g/cm³ · 1 µm = 6 mg. */
  const gramsPerMicrometre = 0.006;
  const treatmentOf = (session: number, slot: number) =>
    issued.plan.treatments.findIndex(({ id }) => id === issued.sessions[session - 1]?.slots[slot]?.treatment);
  const scatter = [0.21, -0.34, 0.13, -0.08, 0.29, -0.17, 0.05];
  const lossOf = (session: number, slot: number) =>
    (demoTruth[treatmentOf(session, slot)] ?? 0) + (scatter[(session * 3 + slot) % 7] ?? 0) + (session % 3) * 0.2;
  const masses =
    (session: number): ReadingOf =>
    (slot, { id }) =>
      (mass(session, slot) - (id === 'after' ? lossOf(session, slot) * gramsPerMicrometre : 0)).toFixed(4);
  await openBench(page, app.origin, deskAt(issued, 9, 'stopped', masses));
  const after = (slot: number, more: number) =>
    (mass(9, slot) - (lossOf(9, slot) + more) * gramsPerMicrometre).toFixed(4);
  await expect(say(page)).toContainText('Track 1: enter panel mass after');
  await enter(page, after(0, 0));
  await saved(page, 'Track 1');
  await expect(alert(page)).toHaveCount(0);
  await enter(page, after(1, 5));
  await expect(alert(page)).toContainText('Loss of film thickness comes to');
  await expect(alert(page)).toContainText(/The readings so far predict -?−?[\d.]+ to [\d.]+ µm here/);
  await page.getByRole('button', { name: 'I have read it again: it is so' }).click();
  await saved(page, 'Track 2');
  expect((await recorded(page)).map(({ raised }) => raised.map(({ check }) => check))).toEqual([['surprise'], []]);
});

test('condition: outside its window it takes a reason, on its limit it does not', async ({ page, app }) => {
  await openBench(page, app.origin, new Desk(issuedPlan()));
  await page.getByLabel('Relative humidity').fill('55');
  await page.getByLabel('Batch of abrasive pads').fill('P-40');
  await page.getByLabel('Room temperature').fill('25');
  await expect(page.locator('.conditions')).not.toContainText('its window (');
  await expect(act(page)).toBeEnabled();
  await page.getByLabel('Room temperature').fill('25.1');
  await expect(page.locator('.conditions')).toContainText(
    'Room temperature 25.1 °C is above its window (21 to 25 °C).'
  );
  await expect(act(page)).toBeDisabled();
  await page.getByLabel('Outside its window').fill('Air conditioning under repair');
  await act(page).click();
  await expect(say(page)).toContainText('Put specimen');
  const [values] = (await eventsOf(page)).flatMap((e) => (e.kind === 'conditions-recorded' ? [e.data.values] : []));
  expect(values?.map(({ condition, value, because, raised }) => [condition, value, because, raised.length])).toEqual([
    ['temperature', 25.1, 'Air conditioning under repair', 1],
    ['humidity', 55, null, 0],
    ['pad', null, null, 0]
  ]);
});

test('ruin: three ways on with their prices, then counted again with a reason', async ({ page, app }) => {
  const issued = plain();
  const spoiled = issued.sessions[1]?.slots[0]?.specimen ?? '';
  await openBench(page, app.origin, deskAt(issued, 2, 'stopped', plainMasses));
  const sheet = page.locator('dialog[open]');
  await page.getByRole('button', { name: 'Ruined …' }).click();
  await sheet.getByRole('button', { name: 'Pad came loose' }).click();
  const ways = sheet.locator('.way');
  await expect(ways).toHaveCount(3);
  const percent: number[] = [];
  for (const [i, title] of ['Repeat later', 'Spare specimen now', 'Leave it out'].entries()) {
    await expect(ways.nth(i)).toContainText(title);
    await expect(ways.nth(i)).toContainText(/standard error of a difference [\d.]+ µm \([+−-]?[\d.]+\s?%\)/);
    percent.push(Number(/\(\+?([−-]?[\d.]+)/.exec(await ways.nth(i).innerText())?.[1]?.replace('−', '-')));
  }
  expect(percent[1], 'a spare in the same slot restores the plan').toBe(0);
  expect(percent[2], 'without the run the comparison is less sharp').toBeGreaterThan(0);
  expect(percent[0]).toBeLessThanOrEqual(percent[2] ?? 0);
  await ways.nth(2).click();
  await expect(sheet).toBeHidden();
  await expect(say(page)).toContainText('Track 2: enter panel mass after');
  await page.getByRole('button', { name: new RegExp(spoiled) }).click();
  await expect(sheet, 'the reading is kept').toContainText(mass(2, 0).toFixed(4));
  await sheet.getByRole('button', { name: 'Not ruined after all …' }).click();
  await sheet.getByRole('button', { name: 'Looked at again: it is sound' }).click();
  await expect(sheet).toBeHidden();
  await expect(say(page)).toContainText('Track 1: enter panel mass after');
  const events = await eventsOf(page);
  const ruin = events.filter((e) => e.kind === 'ruined').at(-1);
  expect(ruin?.data).toEqual({ session: 's2', slot: 0, reason: 'Pad came loose', next: 'leave-out' });
  expect(events.filter((e) => e.kind === 'reinstated').map(({ data }) => data)).toEqual([
    { target: ruin?.id, reason: 'Looked at again: it is sound' }
  ]);
});

/** One reading whose number of cycles may stop at the end of the test; invented. */
const cycles = {
  id: 'cycles',
  label: 'Cycles to break-through',
  unit: '',
  decimals: 0,
  possible: { min: 0, max: null },
  expected: { min: 100, max: 20_000 },
  when: { kind: 'after' },
  repeats: 1,
  resolution: null,
  mayStopAtLimit: true
} as const;
const measured = (id: string, label: string, unit: string, decimals: number) => ({
  ...plain().plan.measurands[0]!,
  id,
  label,
  unit,
  decimals,
  formula: null,
  possible: { min: null, max: null },
  expected: { min: null, max: null }
});

test('limit: “≥ 10,000” is understood, asked about where it has two meanings, and kept as a limit', async ({
  page,
  app
}) => {
  const issued = plain({
    readings: [cycles],
    measurands: [measured('cycles', 'Cycles to break-through', '', 0)],
    primary: null
  });
  await openBench(
    page,
    app.origin,
    deskAt(issued, 1, 'stopped', () => () => null)
  );
  await expect(say(page)).toContainText('Track 1: enter cycles to break-through');
  await enter(page, '≥ 10,000');
  await expect(page.locator('.echo')).toContainText('This can be read in two ways');
  await page.getByRole('button', { name: '≥ 10000', exact: true }).click();
  await expect(say(page)).toContainText('Track 2');
  await page.getByRole('button', { name: 'At least: the test stopped at this limit' }).click();
  for (const key of '9000') await page.getByRole('button', { name: key, exact: true }).click();
  await expect(page.locator('.echo')).toContainText('Understood: ≥ 9');
  await act(page).click();
  await expect(say(page)).toContainText('Track 3');
  await enter(page, '8125');
  await expect(say(page)).toContainText('Look over the readings');
  await expect(page.locator('.check')).toContainText(/≥ 10,?000/);
  expect((await recorded(page)).map(({ value, limit, raw }) => [value, limit, raw])).toEqual([
    [8125, 'none', '8125'],
    [9000, 'at-least', '≥9000'],
    [10_000, 'at-least', '≥ 10,000']
  ]);
});

test('repeats: each reading of a specimen is numbered, and their mean and scatter shown', async ({ page, app }) => {
  const gloss = { ...cycles, id: 'gloss', label: 'Gloss', decimals: 1, repeats: 3, mayStopAtLimit: false };
  const issued = plain({
    readings: [{ ...gloss, expected: { min: 0, max: 100 } }],
    measurands: [measured('gloss', 'Gloss', '', 1)],
    primary: null
  });
  await openBench(
    page,
    app.origin,
    deskAt(issued, 1, 'stopped', () => () => null)
  );
  const typed = ['12.4', '12.9', '12.2'];
  for (const [i, text] of typed.entries()) {
    await expect(say(page)).toContainText(`Track 1: enter gloss, ${i + 1} of 3.`);
    // 12.4 and 12.9 have the mean 12.65 and the standard deviation 0.5/√2 = 0.354.
    if (i === 2) await expect(page.locator('.repeats')).toHaveText('2 of 3, mean 12.65, scatter 0.35');
    await enter(page, text);
  }
  await expect(say(page)).toContainText('Track 2: enter gloss, 1 of 3.');
  expect((await recorded(page)).map(({ repeat, value }) => [repeat, value]).reverse()).toEqual([
    [1, 12.4],
    [2, 12.9],
    [3, 12.2]
  ]);
});

test('timed readings are asked for while the machine runs, point by point', async ({ page, app }) => {
  const at = (point: number) => ({
    ...cycles,
    id: `loss_${point}`,
    label: `Loss at ${point} cycles`,
    unit: 'mg',
    decimals: 1,
    expected: { min: 0, max: 500 },
    when: { kind: 'at' as const, point, unit: 'cycles' },
    mayStopAtLimit: false
  });
  const issued = plain({
    readings: [at(1000), at(500)],
    measurands: [measured('loss_1000', 'Loss at 1000 cycles', 'mg', 1)],
    primary: null
  });
  await openBench(
    page,
    app.origin,
    deskAt(issued, 1, 'running', () => () => null)
  );
  const values = new Map<string, string>();
  for (const point of [500, 1000])
    for (const slot of [0, 1, 2]) {
      await expect(say(page)).toContainText(`Track ${slot + 1}: enter loss at ${point} cycles`);
      const text = `${point / 10 + slot}.5`;
      values.set(`loss_${point}/${slot}`, text);
      await enter(page, text);
    }
  await expect(say(page)).toContainText('The machine is running');
  await act(page).click();
  await expect(say(page)).toContainText('Look over the readings');
  expect(new Map((await recorded(page)).map(({ reading, slot, raw }) => [`${reading}/${slot}`, raw]))).toEqual(values);
});

test('paper: a reading typed in later keeps when it was read and when it was typed', async ({ page, app }) => {
  await openBench(page, app.origin, deskAt(plain(), 1, 'loaded', plainMasses));
  await page.getByRole('button', { name: 'Settings' }).click();
  await page.getByRole('button', { name: 'From paper …' }).click();
  const sheet = page.locator('dialog[open]');
  await sheet.getByLabel('Read at').fill('2026-10-05T09:41');
  await sheet.getByRole('button', { name: 'Type the readings of this time' }).click();
  await expect(page.locator('.bench')).toContainText('From paper, read 2026-10-05 09:41');
  await enter(page, '44.2131');
  await saved(page, '44.2131 g, Track 1');
  const event = (await eventsOf(page)).filter(({ kind }) => kind === 'reading-recorded').at(-1);
  const data = event?.data as Reading;
  expect(data).toMatchObject({ source: 'paper', value: 44.2131 });
  expect(data.readAt).toMatch(/^2026-10-05T09:41:00/);
  expect(Math.abs(Date.parse(event?.at ?? '') - Date.now()), 'typed now').toBeLessThan(60_000);
});

test('keys that come while a reading is being written belong to the next ones, none is lost', async ({ page, app }) => {
  await openBench(page, app.origin, deskAt(plain(), 1, 'loaded', plainMasses));
  await expect(say(page)).toContainText('Track 1');
  // All in one task of the page: no write can have ended in between.
  await page.evaluate(() => {
    const input = document.querySelector<HTMLInputElement>('.window input');
    for (const key of '44.2131\n45.3001\n43.90') {
      if (key === '\n') input?.form?.requestSubmit();
      else if (input) {
        input.value += key;
        input.dispatchEvent(new InputEvent('input', { bubbles: true }));
      }
    }
  });
  await expect(say(page)).toContainText('Track 3');
  await expect(page.locator('.window input')).toHaveValue('43.90');
  await enter(page, '02');
  await expect(say(page)).toContainText('All is loaded');
  expect((await recorded(page)).map(({ slot, raw }) => [slot, raw])).toEqual([
    [2, '43.9002'],
    [1, '45.3001'],
    [0, '44.2131']
  ]);
});
