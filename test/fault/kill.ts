import { Victim } from './browser.ts';
import { checkLog } from './check-log.ts';
import { possibleDrafts, savedIn, typeUntil } from './robot.ts';
import { newTally, type Tally } from './tally.ts';

const wait = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/** SIGKILL to the whole browser at a random moment of a typing robot, round after round on one profile. */
export async function killRounds(origin: string, rounds: number): Promise<Tally> {
  const tally = newTally('browser killed');
  const victim = new Victim(origin);
  const saved = new Set<string>();
  try {
    let page = await victim.open();
    const campaign = await page.evaluate(() => window.harness.begin());
    for (let round = 0; round < rounds; round++) {
      victim.said = [];
      let dead = false;
      const typing = typeUntil(page, `${round}`, () => dead);
      await wait(150 + Math.random() * 900);
      dead = true;
      await victim.kill();
      const typed = await typing;
      tally.trials++;
      for (const line of savedIn(victim.said)) saved.add(line);
      const drafts = possibleDrafts(typed, victim.said);
      page = await victim.open();
      const back = await page.evaluate((id) => window.harness.resume(id), campaign);
      if (back.role !== 'writing') tally.wrong.push(`round ${round}: the tab came back as ${back.role}`);
      if (!drafts.has(String(back.draft))) {
        tally.draftsLost++;
        tally.wrong.push(`round ${round}: draft ${JSON.stringify(back.draft)} is none of ${[...drafts].join(' ')}`);
      }
      await page.fill('#entry', '');
      await checkLog(page, campaign, saved, tally);
      if (await page.evaluate(() => window.harness.alarm.raised))
        tally.wrong.push(`round ${round}: alarm without loss`);
    }
  } finally {
    await victim.remove();
  }
  tally.saved = saved.size;
  return tally;
}
