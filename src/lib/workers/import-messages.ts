import type { BadData, Stamp } from '#lib/core/campaign/make-event.ts';
import type { CampaignSummary } from '#lib/core/campaign/summary.ts';
import type { FileFooter, FileHeader } from '#lib/core/exchange/file-schema.ts';
import type { Damage, FileError } from '#lib/core/exchange/read-campaign-file.ts';
import type { ImportSummary } from '#lib/core/exchange/summarise-import.ts';
import type { Result } from '#lib/core/result.ts';
import type { StorageFault } from '#lib/storage/fault.ts';

/** A file that was read and weighed against what is here. Its events stay in the worker. */
export interface ProposedFile {
  header: FileHeader;
  footer: FileFooter | null;
  damage: Damage | null;
  /** Of the whole file. */
  sha256: string;
  summary: ImportSummary;
  /** The campaign is new on this device. */
  isNew: boolean;
}

/** What this device says of an accepted file. */
export interface TakeOrder {
  device: string;
  who: string;
  /** Name of the file. */
  name: string;
  stamp: Stamp;
  /** What is known of where the file comes from, and the fingerprint of the key that signed it. */
  origin: string;
  key: string | null;
}

export interface TakenFile {
  campaign: string;
  added: number;
  /** This device's event that says so. */
  note: { id: string; at: string };
  summary: CampaignSummary;
}

/** The file was moved, changed or taken away before it could be read. */
export type Unreadable = { tag: 'unreadable-file'; detail: string };
export type ReadFault = FileError | StorageFault | Unreadable;
export type TakeFault = StorageFault | BadData;

export type ImportPhase = 'reading' | 'weighing' | 'writing';

export type ImportRequest = { tag: 'read'; file: Blob } | { tag: 'weigh' } | { tag: 'take'; order: TakeOrder };

export type ImportReply =
  | { tag: 'progress'; phase: ImportPhase; done: number }
  /** From now on something may be written; whether it was, the event of this id says. */
  | { tag: 'writing'; note: string }
  | { tag: 'proposed'; result: Result<ProposedFile, ReadFault> }
  | { tag: 'taken'; result: Result<TakenFile, TakeFault> }
  | { tag: 'failed'; detail: string };
