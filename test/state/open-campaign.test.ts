import 'fake-indexeddb/auto';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { connection } from '#lib/state/database.svelte.ts';
import { library } from '#lib/state/library.svelte.ts';
import { openCampaign, type OpenCampaign } from '#lib/state/open-campaign.svelte.ts';
import { draftsOf } from '#lib/storage/drafts.ts';
import type { Database } from '#lib/storage/schema.ts';

// No other tab here: without Web Locks a tab writes.
beforeEach(() => {
  vi.stubGlobal('navigator', { language: 'en' });
  vi.stubGlobal('document', {
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
    documentElement: { dataset: {} }
  });
});
afterEach(() => vi.unstubAllGlobals());

async function begin(): Promise<OpenCampaign> {
  const made = await library.createCampaign('Invented wall paints');
  if (!made.ok) throw new Error(made.error.tag);
  const opened = await openCampaign(made.value);
  if (!opened.ok) throw new Error(opened.error.tag);
  return opened.value;
}

const note = (text: string) => ({ about: 'campaign', session: null, slot: null, text }) as const;

const kept = async (campaign: OpenCampaign) => {
  const drafts = await draftsOf(connection, campaign.id);
  return drafts.ok ? drafts.value : drafts.error;
};

describe('OpenCampaign', () => {
  it('record(line) takes the draft of the line away with it', async () => {
    const campaign = await begin();
    await campaign.setEntryDraft('entry', '12,3');
    expect((await campaign.record('noted', note('12,3'), { draft: 'entry' })).ok).toBe(true);
    expect(campaign.entryDraft('entry')).toBeUndefined();
    expect(await kept(campaign)).toEqual({});
  });

  it.each(['1', '12,3'])('record(line) leaves the draft %s typed before the line is written', async (next) => {
    const campaign = await begin();
    void campaign.setEntryDraft('entry', '12,3');
    const recorded = campaign.record('noted', note('12,3'), { draft: 'entry' });
    const typed = campaign.setEntryDraft('entry', next);
    expect((await recorded).ok && (await typed).ok).toBe(true);
    expect(campaign.entryDraft('entry')).toBe(next);
    expect(await kept(campaign)).toEqual({ entry: next });
  });

  it('record(line) leaves the draft typed while a line before it is written', async () => {
    const campaign = await begin();
    const first = campaign.record('noted', note('first'), { draft: 'other' });
    void campaign.setEntryDraft('entry', '1');
    const second = campaign.record('noted', note('1'), { draft: 'entry' });
    await first;
    void campaign.setEntryDraft('entry', '2');
    await second;
    expect(campaign.entryDraft('entry')).toBe('2');
    expect(await kept(campaign)).toEqual({ entry: '2' });
  });

  it('record(line) whose write fails leaves the draft of the line where it was', async () => {
    const campaign = await begin();
    await campaign.setEntryDraft('entry', '12,3');
    const full = vi.spyOn(connection, 'write').mockImplementationOnce((operation) =>
      connection.use(async (db) => {
        const refusing = {
          transaction: () => {
            throw new DOMException('no room', 'QuotaExceededError');
          }
        } as unknown as Database;
        void db;
        return operation(refusing, 1);
      })
    );
    const recorded = await campaign.record('noted', note('12,3'), { draft: 'entry' });
    full.mockRestore();
    expect(recorded).toEqual({ ok: false, error: { tag: 'quota' } });
    expect(campaign.entryDraft('entry')).toBe('12,3');
    expect(campaign.unsaved).toHaveLength(1);
    expect(await kept(campaign)).toEqual({ entry: '12,3' });
  });
});
