import { fail, type Result } from '#lib/core/result.ts';
import type {
  ImportPhase,
  ImportReply,
  ImportRequest,
  ProposedFile,
  ReadFault,
  TakenFile,
  TakeFault,
  TakeOrder
} from './import-messages.ts';

export type WorkerEnd =
  /** Stopped by a person. `note`: the id of the event that would say so, once something may have been written. */
  { tag: 'aborted'; note: string | null } | { tag: 'worker-died'; detail: string; note: string | null };

export interface ImportProgress {
  phase: ImportPhase;
  /** 0 to 1. */
  done: number;
}

/** A file in a worker of its own: reading, weighing and writing never hold up the screen. One request at a time. */
export class ImportWorker {
  #worker: Worker;
  #answer: ((result: Result<never, WorkerEnd> | ImportReply) => void) | null = null;
  #note: string | null = null;
  #ended: WorkerEnd | null = null;
  /** Told how far the request on its way is. */
  onProgress: (progress: ImportProgress) => void = () => {};

  constructor() {
    this.#worker = new Worker(new URL('./import.worker.ts', import.meta.url), { type: 'module' });
    this.#worker.onmessage = ({ data }: MessageEvent<ImportReply>) => this.#hear(data);
    this.#worker.onerror = (event) => this.#die(event.message ?? '');
    this.#worker.onmessageerror = () => this.#die('message');
  }

  /** Reads a file and says what it would bring. */
  propose(file: Blob): Promise<Result<ProposedFile, ReadFault | WorkerEnd>> {
    return this.#ask({ tag: 'read', file }, (reply) => (reply.tag === 'proposed' ? reply.result : null));
  }

  /** The same for the file that was read, against what is held now. */
  weigh(): Promise<Result<ProposedFile, ReadFault | WorkerEnd>> {
    return this.#ask({ tag: 'weigh' }, (reply) => (reply.tag === 'proposed' ? reply.result : null));
  }

  /** Takes the file in, whole or not at all. */
  take(order: TakeOrder): Promise<Result<TakenFile, TakeFault | WorkerEnd>> {
    return this.#ask({ tag: 'take', order }, (reply) => (reply.tag === 'taken' ? reply.result : null));
  }

  /** Ends the worker at once; a request on its way is answered `aborted`. */
  stop(): void {
    this.#end({ tag: 'aborted', note: this.#note });
  }

  #ask<T, E extends { tag: string }>(
    request: ImportRequest,
    read: (reply: ImportReply) => Result<T, E> | null
  ): Promise<Result<T, E | WorkerEnd>> {
    if (this.#ended) return Promise.resolve(fail(this.#ended));
    if (this.#answer) throw new Error(`ImportWorker: asked to ${request.tag} while a request is on its way`);
    return new Promise((resolve) => {
      this.#answer = (heard) => {
        const result = 'ok' in heard ? heard : read(heard);
        if (result === null) return;
        this.#answer = null;
        resolve(result);
      };
      this.#worker.postMessage(request);
    });
  }

  #hear(reply: ImportReply): void {
    if (reply.tag === 'progress') this.onProgress(reply);
    else if (reply.tag === 'writing') this.#note = reply.note;
    else if (reply.tag === 'failed') this.#die(reply.detail);
    else this.#answer?.(reply);
  }

  #die(detail: string): void {
    this.#end({ tag: 'worker-died', detail, note: this.#note });
  }

  #end(why: WorkerEnd): void {
    if (this.#ended) return;
    this.#ended = why;
    this.#worker.terminate();
    this.#answer?.(fail(why));
  }
}
