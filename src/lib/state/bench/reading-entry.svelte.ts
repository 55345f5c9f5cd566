import type { DataOf } from '#lib/core/campaign/event.ts';
import { parseReading, type ReadingNotUnderstood, type UnderstoodReading } from '#lib/core/campaign/parse-reading.ts';
import type { Finding, SlipCandidate } from '#lib/core/campaign/checks/finding.ts';
import type { ReadingDefinition } from '#lib/core/campaign/plan.ts';
import { placeKey, type ReadingPlace } from '#lib/core/campaign/steps/due-readings.ts';
import type { Book } from './book.ts';
import { TypedAhead } from './typed-ahead.ts';

type Source = DataOf<'reading-recorded'>['source'];

/** One place of one session, with all that is known about what is read there. */
export interface EntryPlace extends ReadingPlace {
  session: string;
  specimen: string;
  definition: ReadingDefinition;
}

/** A value that a check spoke about and that is not written yet. */
export interface Doubt {
  understood: UnderstoodReading;
  raw: string;
  findings: Finding[];
  candidates: SlipCandidate[];
}

export interface SavedReading {
  slot: number;
  definition: ReadingDefinition;
  understood: UnderstoodReading;
}

export interface EntryWords {
  finding: (finding: Finding, definition: ReadingDefinition) => string;
  slipTaken: (typed: string, taken: number, definition: ReadingDefinition) => string;
}

/**
 * The number being typed for the due reading: understood or asked about, checked, written, and only then said to be saved. What is
 * typed survives a reload as a draft; what could not be written stays in the field.
 */
export class ReadingEntry {
  #book: Book;
  #words: EntryWords;
  #check: (place: EntryPlace, understood: UnderstoodReading) => Promise<Finding[]>;
  #text = $state('');
  #problem = $state.raw<ReadingNotUnderstood | null>(null);
  #doubt = $state.raw<Doubt | null>(null);
  #writing = $state(false);
  #fault = $state.raw<{ tag: string } | null>(null);
  #saved = $state.raw<SavedReading | null>(null);
  #place = $state.raw<EntryPlace | null>(null);
  #source: Source = 'keyboard';
  #line = '';
  readonly #ahead = new TypedAhead();
  /** When it was read, for readings that come from paper. */
  readAt = $state<string | null>(null);

  constructor(
    book: Book,
    words: EntryWords,
    check: (place: EntryPlace, understood: UnderstoodReading) => Promise<Finding[]>
  ) {
    this.#book = book;
    this.#words = words;
    this.#check = check;
  }

