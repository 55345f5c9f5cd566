import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { RepairRequest } from '#lib/core/design/repair/plan-repair.ts';
import { repairInWorker } from '#lib/workers/plan-repair.ts';
import type { RepairReply } from '#lib/workers/plan-repair.worker.ts';
import { ToldWorker } from './told-worker.ts';

beforeEach(() => vi.stubGlobal('Worker', ToldWorker));
afterEach(() => vi.unstubAllGlobals());

const request: RepairRequest = { treatments: 2, planned: [[0, 1]], kept: [[0]], slots: 2, specimens: null };
const report = { plannedAValue: 2, aValue: null, parts: [], pairs: [], options: [] };

describe('repairInWorker', () => {
  test('repairInWorker(request) hands the question over and the answer back, and ends the worker', async () => {
    const answer = repairInWorker(request);
    expect(ToldWorker.last.asked).toEqual(request);
    ToldWorker.last.say<RepairReply>({ ok: true, report });
    expect(await answer).toEqual({ ok: true, value: report });
    expect(ToldWorker.last.terminated).toBe(true);
  });

  test('repairInWorker(request, signal) ends the worker when it is aborted', async () => {
    const stop = new AbortController();
    const answer = repairInWorker(request, stop.signal);
    stop.abort();
    expect(await answer).toEqual({ ok: false, error: { tag: 'aborted' } });
    expect(ToldWorker.last.terminated).toBe(true);
  });

  test('repairInWorker(request) tells of a worker that died', async () => {
    const answer = repairInWorker(request);
    ToldWorker.last.onerror?.({ message: 'out of memory' });
    expect(await answer).toEqual({ ok: false, error: { tag: 'worker-died', detail: 'out of memory' } });
  });
});
