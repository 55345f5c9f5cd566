import { describe, expect, it } from 'vitest';
import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import { writeCampaignFile } from '#lib/core/exchange/campaign-file.ts';
import { mayReplace } from '#lib/core/exchange/may-replace.ts';
import { readCampaignFile } from '#lib/core/exchange/read-campaign-file.ts';
import { campaign, deviceA, deviceB, Recorder } from '../campaign/story.ts';

const maker = { campaign, title: 'T', device: deviceA, at: '2026-03-02T08:00:00.000+01:00', app: '0.0.0' };
const story = () => {
  const a = new Recorder(deviceA).begin();
  a.load(1, 0);
  a.reading(1, 0, 12.5);
  return a.events;
};
const textOf = (events: readonly CampaignEvent[], change: Partial<typeof maker> = {}) =>
  writeCampaignFile(events, { ...maker, ...change });
const read = (text: string) => readCampaignFile(new TextEncoder().encode(text));
const whole = (events: readonly CampaignEvent[]) => {
  const file = read(textOf(events));
  if (!file.ok) throw new Error(file.error.tag);
  return file.value;
};

describe('mayReplace', () => {
  const events = story();
  const shorter = events.slice(0, -1);

  it('mayReplace(no file) and mayReplace(file of no bytes) write', () => {
    expect(mayReplace(null, whole(events))).toBe('write');
    expect(mayReplace(read(''), whole(events))).toBe('write');
  });

  it('mayReplace(part of what is held) writes, mayReplace(the same) does not', () => {
    for (let n = 0; n < events.length; n++)
      expect(mayReplace(read(textOf(events.slice(0, n))), whole(events))).toBe('write');
    expect(mayReplace(read(textOf([...events].reverse())), whole(events))).toBe('same');
  });

  it('mayReplace(file with one event more, however many the new one has) leaves it alone', () => {
    expect(mayReplace(read(textOf(events)), whole(shorter))).toBe('holds-more');
    const other = new Recorder(deviceB);
    other.record('noted', { about: 'campaign', session: null, slot: null, text: 'Only in the folder' });
    expect(mayReplace(read(textOf([...events.slice(0, 1), ...other.events])), whole(events))).toBe('holds-more');
  });

  it('mayReplace(anything) never lets a file without events, or a damaged one, be written', () => {
    expect(mayReplace(null, whole([]))).toBe('nothing');
    expect(mayReplace(read(textOf(events)), whole([]))).toBe('nothing');
    const cut = read(textOf(events).slice(0, -20));
    expect(cut.ok && mayReplace(null, cut.value)).toBe('nothing');
  });

  it('mayReplace(another campaign, no campaign file) leaves it alone', () => {
    const other = textOf([], { campaign: campaign.replace(/.$/u, (c) => (c === '1' ? '2' : '1')) });
    expect(mayReplace(read(other), whole(events))).toBe('foreign');
    expect(mayReplace(read('name;value\n1;2\n'), whole(events))).toBe('foreign');
  });

  it('mayReplace(file cut in its last line) writes where all it counted is held, at every length', () => {
    const text = textOf(shorter);
    const header = text.indexOf('\n') + 1;
    for (let end = header; end < text.length - 1; end += 61)
      expect(mayReplace(read(text.slice(0, end)), whole(events)), `cut at ${end}`).toBe('write');
    const longer = textOf(events);
    expect(mayReplace(read(longer.slice(0, longer.length / 2)), whole(shorter))).toBe('holds-more');
  });

  it('mayReplace(file with a line spoiled in the middle) leaves it to a person', () => {
    const lines = textOf(shorter).split('\n');
    lines[2] = '{spoiled';
    expect(mayReplace(read(lines.join('\n')), whole(events))).toBe('foreign');
    const spoiledAndCut = lines.join('\n').slice(0, -50);
    expect(mayReplace(read(spoiledAndCut), whole(events))).toBe('foreign');
  });
});
