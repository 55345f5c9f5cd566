import fc from 'fast-check';
import { expect, test } from 'vitest';
import { analyse } from '#lib/core/analysis/analyse.ts';
import type { CampaignEvent, UnknownEvent } from '#lib/core/campaign/event.ts';
import { replay } from '#lib/core/campaign/replay.ts';
import { writeCampaignFile } from '#lib/core/exchange/campaign-file.ts';
import { readCampaignFile } from '#lib/core/exchange/read-campaign-file.ts';
import { mergeEvents } from '#lib/core/exchange/summarise-import.ts';
import { analysisInput, observedRows } from '#lib/state/analysis-input.ts';
import { demoEvents, demoMaker } from './demo/demo-events.ts';

type Any = CampaignEvent | UnknownEvent;
const events = demoEvents();

async function analysed(held: readonly Any[]) {
  const state = replay(held, demoMaker.campaign);
  const measurand = state.plan!.measurands[0]!;
  const rows = await observedRows(state, measurand);
  if (!rows.ok) throw new Error(rows.error.tag);
  return analyse({ ...analysisInput(state, measurand, rows.value), control: null });
}

function throughFile(part: readonly CampaignEvent[]): Any[] {
  const file = readCampaignFile(new TextEncoder().encode(writeCampaignFile(part, demoMaker)));
  if (!file.ok) throw new Error(file.error.tag);
  return file.value.events.map(({ event }) => event);
}

test('analyse(a campaign split in two files, whichever is taken in first) is the analysis of the whole, to the last digit', async () => {
  const whole = await analysed(events);
  expect(whole.ok && whole.value.fixed.ok).toBe(true);
  // Each event goes to the first file, the second, or both.
  const place = fc.array(fc.constantFrom(1, 2, 3), { minLength: events.length, maxLength: events.length });
  await fc.assert(
    fc.asyncProperty(place, fc.boolean(), async (places, swapped) => {
      const files = [1, 2].map((file) => throughFile(events.filter((_, i) => (places[i]! & file) > 0)));
      const [first, second] = swapped ? [files[1]!, files[0]!] : [files[0]!, files[1]!];
      const { added, aside } = mergeEvents(first, second);
      expect(aside).toEqual([]);
      expect(await analysed([...first, ...added])).toEqual(whole);
    }),
    { numRuns: 4 }
  );
}, 60_000);
