import type { Page } from '@playwright/test';
import { issuedPlan, Desk, benchCampaign, enter, eventsOf, openBench } from './bench-campaign.ts';
import { expect, test } from './app.ts';

const plan = () => issuedPlan({ conditions: [], runSeconds: null });

/** Invented masses: before around 44 g, after a little less; the last digits differ, so that nothing looks stuck. */
const mass = (session: number, slot: number, after: boolean): string => {
  const before = 440000 + ((session * 7919 + slot * 104729) % 30000);
  return ((before - (after ? 300 + ((session * 37 + slot * 11) % 90) : 0)) / 10000).toFixed(4);
};

interface Acts {
  loads: number;
  readings: number;
  /** Keys or taps that entered readings: digits, sign and Enter. */
  strokes: number;
  other: number;
}

const saved = (page: Page, text: string) => expect(page.locator('[data-saved]')).toContainText(text);

/** Records the campaign through one way of working; every act is counted. */
async function record(
  page: Page,
  how: { act: () => Promise<void>; load: () => Promise<void>; number: (text: string) => Promise<number> }
): Promise<Acts> {
  const acts: Acts = { loads: 0, readings: 0, strokes: 0, other: 0 };
  const say = page.locator('.bench h1');
  const other = async () => {
    await how.act();
    acts.other++;
  };
  const read = async (session: number, slot: number, after: boolean) => {
    const value = mass(session, slot, after);
    await expect(say).toContainText(`Track ${slot + 1}: enter panel mass ${after ? 'after' : 'before'}`);
    acts.strokes += await how.number(value);
    acts.readings++;
    if (slot < 2) await saved(page, `${value} g, Track ${slot + 1}`);
  };
  const { sessions } = plan();
  for (const { number, slots } of sessions) {
    await expect(page.locator('.strip')).toContainText(`Session ${number} of 12`);
    await expect(page.locator('.precautions')).toBeVisible();
    await other();
    for (const slot of [0, 1, 2]) {
      await expect(say).toContainText(`Put specimen ${slots[slot]?.specimen} into Track ${slot + 1}`);
      await how.load();
      acts.loads++;
    }
    for (const slot of [0, 1, 2]) await read(number, slot, false);
    await expect(say).toContainText('All is loaded');
    await other();
    await expect(say).toContainText('The machine is running');
    await other();
    for (const slot of [0, 1, 2]) await read(number, slot, true);
    await expect(say).toContainText('Look over the readings');
    await other();
  }
  await expect(page.locator('h1')).toContainText('All sessions are closed');
  return acts;
}

async function expectRecorded(page: Page, acts: Acts, source: string): Promise<void> {
  const events = await eventsOf(page);
  const readings = events.flatMap((event) => (event.kind === 'reading-recorded' ? [event.data] : []));
  expect(readings).toHaveLength(72);
  for (const { session, sessions } of [{ session: 0, sessions: plan().sessions }])
    for (const planned of sessions.slice(session))
      for (const slot of [0, 1, 2])
        for (const after of [false, true])
          expect(readings).toContainEqual(
            expect.objectContaining({
              session: planned.id,
              slot,
              specimen: planned.slots[slot]?.specimen,
              reading: after ? 'after' : 'before',
              value: Number(mass(planned.number, slot, after)),
              raw: mass(planned.number, slot, after),
              source,
              raised: []
            })
          );
  expect(acts).toEqual({ loads: 36, readings: 72, strokes: 72 * (7 + 1), other: 12 * 4 });
  console.log(
    `${source}: 12 sessions × 3 slots: ${acts.strokes} strokes for 72 readings (7 characters and Enter each), ` +
      `${acts.loads} loads, ${acts.other / 12} other acts a session`
  );
}

test('a campaign of 12 sessions × 3 slots is recorded by keyboard alone at 1180×820', async ({ page, app }) => {
  test.setTimeout(180_000);
  await openBench(page, app.origin, new Desk(plan()));
  const press = () => page.keyboard.press('Enter');
  const acts = await record(page, {
    act: press,
    load: press,
    number: async (text) => {
      await enter(page, text);
      return text.length + 1;
    }
  });
  await expectRecorded(page, acts, 'keyboard');
});

/** Where a finger would touch each key, by its name. */
const keyCentres = (page: Page): Promise<Record<string, [number, number]>> =>
  page.locator('.bench button').evaluateAll((buttons) =>
    Object.fromEntries(
      buttons.map((button) => {
        const { x, y, width, height } = button.getBoundingClientRect();
        return [button.getAttribute('aria-label') ?? button.textContent?.trim() ?? '', [x + width / 2, y + height / 2]];
      })
    )
  );

test('a campaign of 12 sessions × 3 slots is recorded by touch alone at 820×1180', async ({ browser, app }) => {
  test.setTimeout(240_000);
  const context = await browser.newContext({ viewport: { width: 820, height: 1180 }, hasTouch: true, locale: 'en-GB' });
  const page = await context.newPage();
  await openBench(page, app.origin, new Desk(plan()));
  const act = page.locator('.bench .act button');
  const acts = await record(page, {
    act: () => act.tap(),
    load: () => act.tap(),
    number: async (text) => {
      const centres = await keyCentres(page);
      for (const key of text) {
        const [x, y] = centres[key === '.' ? 'Decimal sign' : key] ?? [0, 0];
        await page.touchscreen.tap(x, y);
      }
      await act.tap();
      return text.length + 1;
    }
  });
  await expectRecorded(page, acts, 'keypad');
  await context.close();
});

test('a reload in the middle comes back to the same session, the same slot and what was typed', async ({
  page,
  app
}) => {
  await openBench(page, app.origin, new Desk(plan()));
  const say = page.locator('.bench h1');
  for (let i = 0; i < 4; i++) {
    await page.keyboard.press('Enter');
    await expect(say).toContainText(i < 3 ? `into Track ${i + 1}` : 'Track 1: enter');
  }
  await enter(page, '44.2131');
  await saved(page, '44.2131 g');
  await page.keyboard.type('45.3');
  await expect(page.locator('.plate.focus')).toContainText('45.3');
  await page.reload();
  await expect(say).toContainText('Track 2: enter panel mass before');
  await expect(page.locator('.window input')).toHaveValue('45.3');
  await enter(page, '001');
  await saved(page, '45.3001 g, Track 2');
  const readings = (await eventsOf(page)).flatMap((e) => (e.kind === 'reading-recorded' ? [e.data.raw] : []));
  expect(readings).toEqual(['44.2131', '45.3001']);
  expect(page.url()).toContain(benchCampaign);
});
