import { describe, expect, it } from 'vitest';
import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import { writeCampaignFile } from '#lib/core/exchange/campaign-file.ts';
import { copyIntoFolder, nameBefore } from '#lib/storage/copy-into-folder.ts';
import { mirrorFolder, type MirrorFolder } from '#lib/storage/mirror-folder.ts';
import { campaign, deviceA, Recorder } from '../core/campaign/story.ts';

const name = 'paints-1234.jsonl';
const before = 'paints-1234-before.jsonl';
const bytesOf = (events: readonly CampaignEvent[]): Uint8Array =>
  new TextEncoder().encode(
    writeCampaignFile(events, {
      campaign,
      title: 'T',
      device: deviceA,
      at: '2026-03-02T08:00:00.000+01:00',
      app: '0.0.0'
    })
  );
const events = (() => {
  const a = new Recorder(deviceA).begin();
  for (const slot of [0, 1, 2]) a.load(1, slot);
  a.reading(1, 0, 12.5);
  return a.events;
})();
const upTo = (n: number) => bytesOf(events.slice(0, n));
const all = events.length;

/** A folder in memory. */
class Folder implements MirrorFolder {
  readonly name = 'Copies';
  readonly files = new Map<string, Uint8Array>();
  readonly written: string[] = [];
  permitted = () => Promise.resolve(true);
  read = (file: string) => Promise.resolve(this.files.get(file) ?? null);
  write(file: string, bytes: Uint8Array): Promise<void> {
    this.written.push(file);
    this.files.set(file, bytes);
    return Promise.resolve();
  }
}

describe('copyIntoFolder', () => {
  it('copyIntoFolder(growing log) keeps the file and the one before it', async () => {
    const folder = new Folder();
    for (let n = 1; n <= all; n++) {
      expect(await copyIntoFolder(folder, name, upTo(n))).toEqual({ ok: true, value: { events: n } });
      expect(folder.files.get(name)).toEqual(upTo(n));
      expect(folder.files.get(before)).toEqual(n === 1 ? undefined : upTo(n - 1));
    }
  });

  it('copyIntoFolder(the same again) writes nothing', async () => {
    const folder = new Folder();
    await copyIntoFolder(folder, name, upTo(all));
    const { length } = folder.written;
    expect(await copyIntoFolder(folder, name, upTo(all))).toEqual({ ok: true, value: { events: all } });
    expect(folder.written).toHaveLength(length);
  });

  it('copyIntoFolder(shorter log, empty log) leaves a longer file as it is', async () => {
    const folder = new Folder();
    await copyIntoFolder(folder, name, upTo(all));
    expect(await copyIntoFolder(folder, name, upTo(all - 1))).toMatchObject({
      ok: false,
      error: { tag: 'holds-more' }
    });
    expect(await copyIntoFolder(folder, name, upTo(0))).toMatchObject({ ok: false, error: { tag: 'failed' } });
    expect(folder.files.get(name)).toEqual(upTo(all));
    expect(folder.files.get(before)).toBeUndefined();
  });

  it('copyIntoFolder(over something else) leaves it as it is', async () => {
    const folder = new Folder();
    const foreign = new TextEncoder().encode('shopping list\n');
    folder.files.set(name, foreign);
    expect(await copyIntoFolder(folder, name, upTo(all))).toMatchObject({ ok: false, error: { tag: 'foreign' } });
    expect(folder.files.get(name)).toBe(foreign);
  });

  it('copyIntoFolder(over a cut file) writes, and does not make the cut file the generation before', async () => {
    const folder = new Folder();
    await copyIntoFolder(folder, name, upTo(2));
    await copyIntoFolder(folder, name, upTo(3));
    folder.files.set(name, upTo(3).slice(0, -30));
    expect(await copyIntoFolder(folder, name, upTo(4))).toEqual({ ok: true, value: { events: 4 } });
    expect(folder.files.get(before)).toEqual(upTo(2));
  });

  it('copyIntoFolder(generation before that holds more) leaves that one as it is', async () => {
    const folder = new Folder();
    folder.files.set(before, upTo(all));
    folder.files.set(name, upTo(2));
    expect(await copyIntoFolder(folder, name, upTo(3))).toEqual({ ok: true, value: { events: 3 } });
    expect(folder.files.get(before)).toEqual(upTo(all));
  });

  it('copyIntoFolder(disk that writes other bytes) says so; one that fails keeps the file', async () => {
    const lying = new Folder();
    lying.write = (file, bytes) => {
      lying.files.set(file, bytes.slice(0, -1));
      return Promise.resolve();
    };
    expect(await copyIntoFolder(lying, name, upTo(all))).toEqual({
      ok: false,
      error: { tag: 'failed', detail: 'differs' }
    });
    const full = new Folder();
    await copyIntoFolder(full, name, upTo(2));
    full.write = () => Promise.reject(new Error('disk full'));
    expect(await copyIntoFolder(full, name, upTo(3))).toEqual({
      ok: false,
      error: { tag: 'failed', detail: 'disk full' }
    });
    expect(full.files.get(name)).toEqual(upTo(2));
  });
});

describe('nameBefore', () => {
  it('nameBefore(name) marks the generation in front of the extension', () => {
    expect(nameBefore(name)).toBe(before);
    expect(nameBefore('plain')).toBe('plain-before');
  });
});

describe('mirrorFolder', () => {
  /** A directory handle as browsers give it, as far as it is used. */
  const handle = (state: { now: PermissionState; answer: PermissionState }) => ({
    name: 'Copies',
    asked: 0,
    queryPermission: () => Promise.resolve(state.now),
    requestPermission() {
      this.asked++;
      return Promise.resolve((state.now = state.answer));
    },
    getFileHandle: () => Promise.reject(new DOMException('none', 'NotFoundError'))
  });
  const folderOf = (fake: ReturnType<typeof handle>) => mirrorFolder(fake as unknown as FileSystemDirectoryHandle);

  it('permitted(false) asks nobody; permitted(true) asks once, and only where the browser wants it', async () => {
    const fake = handle({ now: 'prompt', answer: 'granted' });
    const folder = folderOf(fake);
    expect(await folder.permitted(false)).toBe(false);
    expect(fake.asked).toBe(0);
    expect(await folder.permitted(true)).toBe(true);
    expect(await folder.permitted(true)).toBe(true);
    expect(fake.asked).toBe(1);
    expect(await folderOf(handle({ now: 'prompt', answer: 'denied' })).permitted(true)).toBe(false);
  });

  it('read(file that is not there) is null', async () => {
    expect(await folderOf(handle({ now: 'granted', answer: 'granted' })).read(name)).toBeNull();
  });
});
