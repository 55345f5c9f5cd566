import type { Result } from '#lib/core/result.ts';
import { copyIntoFolder, type CopyFault } from '#lib/storage/copy-into-folder.ts';
import type { MirrorFolder } from '#lib/storage/mirror-folder.ts';
import { makeExport, plainName } from './make-export.ts';

/** Copies are made one after the other: an older one must not land on a newer one. */
let queue: Promise<unknown> = Promise.resolve();

/** Copies what the database holds of a campaign into a folder, under a name that stays the same. */
export function copyCampaign(
  folder: MirrorFolder,
  id: string,
  title: string
): Promise<Result<{ events: number }, CopyFault>> {
  const copy = async (): Promise<Result<{ events: number }, CopyFault>> => {
    const made = await makeExport(id, title);
    if (!made.ok) return { ok: false, error: { tag: 'failed', detail: made.error.tag } };
    const bytes = new Uint8Array(await made.value.blob.arrayBuffer());
    return copyIntoFolder(folder, `${plainName(title)}-${id.slice(-8)}.jsonl`, bytes);
  };
  const turn = queue.then(copy, copy);
  queue = turn.catch(() => undefined);
  return turn;
}
