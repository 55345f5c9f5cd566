import { checkCondition } from '#lib/core/campaign/checks/check-condition.ts';
import type { Finding } from '#lib/core/campaign/checks/finding.ts';
import type { DataOf } from '#lib/core/campaign/event.ts';
import { parseReading } from '#lib/core/campaign/parse-reading.ts';
import type { Condition, Plan } from '#lib/core/campaign/plan.ts';
import type { CampaignState, ConditionValue } from '#lib/core/campaign/state.ts';
import type { Book } from './book.ts';

/** One condition as it is typed, understood and checked. */
export interface TypedCondition {
  condition: Condition;
  text: string;
  value: number | null;
  understood: boolean;
  finding: Finding | null;
  because: string;
  /** What the session before had. */
  last: ConditionValue | null;
  /** The text is that of the session before and waits to be confirmed. */
  suggested: boolean;
}

/** Machine settings and the room, once a session, before loading. */
export class Conditions {
  #book: Book;
  #said: (finding: Finding, condition: Condition) => string;
  #session = $state<string | null>(null);
  #texts = $state.raw<Record<string, string>>({});
  #because = $state.raw<Record<string, string>>({});

  constructor(book: Book, said: (finding: Finding, condition: Condition) => string) {
    this.#book = book;
    this.#said = said;
  }

  moveTo(session: string): void {
    if (session === this.#session) return;
    this.#session = session;
    const draft = this.#book.entryDraft(`conditions:${session}`);
    this.#texts = isTexts(draft) ? draft : {};
    this.#because = {};
  }

  get list(): TypedCondition[] {
    const { plan } = this.#book.state;
    return plan ? plan.conditions.map((condition) => this.#typed(plan, condition)) : [];
  }

  /** Every typed value is understood, and one outside its window has its reason. */
  get ready(): boolean {
    return this.list.every(({ understood, finding, because }) => understood && (!finding || because.trim() !== ''));
  }

  type(id: string, text: string): void {
    this.#texts = { ...this.#texts, [id]: text };
    if (this.#session) void this.#book.setEntryDraft(`conditions:${this.#session}`, this.#texts);
  }

  because(id: string, text: string): void {
    this.#because = { ...this.#because, [id]: text };
  }

  /** The event's data; null when no condition was given. */
  get data(): DataOf<'conditions-recorded'> | null {
    const given = this.list.filter(({ text }) => text.trim() !== '');
    if (!this.#session || given.length === 0) return null;
    return {
      session: this.#session,
      values: given.map(({ condition, text, value, finding, because }) => ({
        condition: condition.id,
        raw: text.trim(),
        value,
        raised: finding ? [{ check: 'condition', said: this.#said(finding, condition) }] : [],
        because: finding ? because.trim() : null
      }))
    };
  }

  #typed(plan: Plan, condition: Condition): TypedCondition {
    const typed = this.#texts[condition.id];
    const because = this.#because[condition.id] ?? '';
    const last = lastValue(this.#book.state, this.#session, condition.id);
    const text = typed ?? last?.raw ?? '';
    const known = { condition, text, because, last, suggested: typed === undefined && last !== null };
    if (condition.kind === 'text' || text.trim() === '')
      return { ...known, value: null, understood: true, finding: null };
    const parsed = parseReading(text, { unit: condition.unit });
    const value = parsed.ok && parsed.value.limit === 'none' ? parsed.value.value : null;
    const finding = value === null ? null : checkCondition(condition, value);
    return { ...known, value, understood: value !== null, finding };
  }
}

/** The value of the session that was worked on last before this one. */
function lastValue(state: CampaignState, session: string | null, condition: string): ConditionValue | null {
  const values = state.sessions
    .filter(({ id }) => id !== session)
    .flatMap(({ conditions }) => conditions.filter((value) => value.condition === condition));
  values.sort((a, b) => Date.parse(a.at) - Date.parse(b.at));
  return values.at(-1) ?? null;
}

const isTexts = (draft: unknown): draft is Record<string, string> =>
  typeof draft === 'object' && draft !== null && Object.values(draft).every((text) => typeof text === 'string');
