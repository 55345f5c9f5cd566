import { closeSync, existsSync, openSync, readdirSync, rmSync, statSync, writeSync } from 'node:fs';
import { join } from 'node:path';
import { Victim } from './browser.ts';
import { checkLog } from './check-log.ts';
import { savedIn, typeUntil } from './robot.ts';
import { count, newTally, type Tally } from './tally.ts';

const wait = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

/** Takes the origin's database files away. */
function wipe(profile: string): void {
  rmSync(join(profile, 'Default/IndexedDB'), { recursive: true, force: true });
}

/** Overwrites bytes of every database file at random. */
function corrupt(profile: string): void {
  const folder = join(profile, 'Default/IndexedDB');
  for (const store of readdirSync(folder)) {
    if (!store.endsWith('.leveldb')) continue;
    for (const name of readdirSync(join(folder, store))) {
      if (name === 'LOCK') continue;
      const path = join(folder, store, name);
      const size = statSync(path).size;
      if (size === 0 || Math.random() < 0.3) continue;
      const file = openSync(path, 'r+');
      for (let n = 0; n < 8; n++) {
        const noise = Uint8Array.from({ length: 1 + Math.floor(Math.random() * 64) }, () =>
          Math.floor(Math.random() * 256)
        );
        writeSync(file, noise, 0, noise.length, Math.floor(Math.random() * size));
      }
      closeSync(file);
    }
  }
}

/**
 * The database is gone or damaged at the next start: either everything is still there, or the alarm is up (or the database
 * says that it cannot be opened); nothing is overwritten, and the file of before brings everything back.
 */
async function loseRounds(
  origin: string,
  rounds: number,
  tally: Tally,
  harm: (profile: string) => void
): Promise<Tally> {
  const all = new Set<string>();
  for (let round = 0; round < rounds; round++) {
    const victim = new Victim(origin);
    try {
      let page = await victim.open();
      const campaign = await page.evaluate(() => window.harness.begin());
      let stop = false;
      const typing = typeUntil(page, `${round}`, () => stop);
      await wait(200 + Math.random() * 200);
      stop = true;
      await typing;
      await page.fill('#entry', '');
      await page.waitForFunction(() => window.harness.open?.busy === false);
      const saved = new Set(savedIn(victim.said));
      for (const line of saved) all.add(line);
      const file = await page.evaluate(() => window.harness.export());
      await victim.close();
      if (!existsSync(join(victim.profile, 'Default/IndexedDB'))) throw new Error('no database files where expected');
      harm(victim.profile);
      tally.trials++;
      page = await victim.open();
      const start = await page.evaluate(async (id) => {
        const { alarm, device } = window.harness;
        const log = device.fault ? null : await window.harness.verify(id).catch(() => null);
        return {
          fault: device.fault?.tag ?? null,
          lost: alarm.lost.map((one) => ({ ...one })),
          notes: log?.notes ?? []
        };
      }, campaign);
      const whole = [...saved].every((line) => start.notes.includes(line));
      if (start.fault !== null) count(tally, 'told that it cannot open');
      else if (start.lost.length > 0) count(tally, 'alarm raised');
      else if (whole) count(tally, 'nothing was lost');
      else tally.wrong.push(`round ${round}: ${saved.size} saved, ${start.notes.length} found, nobody told`);
      if (start.fault !== null) continue;
      // Work goes on under the alarm without touching what is remembered, and the file brings everything back.
      if (start.lost.length > 0) {
        const still = await page.evaluate(async () => {
          const { alarm, library } = window.harness;
          await library.createCampaign('Another');
          await alarm.check();
          return alarm.raised;
        });
        if (!still) tally.wrong.push(`round ${round}: the alarm went silent by itself`);
        const back = await page.evaluate(async (text) => {
          const taken = await window.harness.import(text);
          return { ...taken, raised: window.harness.alarm.raised };
        }, file);
        // The file lacks the one event that says it was exported: whoever knows may say so.
        if (back.raised) await page.evaluate(() => window.harness.alarm.acknowledge());
        count(tally, 'brought back from the file');
      }
      await checkLog(page, campaign, saved, tally);
    } finally {
      await victim.remove();
    }
  }
  tally.saved = all.size;
  return tally;
}

/** The files of the database are gone at the next start. */
export const wipeRounds = (origin: string, rounds: number): Promise<Tally> =>
  loseRounds(origin, rounds, newTally('storage wiped'), wipe);

/** The files of the database are full of noise at the next start. */
export const corruptRounds = (origin: string, rounds: number): Promise<Tally> =>
  loseRounds(origin, rounds, newTally('database files corrupted'), corrupt);
