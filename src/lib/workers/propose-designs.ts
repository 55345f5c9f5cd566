import type { DesignRequest, Progress, ProposeError, Proposal } from '#lib/core/design/propose-types.ts';
import { fail, ok } from '#lib/core/result.ts';
import type { Result } from '#lib/core/result.ts';
import type { ProposeReply } from './propose-designs.worker.ts';

/** The worker could not be started, or died on the way. */
export interface WorkerDied {
  tag: 'worker-died';
  detail: string;
}

/**
 * Returns what `proposeDesigns` returns, computed off the screen's thread.
 *
 * An abort ends the worker at once and resolves with the best that was reported so far (`cancelled: true`), so it takes no
 * longer than a message.
 *
 * **Checked by** test/workers/propose-designs.test.ts, test/e2e/same-design.spec.ts
 */
export function proposeInWorker(
  request: DesignRequest,
  { signal, onProgress }: { signal?: AbortSignal | undefined; onProgress?: ((progress: Progress) => void) | undefined }
): Promise<Result<Proposal, ProposeError | WorkerDied>> {
  return new Promise((resolve) => {
    let latest: Progress = { done: 0, choices: [], recommended: null };
    const soFar = () => {
      const { choices, recommended } = latest;
      return ok<Proposal>({ choices, recommended, smallestBalanced: null, cancelled: true });
    };
    if (signal?.aborted) return resolve(soFar());
    const worker = new Worker(new URL('./propose-designs.worker.ts', import.meta.url), { type: 'module' });
    const end = (result: Result<Proposal, ProposeError | WorkerDied>) => {
      worker.terminate();
      signal?.removeEventListener('abort', abort);
      resolve(result);
    };
    const abort = () => end(soFar());
    signal?.addEventListener('abort', abort);
    worker.onmessage = ({ data }: MessageEvent<ProposeReply>) => {
      if (data.tag === 'progress') {
        latest = data.progress;
        onProgress?.(latest);
      } else if (data.tag === 'answer') end(data.answer);
      else end(fail({ tag: 'worker-died', detail: data.detail }));
    };
    worker.onerror = (event) => end(fail({ tag: 'worker-died', detail: event.message || 'the worker did not start' }));
    worker.postMessage(request);
  });
}
