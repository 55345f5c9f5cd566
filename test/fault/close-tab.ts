import { Victim } from './browser.ts';
import { checkLog } from './check-log.ts';
import { possibleDrafts, savedIn, typeUntil } from './robot.ts';
import { newTally, type Tally } from './tally.ts';

const wait = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/** The tab is closed at a random moment of typing, with writes on their way. */
export async function closeTabRounds(origin: string, rounds: number): Promise<Tally> {
  const tally = newTally('tab closed');
  const victim = new Victim(origin);
  const saved = new Set<string>();
  try {
    let page = await victim.open();
    const campaign = await page.evaluate(() => window.harness.begin());
    for (let round = 0; round < rounds; round++) {
      victim.said = [];
      let closed = false;
      const typing = typeUntil(page, `${round}`, () => closed);
      await wait(50 + Math.random() * 500);
      closed = true;
      await page.close();
      const typed = await typing;
      tally.trials++;
      for (const line of savedIn(victim.said)) saved.add(line);
      const drafts = possibleDrafts(typed, victim.said);
      page = await victim.newPage();
      const back = await page.evaluate((id) => window.harness.resume(id), campaign);
      if (!drafts.has(String(back.draft))) {
        tally.draftsLost++;
        tally.wrong.push(`round ${round}: draft ${JSON.stringify(back.draft)} is none of ${[...drafts].join(' ')}`);
      }
      await page.fill('#entry', '');
      await checkLog(page, campaign, saved, tally);
    }
  } finally {
    await victim.remove();
  }
  tally.saved = saved.size;
  return tally;
}
