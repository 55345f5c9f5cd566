import type { CampaignState } from '#lib/core/campaign/state.ts';
import { repairInWorker } from '#lib/workers/plan-repair.ts';
import type { MeasurandResult } from './all-results.ts';
import { repairFacts, type RepairFacts, repairQuestion } from './repair-facts.ts';

/** What ruin has cost and the ways on, as far as it is known. */
export type RepairState =
  | { tag: 'nothing' }
  | { tag: 'computing'; lostRuns: number }
  | { tag: 'done'; facts: RepairFacts }
  | { tag: 'failed'; lostRuns: number; detail: string };

/** The ways on after ruin as they are priced in a worker; a new question replaces the one before. */
export class Repair {
  #state = $state.raw<RepairState>({ tag: 'nothing' });
  #running: AbortController | null = null;

  get state(): RepairState {
    return this.#state;
  }

  async compute(campaign: CampaignState, { input, analysis }: MeasurandResult): Promise<void> {
    this.close();
    const question = repairQuestion(campaign, input);
    if (question === null) {
      this.#state = { tag: 'nothing' };
      return;
    }
    const { lostRuns } = question;
    const run = new AbortController();
    this.#running = run;
    this.#state = { tag: 'computing', lostRuns };
    const made = await repairInWorker(question.request, run.signal);
    if (run.signal.aborted) return;
    if (made.ok) {
      const sigma = analysis.fixed.ok ? analysis.fixed.value.sigma : null;
      const ids = input.treatments.map(({ id }) => id);
      this.#state = { tag: 'done', facts: repairFacts(question, made.value, sigma, ids) };
    } else
      this.#state = {
        tag: 'failed',
        lostRuns,
        detail: made.error.tag === 'worker-died' ? made.error.detail : made.error.tag
      };
  }

  close(): void {
    this.#running?.abort();
    this.#running = null;
  }
}
