import { mayReplace } from '#lib/core/exchange/may-replace.ts';
import { readCampaignFile } from '#lib/core/exchange/read-campaign-file.ts';
import { fail, ok, type Result } from '#lib/core/result.ts';
import type { MirrorFolder } from './mirror-folder.ts';

export type CopyFault =
  /** The file in the folder holds events that this device does not. */
  | { tag: 'holds-more' }
  /** It is another campaign's, or cannot be read. */
  | { tag: 'foreign' }
  /** There was nothing to write, or what was written reads back differently. */
  | { tag: 'failed'; detail: string };

/** The name of the generation before. */
export const nameBefore = (name: string) => name.replace(/(\.[^.]*)?$/u, '-before$1');

/**
 * Copies a campaign file into a folder and reads it back. The file that stood there becomes the generation before, unless
 * that one would lose something by it. Nothing is written over a file that holds more, or that is not understood.
 *
 * @param folder where to
 * @param name of the file in the folder
 * @param bytes the whole campaign file
 * @returns the number of events that the file in the folder holds now
 * Checked by: test/storage/copy-into-folder.test.ts, test/e2e/bench-mirror.spec.ts
 */
export async function copyIntoFolder(
  folder: MirrorFolder,
  name: string,
  bytes: Uint8Array
): Promise<Result<{ events: number }, CopyFault>> {
  try {
    const next = readCampaignFile(bytes);
    if (!next.ok) return fail({ tag: 'failed', detail: next.error.tag });
    const standing = await folder.read(name);
    const found = standing && readCampaignFile(standing);
    const verdict = mayReplace(found, next.value);
    if (verdict === 'nothing') return fail({ tag: 'failed', detail: verdict });
    if (verdict === 'holds-more' || verdict === 'foreign') return fail({ tag: verdict });
    if (verdict === 'same') return ok({ events: next.value.events.length });
    if (standing && found?.ok && found.value.damage === null) {
      const earlier = await folder.read(nameBefore(name));
      if (mayReplace(earlier && readCampaignFile(earlier), found.value) === 'write')
        await folder.write(nameBefore(name), standing);
    }
    await folder.write(name, bytes);
    const back = await folder.read(name);
    const read = back && readCampaignFile(back);
    if (!read?.ok || read.value.sha256 !== next.value.sha256) return fail({ tag: 'failed', detail: 'differs' });
    return ok({ events: read.value.events.length });
  } catch (cause) {
    return fail({ tag: 'failed', detail: cause instanceof Error ? cause.message : String(cause) });
  }
}
