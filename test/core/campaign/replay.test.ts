import { describe, expect, it } from 'vitest';
import { Replay, replay } from '#lib/core/campaign/replay.ts';
import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import type { RunState } from '#lib/core/campaign/state.ts';
import { deviceA, deviceB, Recorder } from './story.ts';

const runOf = (events: CampaignEvent[], session: number, slot: number): RunState => {
  const run = replay(events)
    .sessions.find((s) => s.id === `s${session}`)
    ?.runs.find((r) => r.slot === slot);
  if (!run) throw new Error(`no run s${session}/${slot}`);
  return run;
};
const valueOf = (events: CampaignEvent[], session: number, slot: number): number | null =>
  runOf(events, session, slot).readings[0]?.current?.value ?? null;

describe('replay', () => {
  it('replay(plan issued) lists every session in loading order, waiting, without readings', () => {
    const a = new Recorder(deviceA).begin();
    const state = replay(a.events);
    expect(state.sessions.map((s) => [s.id, s.status, s.runs.length])).toEqual([
      ['s1', 'waiting', 3],
      ['s2', 'waiting', 3],
      ['s3', 'waiting', 3],
      ['s4', 'waiting', 3]
    ]);
    expect(state.title).toBe('Invented wall paints');
    expect(state.events).toBe(2);
  });

  it('replay(session events) walks waiting, loading, running, reading, closed and back', () => {
    const a = new Recorder(deviceA).begin();
    const status = () => replay(a.events).sessions[0]?.status;
    a.record('precautions-acknowledged', { session: 's1' });
    expect(status()).toBe('loading');
    a.record('session-started', { session: 's1', seconds: null });
    expect(status()).toBe('running');
    const stop = a.record('session-stopped', { session: 's1', early: null });
    expect(status()).toBe('reading');
    a.record('undone', { target: stop.id, reason: '' });
    expect(status()).toBe('running');
    a.record('session-stopped', { session: 's1', early: null });
    a.record('session-closed', { session: 's1' });
    expect(status()).toBe('closed');
    a.record('session-reopened', { session: 's1', reason: 'late reading' });
    expect(status()).toBe('reading');
  });

  it('replay(reinstatements that name each other) ends', () => {
    const a = new Recorder(deviceA).begin();
    const first = a.record('reinstated', { target: a.events[0]?.id ?? '', reason: 'a' });
    const second = a.record('reinstated', { target: first.id, reason: 'b' });
    const ring = [...a.events.slice(0, 2), { ...first, data: { target: second.id, reason: 'a' } }, second];
    expect(replay(ring as CampaignEvent[]).events).toBe(4);
  });

  it('replay(correction) lets the corrected value count and keeps both versions', () => {
    const a = new Recorder(deviceA).begin();
    const first = a.reading(1, 0, 12.3);
    const second = a.correct(first.id, 1, 0, 13.2);
    const reading = runOf(a.events, 1, 0).readings[0];
    expect(reading?.current?.value).toBe(13.2);
    expect(reading?.versions.map((v) => [v.value, v.because])).toEqual([
      [12.3, null],
      [13.2, 'misread']
    ]);
    a.record('undone', { target: second.id, reason: '' });
    expect(valueOf(a.events, 1, 0)).toBe(12.3);
  });

  it('replay(undone) of an undone event changes nothing: undo is not undone', () => {
    const a = new Recorder(deviceA).begin();
    const first = a.reading(1, 0, 12.3);
    const undo = a.record('undone', { target: first.id, reason: '' });
    a.record('undone', { target: undo.id, reason: '' });
    expect(valueOf(a.events, 1, 0)).toBeNull();
  });

  it('replay(two values) keeps both, counts none, and takes the decided one', () => {
    const a = new Recorder(deviceA).begin();
    const b = new Recorder(deviceB);
    const first = a.reading(1, 0, 12.3);
    const second = b.reading(1, 0, 14.1);
    const both = [...a.events, ...b.events];
    const [found] = replay(both).contradictions;
    expect(found?.kind).toBe('two-values');
    expect(found?.events.map((e) => e.id)).toEqual(expect.arrayContaining([first.id, second.id]));
    expect(valueOf(both, 1, 0)).toBeNull();
    expect(runOf(both, 1, 0).readings[0]?.contradiction).toBe(found?.key);
    a.learn(b.events);
    a.record('contradiction-decided', {
      about: found?.key ?? '',
      chosen: second.id,
      reason: 'paper sheet says 14.1',
      among: [first.id, second.id]
    });
    const after = [...a.events, ...b.events];
    expect(valueOf(after, 1, 0)).toBe(14.1);
    expect(replay(after).contradictions[0]?.decided?.chosen).toBe(second.id);
    // The chosen value may be corrected without opening the question again; the other one may not.
    const better = a.correct(second.id, 1, 0, 14.2);
    expect(valueOf([...a.events, ...b.events], 1, 0)).toBe(14.2);
    a.record('undone', { target: better.id, reason: '' });
    b.correct(first.id, 1, 0, 12.4);
    const reopened = replay([...a.events, ...b.events]).contradictions[0];
    expect(reopened?.decided).toBeNull();
    expect(reopened?.decisions).toHaveLength(1);
  });

  it('replay(equal values of two devices) is no contradiction', () => {
    const a = new Recorder(deviceA).begin();
    const b = new Recorder(deviceB);
    a.reading(1, 0, 12.3);
    b.reading(1, 0, 12.3);
    const both = [...a.events, ...b.events];
    expect(replay(both).contradictions).toEqual([]);
    expect(valueOf(both, 1, 0)).toBe(12.3);
  });

  it('replay(ruined, spare loaded, read again) keeps the ruined run as an earlier one', () => {
    const a = new Recorder(deviceA).begin();
    a.load(1, 0);
    a.reading(1, 0, 99);
    a.record('ruined', { session: 's1', slot: 0, reason: 'Film torn', next: 'spare-now' });
    a.load(1, 0, 'A9');
    a.reading(1, 0, 11, 'A9');
    const run = runOf(a.events, 1, 0);
    expect([run.specimen, run.treatment, run.ruined, run.readings[0]?.current?.value]).toEqual(['A9', 'A', null, 11]);
    expect(run.earlier.map((r) => [r.specimen, r.ruined?.reason, r.readings[0]?.current?.value])).toEqual([
      ['A1', 'Film torn', 99]
    ]);
  });

  it('replay(ruined session, reinstated) ruins every run, then none, and keeps the history', () => {
    const a = new Recorder(deviceA).begin();
    const ruin = a.record('ruined', { session: 's2', slot: null, reason: 'pump failed', next: 'repeat-later' });
    expect(replay(a.events).sessions[1]?.runs.map((r) => r.ruined?.whole)).toEqual([true, true, true]);
    a.record('reinstated', { target: ruin.id, reason: 'pump was fine' });
    const session = replay(a.events).sessions[1];
    expect(session?.ruined).toBeNull();
    expect(session?.runs.every((r) => r.ruined === null)).toBe(true);
  });

  it('replay(specimen moved in a session by its device) is a swap, in two sessions a contradiction', () => {
    const a = new Recorder(deviceA).begin();
    a.load(1, 0, 'B1', 'wrong one');
    a.load(1, 1, 'B1');
    expect(runOf(a.events, 1, 0).loaded).toBeNull();
    expect(replay(a.events).contradictions).toEqual([]);
    a.load(2, 1, 'B1', 'mixed up');
    const state = replay(a.events);
    expect(state.contradictions.map((c) => c.key)).toEqual(['specimen-twice:B1']);
    expect(runOf(a.events, 1, 1).treatment).toBe('');
    const [first] = state.contradictions[0]?.events ?? [];
    a.record('contradiction-decided', {
      about: 'specimen-twice:B1',
      chosen: first?.id ?? '',
      reason: 'seen in the rack',
      among: state.contradictions[0]?.events.map((e) => e.id) ?? []
    });
    expect(runOf(a.events, 1, 1).treatment).toBe('B');
    expect(runOf(a.events, 2, 1).loaded).toBeNull();
  });

  it('replay(two devices, clocks apart) puts what a device knew before what it then did', () => {
    const a = new Recorder(deviceA).begin();
    a.record('session-started', { session: 's1', seconds: null });
    const b = new Recorder(deviceB, a.now - 3_600_000);
    b.learn(a.events);
    b.record('session-stopped', { session: 's1', early: null });
    expect(replay([...b.events, ...a.events]).sessions[0]?.status).toBe('reading');
  });

  it('Replay.apply leaves the sessions that an event does not concern as the same objects', () => {
    const a = new Recorder(deviceA).begin();
    const growing = new Replay(a.head.campaign);
    a.events.forEach((event) => growing.apply(event));
    const before = growing.state.sessions;
    growing.apply(a.reading(1, 0, 5));
    const after = growing.state.sessions;
    expect(after[0]).not.toBe(before[0]);
    expect(after.slice(1).every((session, index) => session === before[index + 1])).toBe(true);
  });

  it('replay(chain) names a gap, a fork, an edit and a clock that jumped', () => {
    const a = new Recorder(deviceA).begin();
    a.reading(1, 0, 1);
    a.reading(1, 1, 2);
    a.now -= 60_000;
    const whole = a.events;
    const jumped = a.record('noted', { about: 'campaign', session: null, slot: null, text: 'x' });
    const flags = (events: CampaignEvent[]) => replay(events).flags.map((f) => [f.kind, f.detail]);
    expect(flags(whole).map(([kind]) => kind)).toEqual([]);
    const back = { ...jumped, at: '2026-03-02T07:00:00.000+01:00' } as CampaignEvent;
    expect(flags([...whole.slice(0, 4), back])[0]?.[0]).toBe('clock-jumped');
    expect(flags([...whole.slice(0, 2), ...whole.slice(3)])).toEqual([['gap', '3-3']]);
    const [, , third] = whole;
    if (third?.kind !== 'reading-recorded') throw new Error('expected a reading');
    const edited: CampaignEvent = { ...third, data: { ...third.data, value: 9 } };
    expect(flags([...whole.slice(0, 2), edited, ...whole.slice(3)])).toEqual([['altered', '3']]);
    const fork: CampaignEvent = { ...edited, id: '01890000-0000-7000-8000-00000000ffff' };
    expect(flags([...whole, fork])).toEqual([['fork', '3']]);
  });
});
