import { expect, expectAccessible, keepPicture, sizes, test } from './app.ts';
import {
  codesOf,
  field,
  issuePlan,
  nine,
  pasteTreatments,
  startCampaign,
  typeFilmLoss,
  typeSmallPlan,
  waitForChoices
} from './plan-desk.ts';

test('a plan is typed, its design chosen and issued, with the keyboard alone', async ({ page, app }) => {
  await startCampaign(page, app.origin, 'Invented paints');
  const key = (name: string) => page.keyboard.press(name);
  await field(page, 'treatments.0.name').focus();
  for (const name of nine) {
    await page.keyboard.type(name);
    if (name !== nine.at(-1)) await key('Enter');
  }
  await field(page, 'measurands.0.label').focus();
  await page.keyboard.type('Gloss');
  await key('Tab');
  await page.keyboard.type('GU');
  await expect(page.getByRole('blockquote')).toContainText('9 treatments, 3 to a session');
  await waitForChoices(page);
  await expect(page.getByText('recommended', { exact: true })).toBeVisible();
  const first = page.getByRole('radio', { name: /treatments/ }).first();
  await first.focus();
  await key('Space');
  await expect(page.getByText('Chosen by you')).toBeVisible();
  await page.getByRole('button', { name: 'Follow the recommendation' }).focus();
  await key('Enter');
  await expect(page.getByText('Recommended because it is balanced')).toBeVisible();
  await field(page, 'who').focus();
  await page.keyboard.type('E. Planner');
  await page.getByRole('button', { name: 'Issue the plan' }).focus();
  await key('Enter');
  await expect(page.getByRole('heading', { name: 'Loading order' })).toBeVisible({ timeout: 20_000 });
  await expect(page.getByText('Issued by E. Planner')).toBeVisible();
  await expect(page.getByRole('blockquote')).toHaveText(
    '9 treatments, 3 to a session, 12 sessions; each treatment 4 times, each pair together once.'
  );
  const codes = await codesOf(page);
  expect(new Set(codes.slice(0, 36)).size).toBe(36);
});

test('film loss by ISO 11998: 0.0430 g on 0.0040 m² at 1.5 g/cm³ is 7.17 µm', async ({ page, app }) => {
  // By hand: 0.0430 ÷ (0.0040 × 1.5) = 7.1667 cm³/m² = 7.1667 µm.
  await startCampaign(page, app.origin, 'Invented paints');
  await typeFilmLoss(page);
  await expect(page.getByText('Units fit: the formula gives cm³/m², which is µm as it stands.')).toBeVisible();
  await page.getByText('Try it', { exact: true }).click();
  await page.getByLabel('Trial value of before').fill('85,0430');
  await page.getByLabel('Trial value of after').fill('85.0000');
  await expect(page.getByText('gives 7.17 µm')).toBeVisible();
  await field(page, 'constants.0.unit').fill('cm²');
  await field(page, 'constants.0.value').fill('40');
  await expect(page.getByText('times 10000 that is µm')).toBeVisible();
  await expect(page.getByText('gives 7.17 µm')).toBeVisible();
});

test('every fault has its sentence', async ({ page, app }) => {
  await startCampaign(page, app.origin, 'Invented paints');
  const says = (words: string) => expect(page.locator('.ask').getByText(words).first()).toBeVisible();
  await pasteTreatments(page, 'Chalk\nchalk \nFlint\nLinen');
  await field(page, 'treatments.1.name').focus();
  await field(page, 'treatments.2.name').focus();
  await says('is there twice. Two names must differ');
  await field(page, 'treatments.1.name').fill('');
  await field(page, 'treatments.1.specimens').fill('4');
  await field(page, 'treatments.2.specimens').fill('half');
  await field(page, 'treatments.3.specimens').focus();
  await says('This needs a name.');
  await says('“half” is not a number.');
  await field(page, 'machines.0.slots').fill('5');
  await says('every session can hold all of them (complete sessions). That is allowed');
  await typeFilmLoss(page);
  await field(page, 'measurands.0.formula').fill('before - mas');
  await says('“mas” is neither a reading nor a constant. Known are: before, after, area, density.');
  await field(page, 'measurands.0.formula').fill('before[1]');
  await says('“before[1]” is not allowed in a formula.');
  await field(page, 'readings.1.unit').fill('mm');
  await field(page, 'measurands.0.formula').fill('before + after');
  await says('before is in g, after is in mm: these cannot be added, because they are different kinds of quantity.');
  await field(page, 'measurands.0.scatter').fill('1.234');
  await field(page, 'measurands.0.difference').focus();
  await says('can mean 1.234 or 1234');
  await expect(page.getByRole('button', { name: 'Issue the plan' })).toBeDisabled();
  await page.getByRole('link', { name: 'This needs a name.' }).click();
  await expect(field(page, 'treatments.1.name')).toBeFocused();
});

