import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { Progress } from '#lib/core/design/propose-types.ts';
import { proposeInWorker } from '#lib/workers/propose-designs.ts';
import type { ProposeReply } from '#lib/workers/propose-designs.worker.ts';
import { request } from '../core/design/propose/request.ts';
import { ToldWorker } from './told-worker.ts';

beforeEach(() => vi.stubGlobal('Worker', ToldWorker));
afterEach(() => vi.unstubAllGlobals());

const progress = { done: 0.3, choices: [{ id: 'search-9' }], recommended: null } as unknown as Progress;

describe('proposeInWorker', () => {
  test('proposeInWorker(request) hands the request over, the progress on, and the answer back', async () => {
    const onProgress = vi.fn();
    const answer = proposeInWorker(request(), { onProgress });
    expect(ToldWorker.last.asked).toEqual(request());
    ToldWorker.last.say<ProposeReply>({ tag: 'progress', progress });
    expect(onProgress).toHaveBeenCalledWith(progress);
    const proposal = { choices: [], recommended: null, smallestBalanced: null, cancelled: false };
    ToldWorker.last.say<ProposeReply>({ tag: 'answer', answer: { ok: true, value: proposal } });
    expect(await answer).toEqual({ ok: true, value: proposal });
    expect(ToldWorker.last.terminated).toBe(true);
  });

  test('proposeInWorker(request) aborted ends the worker and answers with the best so far within 100 ms', async () => {
    const stop = new AbortController();
    const answer = proposeInWorker(request(), { signal: stop.signal });
    ToldWorker.last.say<ProposeReply>({ tag: 'progress', progress });
    const began = performance.now();
    stop.abort();
    const result = await answer;
    expect(performance.now() - began).toBeLessThan(100);
    expect(ToldWorker.last.terminated).toBe(true);
    expect(result).toMatchObject({ ok: true, value: { choices: progress.choices, cancelled: true } });
  });

  test('proposeInWorker(request) that was aborted before starts no worker', async () => {
    const before = ToldWorker.last;
    const result = await proposeInWorker(request(), { signal: AbortSignal.abort() });
    expect(result).toMatchObject({ ok: true, value: { choices: [], cancelled: true } });
    expect(ToldWorker.last).toBe(before);
  });

  test('proposeInWorker(request) says when the worker dies or breaks', async () => {
    const dead = proposeInWorker(request(), {});
    ToldWorker.last.onerror?.({ message: 'no memory' });
    expect(await dead).toEqual({ ok: false, error: { tag: 'worker-died', detail: 'no memory' } });
    const broken = proposeInWorker(request(), {});
    ToldWorker.last.say<ProposeReply>({ tag: 'broken', detail: 'Error: bug' });
    expect(await broken).toEqual({ ok: false, error: { tag: 'worker-died', detail: 'Error: bug' } });
  });
});
