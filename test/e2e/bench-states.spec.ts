import type { Page } from '@playwright/test';
import { expect, expectAccessible, keepPicture, sizes, test } from './app.ts';
import { Desk, enter, issuedPlan, openBench } from './bench-campaign.ts';

type Look = (state: string) => Promise<void>;

/** Leads the bench through every state a person can see, and lets each be looked at. */
async function walk(page: Page, origin: string, look: Look): Promise<void> {
  const act = page.locator('.bench .act button');
  const say = page.locator('.bench h1');
  const sheet = page.locator('dialog[open]');
  const issued = issuedPlan({ runSeconds: 324 });
  const [first, second] = issued.sessions;
  const code = (slot: number) => first?.slots[slot]?.specimen ?? '';
  const desk = new Desk(issued);
  await openBench(page, origin, desk, '');
  await expect(sheet).toContainText('Who is at the bench?');
  await look('who');
  await sheet.getByRole('textbox').fill('Test person');
  await sheet.getByRole('button', { name: 'Begin' }).click();
  await expect(sheet).toBeHidden();
  await expect(say).toContainText('Before loading');
  await page.getByLabel('Room temperature').fill('27');
  await expect(page.locator('.conditions')).toContainText('above its window');
  await look('prepare-outside-window');
  await page.getByLabel('Room temperature').fill('23,1');
  await page.getByLabel('Relative humidity').fill('50');
  await page.getByLabel('Batch of abrasive pads').fill('P-40');
  await look('prepare');
  await act.click();
  await expect(say).toContainText(`Put specimen ${code(0)}`);
  await look('load');
  await enter(page, second?.slots[0]?.specimen ?? '');
  await expect(page.getByRole('alert')).toContainText('belongs in session 2');
  await look('load-wrong');
  await act.click();
  for (const slot of [0, 1, 2]) {
    await expect(say).toContainText(`Put specimen ${code(slot)}`);
    await act.click();
  }
  await expect(say).toContainText('Track 1: enter panel mass before');
  await page.keyboard.type('44,21');
  await look('read');
  await page.keyboard.press('Backspace');
  await page.keyboard.type('x');
  await page.keyboard.press('Enter');
  await expect(page.locator('.echo')).toContainText('not part of a number');
  await look('read-not-a-number');
  await page.keyboard.press('ControlOrMeta+A');
  await enter(page, '442,131');
  await expect(page.getByRole('alert')).toContainText('44.2131 g would be expected');
  await look('read-warning');
  await page.getByRole('button', { name: '44.2131 g was meant' }).click();
  await expect(say).toContainText('Track 2');
  await look('read-saved');
  await enter(page, '45.3001');
  await expect(say).toContainText('Track 3');
  await enter(page, '43.9002');
  await expect(say).toContainText('All is loaded');
  await look('start');
  await act.click();
  await expect(say).toContainText('The machine is running');
  await look('running');
  await page.clock.setFixedTime(new Date(Date.now() + 340_000));
  await expect(say).toContainText('The run is over');
  await look('run-over');
  await act.click();
  await expect(say).toContainText('Track 1: enter panel mass after');
  await look('read-after');
  await page.getByRole('button', { name: 'Ruined …' }).click();
  await look('ruin');
  await sheet.getByRole('button', { name: 'Pad came loose' }).click();
  await expect(sheet).toContainText('How to go on with it?');
  await look('ruin-ways-on');
  await sheet.getByRole('button', { name: 'Leave it out' }).click();
  await expect(sheet).toBeHidden();
  await look('ruined');
  await enter(page, '45.2612');
  await expect(say).toContainText('Track 3');
  await page.getByRole('button', { name: 'Note …' }).click();
  await sheet.locator('textarea').fill('The pad of track 1 came loose at the end.');
  await look('note');
  await sheet.getByRole('button', { name: 'Save the note' }).click();
  await expect(sheet).toBeHidden();
  await page.getByRole('button', { name: new RegExp(code(2)) }).click();
  await look('slot');
  await sheet.getByRole('button', { name: 'Correct' }).click();
  await sheet.locator('input').first().fill('43.9012');
  await look('correct');
  await sheet.getByRole('button', { name: 'Typing slip' }).click();
  await expect(sheet).toBeHidden();
  await enter(page, '43.8603');
  await expect(say).toContainText('Look over the readings');
  await look('check');
  await page.getByRole('button', { name: /Session 1 of 12/ }).click();
  await look('queue');
  await page.keyboard.press('Escape');
  await page.getByRole('button', { name: 'Settings' }).click();
  await look('settings');
  await sheet.getByRole('button', { name: 'From paper …' }).click();
  await look('paper');
  await page.keyboard.press('Escape');
  await act.click();
  await expect(page.locator('.bench')).toContainText('Session 1 is closed and saved');
  await look('next');
  const second_ = await page.context().newPage();
  await second_.goto(page.url());
  await expect(second_.locator('.bench h1')).toContainText('Another tab records this campaign');
  if (page.viewportSize()) await second_.setViewportSize(page.viewportSize() ?? { width: 0, height: 0 });
  await keepPicture(second_, `bench-following-${page.viewportSize()?.width}`);
  await second_.close();
}

