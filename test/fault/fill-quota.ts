import type { CDPSession } from '@playwright/test';
import { Victim } from './browser.ts';
import { checkLog } from './check-log.ts';
import { allSaid, savedIn, typeUntil } from './robot.ts';
import { count, newTally, type Tally } from './tally.ts';

/** The origin's room ends while a robot types; writing goes on once there is room again. */
export async function fillQuotaRounds(origin: string, rounds: number): Promise<Tally> {
  const tally = newTally('quota exceeded');
  const victim = new Victim(origin);
  const saved = new Set<string>();
  try {
    // The browser keeps what it last heard of the room left: it must hear of little from the start.
    const site = new URL(origin).origin;
    const roomFor = async (devtools: CDPSession, more: number): Promise<void> => {
      const { usage } = await devtools.send('Storage.getUsageAndQuota', { origin: site });
      await devtools.send('Storage.overrideQuotaForOrigin', { origin: site, quotaSize: Math.ceil(usage) + more });
    };
    const page = await victim.open(async (empty) => roomFor(await victim.context.newCDPSession(empty), 60_000));
    const campaign = await page.evaluate(() => window.harness.begin());
    const devtools = await victim.context.newCDPSession(page);
    for (let round = 0; round < rounds; round++) {
      victim.said = [];
      await roomFor(devtools, Math.floor(Math.random() * 4096));
      let stop = false;
      let more = 1 + Math.floor(Math.random() * 3);
      const refusedSoFar = (): number => victim.said.filter((text) => text.startsWith('mark: not saved')).length;
      const typing = typeUntil(page, `${round}`, () => stop);
      for (let n = 1; n < 400 && more > 0; n++) {
        await page.waitForTimeout(20);
        if (refusedSoFar() > 0) more--;
        // The database tidies its files now and then, which makes room again.
        else if (n % 25 === 0) await roomFor(devtools, 0);
      }
      stop = true;
      const typed = await typing;
      await allSaid(page, typed, victim.said);
      tally.trials++;
      const marked = savedIn(victim.said);
      for (const line of marked) saved.add(line);
      const refused = victim.said.filter((text) => text.startsWith('mark: not saved'));
      const unsaid = typed.lines.filter((line) => !victim.said.some((text) => text.includes(`saved ${line}`)));
      if (unsaid.length > 0) tally.wrong.push(`round ${round}: nothing was said about ${unsaid.join(' ')}`);
      if (refused.some((text) => !text.endsWith('quota'))) tally.wrong.push(`round ${round}: ${refused.join(', ')}`);
      if (refused.length > 0) count(tally, 'rounds refused loudly');
      else tally.wrong.push(`round ${round}: the room never ended`);
      // A refused act is in the rescue file, which needs no database.
      const rescue = await page.evaluate(async () => {
        const made = await window.harness.open?.rescueFile();
        return made?.ok ? made.value.blob.text() : null;
      });
      for (const text of refused) {
        const line = text.split(' ')[3] ?? '';
        if (!rescue?.includes(`"text":"${line}"`))
          tally.wrong.push(`round ${round}: ${line} is not in the rescue file`);
      }
      await roomFor(devtools, 12_000);
      await page.fill('#entry', `${round}.after`);
      await page.keyboard.press('Enter');
      await page.waitForFunction((text) => document.querySelector('output')?.value === text, `saved ${round}.after`);
      saved.add(`${round}.after`);
      await checkLog(page, campaign, saved, tally);
      const log = await page.evaluate((id) => window.harness.verify(id), campaign);
      for (const text of refused)
        if (log.notes.includes(text.split(' ')[3] ?? ''))
          tally.wrong.push(`round ${round}: refused, yet written: ${text}`);
    }
    const flags = await page.evaluate((id) => window.harness.verify(id), campaign);
    tally.also['faults written into the record'] = flags.flags.filter((flag) => flag.startsWith('device-fault')).length;
  } finally {
    await victim.remove();
  }
  tally.saved = saved.size;
  return tally;
}
