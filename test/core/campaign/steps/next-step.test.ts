import { describe, expect, it } from 'vitest';
import { currentSession, nextStep } from '#lib/core/campaign/steps/next-step.ts';
import type { ReadingState, SessionState } from '#lib/core/campaign/state.ts';
import { campaign, loadedRun, mark, run, session, wallPaintPlan } from '../wall-paint.ts';

const read = (reading: string): ReadingState => ({
  reading,
  repeat: 1,
  current: {
    ...mark,
    raw: '84',
    value: 84,
    limit: 'none',
    source: 'keypad',
    readAt: null,
    raised: [],
    because: null
  },
  versions: [],
  missing: null,
  contradiction: null
});
const ruined = { ...mark, reason: 'Panel slipped', whole: false, next: null };
const step = (over: Partial<SessionState>, runs = [run('s1', 0, 'A-1'), run('s1', 1, 'B-1')]) =>
  nextStep(wallPaintPlan, session(1, runs, over));
const both = (...readings: string[]) => [
  loadedRun('s1', 0, 'A-1', { readings: readings.map(read) }),
  loadedRun('s1', 1, 'B-1', { readings: readings.map(read) })
];
const started = { ...mark, seconds: 327 };
const stopped = { ...mark, early: null };

describe('nextStep(plan, session)', () => {
  it('asks for precautions before the first load', () => {
    expect(step({})).toEqual({ kind: 'prepare' });
  });
  it('loads slot by slot', () => {
    expect(step({ precautions: mark })).toEqual({ kind: 'load', slot: 0, spare: false });
    expect(step({ precautions: mark }, [loadedRun('s1', 0, 'A-1'), run('s1', 1, 'B-1')])).toEqual({
      kind: 'load',
      slot: 1,
      spare: false
    });
  });
  it('reads before the start what is read before', () => {
    const place = { slot: 0, reading: 'before', repeat: 1 };
    expect(step({ precautions: mark }, both())).toEqual({ kind: 'read-before', place });
  });
  it('starts when all is loaded and read', () => {
    expect(step({ precautions: mark }, both('before'))).toEqual({ kind: 'start' });
  });
  it('runs until it is stopped', () => {
    expect(step({ precautions: mark, started }, both('before'))).toEqual({ kind: 'running', place: null });
  });
  it('reads after the stop', () => {
    const place = { slot: 0, reading: 'after', repeat: 1 };
    expect(step({ precautions: mark, started, stopped }, both('before'))).toEqual({ kind: 'read-after', place });
  });
  it('passes over a ruined run', () => {
    const runs = [loadedRun('s1', 0, 'A-1', { ruined }), loadedRun('s1', 1, 'B-1', { readings: [read('before')] })];
    expect(step({ precautions: mark, started, stopped }, runs)).toMatchObject({ place: { slot: 1 } });
  });
  it('closes when all is read, when a session is ruined, and when every run is ruined before the start', () => {
    expect(step({ precautions: mark, started, stopped }, both('before', 'after'))).toEqual({ kind: 'close' });
    expect(step({ ruined: { ...ruined, whole: true } })).toEqual({ kind: 'close' });
    expect(step({ precautions: mark }, [run('s1', 0, 'A-1', { ruined })])).toEqual({ kind: 'close' });
  });
  it('loads a spare into the slot of a ruined run when that was chosen', () => {
    const runs = [loadedRun('s1', 0, 'A-1', { ruined: { ...ruined, next: 'spare-now' } }), ...both('before').slice(1)];
    expect(step({ precautions: mark }, runs)).toEqual({ kind: 'load', slot: 0, spare: true });
    expect(step({ precautions: mark, started }, runs)).toEqual({ kind: 'running', place: null });
  });
  it('starts again for a spare that came after the stop', () => {
    const later = { ...mark, at: '2026-01-01T09:00:00.000+01:00' };
    const earlier = [loadedRun('s1', 0, 'A-1', { ruined: { ...ruined, next: 'spare-now' } })];
    const planned = loadedRun('s1', 0, 'A-9', { earlier, readings: [read('before')] });
    const loaded = planned.loaded && { ...planned.loaded, ...later };
    const runs = [{ ...planned, loaded }, ...both('before', 'after').slice(1)];
    expect(step({ precautions: mark, started, stopped }, runs)).toEqual({ kind: 'start' });
    const again = { ...started, at: '2026-01-01T09:05:00.000+01:00' };
    expect(step({ precautions: mark, started: again, stopped: null }, runs)).toEqual({ kind: 'running', place: null });
  });
  it('has nothing left in a closed session', () => {
    expect(step({ status: 'closed', closed: mark })).toEqual({ kind: 'closed' });
  });
  it('reads at points of the run while it runs', () => {
    const [reading] = wallPaintPlan.readings;
    if (!reading) throw new Error('the plan has readings');
    const at = { ...reading, id: 'at500', when: { kind: 'at' as const, point: 500, unit: 'cycles' } };
    const plan = { ...wallPaintPlan, readings: [at, ...wallPaintPlan.readings] };
    const running = session(1, both('before'), { precautions: mark, started });
    expect(nextStep(plan, running)).toEqual({ kind: 'running', place: { slot: 0, reading: 'at500', repeat: 1 } });
  });
});

describe('currentSession(state)', () => {
  const first = session(1, [run('s1', 0, 'A-1')], { status: 'closed' });
  const second = session(2, [run('s2', 0, 'A-2')]);
  const third = session(3, [run('s3', 0, 'A-3')], { status: 'running' });

  it('prefers a session that was begun over one that waits', () => {
    expect(currentSession(campaign([first, second, third]))?.id).toBe('s3');
  });
  it('is the first that waits when none was begun', () => {
    expect(currentSession(campaign([first, second]))?.id).toBe('s2');
  });
  it('is null when all are closed', () => {
    expect(currentSession(campaign([first]))).toBeNull();
  });
});