/**
 * What can be tapped and is smaller than 48 px either way. A control inside its label is as large as the label; a field
 * that no finger can reach (visually hidden) is no target.
 */
const smallTargets = (page: Page): Promise<string[]> =>
  page.evaluate(() => {
    const scope = document.querySelector('dialog[open]') ?? document.querySelector('.bench');
    const targets = scope?.querySelectorAll<HTMLElement>(
      'button, input, select, textarea, a[href], summary, [role=radio]'
    );
    return [...(targets ?? [])].flatMap((target) => {
      if (!target.checkVisibility({ visibilityProperty: true }) || target.closest('.visually-hidden')) return [];
      const box = (target.closest('label') ?? target).getBoundingClientRect();
      // A screen rounds to its own pixels; half a pixel is no difference to a finger.
      if (box.width >= 47.5 && box.height >= 47.5) return [];
      const name = target.getAttribute('aria-label') ?? target.textContent?.trim() ?? '';
      return [`${target.localName} “${name.slice(0, 40)}” ${box.width.toFixed(0)}×${box.height.toFixed(0)}`];
    });
  });

for (const size of sizes)
  test(`every state of the bench at ${size.width}×${size.height} is kept as a picture, with targets of 48 px${size.name === 'landscape' ? ', clean under axe' : ''}`, async ({
    page,
    app
  }) => {
    test.setTimeout(180_000);
    await page.setViewportSize(size);
    await page.emulateMedia({ colorScheme: 'light', reducedMotion: 'reduce' });
    const seen: string[] = [];
    const small: string[] = [];
    await walk(page, app.origin, async (state) => {
      await keepPicture(page, `bench-${state}-${size.name}`);
      seen.push(state);
      if (size.name === 'landscape') await expectAccessible(page);
      small.push(...(await smallTargets(page)).map((target) => `${state}: ${target}`));
      const wide = await page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
      expect(wide, `${state} scrolls sideways`).toBeLessThanOrEqual(0);
    });
    expect(seen).toContain('next');
    expect(small, 'targets under 48 px').toEqual([]);
  });

test('axe finds no colours hard to read in any state of the bench in the dark', async ({ page, app }) => {
  test.setTimeout(180_000);
  await page.emulateMedia({ colorScheme: 'dark', reducedMotion: 'reduce' });
  await walk(page, app.origin, async (state) => {
    await expectAccessible(page, 'colours');
    await keepPicture(page, `bench-${state}-dark`);
  });
});

test('at 200 % zoom every state of the bench is whole and axe finds nothing grave', async ({ page, app }) => {
  test.setTimeout(180_000);
  // A viewport of half the size is what 200 % zoom gives a page (WCAG 2.2, 1.4.4 and 1.4.10).
  await page.setViewportSize({ width: 590, height: 410 });
  await walk(page, app.origin, async (state) => {
    await expectAccessible(page, 'room');
    const wide = await page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
    expect(wide, `${state} scrolls sideways`).toBeLessThanOrEqual(0);
    await keepPicture(page, `bench-${state}-zoom`);
  });
});
