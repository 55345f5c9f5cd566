import type { FileError } from '#lib/core/exchange/read-campaign-file.ts';
import type { ProposeFault } from '#lib/state/library.svelte.ts';
import { importTexts } from '#lib/ui/texts/import.ts';

const ofFiles = new Set<string>([
  'empty-file',
  'too-big',
  'not-a-campaign-file',
  'newer-file',
  'bad-header'
] satisfies FileError['tag'][]);

/** Why a file was refused, in words. */
export function refusalText(error: ProposeFault): string {
  const t = importTexts();
  return ofFiles.has(error.tag) ? t.fileError(error as FileError) : t.fault(error.tag);
}
