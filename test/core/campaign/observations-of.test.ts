import { describe, expect, it } from 'vitest';
import { observationsOf } from '#lib/core/campaign/observations-of.ts';
import type { Plan } from '#lib/core/campaign/plan.ts';
import { replay } from '#lib/core/campaign/replay.ts';
import { deviceA, issued, plan, Recorder, specimen } from './story.ts';

const direct = (): number | null => null;

function storyWith(readings: Partial<Plan['readings'][number]>[], formula: string | null): Recorder {
  const [reading] = plan.readings;
  const [measurand] = plan.measurands;
  if (!reading || !measurand) throw new Error('the plan has a reading and a measurand');
  const changed: Plan = {
    ...plan,
    readings: readings.map((one) => ({ ...reading, ...one })),
    measurands: [{ ...measurand, formula }]
  };
  const a = new Recorder(deviceA);
  a.record('campaign-created', { title: 'T', demo: false });
  a.record('plan-issued', { ...issued, plan: changed });
  return a;
}

const read = (
  a: Recorder,
  reading: string,
  value: number,
  repeat = 1,
  limit: 'none' | 'at-least' | 'at-most' = 'none'
) =>
  a.record('reading-recorded', {
    session: 's1',
    slot: 0,
    specimen: specimen(1, 0),
    reading,
    repeat,
    raw: `${value}`,
    value,
    limit,
    source: 'keyboard',
    readAt: null,
    raised: [],
    because: null
  });

describe('observationsOf', () => {
  it('observationsOf(campaign) has one row a planned run, null where nothing was read, ruined ones marked', () => {
    const a = new Recorder(deviceA).begin();
    a.reading(1, 0, 12.5);
    a.reading(1, 1, 99);
    a.record('ruined', { session: 's1', slot: 1, reason: 'Film torn', next: null });
    const rows = observationsOf(replay(a.events), 'loss', direct);
    expect(rows).toHaveLength(12);
    expect(
      rows.slice(0, 3).map(({ treatment, session, slot, y, ruined }) => [treatment, session, slot, y, ruined])
    ).toEqual([
      ['A', 's1', 0, 12.5, false],
      ['B', 's1', 1, 99, true],
      ['C', 's1', 2, null, false]
    ]);
  });

  it('observationsOf(ruined run and its spare) has a row for each', () => {
    const a = new Recorder(deviceA).begin();
    a.load(1, 0);
    a.reading(1, 0, 99);
    a.record('ruined', { session: 's1', slot: 0, reason: 'Film torn', next: 'spare-now' });
    a.load(1, 0, 'A9');
    a.reading(1, 0, 11, 'A9');
    const rows = observationsOf(replay(a.events), 'loss', direct).filter((r) => r.session === 's1' && r.slot === 0);
    expect(rows.map(({ specimen: code, y, ruined, runId }) => [code, y, ruined, runId])).toEqual([
      ['A1', 99, true, 's1/0/A1'],
      ['A9', 11, false, 's1/0']
    ]);
  });

  it('observationsOf(repeats) takes their mean once all are there or said to be missing', () => {
    const a = storyWith([{ repeats: 3 }], null);
    const y = () => observationsOf(replay(a.events), 'loss', direct)[0]?.y;
    read(a, 'loss', 10, 1);
    read(a, 'loss', 14, 2);
    expect(y()).toBeNull();
    a.record('reading-missing', { session: 's1', slot: 0, reading: 'loss', repeat: 3, reason: 'gauge fell' });
    expect(y()).toBe(12);
  });

  it('observationsOf(limited reading in a formula) is limited on the side to which the formula carries it', () => {
    const a = storyWith([{ id: 'before' }, { id: 'after' }], 'before - after');
    read(a, 'before', 10);
    read(a, 'after', 4, 1, 'at-least');
    const evaluate = (_: unknown, { before, after }: Record<string, number | null>): number | null =>
      before === null || before === undefined || after === null || after === undefined ? null : before - after;
    const [row] = observationsOf(replay(a.events), 'loss', evaluate);
    expect([row?.y, row?.limit]).toEqual([6, 'at-most']);
  });

  it('observationsOf(undecided contradiction) has no y and says so', () => {
    const a = new Recorder(deviceA).begin();
    a.load(1, 0, 'Q7', 'label gone');
    a.reading(1, 0, 12.5, 'Q7');
    const [row] = observationsOf(replay(a.events), 'loss', direct);
    expect([row?.treatment, row?.y, row?.undecided]).toEqual(['', null, true]);
  });
});
