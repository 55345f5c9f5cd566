import type { CampaignEvent, Kind, UnknownEvent } from './event.ts';
import type { Mark } from './state.ts';

export type Of<K extends Kind> = Extract<CampaignEvent, { kind: K }>;

/** Who did it, when, and by which event. */
export const markOf = (event: CampaignEvent | UnknownEvent): Mark => ({
  event: event.id,
  at: event.at,
  who: event.who,
  device: event.device
});

const lasting = new Set<string>([
  'campaign-created',
  'plan-issued',
  'plan-amended',
  'undone',
  'exported',
  'imported',
  'device-fault'
]);

/** Can the act be taken back by an *undone* event? Plans are amended, files stay written, and undo is not undone. */
export const isUndoable = (event: { kind: string }): boolean => !lasting.has(event.kind);
