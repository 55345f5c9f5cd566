import type { CampaignEvent, DataOf, Kind } from '#lib/core/campaign/event.ts';
import type { CampaignState } from '#lib/core/campaign/state.ts';
import type { Result } from '#lib/core/result.ts';

/** What the bench needs of an open campaign; `record` resolves once the event is durably written, or says why it is not. */
export interface Book {
  readonly state: CampaignState;
  record<K extends Kind>(
    kind: K,
    data: DataOf<K>,
    options?: { draft?: string }
  ): Promise<Result<CampaignEvent, { tag: string }>>;
  /** Something typed that is not an event yet. */
  entryDraft(name: string): unknown;
  setEntryDraft(name: string, value: unknown): Promise<unknown>;
}
