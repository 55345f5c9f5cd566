import type { Analysis, InputFault } from '#lib/core/analysis/analysis-result.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import type { ObservedRow } from '#lib/core/campaign/observations-of.ts';
import type { Measurand } from '#lib/core/campaign/plan.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import type { FormulaError } from '#lib/formula/formula-error.ts';
import { analysisInput, observedRows } from './analysis-input.ts';

export type ResultsFault = InputFault | FormulaError | { tag: 'worker-failed'; detail: string };

/** What is on the screen for one measurand. */
export type ResultsState =
  | { tag: 'waiting'; stage: string; since: number }
  | { tag: 'done'; input: Observations; observed: ObservedRow[]; analysis: Analysis; milliseconds: number }
  | { tag: 'fault'; fault: ResultsFault }
  | { tag: 'cancelled' };

/** Runs an analysis off the screen's thread. */
export type Analyse = (
  input: Observations,
  options: { signal: AbortSignal; onStage: (stage: string) => void }
) => Promise<{ ok: true; value: Analysis } | { ok: false; error: ResultsFault }>;

/** The analysis of one measurand as it is computed; a new computation replaces the one before. */
export class Results {
  #state = $state.raw<ResultsState>({ tag: 'waiting', stage: 'start', since: 0 });
  #running: AbortController | null = null;
  readonly #analyse: Analyse;

  constructor(analyse: Analyse) {
    this.#analyse = analyse;
  }

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
      if (!run.signal.aborted) this.#state = next;
    };
    show({ tag: 'waiting', stage: 'start', since });
    const rows = await observedRows(campaign, measurand);
    if (!rows.ok) return show({ tag: 'fault', fault: rows.error });
    const input = analysisInput(campaign, measurand, rows.value);
    try {
      const made = await this.#analyse(input, {
        signal: run.signal,
        onStage: (stage) => show({ tag: 'waiting', stage, since })
      });
      if (!made.ok) return show({ tag: 'fault', fault: made.error });
      const milliseconds = performance.now() - since;
      show({ tag: 'done', input, observed: rows.value, analysis: made.value, milliseconds });
    } catch (error) {
      const detail = error instanceof Error ? error.message : String(error);
      show({ tag: 'fault', fault: { tag: 'worker-failed', detail } });
    }
  }

  /** Stops computing; the record is not touched. */
  cancel(): void {
    if (this.#state.tag !== 'waiting') return;
    this.#running?.abort();
    this.#running = null;
    this.#state = { tag: 'cancelled' };
  }

  close(): void {
    this.#running?.abort();
  }
}
