import type { Measurand } from '#lib/core/campaign/plan.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { type MeasurandResult, type ResultFault, resultOf } from './all-results.ts';

/** What is on the screen for one measurand. */
export type ResultsState =
  | { tag: 'waiting'; stage: string; since: number }
  | { tag: 'done'; result: MeasurandResult; milliseconds: number }
  | { tag: 'fault'; fault: ResultFault }
  | { tag: 'cancelled' };

/** The analysis of one measurand as it is computed; a new computation replaces the one before. */
export class Results {
  #state = $state.raw<ResultsState>({ tag: 'waiting', stage: 'start', since: 0 });
  #running: AbortController | null = null;

  get state(): ResultsState {
    return this.#state;
  }

  /** Computes from the record as it stands; resolves when it is done, cancelled or replaced. */
  async compute(campaign: CampaignState, measurand: Measurand): Promise<void> {
    this.#running?.abort();
    const run = new AbortController();
    this.#running = run;
    const since = performance.now();
    const show = (next: ResultsState): void => {
      if (this.#running === run) this.#state = next;
    };
    show({ tag: 'waiting', stage: 'start', since });
    const made = await resultOf(campaign, measurand, {
      signal: run.signal,
      onStage: (stage) => show({ tag: 'waiting', stage, since })
    });
    if (run.signal.aborted) return;
    if (made.ok) show({ tag: 'done', result: made.value, milliseconds: performance.now() - since });
    else show({ tag: 'fault', fault: made.error });
  }

  /** Stops computing; the record is not touched. */
  cancel(): void {
    if (this.#state.tag !== 'waiting') return;
    this.close();
    this.#state = { tag: 'cancelled' };
  }

  close(): void {
    this.#running?.abort();
    this.#running = null;
  }
}
