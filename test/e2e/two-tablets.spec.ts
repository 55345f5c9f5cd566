import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import type { Download, Locator, Page } from '@playwright/test';
import { unzipSync } from 'fflate';
import type { IssuedPlan } from '#lib/core/campaign/plan.ts';
import { expect, expectAccessible, keepPicture, sizes, test, watchContext } from './app.ts';
import { eventsOf } from './bench-campaign.ts';
import { field, pasteTreatments, startCampaign, waitForChoices } from './plan-desk.ts';
import { TabletRecord } from './tablet-record.ts';

/** Goes on with the Tab key until the element has the focus: what the keyboard cannot reach fails. */
async function reach(page: Page, target: Locator): Promise<void> {
  await expect(target).toBeVisible();
  for (let presses = 0; presses < 160; presses++) {
    if (await target.evaluate((element) => element === document.activeElement)) return;
    await page.keyboard.press('Tab');
  }
  throw new Error(`the Tab key does not reach ${target.toString()}`);
}

async function press(page: Page, target: Locator): Promise<void> {
  await reach(page, target);
  await page.keyboard.press('Enter');
}

async function type(page: Page, target: Locator, text: string): Promise<void> {
  await reach(page, target);
  await page.keyboard.press('ControlOrMeta+a');
  await page.keyboard.type(text);
}

/** The file that pressing a button saves. */
async function saved(page: Page, button: Locator): Promise<Buffer> {
  const [download]: [Download, void] = await Promise.all([page.waitForEvent('download'), press(page, button)]);
  return readFileSync(await download.path());
}

/** Brings a file in through the desk, from the button to the summary's acceptance. */
async function bringIn(page: Page, name: string, bytes: Buffer): Promise<void> {
  const choosing = page.waitForEvent('filechooser');
  await press(page, page.locator('.zone button'));
  await (await choosing).setFiles({ name, mimeType: 'application/jsonl', buffer: bytes });
  await press(page, page.getByRole('article', { name }).getByRole('button', { name: 'Take it in' }));
  await expect(page.getByRole('article', { name })).toContainText('Taken in');
}

async function pictures(page: Page, name: string): Promise<void> {
  const before = page.viewportSize();
  for (const size of sizes.filter(({ name: one }) => one !== 'portrait')) {
    await page.setViewportSize(size);
    await keepPicture(page, `two-tablets-${name}-${size.name}`);
  }
  if (before) await page.setViewportSize(before);
}

