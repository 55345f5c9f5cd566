import { checkRange } from '#lib/core/campaign/checks/check-range.ts';
import type { Finding } from '#lib/core/campaign/checks/finding.ts';
import type { DataOf } from '#lib/core/campaign/event.ts';
import { parseReading, type ReadingNotUnderstood, type UnderstoodReading } from '#lib/core/campaign/parse-reading.ts';
import type { ReadingDefinition } from '#lib/core/campaign/plan.ts';
import type { CampaignState, ReadingState, RunState } from '#lib/core/campaign/state.ts';

/** A recorded reading put right: a new event that names the old one and says why; both stay. */
export class Correction {
  text = $state('');
  readonly versions: ReadingState['versions'];
  #session: string;
  #run: RunState;
  #definition: ReadingDefinition;
  #repeat: number;
  #current: ReadingState['current'];

  constructor(_state: CampaignState, session: string, run: RunState, definition: ReadingDefinition, repeat: number) {
    const reading = run.readings.find((one) => one.reading === definition.id && one.repeat === repeat);
    this.versions = reading?.versions ?? [];
    this.#current = reading?.current ?? null;
    this.#session = session;
    this.#run = run;
    this.#definition = definition;
    this.#repeat = repeat;
  }

  #parse() {
    const { unit, decimals, mayStopAtLimit } = this.#definition;
    return parseReading(this.text, { unit, decimals, mayStopAtLimit });
  }
  get understood(): UnderstoodReading | null {
    const parsed = this.#parse();
    return parsed.ok ? parsed.value : null;
  }
  get problem(): ReadingNotUnderstood | null {
    const parsed = this.#parse();
    return parsed.ok || parsed.error.tag === 'empty' ? null : parsed.error;
  }
  get findings(): Finding[] {
    const { understood } = this;
    const range = understood && checkRange(understood.value, this.#definition.possible, this.#definition.expected);
    return range ? [range] : [];
  }

  /** The event's data; null while there is no right value or nothing to put right. */
  data(reason: string, said: (finding: Finding) => string): DataOf<'reading-corrected'> | null {
    const { understood } = this;
    if (!understood || !this.#current) return null;
    return {
      session: this.#session,
      slot: this.#run.slot,
      specimen: this.#run.specimen,
      reading: this.#definition.id,
      repeat: this.#repeat,
      raw: this.text,
      value: understood.value,
      limit: understood.limit,
      target: this.#current.event,
      reason,
      raised: this.findings.map((finding) => ({ check: finding.check, said: said(finding) }))
    };
  }
}
