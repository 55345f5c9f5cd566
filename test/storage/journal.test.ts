import 'fake-indexeddb/auto';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { replay } from '#lib/core/campaign/replay.ts';
import { summaryOf } from '#lib/core/campaign/summary.ts';
import { type Sealed } from '#lib/core/campaign/make-event.ts';
import { canonicalJson, sealOf } from '#lib/core/campaign/seal.ts';
import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import { Connection } from '#lib/storage/connection.ts';
import { draftsOf, putDraft } from '#lib/storage/drafts.ts';
import { append, load } from '#lib/storage/journal.ts';
import { campaign, deviceA, Recorder } from '../core/campaign/story.ts';

let connection: Connection;
let name = 0;
beforeEach(() => {
  connection = new Connection({}, `test-${name++}`);
});
afterEach(() => connection.drop());

const sealed = (recorder: Recorder, event: CampaignEvent): Sealed => ({
  event,
  text: canonicalJson(event),
  seal: sealOf(event),
  head: recorder.head
});
const summary = (events: CampaignEvent[]) => summaryOf(replay(events), deviceA);

describe('append', () => {
  it('append(event) is read back by load to the letter, its draft gone with it', async () => {
    const a = new Recorder(deviceA).begin();
    await putDraft(connection, campaign, 'entry', () => '12,3');
    for (const event of a.events) {
      const written = await append(connection, sealed(a, event), summary(a.events), { name: 'entry', now: () => null });
      expect(written).toEqual({ ok: true, value: undefined });
    }
    const loaded = await load(connection, campaign, true);
    expect(loaded.ok && loaded.value.events.map((e) => canonicalJson(e))).toEqual(
      a.events.map((e) => canonicalJson(e))
    );
    expect(loaded.ok && loaded.value.unreadable).toEqual([]);
    expect(await draftsOf(connection, campaign)).toEqual({ ok: true, value: {} });
  });

  it('append(event) keeps what is typed in the place of its draft at the moment of the write', async () => {
    const a = new Recorder(deviceA).begin();
    const [first] = a.events;
    if (!first) throw new Error('no event');
    let typed = '12,3';
    await putDraft(connection, campaign, 'entry', () => typed);
    const written = append(connection, sealed(a, first), summary(a.events), { name: 'entry', now: () => typed });
    typed = '4';
    expect((await written).ok).toBe(true);
    expect(await draftsOf(connection, campaign)).toEqual({ ok: true, value: { entry: '4' } });
  });

  it('append(second event under a number already taken) is refused as stale and writes nothing', async () => {
    const a = new Recorder(deviceA).begin();
    const twin = new Recorder(deviceA);
    const other = twin.record('campaign-created', { title: 'other', demo: false });
    const [first] = a.events;
    if (!first) throw new Error('no event');
    expect((await append(connection, sealed(a, first), summary(a.events))).ok).toBe(true);
    const again = { ...other, id: '01890000-0000-7000-8000-00000000eeee' };
    const refused = await append(connection, sealed(twin, again), summary(a.events));
    expect(refused).toEqual({ ok: false, error: { tag: 'stale' } });
    const loaded = await load(connection, campaign);
    expect(loaded.ok && loaded.value.events).toHaveLength(1);
  });

  it('append(event) after its connection was lost opens a new one and writes exactly one event', async () => {
    const a = new Recorder(deviceA).begin();
    const [first, second] = a.events;
    if (!first || !second) throw new Error('no events');
    await append(connection, sealed(a, first), summary(a.events));
    await connection.use(async (db) => db.close());
    expect((await append(connection, sealed(a, second), summary(a.events))).ok).toBe(true);
    const loaded = await load(connection, campaign);
    expect(loaded.ok && loaded.value.events).toHaveLength(2);
  });
});

describe('Connection', () => {
  it('write() is refused on a database of a later program, reading goes on', async () => {
    await connection.use(async (db) => db.count('events'));
    connection.drop();
    await new Promise<void>((resolve, reject) => {
      const request = indexedDB.open(`test-${name - 1}`, 99);
      request.onsuccess = () => (request.result.close(), resolve());
      request.onerror = () => reject(new Error('open failed'));
    });
    const a = new Recorder(deviceA).begin();
    const [first] = a.events;
    if (!first) throw new Error('no event');
    expect(await append(connection, sealed(a, first), summary(a.events))).toEqual({
      ok: false,
      error: { tag: 'newer-schema', version: 99 }
    });
    expect((await load(connection, campaign)).ok).toBe(true);
  });
});
