import type {
  DesignChoice,
  DesignRequest,
  Progress,
  ProposeError,
  Proposal,
  Reason
} from '#lib/core/design/propose-types.ts';
import { proposeInWorker } from '#lib/workers/propose-designs.ts';

/** Waits so long after the last change before a search begins. */
const pause = 250;
/** Shows what is found at most so often: a better design every few milliseconds would only flicker. */
const rest = 200;

/** The search for designs that answers the request as it stands: started anew at every change, cancelled at will. */
export class DesignSearch {
  #choices = $state.raw<readonly DesignChoice[]>([]);
  #recommended = $state.raw<{ id: string; reason: Reason } | null>(null);
  #smallestBalanced = $state.raw<Proposal['smallestBalanced']>(null);
  #error = $state.raw<ProposeError | null>(null);
  #status = $state<'idle' | 'running' | 'done' | 'cancelled' | 'failed'>('idle');
  #done = $state(0);
  #treatments = $state(0);
  #question = '';
  #timer: ReturnType<typeof setTimeout> | undefined;
  #running: AbortController | null = null;
  #latest: Progress | null = null;
  #shown = 0;

  get choices(): readonly DesignChoice[] {
    return this.#choices;
  }
  get recommended() {
    return this.#recommended;
  }
  get smallestBalanced() {
    return this.#smallestBalanced;
  }
  get error() {
    return this.#error;
  }
  get status() {
    return this.#status;
  }
  /** How many treatments the choices are for. */
  get treatments() {
    return this.#treatments;
  }
  /** 0 … 1 */
  get done() {
    return this.#done;
  }

  /** Asks for designs; the same question again changes nothing. Returns true when it is a new one. */
  ask(request: DesignRequest | null): boolean {
    const question = request === null ? '' : JSON.stringify(request);
    if (question === this.#question) return false;
    this.stop();
    this.#question = question;
    this.#choices = [];
    this.#recommended = null;
    this.#smallestBalanced = null;
    this.#error = null;
    this.#done = 0;
    this.#treatments = request?.treatments ?? 0;
    this.#status = request === null ? 'idle' : 'running';
    if (request !== null) this.#timer = setTimeout(() => void this.#run(request), pause);
    return true;
  }

  async #run(request: DesignRequest): Promise<void> {
    const running = new AbortController();
    this.#running = running;
    const answer = await proposeInWorker(request, {
      signal: running.signal,
      onProgress: (progress) => {
        if (this.#running === running) this.#take(progress);
      }
    });
    if (this.#running !== running) return;
    this.#running = null;
    this.#latest = null;
    if (!answer.ok) {
      if (answer.error.tag === 'worker-died') this.#status = 'failed';
      else {
        this.#error = answer.error;
        this.#status = 'done';
      }
      return;
    }
    this.#choices = answer.value.choices;
    this.#recommended = answer.value.recommended;
    this.#smallestBalanced = answer.value.smallestBalanced;
    this.#status = answer.value.cancelled ? 'cancelled' : 'done';
  }

  #take(progress: Progress): void {
    const wait = this.#shown + rest - performance.now();
    if (this.#latest === null) setTimeout(() => this.#show(), Math.max(0, wait));
    this.#latest = progress;
  }

  #show(): void {
    if (this.#latest === null) return;
    const { done, choices, recommended } = this.#latest;
    this.#latest = null;
    this.#shown = performance.now();
    this.#done = done;
    this.#choices = choices;
    this.#recommended = recommended;
  }

  /** Ends the search and keeps the best so far. */
  cancel(): void {
    if (this.#running === null) return;
    this.#status = 'cancelled';
    this.#running.abort();
  }

  /** Ends the search without a word: another question follows, or the page goes. */
  stop(): void {
    clearTimeout(this.#timer);
    this.#running?.abort();
    this.#running = null;
    this.#latest = null;
  }
}