  get text() {
    return this.#text;
  }
  get problem() {
    return this.#problem;
  }
  get doubt() {
    return this.#doubt;
  }
  get writing() {
    return this.#writing;
  }
  get fault() {
    return this.#fault;
  }
  get saved() {
    return this.#saved;
  }
  get place() {
    return this.#place;
  }
  /** What the text means at present; null while it is not one number. */
  get understood(): UnderstoodReading | null {
    if (!this.#place || this.#text === '') return null;
    const parsed = this.#parse(this.#text, this.#place);
    return parsed.ok ? parsed.value : null;
  }

  /** The place that is due now; a draft typed there before is taken up again. */
  moveTo(place: EntryPlace | null): void {
    if (nameOf(place) === nameOf(this.#place)) {
      this.#place = place;
      return;
    }
    this.#place = place;
    const draft = place ? this.#book.entryDraft(nameOf(place)) : null;
    this.#text = typeof draft === 'string' ? draft : '';
    this.#source = 'keyboard';
    this.#problem = null;
    this.#doubt = null;
    this.#fault = null;
    this.#goOn();
  }

  /** The text as the field holds it after a keystroke. */
  type(text: string): void {
    if (this.#writing) this.#ahead.field(text, this.#text);
    else this.#set(text, 'keyboard');
  }

  /** A key of the program's own keypad. */
  press(key: string): void {
    if (this.#writing) return this.#ahead.key(key);
    const fresh = this.#doubt ? '' : this.#text;
    const source: Source = fresh === '' || this.#source === 'keypad' ? 'keypad' : 'keyboard';
    if (key === 'Backspace') this.#set([...this.#text].slice(0, -1).join(''), source);
    else if (key === 'sign') this.#set(fresh.startsWith('-') ? fresh.slice(1) : `-${fresh}`, source);
    else if (key === 'at-least') this.#set(fresh.startsWith('≥') ? fresh.slice(1) : `≥${fresh}`, source);
    else this.#set(fresh + key, source);
  }

  /** A stable line of a gauge: the number in it, and the line to the letter. */
  async receive(text: string, line: string): Promise<void> {
    if (this.#writing || this.#doubt || !this.#place) return;
    this.#set(text, 'serial');
    this.#line = line;
    await this.enter();
  }

  /** Enter: understood and not doubted, it is written. */
  async enter(): Promise<void> {
    const place = this.#place;
    if (this.#writing) this.#ahead.enter();
    if (!place || this.#writing) return;
    const parsed = this.#parse(this.#text, place);
    if (!parsed.ok) {
      this.#problem = parsed.error;
      return;
    }
    await this.#offer(place, parsed.value, this.#text);
  }

  /** One of the two meanings of an ambiguous text. */
  async mean(understood: UnderstoodReading): Promise<void> {
    if (this.#place && !this.#writing) await this.#offer(this.#place, understood, this.#text);
  }

  /** The doubted value is kept, with a reason. */
  async keep(because: string): Promise<void> {
    const doubt = this.#doubt;
    if (!doubt || !this.#place || this.#writing) return;
    await this.#write(this.#place, doubt.understood, doubt.raw, doubt.findings, because);
  }

  /** A likely slip is put right by one tap: what was typed is kept in the words of the check. */
  async take(candidate: SlipCandidate): Promise<void> {
    const doubt = this.#doubt;
    const place = this.#place;
    if (!doubt || !place || this.#writing) return;
    const plain = String(candidate.value);
    const said = this.#words.slipTaken(doubt.raw, candidate.value, place.definition);
    await this.#write(place, { value: candidate.value, plain, limit: doubt.understood.limit }, plain, [], null, [
      { check: 'slip', said }
    ]);
  }

  /** The doubted value is thrown away, to be entered again. */
  again(): void {
    this.#doubt = null;
    this.#set('', 'keyboard');
  }

  #parse(text: string, place: EntryPlace) {
    const { unit, decimals, mayStopAtLimit } = place.definition;
    return parseReading(text, { unit, decimals, mayStopAtLimit, separatorIsDecimal: this.#source === 'keypad' });
  }

  #set(text: string, source: Source): void {
    this.#text = text;
    this.#source = source;
    this.#line = '';
    this.#problem = null;
    this.#doubt = null;
    this.#fault = null;
    if (this.#place) void this.#book.setEntryDraft(nameOf(this.#place), text === '' ? null : text);
  }

  async #offer(place: EntryPlace, understood: UnderstoodReading, raw: string): Promise<void> {
    this.#problem = null;
    this.#writing = true;
    const findings = await this.#check(place, understood);
    this.#writing = false;
    if (findings.length === 0) return this.#write(place, understood, raw, [], null);
    const candidates = findings.flatMap((finding) => (finding.check === 'slip' ? finding.candidates : []));
    this.#ahead.drop();
    this.#doubt = { understood, raw, findings, candidates };
  }

  async #write(
    place: EntryPlace,
    understood: UnderstoodReading,
    raw: string,
    findings: Finding[],
    because: string | null,
    told: DataOf<'reading-recorded'>['raised'] = []
  ): Promise<void> {
    this.#writing = true;
    this.#fault = null;
    const result = await this.#book.record(
      'reading-recorded',
      {
        session: place.session,
        slot: place.slot,
        specimen: place.specimen,
        reading: place.reading,
        repeat: place.repeat,
        raw: this.#line === '' ? raw : this.#line,
        value: understood.value,
        limit: understood.limit,
        source: this.readAt === null ? this.#source : 'paper',
        readAt: this.readAt,
        raised: [
          ...told,
          ...findings.map((finding) => ({ check: finding.check, said: this.#words.finding(finding, place.definition) }))
        ],
        because
      },
      { draft: nameOf(place) }
    );
    this.#writing = false;
    if (!result.ok) {
      this.#ahead.drop();
      this.#fault = result.error;
      return;
    }
    this.#saved = { slot: place.slot, definition: place.definition, understood };
    this.#doubt = null;
    this.#problem = null;
    if (nameOf(this.#place) === nameOf(place)) {
      this.#text = '';
      this.#line = '';
    } else this.#goOn();
  }

  /** What was typed while the reading before was being written belongs to the one that is due now. */
  #goOn(): void {
    if (this.#writing) return;
    const next = this.#place ? this.#ahead.take() : null;
    if (!next) return this.#ahead.drop();
    this.#set(next.text, next.source);
    if (!next.entered) return;
    void this.enter();
    // A line that is asked about stops what follows it: the next place is not certain.
    if (this.writing) this.#ahead.putBack(next.rest);
  }
}

const nameOf = (place: EntryPlace | null) => (place ? `reading:${place.session}/${placeKey(place)}` : '');
