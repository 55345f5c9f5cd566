import { readFileSync } from 'node:fs';
import type { CampaignEvent, DataOf } from '#lib/core/campaign/event.ts';
import { expect, test } from './app.ts';
import { eventsOf } from './bench-campaign.ts';
import { field, issuePlan, pasteTreatments, startCampaign, waitForChoices } from './plan-desk.ts';

interface Case {
  data: { treatment: string[]; block: string[]; y: number[] };
}
/**
 * Montgomery, Design and Analysis of Experiments: 4 catalysts, 4 batches of raw material, 3 a batch; data typed from memory of
 * the book, as test/reference/cases/pub_catalyst.json says.
 */
const { data } = JSON.parse(readFileSync('test/reference/cases/pub_catalyst.json', 'utf8')) as Case;
const catalysts = ['1', '2', '3', '4'];

/** The batch that lacks the same catalyst as a session, and its reading of a catalyst. */
function published(lacking: string, catalyst: string): number {
  const batch = [...new Set(data.block)].find(
    (name) => !data.treatment.some((treatment, row) => data.block[row] === name && treatment === lacking)
  );
  const row = data.treatment.findIndex((treatment, at) => treatment === catalyst && data.block[at] === batch);
  const y = data.y[row];
  if (y === undefined) throw new Error(`no reading of catalyst ${catalyst} in batch ${batch}`);
  return y;
}

const issuedIn = (events: CampaignEvent[]): DataOf<'plan-issued'> => {
  const event = events.find(({ kind }) => kind === 'plan-issued');
  if (event?.kind !== 'plan-issued') throw new Error('the plan was not issued');
  return event.data;
};

test('the published catalyst example, planned, recorded session by session and analysed, gives the published figures', async ({
  page,
  app
}) => {
  test.setTimeout(120_000);
  await startCampaign(page, app.origin, 'Catalysts, published example');
  await pasteTreatments(page, catalysts.join('\n'));
  await field(page, 'machines.0.slots').fill('3');
  await field(page, 'measurands.0.label').fill('Reaction time');
  await field(page, 'measurands.0.unit').fill('min');
  await waitForChoices(page);
  await page
    .getByRole('radio', { name: /\b4 sessions/ })
    .first()
    .check();
  await issuePlan(page, 'catalyst');
  const { plan, sessions } = issuedIn(await eventsOf(page));
  const nameOf = (id: string): string => plan.treatments.find((treatment) => treatment.id === id)?.name ?? '';
  expect(sessions).toHaveLength(4);

  await page.getByRole('link', { name: 'Bench' }).first().click();
  const act = page.locator('div.act button');
  for (const session of sessions) {
    const loaded = session.slots.map((slot) => nameOf(slot?.treatment ?? ''));
    const lacking = catalysts.find((catalyst) => !loaded.includes(catalyst)) ?? '';
    await expect(page.getByRole('heading', { level: 1 })).toContainText('Before loading');
    await act.click();
    for (let slot = 0; slot < 3; slot++) {
      await expect(act).toContainText(`is in slot ${slot + 1}`);
      await act.click();
    }
    await expect(act).toContainText('Start');
    await act.click();
    await expect(act).toContainText('Stop');
    await act.click();
    for (const catalyst of loaded) {
      const due = page.locator('.bench input:focus');
      await expect(due).toHaveValue('');
      await page.keyboard.type(String(published(lacking, catalyst)));
      await page.keyboard.press('Enter');
    }
    await expect(act).toContainText(`Close session ${session.number}`);
    await act.click();
  }
  await expect(page.getByRole('heading', { level: 1 })).toContainText('All sessions are closed');

  await page.getByRole('link', { name: 'Results' }).first().click();
  const content = page.locator('#content');
  for (const mean of ['71.375', '71.625', '72.000', '75.000']) await expect(content).toContainText(mean);
  await content.getByText('Scatter and efficiency').click();
  for (const figure of ['22.75', '3.25', '11.67']) await expect(content).toContainText(figure);
  await content.getByText('Workings', { exact: true }).click();
  await expect(content).toContainText('The effects add to 0');
});
