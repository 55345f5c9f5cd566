import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { replay } from '#lib/core/campaign/replay.ts';
import { canonicalJson } from '#lib/core/campaign/seal.ts';
import { writeCampaignFile } from '#lib/core/exchange/campaign-file.ts';
import { readCampaignFile } from '#lib/core/exchange/read-campaign-file.ts';
import { weighImport } from '#lib/core/exchange/summarise-import.ts';
import { campaign, deviceA, deviceB, Recorder } from '../campaign/story.ts';
import { signedFile } from './signed-file.ts';

const maker = { campaign, title: 'T', device: deviceA, at: '2026-03-02T08:00:00.000+01:00', app: '0.0.0' };
const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);
const story = () => {
  const a = new Recorder(deviceA).begin();
  a.load(1, 0);
  a.reading(1, 0, 12.5);
  a.record('noted', { about: 'run', session: 's1', slot: 0, text: 'Ränder "sauber"\n' });
  return a;
};
const text = writeCampaignFile(story().events, maker);

describe('readCampaignFile', () => {
  it('readCampaignFile(written file) gives every event back, undamaged', () => {
    const read = readCampaignFile(bytesOf(text));
    expect(read.ok && read.value.damage).toBeNull();
    expect(read.ok && read.value.events.map((e) => canonicalJson(e.event))).toEqual(
      story().events.map((e) => canonicalJson(e))
    );
  });

  it('readCampaignFile(signed file with one changed byte) never passes as undamaged, whichever byte and bit', async () => {
    const { text: signed, check } = await signedFile(story().events, maker);
    const bytes = bytesOf(signed);
    const whole = readCampaignFile(bytes);
    expect(whole.ok && whole.value.damage).toBeNull();
    expect(whole.ok && (await check(whole.value))).toBe(true);
    for (let at = 0; at < bytes.length; at++) {
      const changed = Uint8Array.from(bytes);
      changed[at] = (changed[at] ?? 0) ^ (1 << (at % 8));
      const read = readCampaignFile(changed);
      if (read.ok) expect(read.value.damage, `byte ${at}`).not.toBeNull();
    }
  });

  it('readCampaignFile(cut file) yields the whole lines and says how many are missing', () => {
    const lines = text.split('\n');
    const cut = `${lines.slice(0, 3).join('\n')}\n${lines[3]?.slice(0, 20)}`;
    const read = readCampaignFile(bytesOf(cut));
    expect(read.ok && read.value.events).toHaveLength(2);
    expect(read.ok && read.value.damage).toEqual({
      missingLines: 3,
      bad: 1,
      badLines: [{ line: 4, cause: 'not-json', path: '', detail: '' }],
      repeated: 0,
      footer: 'absent'
    });
  });

  it.each([
    ['', 'empty-file', undefined],
    ['PK\u0003\u0004', 'not-a-campaign-file', 'zip'],
    ['<!DOCTYPE html>', 'not-a-campaign-file', 'html'],
    ['a,b,c\n1,2,3', 'not-a-campaign-file', 'csv'],
    ['{"format":"evenload-campaign","version":2}\n', 'newer-file', undefined],
    ['{"format":"evenload-campaign","version":1}\n', 'bad-header', undefined]
  ])('readCampaignFile(%j) says %s', (content, tag, looksLike) => {
    const read = readCampaignFile(bytesOf(content));
    expect(read.ok).toBe(false);
    if (!read.ok) expect(read.error).toMatchObject(looksLike ? { tag, looksLike } : { tag });
  });

  it('readCampaignFile(line with a __proto__ key) refuses that line', () => {
    const lines = text.split('\n');
    lines[3] = (lines[3] ?? '').replace('"data":{', '"data":{"__proto__":{"x":1},');
    const read = readCampaignFile(bytesOf(lines.join('\n')));
    expect(read.ok && read.value.damage?.badLines[0]).toMatchObject({ line: 4, cause: 'hostile-key' });
    expect(({} as { x?: number }).x).toBeUndefined();
  });
});

describe('weighImport', () => {
  it('weighImport(held, file) counts new and known, names contradictions, shares and other bytes', () => {
    const a = story();
    const b = new Recorder(deviceB);
    b.reading(1, 0, 13.5);
    const [created] = a.events;
    if (!created) throw new Error('no event');
    const other = { ...created, who: 'Somebody else' };
    const { summary, added, aside } = weighImport(campaign, a.events, [...a.events, ...b.events, other]);
    expect([summary.added, summary.known, summary.quarantined]).toEqual([1, 5, 1]);
    expect(added).toEqual(b.events);
    expect(aside).toEqual([other]);
    expect(summary.contradictions).toEqual([{ kind: 'two-values', count: 1 }]);
    expect(summary.devices.map(({ device, added, who }) => [device, added, who])).toEqual([
      [deviceB, 1, ['Operator 1']]
    ]);
  });

  it('weighImport(held, file) leads to the state of all events together, whichever of them were held', () => {
    const a = story();
    const b = new Recorder(deviceB);
    b.learn(a.events);
    b.reading(1, 0, 13.5);
    b.reading(1, 1, 14.5);
    const all = [...a.events, ...b.events];
    fc.assert(
      fc.property(fc.subarray(all), fc.shuffledSubarray(all, { minLength: all.length }), (held, file) => {
        const { replay: merged, summary } = weighImport(campaign, held, file);
        expect(canonicalJson(merged.state)).toBe(canonicalJson(replay(all)));
        expect(summary.added + held.length).toBe(all.length);
      }),
      { numRuns: 60 }
    );
  });

  it('weighImport(file in no order) costs far less than the square of its length', () => {
    const a = new Recorder(deviceA).begin();
    for (let n = 0; n < 8_000; n++) a.record('noted', { about: 'shift', session: null, slot: null, text: `note ${n}` });
    const timeOf = (count: number): number => {
      const file = a.events.slice(0, count).toReversed();
      const times = [0, 1, 2].map(() => {
        const began = performance.now();
        expect(weighImport(campaign, [], file).summary.flags).toEqual([]);
        return performance.now() - began;
      });
      return Math.min(...times);
    };
    // Eight times the events: the square of the length would be sixty-four times the time.
    expect(timeOf(8_000)).toBeLessThan(32 * timeOf(1_000));
  });
});
