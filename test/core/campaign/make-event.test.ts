import { describe, expect, it } from 'vitest';
import { checkEvent } from '#lib/core/campaign/check-event.ts';
import { lastTick } from '#lib/core/campaign/event.ts';
import { inOrder } from '#lib/core/campaign/in-order.ts';
import { lastUndoable } from '#lib/core/campaign/last-undoable.ts';
import { makeEvent } from '#lib/core/campaign/make-event.ts';
import { canonicalJson, noHash, sha256OfText } from '#lib/core/campaign/seal.ts';
import { deviceA, deviceB, Recorder } from './story.ts';

const stamp = { now: 0, offset: -210, mono: 1, run: 'r', app: '1', random: new Uint8Array(10) };

describe('makeEvent', () => {
  it('makeEvent(next) continues number and chain: prev is the SHA-256 of the text before', () => {
    const a = new Recorder(deviceA).begin();
    const [first, second] = a.events;
    expect([first?.seq, first?.prev, second?.seq]).toEqual([1, noHash, 2]);
    expect(second?.prev).toBe(sha256OfText(canonicalJson(first)));
  });

  it('makeEvent(data that does not fit) names the field and makes nothing', () => {
    const made = makeEvent(
      { kind: 'session-closed', data: { session: 'x'.repeat(41) }, who: '' },
      new Recorder(deviceA).head,
      stamp
    );
    expect(made).toMatchObject({ ok: false, error: { tag: 'bad-data', kind: 'session-closed', path: 'session' } });
  });

  it('makeEvent(half an emoji, a name too long) makes an event that its own check accepts', () => {
    const data = { about: 'campaign' as const, session: null, slot: null, text: 'cut \ud83d' };
    const made = makeEvent({ kind: 'noted', data, who: 'n'.repeat(300) }, new Recorder(deviceA).head, stamp);
    expect(made.ok && checkEvent(JSON.parse(made.value.text)).ok).toBe(true);
    expect(made.ok && made.value.event.at).toBe('1969-12-31T20:30:00.000-03:30');
    expect(made.ok && made.value.event.data).toMatchObject({ text: 'cut \ufffd' });
  });

  it('makeEvent(after a tick at the limit) still makes a valid event', () => {
    const head = { ...new Recorder(deviceA).head, tick: lastTick };
    const made = makeEvent({ kind: 'session-closed', data: { session: 's1' }, who: '' }, head, stamp);
    expect(made.ok && checkEvent(made.value.event).ok).toBe(true);
  });
});

describe('checkEvent', () => {
  it('checkEvent(unknown kind) lets it through, a known kind with a wrong field not, naming the path', () => {
    const a = new Recorder(deviceA).begin();
    const [created] = a.events;
    expect(checkEvent({ ...created, kind: 'of-the-future', data: { x: 1 } }).ok).toBe(true);
    const bad = checkEvent({ ...created, data: { title: 'T', demo: 'yes' } });
    expect(bad).toMatchObject({ ok: false, error: { tag: 'bad-event', path: 'data.demo' } });
    expect(checkEvent({ ...created, kind: 'constructor' }).ok).toBe(true);
  });
});

describe('inOrder', () => {
  it('inOrder(events without ticks of a clock that jumped back) keeps each device by sequence number', () => {
    const a = new Recorder(deviceA).begin();
    a.now -= 3_600_000;
    a.record('noted', { about: 'campaign', session: null, slot: null, text: 'after' });
    const b = new Recorder(deviceB, a.now + 1_800_000);
    b.record('noted', { about: 'campaign', session: null, slot: null, text: 'b' });
    const bare = [...a.events, ...b.events].map(({ tick: _tick, ...event }) => event as (typeof a.events)[number]);
    expect(inOrder([...bare].reverse()).map(({ device, seq }) => `${device.at(-1)}${seq}`)).toEqual([
      'b1',
      'a1',
      'a2',
      'a3'
    ]);
  });
});

describe('lastUndoable', () => {
  it('lastUndoable(events) walks back over what is undone, other devices and lasting acts', () => {
    const a = new Recorder(deviceA).begin();
    expect(lastUndoable(a.events, deviceA)).toBeNull();
    const one = a.reading(1, 0, 1);
    const two = a.reading(1, 1, 2);
    const b = new Recorder(deviceB);
    b.reading(1, 2, 3);
    const last = () => lastUndoable([...a.events, ...b.events], deviceA)?.id;
    expect(last()).toBe(two.id);
    a.record('undone', { target: two.id, reason: '' });
    a.record('exported', { events: 5, sha256: noHash, how: 'download' });
    expect(last()).toBe(one.id);
  });
});
