type Source = 'keypad' | 'keyboard';

/**
 * Keys that come while a reading is still being written: a quick hand or a gauge is ahead of the device. They are kept in
 * order for the readings that are due next; a key that was swallowed would leave another number.
 * Checked by: test/state/bench/typed-ahead.test.ts, test/e2e/bench-checks.spec.ts
 */
export class TypedAhead {
  /** Whole lines, then the one that is not entered yet. */
  #lines: string[] = [''];
  #source: Source = 'keyboard';
  /** Characters of the field that lines before this one have taken. */
  #taken = 0;
  /** Start of the last line that the field does not show. */
  #hidden = '';

  /** The field as it is now, with what stood in it when the writing began. */
  field(text: string, written: string): void {
    if (!text.startsWith(written)) return;
    this.#lines[this.#lines.length - 1] = this.#hidden + text.slice(written.length + this.#taken);
    this.#source = 'keyboard';
  }

  /** A key of the program's own keypad. */
  key(key: string): void {
    const line = this.#lines.at(-1) ?? '';
    if (key.length > 1 && key !== 'Backspace') return;
    this.#lines[this.#lines.length - 1] = key === 'Backspace' ? line.slice(0, -1) : line + key;
    this.#source = 'keypad';
  }

  /** Enter: what comes now belongs to the reading after the next. An Enter behind nothing says nothing. */
  enter(): void {
    const line = this.#lines.at(-1) ?? '';
    if (line === '') return;
    this.#taken += line.length - this.#hidden.length;
    this.#hidden = '';
    this.#lines.push('');
  }

  /** The first of what was typed; null: nothing was. */
  take(): { text: string; entered: boolean; source: Source; rest: string[] } | null {
    const [text = '', ...rest] = this.#lines;
    const source = this.#source;
    this.drop();
    return text === '' ? null : { text, entered: rest.length > 0, source, rest };
  }

  /** Puts back what follows the line that was taken. */
  putBack(rest: readonly string[]): void {
    this.drop();
    if (rest.length > 0) this.#lines = [...rest];
    this.#hidden = rest.at(-1) ?? '';
  }

  drop(): void {
    this.#lines = [''];
    this.#taken = 0;
    this.#hidden = '';
  }
}
