import 'fake-indexeddb/auto';
import { beforeEach, describe, expect, it } from 'vitest';
import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import { replay } from '#lib/core/campaign/replay.ts';
import { canonicalJson, sealOf } from '#lib/core/campaign/seal.ts';
import { stateHash } from '#lib/core/campaign/state-hash.ts';
import { summaryOf } from '#lib/core/campaign/summary.ts';
import { connection } from '#lib/state/database.svelte.ts';
import { OpenCampaignCheckpoint } from '#lib/state/open-campaign-checkpoint.ts';
import { OpenCampaignLog } from '#lib/state/open-campaign-log.ts';
import { load } from '#lib/storage/journal.ts';
import { takeIn } from '#lib/storage/take-in.ts';
import { bigCampaign } from '../bench/big-campaign.ts';
import { campaign, deviceA, deviceB, Recorder } from '../core/campaign/story.ts';

const all = bigCampaign(deviceA, 22);
/** The last session and a half come after the checkpoint. */
const before = all.slice(0, -75);

const kept = (event: CampaignEvent) => ({ event, text: canonicalJson(event), seal: sealOf(event) });

async function write(events: readonly CampaignEvent[]): Promise<void> {
  const last = events.at(-1);
  if (!last) throw new Error('no events');
  const head = { campaign, device: deviceA, seq: last.seq, hash: sealOf(last), tick: 0 };
  const summary = summaryOf(replay([last], campaign), deviceA);
  const held = await load(connection, campaign);
  if (!held.ok) throw new Error(held.error.tag);
  const note = { ...kept(last), head };
  const added = events.slice(0, -1).map(kept);
  const written = await takeIn(connection, { held: held.value, added, aside: [], note, from: '', summary });
  if (!written.ok) throw new Error(written.error.tag);
}

async function open(): Promise<OpenCampaignLog> {
  const opened = await OpenCampaignLog.open(campaign, deviceA);
  if (!opened.ok) throw new Error(opened.error.tag);
  return opened.value;
}

/** Writes a campaign and a checkpoint of it, then what comes after. */
async function withCheckpoint(after: readonly CampaignEvent[]): Promise<void> {
  await write(before);
  await new OpenCampaignCheckpoint(await open(), () => true).save();
  if (after.length > 0) await write(after);
}

beforeEach(async () => {
  await connection.use(async (db) => {
    for (const name of db.objectStoreNames) await db.clear(name);
  });
});

describe('OpenCampaignLog', () => {
  it('open(campaign) goes on from the checkpoint, reads the rest of the log, and has the state of the whole', async () => {
    await withCheckpoint(all.slice(before.length));
    const log = await open();
    expect(log.whole).toBe(false);
    expect(log.replay.cold).toBe(true);
    expect(stateHash(log.state)).toBe(stateHash(replay(all)));
    expect(log.state.events).toBe(all.length);
    await log.readRest(() => Promise.resolve(true));
    expect(new Set(log.events.map(({ id }) => id))).toEqual(new Set(all.map(({ id }) => id)));
  });

  it('prepare(undo of an act of a session long closed) reads what it needs and no more', async () => {
    await withCheckpoint([]);
    const log = await open();
    const recorder = new Recorder(deviceA, Date.UTC(2027, 0, 1));
    recorder.head = log.headOf(deviceA);
    const target = all.find(({ kind }) => kind === 'reading-recorded');
    const undone = recorder.record('undone', { target: target?.id ?? '', reason: 'wrong panel' });
    expect((await log.prepare(undone)).ok).toBe(true);
    log.apply(undone);
    expect(log.replay.cold).toBe(true);
    expect(stateHash(log.state)).toBe(stateHash(replay([...before, undone])));
    log.retract();
    expect(stateHash(log.state)).toBe(stateHash(replay(before)));
  });

  it('catchUp() takes in what another tab wrote, and a file of another device by reading the log anew', async () => {
    await withCheckpoint([]);
    const log = await open();
    await write(all.slice(before.length));
    expect(await log.catchUp()).toEqual({ ok: true, value: true });
    expect(log.replay.cold).toBe(true);
    const b = new Recorder(deviceB);
    b.learn(all);
    b.record('noted', { about: 'session', session: 's1', slot: null, text: 'from the other tablet' });
    await write(b.events);
    expect(await log.catchUp()).toEqual({ ok: true, value: true });
    expect(log.whole).toBe(true);
    expect(stateHash(log.state)).toBe(stateHash(replay([...all, ...b.events])));
    expect(await log.catchUp()).toEqual({ ok: true, value: false });
  });

  const harm: [string, () => Promise<unknown>][] = [
    ['an event before it is gone', () => connection.use((db) => db.delete('events', all[40]?.id ?? ''))],
    [
      'the event it ends with is another',
      () =>
        connection.use(async (db) => {
          const stored = await db.get('events', before.at(-1)?.id ?? '');
          if (stored) await db.put('events', { ...stored, seal: 'f'.repeat(64) });
        })
    ],
    ['a session is missing in it', () => connection.use((db) => db.delete('checkpoints', [campaign, 's:s7']))],
    [
      'it is of another program',
      () =>
        connection.use(async (db) => {
          const core = await db.get('checkpoints', [campaign, 'core']);
          if (core) await db.put('checkpoints', { ...core, text: core.text.replace('"program":"', '"program":"9') });
        })
    ],
    [
      'it is no text that can be read',
      () => connection.use((db) => db.put('checkpoints', { campaign, part: 's:s7', text: '{', runs: '[]' }))
    ]
  ];
  it.each(harm)('open(campaign) does not use a checkpoint when %s', async (_what, act) => {
    await withCheckpoint([]);
    expect((await open()).whole).toBe(false);
    await act();
    const log = await open();
    expect(log.whole).toBe(true);
    expect(stateHash(log.state)).toBe(stateHash(replay(log.events)));
  });

  it('prepare(event of a session whose events were changed) reads the log instead', async () => {
    await withCheckpoint([]);
    await connection.use(async (db) => {
      const part = await db.get('checkpoints', [campaign, 'e:s7']);
      if (part) await db.put('checkpoints', { ...part, text: part.text.replaceAll('"value":', '"value":1') });
    });
    const log = await open();
    const recorder = new Recorder(deviceA, Date.UTC(2027, 0, 1));
    recorder.head = log.headOf(deviceA);
    const note = recorder.record('noted', { about: 'session', session: 's7', slot: null, text: 'late' });
    expect((await log.prepare(note)).ok).toBe(true);
    expect(log.whole).toBe(true);
    log.apply(note);
    expect(stateHash(log.state)).toBe(stateHash(replay([...before, note])));
  });
});

describe('OpenCampaignCheckpoint', () => {
  it('save() writes the sessions that have changed, and never over a checkpoint of another tab', async () => {
    await withCheckpoint([]);
    const [mine, other] = [await open(), await open()];
    await write(all.slice(before.length));
    await other.catchUp();
    await mine.catchUp();
    const others = new OpenCampaignCheckpoint(other, () => true);
    await others.save();
    const stamp = async () => connection.use((db) => db.get('checkpoints', [campaign, 'stamp']));
    const held = await stamp();
    await new OpenCampaignCheckpoint(mine, () => true).save();
    expect(await stamp()).toEqual(held);
    const log = await open();
    expect(log.whole).toBe(false);
    expect(stateHash(log.state)).toBe(stateHash(replay(all)));
  });

  it('save() leaves it while a write is on its way', async () => {
    await write(before);
    await new OpenCampaignCheckpoint(await open(), () => false).save();
    expect((await open()).whole).toBe(true);
  });
});
