/** What the smoke of the main job needs of a browser, the same for every engine. Selectors are CSS. */
export interface Driver {
  readonly engine: string;
  goto(url: string): Promise<void>;
  /** Clicks the first visible element; waits for it. */
  click(selector: string): Promise<void>;
  /** Types into the focused element, key by key; `\n` is Enter. */
  type(text: string): Promise<void>;
  /** Puts text into a field, replacing what is there. */
  fill(selector: string, text: string): Promise<void>;
  /** Runs a function body in the page and returns its (JSON) value. */
  evaluate<T>(body: string): Promise<T>;
  close(): Promise<void>;
}

const deadline = 20_000;

/** Polls until the body is truthy in the page; says what was waited for when it never is. */
export async function waitFor(driver: Driver, what: string, body: string): Promise<void> {
  const end = Date.now() + deadline;
  let last: unknown = null;
  while (Date.now() < end) {
    try {
      last = await driver.evaluate(body);
      if (last) return;
    } catch (error) {
      last = error;
    }
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
  throw new Error(`${driver.engine}: waited ${deadline / 1000} s for ${what}; last answer: ${String(last)}`);
}

/** Text of the first element that matches; empty when there is none. */
export const textOf = (driver: Driver, selector: string): Promise<string> =>
  driver.evaluate(`return document.querySelector(${JSON.stringify(selector)})?.textContent?.trim() ?? ''`);

/** Body that finds the first visible match. */
export const visible = (selector: string): string =>
  `[...document.querySelectorAll(${JSON.stringify(selector)})].find((e) => e.getClientRects().length > 0)`;
