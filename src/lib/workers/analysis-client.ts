import type { AnalysisStage } from '#lib/core/analysis/analyse.ts';
import type { Analysis } from '#lib/core/analysis/analysis-result.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import type { InputFault } from '#lib/core/analysis/reason.ts';
import { fail, type Result } from '#lib/core/result.ts';
import type { AnalysisReply, AnalysisRequest } from './analysis.worker.ts';

export type AnalysisFault = InputFault | { tag: 'aborted' } | { tag: 'worker-died'; detail: string };

export interface AnalysisOptions {
  /** Ends the computation at once. */
  signal?: AbortSignal;
  /** Called when a stage begins. */
  onStage?: (stage: AnalysisStage) => void;
}

type Waiting = (reply: AnalysisReply) => void;

let worker: Worker | null = null;
let next = 0;
const waiting = new Map<number, Waiting>();

/** The worker stays alive between analyses, so that its tables of distributions are built once. */
function start(): Worker {
  const started = new Worker(new URL('./analysis.worker.ts', import.meta.url), { type: 'module' });
  started.onmessage = ({ data }: MessageEvent<AnalysisReply>) => waiting.get(data.id)?.(data);
  started.onerror = (event) => stop({ tag: 'failed', detail: event.message ?? '' });
  started.onmessageerror = () => stop({ tag: 'failed', detail: 'message' });
  return started;
}

/** Ends the worker; whoever still waits is told. */
function stop(why: { tag: 'failed'; detail: string }): void {
  worker?.terminate();
  worker = null;
  const left = [...waiting];
  waiting.clear();
  for (const [id, tell] of left) tell({ id, ...why });
}

/** Analyses observations off the screen's thread. Several calls are answered in turn. */
export function analyseInWorker(
  observations: Observations,
  { signal, onStage }: AnalysisOptions = {}
): Promise<Result<Analysis, AnalysisFault>> {
  return new Promise((resolve) => {
    if (signal?.aborted) return resolve(fail({ tag: 'aborted' }));
    const id = next++;
    const end = (result: Result<Analysis, AnalysisFault>): void => {
      waiting.delete(id);
      signal?.removeEventListener('abort', abort);
      resolve(result);
    };
    const abort = (): void => {
      end(fail({ tag: 'aborted' }));
      // A computation cannot be interrupted: the worker is ended unless another caller still waits for it.
      if (waiting.size === 0) stop({ tag: 'failed', detail: 'aborted' });
    };
    signal?.addEventListener('abort', abort);
    waiting.set(id, (reply) => {
      if (reply.tag === 'stage') onStage?.(reply.stage);
      else if (reply.tag === 'done') end(reply.result);
      else end(fail({ tag: 'worker-died', detail: reply.detail }));
    });
    worker ??= start();
    const request: AnalysisRequest = { id, observations };
    worker.postMessage(request);
  });
}
