import { SvelteSet } from 'svelte/reactivity';
import { fieldId } from './plan-verbs.ts';

/** Which fields have been left once: a field that was never reached is not scolded. */
export class Touched {
  #ids = new SvelteSet<string>();

  left(field: EventTarget | null): void {
    if (field instanceof HTMLElement && field.id.startsWith('f-')) this.#ids.add(field.id);
  }

  /** Has the field, or one of its parts (the two ends of a range), been left? Whole lists are never scolded. */
  shown(path: string): boolean {
    const id = fieldId(path);
    return this.#ids.has(id) || this.#ids.has(`${id}-min`) || this.#ids.has(`${id}-max`);
  }
}
