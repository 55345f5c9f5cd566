import { fail, ok, type Result } from '#lib/core/result.ts';
import type { ExportedFile } from './make-export.ts';

/** How a file can leave this device, the surest first. */
export type WayOut = 'share' | 'save' | 'download';
export type DeliveryFault =
  /** The person closed the share sheet or the file dialog. */
  | { tag: 'cancelled' }
  /** What was written reads back as something else. */
  | { tag: 'differs' }
  | { tag: 'refused'; detail: string };

interface SavePicker {
  showSaveFilePicker?: (options: {
    suggestedName: string;
    types: { description: string; accept: Record<string, string[]> }[];
  }) => Promise<FileSystemFileHandle>;
}

/** Share lists take text files everywhere, JSON Lines hardly anywhere: what a file is stands inside it, not in its name. */
function shareable(file: ExportedFile): File | null {
  if (typeof navigator.share !== 'function' || typeof navigator.canShare !== 'function') return null;
  const candidates = [
    new File([file.blob], file.name, { type: 'application/jsonl' }),
    new File([file.blob], `${file.name}.txt`, { type: 'text/plain' })
  ];
  return candidates.find((one) => navigator.canShare({ files: [one] })) ?? null;
}

/** The ways this device offers, in the order they are tried: share sheet, file dialog, download. */
export function waysOut(file: ExportedFile): WayOut[] {
  const ways: WayOut[] = [];
  if (shareable(file)) ways.push('share');
  if ('showSaveFilePicker' in globalThis) ways.push('save');
  return [...ways, 'download'];
}

/** Hands the file over. A saved file is read back and its SHA-256 compared before anybody may say that it is out. */
export async function deliverFile(file: ExportedFile, way: WayOut): Promise<Result<WayOut, DeliveryFault>> {
  try {
    if (way === 'share') {
      const shared = shareable(file);
      if (!shared) return fail({ tag: 'refused', detail: 'share' });
      await navigator.share({ files: [shared], title: file.name });
      return ok(way);
    }
    if (way === 'save') return await save(file);
    download(file);
    return ok(way);
  } catch (cause) {
    if (cause instanceof DOMException && cause.name === 'AbortError') return fail({ tag: 'cancelled' });
    return fail({ tag: 'refused', detail: cause instanceof Error ? cause.message : String(cause) });
  }
}

async function save(file: ExportedFile): Promise<Result<WayOut, DeliveryFault>> {
  const handle = await (globalThis as SavePicker).showSaveFilePicker?.({
    suggestedName: file.name,
    types: [{ description: 'Evenload', accept: { 'application/jsonl': ['.jsonl'] } }]
  });
  if (!handle) return fail({ tag: 'refused', detail: 'save' });
  const stream = await handle.createWritable();
  await stream.write(file.blob);
  await stream.close();
  const written = await handle.getFile();
  return (await sha256Of(written)) === file.sha256 ? ok('save') : fail({ tag: 'differs' });
}

function download(file: ExportedFile): void {
  const url = URL.createObjectURL(file.blob);
  const link = document.createElement('a');
  link.href = url;
  link.download = file.name;
  link.click();
  setTimeout(() => URL.revokeObjectURL(url), 60_000);
}

/** SHA-256 of a file's bytes, in hexadecimal digits. */
export async function sha256Of(blob: Blob): Promise<string> {
  const digest = await crypto.subtle.digest('SHA-256', await blob.arrayBuffer());
  return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, '0')).join('');
}
