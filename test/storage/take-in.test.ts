import 'fake-indexeddb/auto';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import type { Sealed } from '#lib/core/campaign/make-event.ts';
import { replay } from '#lib/core/campaign/replay.ts';
import { canonicalJson, sealOf } from '#lib/core/campaign/seal.ts';
import { summaryOf } from '#lib/core/campaign/summary.ts';
import { Connection } from '#lib/storage/connection.ts';
import { append, load, type LoadedLog } from '#lib/storage/journal.ts';
import { holdsEvent, type Taking, takeIn } from '#lib/storage/take-in.ts';
import { campaign, deviceA, deviceB, Recorder } from '../core/campaign/story.ts';

let connection: Connection;
let name = 0;
beforeEach(() => {
  connection = new Connection({}, `take-in-${name++}`);
});
afterEach(() => connection.drop());

const b = new Recorder(deviceB);
const noteEvent = b.record('imported', { sha256: '0'.repeat(64), added: 2, known: 0, name: 'x' });
const sealed = (event: CampaignEvent): Sealed => ({
  event,
  text: canonicalJson(event),
  seal: sealOf(event),
  head: b.head
});
const summary = (events: CampaignEvent[]) => summaryOf(replay(events), deviceA);
const held = async (): Promise<LoadedLog> => {
  const loaded = await load(connection, campaign, true);
  if (!loaded.ok) throw new Error(loaded.error.tag);
  return loaded.value;
};
const taking = async (added: CampaignEvent[], aside: CampaignEvent[] = []): Promise<Taking> => ({
  held: await held(),
  added: added.map(sealed),
  aside: aside.map(sealed),
  note: sealed(noteEvent),
  from: 'file',
  summary: summary(added)
});

describe('takeIn', () => {
  it('takeIn(events) keeps forks beside the first and other bytes of a known id aside', async () => {
    const { events } = new Recorder(deviceA).begin();
    const [created, issued] = events;
    if (!created || !issued) throw new Error('no events');
    await append(connection, sealed(created), summary(events));
    const fork = { ...created, id: '01890000-0000-7000-8000-00000000eeee' } as CampaignEvent;
    const second = { ...issued, id: '01890000-0000-7000-8000-00000000ffff' } as CampaignEvent;
    const other = { ...created, who: 'Somebody else' } as CampaignEvent;
    const taken = await takeIn(connection, await taking([issued, fork, second], [other]));
    expect(taken).toEqual({ ok: true, value: undefined });
    const ids = (await held()).events.map(({ id }) => id);
    expect(new Set(ids)).toEqual(new Set([created.id, issued.id, fork.id, second.id, noteEvent.id]));
    const kept = await connection.use((db) => db.getAll('quarantine'));
    expect(kept.ok && kept.value.map(({ id, from }) => [id, from])).toEqual([[created.id, 'file']]);
    expect(await holdsEvent(connection, noteEvent.id)).toEqual({ ok: true, value: true });
  });

  it('takeIn(events) weighed before another tab wrote is refused as stale and writes nothing', async () => {
    const { events } = new Recorder(deviceA).begin();
    const [created, issued] = events;
    if (!created || !issued) throw new Error('no events');
    const order = await taking([issued]);
    await append(connection, sealed(created), summary(events));
    expect(await takeIn(connection, order)).toEqual({ ok: false, error: { tag: 'stale' } });
    expect((await held()).events.map(({ id }) => id)).toEqual([created.id]);
    expect(await holdsEvent(connection, noteEvent.id)).toEqual({ ok: true, value: false });
  });

  it('takeIn(event under an id of another campaign) sets it aside and takes the rest in', async () => {
    const { events } = new Recorder(deviceA).begin();
    const [created, issued] = events;
    if (!created || !issued) throw new Error('no events');
    const elsewhere = { ...created, campaign: '01890000-0000-7000-8000-0000000000c1' } as CampaignEvent;
    await append(connection, sealed(elsewhere), { ...summary(events), id: elsewhere.campaign });
    expect((await takeIn(connection, await taking([created, issued]))).ok).toBe(true);
    expect((await held()).events.map(({ id }) => id).toSorted()).toEqual([issued.id, noteEvent.id].toSorted());
    const kept = await connection.use((db) => db.getAll('quarantine'));
    expect(kept.ok && kept.value.map(({ id }) => id)).toEqual([created.id]);
  });

  it('takeIn(an event that cannot be added, among others) tells the first error and leaves nothing of them', async () => {
    const { events } = new Recorder(deviceA).begin();
    const [created, issued] = events;
    if (!created || !issued) throw new Error('no events');
    const twice = await taking([created, created, issued]);
    expect(await takeIn(connection, twice)).toEqual({ ok: false, error: { tag: 'stale' } });
    expect((await held()).events).toEqual([]);
  });

  it('takeIn(events) that ends on the way leaves nothing of them', async () => {
    const a = new Recorder(deviceA).begin();
    for (let n = 0; n < 3_000; n++) a.record('noted', { about: 'shift', session: null, slot: null, text: `note ${n}` });
    const order = await taking(a.events);
    const stopped = takeIn(connection, order, (done) => {
      if (done > 0.5) throw new Error('the worker ended');
    });
    expect((await stopped).ok).toBe(false);
    connection.drop();
    expect((await held()).events).toEqual([]);
  });
});
