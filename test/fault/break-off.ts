import type { Page } from '@playwright/test';
import { Victim } from './browser.ts';
import { checkLog } from './check-log.ts';
import { possibleDrafts, savedIn, typeUntil } from './robot.ts';
import { newTally, type Tally } from './tally.ts';

const wait = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/** How a robot is cut off in the middle of a line, and how the app comes back. */
interface BreakOff {
  fault: string;
  /** Milliseconds of typing, at least and at most. */
  after: [number, number];
  cut: (victim: Victim, page: Page) => Promise<void>;
  comeBack: (victim: Victim) => Promise<Page>;
}

/** A robot types until it is cut off, round after round on one profile; then all that showed *saved* must be there. */
async function breakOffRounds(origin: string, rounds: number, how: BreakOff): Promise<Tally> {
  const tally = newTally(how.fault);
  const victim = new Victim(origin);
  const saved = new Set<string>();
  const [least, most] = how.after;
  try {
    let page = await victim.open();
    const campaign = await page.evaluate(() => window.harness.begin());
    for (let round = 0; round < rounds; round++) {
      victim.said = [];
      let over = false;
      const typing = typeUntil(page, `${round}`, () => over);
      await wait(least + Math.random() * (most - least));
      over = true;
      await how.cut(victim, page);
      const typed = await typing;
      tally.trials++;
      for (const line of savedIn(victim.said)) saved.add(line);
      const drafts = possibleDrafts(typed, victim.said);
      page = await how.comeBack(victim);
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

/** SIGKILL to the whole browser. */
export const killRounds = (origin: string, rounds: number): Promise<Tally> =>
  breakOffRounds(origin, rounds, {
    fault: 'browser killed',
    after: [150, 1050],
    cut: (victim) => victim.kill(),
    comeBack: (victim) => victim.open()
  });

/** The tab is closed with writes on their way. */
export const closeTabRounds = (origin: string, rounds: number): Promise<Tally> =>
  breakOffRounds(origin, rounds, {
    fault: 'tab closed',
    after: [50, 550],
    cut: (_victim, page) => page.close(),
    comeBack: (victim) => victim.newPage()
  });
