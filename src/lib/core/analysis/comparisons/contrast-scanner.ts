const SAME: Readonly<Record<string, string>> = { '−': '-', '–': '-', '·': '*', '×': '*', '∗': '*', '÷': '/', ':': '/' };
const WORD = /[\p{L}\p{N}_]/u;

/** Walks over a typed question: signs, brackets, numbers, names of treatments. */
export class ContrastScanner {
  readonly #text: string;
  readonly #names: { readonly treatment: number; readonly pattern: RegExp; readonly length: number }[];
  #at = 0;

  constructor(text: string, names: readonly string[]) {
    this.#text = text;
    this.#names = names
      .map((name, treatment) => ({ treatment, words: name.trim().split(/\s+/) }))
      .filter(({ words }) => words[0] !== '')
      .map(({ treatment, words }) => ({
        treatment,
        length: words.join(' ').length,
        pattern: new RegExp(words.map(escaped).join('\\s+'), 'iuy')
      }))
      .sort((a, b) => b.length - a.length);
  }

  /** Position of the next character that is not a blank. */
  position(): number {
    while (this.#at < this.#text.length && /\s/.test(this.#text[this.#at]!)) this.#at++;
    return this.#at;
  }

  atEnd(): boolean {
    return this.position() >= this.#text.length;
  }

  /** The next character, signs in their plain form; empty at the end. */
  peek(): string {
    const character = this.#text[this.position()] ?? '';
    return SAME[character] ?? character;
  }

  /** Steps over the character if it comes next. */
  take(character: string): boolean {
    if (this.peek() !== character) return false;
    this.#at++;
    return true;
  }

  /** Whether a name, a number or an opening bracket comes next: two factors side by side are a product. */
  startsFactor(): boolean {
    if (this.atEnd()) return false;
    const back = this.#at;
    const starts = this.peek() === '(' || this.takeName() !== null || this.takeNumber() !== null;
    this.#at = back;
    return starts;
  }

  /** Steps over the longest name that comes next and returns its treatment, or null. */
  takeName(): number | null {
    const at = this.position();
    const quoted = this.#text[at] === '"';
    for (const { treatment, pattern } of this.#names) {
      pattern.lastIndex = quoted ? at + 1 : at;
      const found = pattern.exec(this.#text);
      if (!found) continue;
      const end = pattern.lastIndex;
      if (quoted) {
        if (this.#text[end] !== '"') continue;
        this.#at = end + 1;
        return treatment;
      }
      // Not in the middle of a longer word: "A" is not the start of "Alkyd".
      if (WORD.test(this.#text[end - 1]!) && WORD.test(this.#text[end] ?? ' ')) continue;
      this.#at = end;
      return treatment;
    }
    return null;
  }

  /** As takeName, but leaves a name that is a number and multiplies what follows. */
  takeTreatment(): number | null {
    const back = this.position();
    const treatment = this.takeName();
    if (treatment === null || this.#text[back] === '"') return treatment;
    const number = /^[\d.,\s]+$/.test(this.#text.slice(back, this.#at));
    if (!number || !(this.peek() === '*' || this.startsFactor())) return treatment;
    this.#at = back;
    return null;
  }

  /** Steps over a number and returns it, or null. */
  takeNumber(): number | null {
    const at = this.position();
    if (this.#text[at] === '½') {
      this.#at++;
      return 0.5;
    }
    const number = /(?:\d+(?:[.,]\d+)?|[.,]\d+)/y;
    number.lastIndex = at;
    const found = number.exec(this.#text);
    if (!found || WORD.test(this.#text[number.lastIndex] ?? ' ')) {
      // "2A" is twice A, "2nd" is no number: what follows must be a name.
      if (!found || !this.#nameAt(number.lastIndex)) return null;
    }
    this.#at = number.lastIndex;
    return Number(found[0].replace(',', '.'));
  }

  /** The word that comes next, as typed; empty if none. */
  word(): string {
    const word = /[\p{L}\p{N}_]+/uy;
    word.lastIndex = this.position();
    return word.exec(this.#text)?.[0] ?? '';
  }

  #nameAt(at: number): boolean {
    const back = this.#at;
    this.#at = at;
    const found = this.takeName() !== null;
    this.#at = back;
    return found;
  }
}

function escaped(word: string): string {
  return word.replace(/[\\^$.*+?()[\]{}|/]/g, '\\$&');
}
