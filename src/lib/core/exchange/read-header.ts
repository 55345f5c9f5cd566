import * as v from 'valibot';
import { fail, ok, type Result } from '../result.ts';
import { fileFormat, type FileHeader, fileVersion, HeaderSchema } from './file-schema.ts';
import { strictJson } from './strict-json.ts';
import { decodeUtf8 } from './utf8.ts';

/** What a file is by its first bytes. */
export type Look = 'zip' | 'pdf' | 'image' | 'html' | 'csv' | 'json' | 'text' | 'binary';

export type HeaderError =
  { tag: 'newer-file'; version: number; understands: number } | { tag: 'bad-header'; path: string; cause: string };

/** The header, or null when the line is none of ours. */
export function readHeader(bytes: Uint8Array): Result<FileHeader, HeaderError> | null {
  if (bytes.length > 4096) return null;
  const text = decodeUtf8(bytes);
  const parsed = text === null ? null : strictJson(text);
  if (!parsed?.ok || parsed.value === null || typeof parsed.value !== 'object') return null;
  const { format, version } = parsed.value as { format?: unknown; version?: unknown };
  if (format !== fileFormat) return null;
  if (typeof version === 'number' && version > fileVersion)
    return fail({ tag: 'newer-file', version, understands: fileVersion });
  const checked = v.safeParse(HeaderSchema, parsed.value);
  if (checked.success) return ok(checked.output);
  const [issue] = checked.issues;
  return fail({ tag: 'bad-header', path: v.getDotPath(issue) ?? '', cause: issue.message });
}

/** What a file is by its first bytes; its name is not asked. */
export function sniff(bytes: Uint8Array): Look {
  const begins = (...signature: number[]): boolean => signature.every((byte, at) => bytes[at] === byte);
  if (begins(0x50, 0x4b)) return 'zip';
  if (begins(0x25, 0x50, 0x44, 0x46)) return 'pdf';
  if (begins(0x89, 0x50, 0x4e, 0x47) || begins(0xff, 0xd8, 0xff) || begins(0x47, 0x49, 0x46)) return 'image';
  const text = decodeUtf8(bytes.subarray(0, 4096).filter((byte) => byte < 128));
  if (text === null || bytes.subarray(0, 4096).includes(0)) return 'binary';
  const start = text.trimStart().toLowerCase();
  if (start.startsWith('<!doctype') || start.startsWith('<html') || start.startsWith('<svg')) return 'html';
  if (start.startsWith('{') || start.startsWith('[')) return 'json';
  const line = text.split('\n')[0] ?? '';
  return /[;,\t]/.test(line) ? 'csv' : 'text';
}
