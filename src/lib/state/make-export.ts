import type { CampaignEvent, UnknownEvent } from '#lib/core/campaign/event.ts';
import { closeFile, fileBody } from '#lib/core/exchange/campaign-file.ts';
import { type CampaignFile, type FileError, readCampaignFile } from '#lib/core/exchange/read-campaign-file.ts';
import { fail, ok, type Result } from '#lib/core/result.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import { load } from '#lib/storage/journal.ts';
import { connection } from './database.svelte.ts';
import { device } from './device.svelte.ts';
import { signFile, type SigningFault } from './signing.ts';
import { timeNow } from './surroundings.ts';

/** A campaign file that was read back and found whole. */
export interface ExportedFile {
  blob: Blob;
  name: string;
  /** Of the whole file. */
  sha256: string;
  events: number;
  /** Sequence number of this device's last event in it. */
  upTo: number;
  bytes: number;
  /** Why it bears no signature; null when it does. */
  unsigned: SigningFault | null;
}

/** Why there is no file that can be trusted. */
export type ExportFault =
  | StorageFault
  | { tag: 'unreadable-records'; count: number }
  | { tag: 'read-back-failed'; error: FileError | null; file: CampaignFile | null };

/** Makes the file from what the database holds (not from memory), reads it back, counts and hashes it. */
export async function makeExport(campaign: string, title: string): Promise<Result<ExportedFile, ExportFault>> {
  const loaded = await load(connection, campaign, true);
  if (!loaded.ok) return loaded;
  const { events, unreadable } = loaded.value;
  if (unreadable.length > 0) return fail({ tag: 'unreadable-records', count: unreadable.length });
  return fileOf(events, campaign, title);
}

/** A file of given events, read back, counted and hashed. */
export async function fileOf(
  events: readonly (CampaignEvent | UnknownEvent)[],
  campaign: string,
  title: string
): Promise<Result<ExportedFile, ExportFault>> {
  const at = timeNow();
  const maker = { campaign, title, device: device.id, at, app: __APP_VERSION__ };
  const body = fileBody(events, maker);
  const signature = await signFile(maker, body);
  const blob = new Blob([closeFile(body, signature.ok ? signature.value : null)], { type: 'application/jsonl' });
  const read = readCampaignFile(new Uint8Array(await blob.arrayBuffer()));
  if (!read.ok) return fail({ tag: 'read-back-failed', error: read.error, file: null });
  const { damage, events: found, sha256 } = read.value;
  if (damage !== null || found.length !== events.length)
    return fail({ tag: 'read-back-failed', error: null, file: read.value });
  const unsigned = signature.ok ? null : signature.error;
  const upTo = Math.max(0, ...events.filter((one) => one.device === device.id).map(({ seq }) => seq));
  return ok({ blob, name: fileName(title, at), sha256, events: events.length, upTo, bytes: blob.size, unsigned });
}

/** A name that every file system takes; it says nothing that the file does not say itself. */
export function fileName(title: string, at: string): string {
  const stamp = at.slice(0, 16).replace(/[-:]/g, '').replace('T', '-');
  return `${plainName(title)}-${stamp}.jsonl`;
}

/** A title in letters that every file system takes. */
export function plainName(title: string): string {
  const plain = title
    .normalize('NFKD')
    .replace(/[^\w]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 40);
  return plain || 'campaign';
}
