import type { CampaignEvent } from './event.ts';
import { inOrder } from './in-order.ts';
import { isUndoable, type Of } from './marks.ts';
import type { Decision } from './resolve.ts';

/** An event that says something of another one, or of a contradiction. */
export type Speaking = Of<'undone'> | Of<'reinstated'> | Decision;

export const isSpeaking = (event: CampaignEvent): event is Speaking =>
  event.kind === 'undone' || event.kind === 'reinstated' || event.kind === 'contradiction-decided';

/** What events say of other events: undone, reinstated, decided. It may be said before the other event is here. */
export class SpokenOf {
  #undoing = new Map<string, Of<'undone'>[]>();
  #reinstating = new Map<string, Of<'reinstated'>[]>();
  #decisions = new Map<string, Decision[]>();

  add(event: Speaking): void {
    if (event.kind === 'undone') push(this.#undoing, event.data.target, event);
    else if (event.kind === 'reinstated') push(this.#reinstating, event.data.target, event);
    else push(this.#decisions, event.data.about, event);
  }

  /** Takes an event out again. */
  remove(event: Speaking): void {
    if (event.kind === 'undone') drop(this.#undoing, event.data.target, event);
    else if (event.kind === 'reinstated') drop(this.#reinstating, event.data.target, event);
    else drop(this.#decisions, event.data.about, event);
  }

  get all(): Speaking[] {
    return [...this.#undoing.values(), ...this.#reinstating.values(), ...this.#decisions.values()].flat();
  }

  /** Events spoken of, with what speaks of them. */
  get targets(): [string, CampaignEvent[]][] {
    return [...this.#undoing, ...this.#reinstating];
  }

  /** Does any event speak of this one? */
  speaksOf(id: string): boolean {
    return this.#undoing.has(id) || this.#reinstating.has(id);
  }

  undone = (event: CampaignEvent): boolean => this.#undoing.has(event.id) && isUndoable(event);

  decisionsOn = (key: string): readonly Decision[] =>
    inOrder((this.#decisions.get(key) ?? []).filter((event) => !this.undone(event)));

  reinstatement = (ruin: string): Of<'reinstated'> | undefined =>
    inOrder((this.#reinstating.get(ruin) ?? []).filter((event) => !this.undone(event)))[0];
}

const push = <T>(map: Map<string, T[]>, key: string, value: T): void => {
  map.set(key, [...(map.get(key) ?? []), value]);
};

const drop = <T>(map: Map<string, T[]>, key: string, value: T): void => {
  const left = (map.get(key) ?? []).filter((one) => one !== value);
  if (left.length > 0) map.set(key, left);
  else map.delete(key);
};
