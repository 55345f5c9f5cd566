import type { Result } from '#lib/core/result.ts';
import { putDraft } from '#lib/storage/drafts.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import type { TakenDraft } from '#lib/storage/journal.ts';
import { connection } from './database.svelte.ts';

/** What stands in a field, as a new object at every stroke: the same text typed again is another draft. */
interface Draft {
  readonly value: unknown;
}
type Drafts = Readonly<Record<string, Draft>>;

/**
 * What is typed in a campaign and not recorded yet. The database is never told an old text: each write puts what the
 * field holds at the moment of its transaction, whoever asked for it.
 * Checked by: test/state/open-campaign.test.ts.
 */
export class OpenCampaignDrafts {
  #campaign: string;
  #held = $state.raw<Drafts>({});
  #fault = $state.raw<StorageFault | null>(null);
  #recording = new WeakSet<Draft>();
  /** Writes under way, by name. */
  #writing: Record<string, number> = {};

  constructor(campaign: string, stored: Readonly<Record<string, unknown>>) {
    this.#campaign = campaign;
    this.#held = draftsFrom(stored);
  }

  /** Why the last draft could not be kept; it is still on the screen. */
  get fault(): StorageFault | null {
    return this.#fault;
  }

  get(name: string): unknown {
    return this.#held[name]?.value;
  }

  /** Keeps a plain value under a name; null: nothing. */
  async set(name: string, value: unknown): Promise<Result<void, StorageFault>> {
    this.#held = value === null ? without(this.#held, name) : { ...this.#held, [name]: { value } };
    const kept = await this.#put(name);
    this.#fault = kept.ok ? null : kept.error;
    return kept;
  }

  /**
   * Records what stands under a name at the time of the call. It is gone once the act has been written, and back in the
   * database if that fails; what was typed under the name meanwhile stays either way.
   * @param act writes the event, and the draft as it then stands, in one transaction
   */
  recording<T extends { ok: boolean }>(
    name: string | null,
    act: (taken: TakenDraft | null) => Promise<T>
  ): () => Promise<T> {
    if (name === null) return () => act(null);
    const draft = this.#held[name];
    return async () => {
      if (draft) this.#recording.add(draft);
      let written = false;
      try {
        const done = await act({ name, now: () => this.#toKeep(name) });
        written = done.ok;
        return done;
      } finally {
        const stands = draft !== undefined && this.#held[name] === draft;
        if (draft) this.#recording.delete(draft);
        if (stands && written) this.#held = without(this.#held, name);
        else if (stands) void this.#put(name);
      }
    };
  }

  /** Takes over what another tab has stored, but for what is being written here. */
  adopt(stored: Readonly<Record<string, unknown>>): void {
    const own = Object.entries(this.#held).filter(([name]) => (this.#writing[name] ?? 0) > 0);
    this.#held = { ...draftsFrom(stored), ...Object.fromEntries(own) };
  }

  #toKeep(name: string): unknown {
    const draft = this.#held[name];
    return draft && !this.#recording.has(draft) ? draft.value : null;
  }

  async #put(name: string): Promise<Result<void, StorageFault>> {
    this.#writing[name] = (this.#writing[name] ?? 0) + 1;
    const kept = await putDraft(connection, this.#campaign, name, () => this.#toKeep(name));
    this.#writing[name] = (this.#writing[name] ?? 1) - 1;
    return kept;
  }
}

const draftsFrom = (stored: Readonly<Record<string, unknown>>): Drafts =>
  Object.fromEntries(Object.entries(stored).map(([name, value]) => [name, { value }]));

function without(drafts: Drafts, name: string): Drafts {
  const { [name]: _gone, ...rest } = drafts;
  return rest;
}
