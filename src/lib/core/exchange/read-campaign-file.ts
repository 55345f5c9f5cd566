import * as v from 'valibot';
import { checkEvent } from '../campaign/check-event.ts';
import type { CampaignEvent, UnknownEvent } from '../campaign/event.ts';
import { canonicalJson, rememberSeal, sha256OfBytes, sha256OfText } from '../campaign/seal.ts';
import { fail, ok, type Result } from '../result.ts';
import { fileLimits } from './file-limits.ts';
import {
  type FileFooter,
  fileFormat,
  type FileHeader,
  fileVersion,
  FooterSchema,
  HeaderSchema
} from './file-schema.ts';
import { type JsonFault, strictJson } from './strict-json.ts';
import { decodeUtf8 } from './utf8.ts';

/** Why nothing of a file can be used. */
export type FileError =
  | { tag: 'empty-file' }
  | { tag: 'too-big'; bytes: number; most: number }
  /** Not one of ours: no header line. `looksLike` is what its first bytes say it is. */
  | { tag: 'not-a-campaign-file'; looksLike: 'zip' | 'pdf' | 'image' | 'html' | 'csv' | 'json' | 'text' | 'binary' }
  | { tag: 'newer-file'; version: number; understands: number }
  | { tag: 'bad-header'; path: string; cause: string };

/** A line that is not taken in, and why. */
export interface BadLine {
  line: number;
  cause:
    | JsonFault['cause']
    | 'bad-event'
    | 'other-campaign'
    | 'too-long'
    | 'not-text'
    | 'bad-footer'
    | 'after-footer'
    | 'too-many';
  /** Path to the field, for `bad-event` and `bad-footer`. */
  path: string;
  detail: string;
}

/** What is wrong with a file of which something can be used. */
export interface Damage {
  /** Whole event lines that the header counted and that are not there or not readable. */
  missingLines: number;
  badLines: BadLine[];
  /** Lines that stand in the file more than once. */
  repeated: number;
  /** `absent`: the file was cut before its footer. */
  footer: 'fits' | 'differs' | 'absent';
}

export interface ReadEvent {
  event: CampaignEvent | UnknownEvent;
  text: string;
  seal: string;
  line: number;
}

export interface CampaignFile {
  header: FileHeader;
  footer: FileFooter | null;
  events: ReadEvent[];
  /** null: every byte is as it was written. */
  damage: Damage | null;
  /** SHA-256 of the whole file. */
  sha256: string;
}

/** Called now and then with the share read so far, 0 to 1; returning false stops the reading. */
export type Progress = (done: number) => void;

/**
 * Reads a campaign file from its bytes. Whatever whole lines can be trusted come back, with what is missing or wrong; no
 * line of a damaged file is believed beyond what its own text says. Never throws on any bytes.
 * Checked by: test/core/exchange/campaign-file.test.ts, test/core/exchange/campaign-file.fuzz.test.ts.
 */
export function readCampaignFile(bytes: Uint8Array, progress: Progress = () => {}): Result<CampaignFile, FileError> {
  if (bytes.length === 0) return fail({ tag: 'empty-file' });
  if (bytes.length > fileLimits.bytes) return fail({ tag: 'too-big', bytes: bytes.length, most: fileLimits.bytes });
  const lines = linesOf(bytes);
  const first = lines[0];
  const head = first === undefined ? null : readHeader(bytes.subarray(first.from, first.to));
  if (head === null) return fail({ tag: 'not-a-campaign-file', looksLike: sniff(bytes) });
  if (!head.ok) return head;
  const header = head.value;

  const badLines: BadLine[] = [];
  const events: ReadEvent[] = [];
  const seen = new Set<string>();
  let repeated = 0;
  let footer: FileFooter | null = null;
  let fits = false;
  for (let index = 1; index < lines.length; index++) {
    const line = lines[index] as Line;
    const number = index + 1;
    const bad = (cause: BadLine['cause'], path = '', detail = ''): void =>
      void badLines.push({ line: number, cause, path, detail });
    if (index % 500 === 0) progress(line.from / bytes.length);
    if (footer) {
      bad('after-footer');
      continue;
    }
    if (line.to - line.from > fileLimits.line) {
      bad('too-long');
      continue;
    }
    // A line without its end was cut while it was written.
    if (!line.whole) {
      bad('not-json');
      continue;
    }
    const text = decodeUtf8(bytes.subarray(line.from, line.to));
    if (text === null) {
      bad('not-text');
      continue;
    }
    const parsed = strictJson(text);
    if (!parsed.ok) {
      bad(parsed.error.cause);
      continue;
    }
    if (isFooter(parsed.value)) {
      const checked = v.safeParse(FooterSchema, parsed.value);
      if (!checked.success) {
        bad('bad-footer', v.getDotPath(checked.issues[0]) ?? '', checked.issues[0].message);
        continue;
      }
      footer = checked.output;
      const { seal, ...rest } = footer;
      fits =
        seal === sha256OfText(canonicalJson(rest)) &&
        footer.sha256 === sha256OfBytes(bytes.subarray(0, line.from)) &&
        footer.events === header.events;
      continue;
    }
    const checked = checkEvent(parsed.value);
    if (!checked.ok) bad('bad-event', checked.error.path, checked.error.cause);
    else if (checked.value.campaign !== header.campaign) bad('other-campaign', '', checked.value.campaign);
    else if (events.length >= fileLimits.events) bad('too-many');
    else if (seen.has(text)) repeated++;
    else {
      seen.add(text);
      const seal = sha256OfText(text);
      rememberSeal(checked.value, seal);
      events.push({ event: checked.value, text, seal, line: number });
    }
  }
  progress(1);
  const sound = fits && badLines.length === 0 && repeated === 0 && events.length === header.events;
  const damage: Damage = {
    missingLines: Math.max(0, header.events - events.length),
    badLines,
    repeated,
    footer: footer === null ? 'absent' : fits ? 'fits' : 'differs'
  };
  return ok({ header, footer, events, damage: sound ? null : damage, sha256: sha256OfBytes(bytes) });
}

interface Line {
  from: number;
  to: number;
  /** Did its line feed come? */
  whole: boolean;
}

function linesOf(bytes: Uint8Array): Line[] {
  const lines: Line[] = [];
  let from = 0;
  while (from < bytes.length && lines.length <= fileLimits.events + 2) {
    const end = bytes.indexOf(10, from);
    lines.push({ from, to: end < 0 ? bytes.length : end, whole: end >= 0 });
    if (end < 0) break;
    from = end + 1;
  }
  return lines;
}

const isFooter = (value: unknown): boolean =>
  value !== null && typeof value === 'object' && Object.hasOwn(value, 'sha256') && !Object.hasOwn(value, 'kind');

/** The header, or null when the line is none of ours. */
function readHeader(bytes: Uint8Array): Result<FileHeader, FileError> | null {
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

type Look = Extract<FileError, { tag: 'not-a-campaign-file' }>['looksLike'];

/** What a file is by its first bytes; its name is not asked. */
function sniff(bytes: Uint8Array): Look {
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
