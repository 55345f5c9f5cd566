import { expect, it } from 'vitest';
import { shiftAtHand, shiftSummary } from '#lib/core/campaign/steps/shift-summary.ts';
import type { ReadingState } from '#lib/core/campaign/state.ts';
import { campaign, loadedRun, mark, run, session } from '../wall-paint.ts';

const reading = (over: Partial<ReadingState>): ReadingState => ({
  reading: 'after',
  repeat: 1,
  current: null,
  versions: [],
  missing: null,
  contradiction: null,
  ...over
});
const kept = reading({
  current: {
    ...mark,
    raw: '95',
    value: 95,
    limit: 'none',
    source: 'keypad',
    readAt: null,
    raised: [{ check: 'unexpected', said: '95 g is above what was expected (80 to 90 g).' }],
    because: 'Read again'
  }
});
const note = { ...mark, about: 'run' as const, session: 's1', slot: 0, text: 'A scratch' };
const ruined = { ...mark, reason: 'Panel slipped', whole: false, next: null };
const state = campaign([
  session(1, [loadedRun('s1', 0, 'A-1', { readings: [kept], notes: [note] }), run('s1', 1, 'B-1', { ruined })], {
    status: 'closed'
  }),
  session(2, [run('s2', 0, 'C-1', { readings: [reading({})] })]),
  session(3, [run('s3', 0, 'D-1', { readings: [reading({ missing: { ...mark, reason: 'Torn' } })] })], {
    status: 'closed'
  })
]);
const summary = shiftSummary(state, 1);

it('shiftSummary(state, shift) counts what is closed and what is open', () => {
  expect([summary.closed.map(({ id }) => id), summary.open.map(({ id }) => id)]).toEqual([['s1', 's3'], ['s2']]);
});

it('shiftSummary(state, shift) lists what was flagged, ruined and missing, with the reasons', () => {
  expect(summary.flagged).toMatchObject([{ said: kept.current?.raised[0]?.said, because: 'Read again' }]);
  expect(summary.ruined).toMatchObject([{ reason: 'Panel slipped' }]);
  expect(summary.missing).toMatchObject([{ reading: 'after', reason: 'Torn' }]);
});

it('shiftSummary(state, shift) names notes and people', () => {
  expect(summary.notes.map(({ text }) => text)).toEqual(['A scratch']);
  expect(summary.who).toEqual(['Test']);
});

it('shiftSummary(state, another shift) is empty', () => {
  const other = shiftSummary(state, 2);
  expect([other.closed, other.open, other.flagged, other.ruined]).toEqual([[], [], [], []]);
});

it('shiftAtHand(state) is the last opened and not closed, else that of the last session worked on', () => {
  expect(shiftAtHand(state)).toBe(1);
  const opened = { shift: 3, operator: '', opened: mark, closed: null };
  expect(shiftAtHand({ ...state, shifts: [opened] })).toBe(3);
  expect(shiftAtHand({ ...state, shifts: [{ ...opened, closed: { ...mark, handOver: '' } }] })).toBe(1);
});
