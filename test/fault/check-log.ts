import type { Page } from '@playwright/test';
import type { Tally } from './tally.ts';

/** Reads the log back from the database and holds it against what showed *saved*. */
export async function checkLog(page: Page, campaign: string, saved: ReadonlySet<string>, tally: Tally): Promise<void> {
  const log = await page.evaluate((id) => window.harness.verify(id), campaign);
  const times = new Map<string, number>();
  for (const note of log.notes) times.set(note, (times.get(note) ?? 0) + 1);
  for (const line of saved) if (!times.has(line)) tally.lost++;
  for (const n of times.values()) if (n > 1) tally.doubled++;
  if (log.unreadable.length > 0) tally.wrong.push(`${log.unreadable.length} unreadable events`);
  const bad = log.flags.filter((flag) => /^(gap|fork|altered)/.test(flag));
  if (bad.length > 0) tally.wrong.push(`chain: ${bad.join('; ')}`);
  if (new Set(log.places).size !== log.places.length) tally.wrong.push('a sequence number was given twice');
}
