import { readingAt, type ReadingPlace } from '#lib/core/campaign/steps/due-readings.ts';
import { currentSession, nextStep, type Step } from '#lib/core/campaign/steps/next-step.ts';
import type { DataOf, Kind } from '#lib/core/campaign/event.ts';
import type { Machine, Plan, PlannedSession } from '#lib/core/campaign/plan.ts';
import type { Ruin, RunState, SessionState } from '#lib/core/campaign/state.ts';
import type { Book } from './book.ts';
import { Conditions } from './conditions.svelte.ts';
import { Loading } from './loading.svelte.ts';
import { ReadingEntry, type EntryPlace } from './reading-entry.svelte.ts';
import type { BenchWords } from './bench-words.ts';
import { allChecksFor } from './reading-checks.ts';
import { unusedSpares } from '#lib/core/campaign/steps/unused-spares.ts';

/**
 * One session at the machine: what is due, and the verbs of the person beside it. Everything it knows comes from the
 * record; what it adds is which session and which place the person has turned to.
 */
export class Bench {
  readonly conditions: Conditions;
  readonly loading: Loading;
  readonly entry: ReadingEntry;
  #book: Book;
  #chosenSession = $state<string | null>(null);
  #chosenPlace = $state.raw<(ReadingPlace & { session: string }) | null>(null);
  #busy = $state(false);
  #fault = $state.raw<{ tag: string; again: () => Promise<void> } | null>(null);
  /** The session that was closed last in this tab. */
  #justClosed = $state<string | null>(null);

  #chosenLoad = $state<string | null>(null);
  #operator: () => string;

  constructor(book: Book, words: BenchWords, isWellFormed: (code: string) => boolean, operator: () => string) {
    this.#book = book;
    this.#operator = operator;
    this.conditions = new Conditions(book, words.condition);
    this.loading = new Loading(book, isWellFormed);
    this.entry = new ReadingEntry(book, words, (place, understood) => allChecksFor(book.state, place, understood));
  }

