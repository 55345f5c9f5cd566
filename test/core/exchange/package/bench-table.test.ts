import { expect, test } from 'vitest';
import { replay } from '#lib/core/campaign/replay.ts';
import { benchCsv, benchTable } from '#lib/core/exchange/package/bench-table.ts';
import { Desk, issuedPlan } from '../../../e2e/bench-campaign.ts';

/** Invented: one session of three, the first run read twice and ruined, the second kept after a warning. */
function recorded() {
  const issued = issuedPlan();
  const [session] = issued.sessions;
  if (!session) throw new Error('a plan has sessions');
  const desk = new Desk(issued);
  const read = (slot: number, raw: string, rest: object = {}) =>
    desk.write('reading-recorded', {
      session: session.id,
      slot,
      specimen: session.slots[slot]?.specimen ?? '',
      reading: 'before',
      repeat: 1,
      raw,
      value: Number(raw),
      limit: 'none',
      source: 'keyboard',
      raised: [],
      because: null,
      readAt: null,
      ...rest
    });
  read(0, '44.2131');
  read(1, '61.5', { raised: [{ check: 'unexpected', said: 'expected are 35 to 55 g' }], because: 'Heavy panel, =so' });
  desk.write('ruined', { session: session.id, slot: 0, reason: 'Pad came loose', next: null });
  return replay(desk.events.map(({ event }) => event));
}

test('benchTable lists what counts, kept and ruined alike, each with its treatment and its reason', () => {
  const { fields, rows } = benchTable(recorded());
  const named = rows.map((row) => Object.fromEntries(fields.map(({ name }, at) => [name, row[at]])));
  expect(named).toHaveLength(2);
  expect(named[0]).toMatchObject({ session: 1, slot: 1, value: 44.2131, unit: 'g', ruined: true });
  expect(named[0]?.['ruin_reason']).toContain('Pad came loose');
  expect(named[1]).toMatchObject({
    slot: 2,
    value: 61.5,
    raw: '61.5',
    ruined: false,
    raised: 'expected are 35 to 55 g',
    because: 'Heavy panel, =so'
  });
  expect(named[0]?.['treatment']).toMatch(/^Recipe \d/);
});

test('benchCsv begins with the mark by which a spreadsheet knows UTF-8 and has one line a reading', () => {
  const text = benchCsv(recorded());
  expect(text.startsWith('\uFEFFsession,machine,slot,specimen,treatment,')).toBe(true);
  expect(text.trimEnd().split('\r\n')).toHaveLength(3);
});
