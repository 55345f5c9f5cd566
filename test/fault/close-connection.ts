import { Victim } from './browser.ts';
import { checkLog } from './check-log.ts';
import { allSaid, savedIn, typeUntil } from './robot.ts';
import { count, newTally, type Tally } from './tally.ts';

const wait = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/** The browser itself cuts every database connection of the origin (its own internals page) while a robot types. */
export async function closeConnectionRounds(origin: string, rounds: number): Promise<Tally> {
  const tally = newTally('connection force-closed');
  const victim = new Victim(origin);
  const saved = new Set<string>();
  try {
    const page = await victim.open();
    const campaign = await page.evaluate(() => window.harness.begin());
    const internals = await victim.context.newPage();
    await internals.goto('chrome://indexeddb-internals');
    const cut = internals.getByText('Force close').first();
    await cut.waitFor();
    for (let round = 0; round < rounds; round++) {
      victim.said = [];
      await page.evaluate(() => window.harness.databaseNews.clear());
      let stop = false;
      const typing = typeUntil(page, `${round}`, () => stop);
      await wait(20 + Math.random() * 200);
      await cut.evaluate((link) => (link as HTMLElement).click());
      await wait(20 + Math.random() * 200);
      stop = true;
      const typed = await typing;
      await allSaid(page, typed, victim.said);
      await page.fill('#entry', '');
      tally.trials++;
      if (await page.evaluate(() => window.harness.databaseNews.current !== null)) count(tally, 'told of the cut');
      const marked = savedIn(victim.said);
      for (const line of marked) saved.add(line);
      for (const line of typed.lines)
        if (!victim.said.some((text) => text.startsWith('mark: ') && text.includes(`saved ${line}`)))
          tally.wrong.push(`round ${round}: nothing was said about ${line}`);
        else if (!marked.includes(line)) count(tally, 'said not to be saved');
      await checkLog(page, campaign, saved, tally);
    }
  } finally {
    await victim.remove();
  }
  tally.saved = saved.size;
  return tally;
}
