import { checkLoad, type LoadVerdict } from '#lib/core/campaign/checks/check-load.ts';
import type { DataOf } from '#lib/core/campaign/event.ts';
import type { Book } from './book.ts';

type How = DataOf<'specimen-loaded'>['how'];

/** The slot that is loaded now and the specimen that belongs there. */
export interface LoadPlace {
  session: string;
  slot: number;
  specimen: string;
  /** A spare follows a ruined run here. */
  spare: boolean;
}

/**
 * Putting specimens in: tapped, scanned or typed. What is not the planned specimen of the slot is not recorded before a
 * person has said what is really there.
 */
export class Loading {
  #book: Book;
  #isWellFormed: (code: string) => boolean;
  #place = $state.raw<LoadPlace | null>(null);
  #text = $state('');
  #verdict = $state.raw<LoadVerdict | null>(null);
  #how: How = 'typed';
  #writing = $state(false);
  #fault = $state.raw<{ tag: string } | null>(null);
  #lastScan = -Infinity;
  #done = $state<string | null>(null);

  constructor(book: Book, isWellFormed: (code: string) => boolean) {
    this.#book = book;
    this.#isWellFormed = isWellFormed;
  }

  /** `session/slot` that was loaded last. */
  get done() {
    return this.#done;
  }
  get text() {
    return this.#text;
  }
  get place() {
    return this.#place;
  }
  /** What is wrong with the code in hand; null when nothing is. */
  get verdict() {
    return this.#verdict;
  }
  get writing() {
    return this.#writing;
  }
  get fault() {
    return this.#fault;
  }

  moveTo(place: LoadPlace | null): void {
    const same = place?.session === this.#place?.session && place?.slot === this.#place?.slot;
    this.#place = place;
    if (same) return;
    if (place && this.#done === `${place.session}/${place.slot}`) this.#done = null;
    this.#text = '';
    this.#verdict = null;
    this.#fault = null;
  }

  type(text: string): void {
    this.#text = text;
  }

  /** Enter in the field: a code, or nothing at all, which confirms the planned specimen. `now` in milliseconds. */
  async enter(now: number): Promise<void> {
    if (this.#text.trim() !== '') {
      this.#lastScan = now;
      return this.offer(this.#text, 'typed');
    }
    // Some hand scanners send two line ends: the second must not confirm the next slot.
    if (now - this.#lastScan > 400) await this.confirm();
  }

  /** The planned specimen is in the slot. */
  async confirm(): Promise<void> {
    if (this.#place) await this.#load(this.#place.slot, this.#place.specimen, 'tap', this.#spareReason());
  }

  /** A code as scanned or typed. */
  async offer(code: string, how: How): Promise<void> {
    const place = this.#place;
    if (!place || this.#writing) return;
    const verdict = checkLoad(this.#book.state, place.session, place.slot, code, this.#isWellFormed);
    this.#how = how;
    const spareFits = place.spare && verdict.kind === 'spare' && verdict.fits;
    if ((verdict.kind === 'as-planned' && !place.spare) || spareFits)
      return this.#load(place.slot, verdict.code, how, spareFits ? this.#spareReason() : null);
    this.#verdict = verdict;
    this.#text = '';
  }

  /** It belongs into another slot of this session and goes there. */
  async putThere(): Promise<void> {
    const verdict = this.#verdict;
    if (verdict?.kind === 'other-slot') await this.#load(verdict.place.slot, verdict.code, this.#how, null);
  }

  /** It is what really is in this slot. */
  async really(because: string): Promise<void> {
    if (this.#verdict && this.#place) await this.#load(this.#place.slot, this.#verdict.code, this.#how, because);
  }

  /** The wrong specimen is put aside. */
  aside(): void {
    this.#verdict = null;
    this.#text = '';
  }

  #spareReason = () => (this.#place?.spare === true ? 'spare' : null);

  async #load(slot: number, specimen: string, how: How, because: string | null): Promise<void> {
    const place = this.#place;
    if (!place || this.#writing) return;
    this.#writing = true;
    this.#fault = null;
    const data = { session: place.session, slot, specimen, how, because };
    const result = await this.#book.record('specimen-loaded', data);
    this.#writing = false;
    if (result.ok) {
      this.#done = `${place.session}/${place.slot}`;
      this.aside();
    } else this.#fault = result.error;
  }
}
