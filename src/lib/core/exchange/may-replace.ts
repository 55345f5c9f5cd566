import type { Result } from '../result.ts';
import type { CampaignFile, FileError } from './read-campaign-file.ts';

/**
 * What a copy that is kept up to date may do with the file it finds: `write` over it, leave it because it holds the
 * `same`, or leave it alone because the new one says `nothing`, because the old one `holds-more`, or because it is `foreign`.
 */
export type Replacement = 'write' | 'same' | 'nothing' | 'holds-more' | 'foreign';

/**
 * Returns whether a campaign file may stand in the place of another without anything being lost: never an empty one over a
 * full one, never a log over one that holds an event it does not hold. A file that was cut while it was written is replaced when
 * all that is left of it is held and it never said it held more; any other damage is left to a person.
 *
 * @param found what was read in the place; null: no file is there
 * @param next the file that would be written, read back
 * Checked by: test/core/exchange/may-replace.test.ts
 */
export function mayReplace(found: Result<CampaignFile, FileError> | null, next: CampaignFile): Replacement {
  if (next.damage !== null || next.events.length === 0) return 'nothing';
  if (found === null) return 'write';
  if (!found.ok) return found.error.tag === 'empty-file' ? 'write' : 'foreign';
  const { header, events, damage } = found.value;
  if (header.campaign !== next.header.campaign) return 'foreign';
  const held = new Set(next.events.map(({ text }) => text));
  if (header.events > held.size || events.some(({ text }) => !held.has(text))) return 'holds-more';
  if (damage !== null) return damage.footer === 'absent' && damage.badLines.length <= 1 ? 'write' : 'foreign';
  return events.length === held.size ? 'same' : 'write';
}