  get plan(): Plan | null {
    return this.#book.state.plan;
  }
  get session(): SessionState | null {
    const { state } = this.#book;
    return state.sessions.find(({ id }) => id === this.#chosenSession) ?? currentSession(state);
  }
  get machine(): Machine | null {
    const id = this.session?.plan.machine;
    return this.plan?.machines.find((machine) => machine.id === id) ?? null;
  }
  get step(): Step {
    const { plan, session } = this;
    if (!plan || !session) return { kind: 'closed' };
    const again = session.runs.find((run) => this.#chosenLoad === `${session.id}/${run.slot}` && !run.ruined);
    return again ? { kind: 'load', slot: again.slot, spare: false } : nextStep(plan, session);
  }
  get busy() {
    return this.#busy || this.entry.writing || this.loading.writing;
  }
  /** The last act that was not written, with how to try again. */
  get fault() {
    return this.#fault;
  }
  get justClosed(): SessionState | null {
    return this.#book.state.sessions.find(({ id, status }) => id === this.#justClosed && status === 'closed') ?? null;
  }

  /** The place that is read now: one the person turned to, else the next due one. */
  get place(): EntryPlace | null {
    const { session, plan, step } = this;
    if (!session || !plan) return null;
    const chosen = this.#chosenPlace;
    const due = 'place' in step ? step.place : null;
    const stillOpen =
      chosen?.session === session.id &&
      due !== null &&
      session.runs.some(
        (run) => run.slot === chosen.slot && !run.ruined && !readingAt(run, chosen.reading, chosen.repeat)?.current
      );
    const place = stillOpen ? chosen : due;
    const run = session.runs.find(({ slot }) => slot === place?.slot);
    const definition = plan.readings.find(({ id }) => id === place?.reading);
    if (!place || !run || !definition) return null;
    const { slot, reading, repeat } = place;
    return { session: session.id, slot, reading, repeat, specimen: run.specimen, definition };
  }

  /** The specimen to be loaded now. */
  get toLoad() {
    const { session, step } = this;
    if (!session || step.kind !== 'load') return null;
    const run = session.runs.find(({ slot }) => slot === step.slot);
    if (!run) return null;
    const spare = step.spare ? (unusedSpares(this.#book.state, run.planned.treatment)[0] ?? null) : null;
    return {
      session: session.id,
      slot: step.slot,
      specimen: spare ?? run.planned.specimen,
      spare: step.spare
    };
  }

  /** Brings the fields in line with what is due; call it whenever that may have changed. */
  follow(): void {
    if (this.session) this.conditions.moveTo(this.session.id);
    if (this.loading.done === this.#chosenLoad) this.#chosenLoad = null;
    this.loading.moveTo(this.toLoad);
    this.entry.moveTo(this.place);
  }

  turnTo(session: string): void {
    this.#chosenSession = session;
    this.#chosenPlace = null;
    this.#justClosed = null;
  }
  turnToPlace(place: ReadingPlace): void {
    if (this.session) this.#chosenPlace = { ...place, session: this.session.id };
  }

  /** Something else may be in a slot that counts as loaded: it is asked anew. */
  turnToLoad(slot: number): void {
    if (this.session) this.#chosenLoad = `${this.session.id}/${slot}`;
  }
  leaveLoad(): void {
    this.#chosenLoad = null;
    this.loading.aside();
  }

  /** Precautions are read and conditions confirmed; the first of a shift opens it. */
  async prepare(): Promise<void> {
    const { session } = this;
    if (!session || !this.conditions.ready) return;
    const { shift } = session.plan;
    const open = this.#book.state.shifts.some((one) => one.shift === shift && one.closed === null);
    if (!open && !(await this.openShift(shift, this.#operator()))) return;
    const conditions = this.conditions.data;
    if (conditions && !(await this.#do('conditions-recorded', conditions, `conditions:${session.id}`))) return;
    await this.#do('precautions-acknowledged', { session: session.id });
  }
  start(): Promise<boolean> {
    const seconds = this.plan?.runSeconds ?? null;
    return this.#inSession((session) => this.#do('session-started', { session, seconds }));
  }
  stop(early: string | null): Promise<boolean> {
    return this.#inSession((session) => this.#do('session-stopped', { session, early }));
  }
  async close(): Promise<void> {
    const { session } = this;
    if (!session || !(await this.#do('session-closed', { session: session.id }))) return;
    this.#justClosed = session.id;
    this.#chosenSession = null;
  }
  async reopen(session: string, reason: string): Promise<void> {
    if (await this.#do('session-reopened', { session, reason })) this.turnTo(session);
  }
  sayMissing(place: ReadingPlace, reason: string): Promise<boolean> {
    const { slot, reading, repeat } = place;
    return this.#inSession((session) => this.#do('reading-missing', { session, slot, reading, repeat, reason }));
  }
  /** A run, or the whole session when the slot is null. */
  ruin(slot: number | null, reason: string): Promise<boolean> {
    return this.#inSession((session) => this.#do('ruined', { session, slot, reason, next: null }));
  }
  /** The way on after ruin: said anew with the way in it, then the first saying is taken back. */
  async goOn(
    ruin: Ruin,
    slot: number | null,
    next: NonNullable<Ruin['next']>,
    session: string,
    added: PlannedSession | null
  ): Promise<boolean> {
    if (next === 'repeat-later') {
      const change = { kind: 'add-session' as const, session: added as PlannedSession };
      if (!added || !(await this.#do('plan-amended', { reason: ruin.reason, change }))) return false;
    }
    return (
      (await this.#do('ruined', { session, slot, reason: ruin.reason, next })) &&
      (await this.#do('undone', { target: ruin.event, reason: '' }))
    );
  }
  reinstate(ruin: Ruin, reason: string): Promise<boolean> {
    return this.#do('reinstated', { target: ruin.event, reason });
  }
  note(about: DataOf<'noted'>['about'], slot: number | null, text: string): Promise<boolean> {
    const session = about === 'run' || about === 'session' ? (this.session?.id ?? null) : null;
    return this.#do('noted', { about, session, slot: about === 'run' ? slot : null, text });
  }
  correct(data: DataOf<'reading-corrected'>): Promise<boolean> {
    return this.#do('reading-corrected', data);
  }
  amend(data: DataOf<'plan-amended'>): Promise<boolean> {
    return this.#do('plan-amended', data);
  }
  openShift(shift: number, operator: string): Promise<boolean> {
    return this.#do('shift-opened', { shift, operator });
  }

  run(slot: number): RunState | null {
    return this.session?.runs.find((run) => run.slot === slot) ?? null;
  }

  #inSession(act: (session: string) => Promise<boolean>): Promise<boolean> {
    const id = this.session?.id;
    return id === undefined ? Promise.resolve(false) : act(id);
  }

  /** Writes one event; what could not be written stays to be tried again. */
  async #do<K extends Kind>(kind: K, data: DataOf<K>, draft?: string): Promise<boolean> {
    this.#busy = true;
    const result = await this.#book.record(kind, data, draft === undefined ? {} : { draft });
    this.#busy = false;
    if (result.ok) this.#fault = null;
    else
      this.#fault = {
        tag: result.error.tag,
        again: async () => void (await this.#do(kind, data, draft))
      };
    if (result.ok && kind !== 'session-closed') this.#justClosed = null;
    return result.ok;
  }
}
