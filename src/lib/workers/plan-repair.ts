import type { RepairReport, RepairRequest } from '#lib/core/design/repair/plan-repair.ts';
import { fail, ok, type Result } from '#lib/core/result.ts';
import type { RepairReply } from './plan-repair.worker.ts';

export type RepairFault = { tag: 'aborted' } | { tag: 'worker-died'; detail: string };

/**
 * Prices the ways on after ruin off the screen's thread; `signal` ends the worker at once.
 * Checked by: test/workers/plan-repair.test.ts
 */
export function repairInWorker(
  request: RepairRequest,
  signal?: AbortSignal
): Promise<Result<RepairReport, RepairFault>> {
  return new Promise((resolve) => {
    if (signal?.aborted) return resolve(fail({ tag: 'aborted' }));
    const worker = new Worker(new URL('./plan-repair.worker.ts', import.meta.url), { type: 'module' });
    const end = (result: Result<RepairReport, RepairFault>): void => {
      worker.terminate();
      signal?.removeEventListener('abort', abort);
      resolve(result);
    };
    const abort = (): void => end(fail({ tag: 'aborted' }));
    signal?.addEventListener('abort', abort);
    worker.onmessage = ({ data }: MessageEvent<RepairReply>) =>
      end(data.ok ? ok(data.report) : fail({ tag: 'worker-died', detail: data.detail }));
    worker.onerror = (event) => end(fail({ tag: 'worker-died', detail: event.message ?? '' }));
    worker.postMessage(request);
  });
}
