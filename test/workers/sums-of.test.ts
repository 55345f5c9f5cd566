import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { readCampaignFile } from '#lib/core/exchange/read-campaign-file.ts';
import { writeCampaignFile } from '#lib/core/exchange/campaign-file.ts';
import { sumsOf } from '#lib/workers/sums-of.ts';
import { campaign, deviceA, Recorder } from '../core/campaign/story.ts';

const at = '2026-03-02T08:00:00.000+01:00';
const { events } = new Recorder(deviceA).begin();
const text = writeCampaignFile(events, { campaign, title: 'Invented', device: deviceA, at, app: '0' });
const bytesOf = (s: string) => new TextEncoder().encode(s) as Uint8Array<ArrayBuffer>;
const sha256 = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex');

// Source of the sums: Node's own SHA-256 (OpenSSL).
describe('sumsOf', () => {
  it('sumsOf(file) gives the SHA-256 of the file and of all before its footer', async () => {
    const bytes = bytesOf(text);
    const body = bytesOf(text.slice(0, text.lastIndexOf('\n', text.length - 2) + 1));
    expect([...(await sumsOf(bytes))]).toEqual([
      [body.length, sha256(body)],
      [bytes.length, sha256(bytes)]
    ]);
  });

  it('sumsOf(no bytes) is empty; of one line, a lone feed or no feed it is of all, and of nothing', async () => {
    expect((await sumsOf(bytesOf(''))).size).toBe(0);
    for (const one of ['x', '\n', 'x\n', 'xy']) {
      const sums = await sumsOf(bytesOf(one));
      expect([sums.get(0), sums.get(one.length)]).toEqual([sha256(bytesOf('')), sha256(bytesOf(one))]);
    }
  });

  it('readCampaignFile(file, its sums) reads what it reads without them, of a whole, cut, changed or longer file', async () => {
    const files = [text, text.slice(0, -40), text.slice(0, -200), text.replace('"seq":2', '"seq":9'), `${text}{}\n`];
    for (const one of files) {
      const bytes = bytesOf(one);
      const read = readCampaignFile(bytes, () => {}, await sumsOf(bytes));
      expect(read).toEqual(readCampaignFile(bytes));
      expect(read.ok && read.value.sha256).toBe(sha256(bytes));
    }
  });
});
