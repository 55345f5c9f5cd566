import type { Measurand } from '#lib/core/campaign/plan.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import { type MeasurandResult, primaryFirst, type ResultFault, resultOf } from './all-results.ts';

/** A measurand that has no analysis, and why. */
export interface MeasurandFault {
  measurand: Measurand;
  fault: ResultFault;
}

/** The results of every measurand of a plan, the primary first, as far as they are known. */
export type SeveralState =
  | { tag: 'nothing' }
  | { tag: 'computing'; known: number; all: number }
  | { tag: 'done'; results: MeasurandResult[]; faults: MeasurandFault[] };

/** The measurands that are not on the screen, analysed in turn, each for itself; what is known of a record is kept. */
export class SeveralResults {
  #state = $state.raw<SeveralState>({ tag: 'nothing' });
  #running: AbortController | null = null;
  #record: CampaignState | null = null;
  #known: MeasurandResult[] = [];

  get state(): SeveralState {
    return this.#state;
  }

  /**
   * Computes what is missing beside the result on the screen, from the record that one was computed from.
   * Stays at `nothing` for a plan with one measurand.
   */
  async compute(record: CampaignState, shown: MeasurandResult): Promise<void> {
    this.pause();
    const measurands = primaryFirst(record);
    if (measurands.length < 2) {
      this.#state = { tag: 'nothing' };
      return;
    }
    if (record !== this.#record) this.#known = [];
    this.#record = record;
    const find = (id: string): MeasurandResult | undefined => this.#known.find((one) => one.measurand.id === id);
    if (!find(shown.measurand.id)) this.#known.push(shown);
    const run = new AbortController();
    this.#running = run;
    const faults: MeasurandFault[] = [];
    for (const measurand of measurands) {
      if (find(measurand.id)) continue;
      this.#state = { tag: 'computing', known: this.#known.length, all: measurands.length };
      const made = await resultOf(record, measurand, { signal: run.signal });
      if (run.signal.aborted) return;
      if (made.ok) this.#known.push(made.value);
      else faults.push({ measurand, fault: made.error });
    }
    const results = measurands.flatMap(({ id }) => find(id) ?? []);
    this.#state = { tag: 'done', results, faults };
  }

  /** Stops computing, so that the measurand a person asks for need not wait; what is known is kept. */
  pause(): void {
    this.#running?.abort();
    this.#running = null;
  }
}
