import type { LayoutRequest } from '#lib/core/design/lay-out-plan.ts';
import { fail, ok, type Result } from '#lib/core/result.ts';
import type { Drawn, LayOutReply } from './lay-out.worker.ts';

export type { Drawn };
export type LayOutFault =
  | { tag: 'aborted' }
  /** The request contradicts itself: a design that does not fit the machines. */
  | { tag: 'contradicts'; detail: string }
  | { tag: 'worker-died'; detail: string };

/** Draws a loading order off the screen's thread; `signal` ends the worker at once. */
export function layOut(request: LayoutRequest, signal?: AbortSignal): Promise<Result<Drawn, LayOutFault>> {
  return new Promise((resolve) => {
    if (signal?.aborted) return resolve(fail({ tag: 'aborted' }));
    const worker = new Worker(new URL('./lay-out.worker.ts', import.meta.url), { type: 'module' });
    const end = (result: Result<Drawn, LayOutFault>) => {
      worker.terminate();
      signal?.removeEventListener('abort', abort);
      resolve(result);
    };
    const abort = () => end(fail({ tag: 'aborted' }));
    signal?.addEventListener('abort', abort);
    worker.onmessage = ({ data }: MessageEvent<LayOutReply>) =>
      end(data.ok ? ok(data.drawn) : fail({ tag: 'contradicts', detail: data.detail }));
    worker.onerror = (event) => end(fail({ tag: 'worker-died', detail: event.message ?? '' }));
    worker.postMessage(request);
  });
}
