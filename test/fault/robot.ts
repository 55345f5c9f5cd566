import type { Page } from '@playwright/test';

/** What a robot typed and what the page said it had kept. */
export interface Typed {
  /** Every state of the field in order; '' after each Enter. */
  states: string[];
  /** Whole lines that were entered. */
  lines: string[];
}

/**
 * Types numbers and Enter as fast as the browser takes them, until stopped or until the browser dies. Each line is unique, so
 * that a lost or doubled one is seen.
 */
export async function typeUntil(page: Page, prefix: string, stopped: () => boolean): Promise<Typed> {
  const typed: Typed = { states: [''], lines: [] };
  try {
    await page.focus('#entry');
    for (let n = 0; !stopped(); n++) {
      const line = `${prefix}.${n}`;
      let state = '';
      for (const key of line) {
        if (stopped()) return typed;
        state += key;
        typed.states.push(state);
        await page.keyboard.press(key);
      }
      typed.states.push('');
      typed.lines.push(line);
      await page.keyboard.press('Enter');
    }
  } catch {
    // The browser is gone; what was typed up to here stands.
  }
  return typed;
}

/** Lines the page marked as saved. */
export const savedIn = (said: readonly string[]): string[] =>
  said.flatMap((text) => (text.startsWith('mark: saved ') ? [text.slice('mark: saved '.length)] : []));

/**
 * The states of the field that may be found again: from the last one the page said it had kept, on. The page tells of
 * every text in the order typed, so that they are counted: the same beginning of another line is another state.
 */
export function possibleDrafts(typed: Typed, said: readonly string[]): Set<string> {
  const told = said.filter((text) => /^draft: ./.test(text)).length;
  let from = 0;
  for (let left = told, at = 0; left > 0 && at < typed.states.length; at++)
    if (typed.states[at] !== '') {
      from = at;
      left--;
    }
  return new Set(typed.states.slice(from));
}

/** Waits until the page has said of every whole line what became of it. */
export async function allSaid(page: Page, typed: Typed, said: readonly string[]): Promise<void> {
  const open = (): boolean => {
    const words = new Set(said.filter((text) => text.startsWith('mark: ')).flatMap((text) => text.split(' ')));
    return typed.lines.some((line) => !words.has(line));
  };
  for (let n = 0; n < 400 && open(); n++) await page.waitForTimeout(50);
}