test('a draft is there again after a reload, the choice made by hand too', async ({ page, app }) => {
  await startCampaign(page, app.origin, 'Invented paints');
  await typeSmallPlan(page);
  const last = page.getByRole('radio', { name: /treatments/ }).last();
  await last.check();
  const sentence = await page.getByRole('blockquote').innerText();
  await expect(page.getByText('Draft stored on this device')).toBeVisible();
  await page.reload();
  await expect(field(page, 'treatments.3.name')).toHaveValue('Moss');
  await waitForChoices(page);
  await expect(page.getByRole('blockquote')).toHaveText(sentence);
});

test('the same seed gives the same loading order and codes', async ({ page, app }) => {
  const orders: string[][] = [];
  for (const title of ['First', 'Second']) {
    await startCampaign(page, app.origin, title);
    await typeSmallPlan(page);
    await issuePlan(page, 'same as ever');
    orders.push(await codesOf(page));
  }
  expect(orders[0]).toEqual(orders[1]);
  expect(orders[0]?.length).toBeGreaterThan(6);
});

test('an issued plan changes by amendments with a reason, which stay in sight', async ({ page, app }) => {
  await startCampaign(page, app.origin, 'Invented paints');
  await typeSmallPlan(page);
  await issuePlan(page);
  const sessions = page.locator('tbody th[scope="row"].session');
  const before = await sessions.count();
  await page.getByRole('button', { name: 'Record the change' }).click();
  await expect(page.getByText('A change needs its reason.')).toBeVisible();
  await field(page, 'amend.reason').fill('Pad was worn');
  await page.getByRole('button', { name: 'Record the change' }).click();
  await expect(page.getByText(`Session ${before + 1} added; it repeats session 1`)).toBeVisible();
  await expect(sessions).toHaveCount(before + 1);

  await field(page, 'amend.kind').selectOption('replace-plan');
  await page.getByRole('button', { name: 'Change limits, precautions and words' }).click();
  await field(page, 'precautions').fill('Wear gloves.');
  await field(page, 'replace-reason').fill('Forgotten');
  await page.getByRole('button', { name: 'Record the change' }).click();
  await expect(page.getByText('Limits, precautions or words changed')).toBeVisible();
  await page.reload();
  await expect(page.getByText('Pad was worn')).toBeVisible();
  await expect(page.getByText('Forgotten')).toBeVisible();
});

test('an earlier campaign lends its frame to a new one', async ({ page, app }) => {
  await startCampaign(page, app.origin, 'Invented paints, first round');
  await typeSmallPlan(page);
  await issuePlan(page);
  await startCampaign(page, app.origin, 'Second round');
  await page.getByText('Begin with the frame of an earlier campaign').click();
  await page.getByRole('button', { name: 'Take it over' }).click();
  await expect(field(page, 'treatments.3.name')).toHaveValue('Moss');
  await expect(field(page, 'measurands.0.label')).toHaveValue('Gloss');
  await expect(field(page, 'title')).toHaveValue('Second round');
});

test('a search can be stopped and keeps the best so far', async ({ page, app }) => {
  await startCampaign(page, app.origin, 'Forty');
  await pasteTreatments(page, Array.from({ length: 40 }, (_, i) => `Sample ${i + 1}`).join('\n'));
  await field(page, 'machines.0.slots').fill('6');
  const stop = page.getByRole('button', { name: 'Stop here' });
  await expect(page.getByRole('blockquote')).toContainText('40 treatments, 6 to a session', { timeout: 20_000 });
  await stop.click();
  await expect(page.getByText('Stopped; these are the best found so far.')).toBeVisible({ timeout: 500 });
  await expect(page.getByRole('blockquote')).toContainText('40 treatments, 6 to a session');
});

test('the plan screen is accessible and laid out for every size', async ({ page, app }) => {
  test.slow();
  await startCampaign(page, app.origin, 'Invented wall paints, second round');
  await expectAccessible(page);
  await pasteTreatments(page, nine.join('\n'));
  await typeFilmLoss(page);
  await field(page, 'measurands.0.scatter').fill('0.8');
  await field(page, 'measurands.0.difference').fill('2');
  await field(page, 'sessionsPerShift').fill('3');
  await field(page, 'minutesPerSession').fill('45');
  await waitForChoices(page);
  await expect(page.getByText('If work stops early')).toBeVisible({ timeout: 20_000 });
  await expect(page.getByRole('img', { name: /Who meets whom/ }).locator('path')).not.toHaveCount(0);
  await expect(page.getByRole('slider', { name: /Who meets whom/ })).toHaveAttribute('aria-valuemax', '36');
  await expectAccessible(page);
  await page.evaluate(() => window.scrollTo(0, 0));
  for (const { name, width, height } of sizes) {
    await page.setViewportSize({ width, height });
    await keepPicture(page, `plan-${name}`);
    const overflow = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
    expect(overflow, `${name} scrolls sideways`).toBeLessThanOrEqual(0);
  }
  await issuePlan(page);
  await expectAccessible(page);
  await page.evaluate(() => window.scrollTo(0, 0));
  for (const { name, width, height } of sizes) {
    await page.setViewportSize({ width, height });
    await keepPicture(page, `plan-issued-${name}`);
  }
});