test('a campaign planned, issued, recorded on two tablets, decided, read and reported, by keyboard alone', async ({
  page,
  app,
  browser
}) => {
  test.setTimeout(120_000);
  await page.setViewportSize({ width: 1440, height: 900 });
  await page.emulateMedia({ reducedMotion: 'reduce' });
  let campaign = '';
  let issued: IssuedPlan | null = null;

  await test.step('plan and issue', async () => {
    await startCampaign(page, app.origin, 'Invented paints, two tablets');
    await reach(page, field(page, 'treatments.0.name'));
    await pasteTreatments(page, 'Chalk\nFlint\nLinen\nMoss');
    await type(page, field(page, 'machines.0.slots'), '2');
    await type(page, field(page, 'measurands.0.label'), 'Gloss');
    await waitForChoices(page);
    await type(page, field(page, 'who'), 'E. Planner (invented)');
    await press(page, page.getByRole('button', { name: 'Issue the plan' }));
    await expect(page.getByRole('heading', { name: 'Loading order' })).toBeVisible({ timeout: 20_000 });
    const event = (await eventsOf(page)).find(({ kind }) => kind === 'plan-issued');
    if (event?.kind !== 'plan-issued') throw new Error('the plan was not issued');
    issued = event.data;
    campaign = event.campaign;
    await pictures(page, 'plan');
  });
  const plan = issued as IssuedPlan | null;
  if (!plan) throw new Error('no plan');

  await test.step('print', async () => {
    await press(page, page.getByRole('link', { name: 'Print: Load sheets' }));
    await expect(page.locator('.paper')).toHaveCount(plan.sessions.length);
  });

  const planFile = await test.step('take the plan to the tablets', async () => {
    await page.goto(`${app.origin}/shift?c=${campaign}`);
    return saved(page, page.getByRole('button', { name: /[Dd]ownload/ }));
  });

  // Invented: every paint has a level of its own, every session an offset, and a little scatter.
  const level = (treatment: string): number => plan.plan.treatments.findIndex(({ id }) => id === treatment) * 4;
  const value = (session: number, treatment: string): number =>
    20 + level(treatment) + session * 1.5 + ((session * 7 + level(treatment)) % 3) * 0.2;
  const half = Math.ceil(plan.sessions.length / 2);
  const disputed = plan.sessions[0];
  if (!disputed) throw new Error('no session');
  const files = await test.step('record on two tablets', () =>
    Promise.all(
      ['A. Tablet (invented)', 'B. Tablet (invented)'].map(async (who, tablet) => {
        const context = await browser.newContext({ locale: 'en-GB', viewport: { width: 1180, height: 820 } });
        const faults = await watchContext(context, app.origin);
        const bench = await context.newPage();
        await bench.goto(`${app.origin}/desk`);
        await bringIn(bench, 'plan.jsonl', planFile);
        const record = new TabletRecord(campaign, `019aa000-0000-7000-8000-00000000000${tablet + 1}`, who);
        const own = tablet === 0 ? plan.sessions.slice(0, half) : plan.sessions.slice(half);
        for (const session of own) record.session(plan, session, (treatment) => value(session.number, treatment));
        if (tablet === 1) record.reading(plan, disputed, 0, 77.7);
        await record.store(bench);
        await bench.goto(`${app.origin}/shift?c=${campaign}`);
        const file = await saved(bench, bench.getByRole('button', { name: /[Dd]ownload/ }));
        expect(faults).toEqual([]);
        await context.close();
        return file;
      })
    ));

  await test.step('bring in, decide the contradiction', async () => {
    await page.goto(`${app.origin}/desk?c=${campaign}`);
    for (const [tablet, file] of files.entries()) await bringIn(page, `tablet-${tablet + 1}.jsonl`, file);
    await expect(page.getByRole('heading', { name: 'Contradictions to decide' })).toBeVisible();
    const [one, other] = await Promise.all(
      [0, 1].map((n) => page.locator('fieldset label').nth(n).boundingBox()) // prettier-ignore
    );
    expect(one?.y, 'side by side').toBe(other?.y);
    await expectAccessible(page);
    await pictures(page, 'decide');
    await reach(page, page.locator('fieldset input[type=radio]').first());
    const right = page.locator('fieldset label').filter({ hasNotText: '77.7' }).locator('input');
    await page.keyboard.press('Space');
    if (!(await right.isChecked())) await page.keyboard.press('ArrowDown');
    await expect(right).toBeChecked();
    await type(page, page.getByLabel('Reason', { exact: true }), 'The paper says so; B. typed into the wrong session.');
    await press(page, page.getByRole('button', { name: 'Record the decision' }));
    await expect(page.getByRole('heading', { name: 'Contradictions to decide' })).toHaveCount(0);
    const decided = (await eventsOf(page)).find(({ kind }) => kind === 'contradiction-decided');
    expect(decided?.kind === 'contradiction-decided' && decided.data.reason).toContain('The paper says so');
  });

  await test.step('results', async () => {
    await press(page, page.locator(`#content a[href$="/results?c=${campaign}"]`).first());
    const means = page.getByRole('table', { name: /every treatment, best first/ });
    await expect(means.getByRole('row')).toHaveCount(5, { timeout: 30_000 });
    await expect(page.locator('#content')).not.toContainText('77.7');
    await expectAccessible(page);
    await pictures(page, 'results');
  });

  await test.step('report and package', async () => {
    await press(page, page.getByRole('link', { name: /^Report/ }).last());
    const html = (await saved(page, page.getByRole('button', { name: 'Save the report' }))).toString('utf8');
    const zip = await saved(page, page.getByRole('button', { name: 'Save the data package' }));
    await expectAccessible(page);
    await pictures(page, 'report');

    const reader = await browser.newPage();
    await reader.setContent(html);
    await expect(reader.locator('h1')).toHaveText('Invented paints, two tablets');
    await expect(reader.locator('[src], [href], link, script, iframe, object, embed')).toHaveCount(0);
    await expect(reader.locator('table').first()).toContainText('Chalk');
    expect(html).not.toMatch(/url\(|@import/);
    await reader.close();

    const parts = unzipSync(new Uint8Array(zip));
    const { resources } = JSON.parse(new TextDecoder().decode(parts['datapackage.json'])) as {
      resources: { path: string; bytes: number; hash: string }[];
    };
    expect(resources.length + 1).toBe(Object.keys(parts).length);
    for (const { path, bytes, hash } of resources) {
      const part = parts[path];
      expect(part?.length, path).toBe(bytes);
      expect(
        `sha256:${createHash('sha256')
          .update(part ?? '')
          .digest('hex')}`,
        path
      ).toBe(hash);
    }
    const readings = resources.find(({ path }) => /readings\.csv$/.test(path));
    expect(new TextDecoder().decode(parts[readings?.path ?? ''])).toContain('77.7');
  });
});
