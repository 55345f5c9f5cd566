import * as v from 'valibot';
import { checkEvent } from '../campaign/check-event.ts';
import type { CampaignEvent, UnknownEvent } from '../campaign/event.ts';
import { canonicalJson, rememberSeal, RunningSha256, sha256OfBytes, sha256OfText } from '../campaign/seal.ts';
import { fail, ok, type Result } from '../result.ts';
import { fileLimits } from './file-limits.ts';
import { type FileFooter, type FileHeader, FooterSchema } from './file-schema.ts';
import { type HeaderError, type Look, readHeader, sniff } from './read-header.ts';
import { type JsonFault, strictJson } from './strict-json.ts';
import { decodeUtf8 } from './utf8.ts';

/** Why nothing of a file can be used. */
export type FileError =
  | { tag: 'empty-file' }
  | { tag: 'too-big'; bytes: number; most: number }
  /** Not one of ours: no header line. `looksLike` is what its first bytes say it is. */
  | { tag: 'not-a-campaign-file'; looksLike: Look }
  | HeaderError;

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
  /** How many lines are not taken in; the first of them are in `badLines`. */
  bad: number;
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

/** Bad lines that are named one by one; a file of nothing else is not kept in memory twice. */
const named = 100;

/** Called now and then with the share read so far, 0 to 1. */
export type Progress = (done: number) => void;

/** SHA-256 of the first n bytes of a file by n, where it has been computed already; 64 hexadecimal digits. */
export type KnownSums = ReadonlyMap<number, string>;

/** Where the last line of a file begins; before a sound file's footer, whose sum is of everything before it. */
export const lastLineOf = (bytes: Uint8Array): number =>
  bytes.length < 2 ? 0 : bytes.lastIndexOf(10, bytes.length - 2) + 1;

/**
 * Reads a campaign file from its bytes. Whatever whole lines can be trusted come back, with what is missing or wrong; no
 * line of a damaged file is believed beyond what its own text says. Never throws on any bytes.
 * @param sums sums of these very bytes that a faster way has given; the rest is computed here
 * Checked by: test/core/exchange/campaign-file.test.ts, test/core/exchange/campaign-file.fuzz.test.ts.
 */
export function readCampaignFile(
  bytes: Uint8Array,
  progress: Progress = () => {},
  sums: KnownSums = new Map()
): Result<CampaignFile, FileError> {
  if (bytes.length === 0) return fail({ tag: 'empty-file' });
  if (bytes.length > fileLimits.bytes) return fail({ tag: 'too-big', bytes: bytes.length, most: fileLimits.bytes });
  const lines = linesOf(bytes);
  const first = lines[0];
  const head = first === undefined ? null : readHeader(bytes.subarray(first.from, first.to));
  if (head === null) return fail({ tag: 'not-a-campaign-file', looksLike: sniff(bytes) });
  if (!head.ok) return head;
  const header = head.value;

  const badLines: BadLine[] = [];
  let allBad = 0;
  const events: ReadEvent[] = [];
  const seen = new Set<string>();
  let repeated = 0;
  let footer: FileFooter | null = null;
  let fits = false;
  const sum = new RunningSha256();
  let summed = 0;
  const sumUpTo = (to: number): string => {
    const given = sums.get(to);
    if (given !== undefined) return given;
    sum.add(bytes.subarray(summed, to));
    summed = to;
    return sum.sum;
  };
  for (let index = 1; index < lines.length; index++) {
    const line = lines[index] as Line;
    const number = index + 1;
    const bad = (cause: BadLine['cause'], path = '', detail = ''): void => {
      if (++allBad <= named) badLines.push({ line: number, cause, path, detail });
    };
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
    const own = bytes.subarray(line.from, line.to);
    const text = decodeUtf8(own);
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
      const before = sumUpTo(line.from);
      fits = seal === sha256OfText(canonicalJson(rest)) && footer.sha256 === before && footer.events === header.events;
      continue;
    }
    const checked = checkEvent(parsed.value);
    if (!checked.ok) bad('bad-event', checked.error.path, checked.error.cause);
    else if (checked.value.campaign !== header.campaign) bad('other-campaign', '', checked.value.campaign);
    else if (events.length >= fileLimits.events) bad('too-many');
    else {
      const seal = sha256OfBytes(own);
      if (seen.has(seal)) {
        repeated++;
        continue;
      }
      seen.add(seal);
      rememberSeal(checked.value, seal);
      events.push({ event: checked.value, text, seal, line: number });
    }
  }
  progress(1);
  const sound = fits && allBad === 0 && repeated === 0 && events.length === header.events;
  const damage: Damage = {
    missingLines: Math.max(0, header.events - events.length),
    bad: allBad,
    badLines,
    repeated,
    footer: footer === null ? 'absent' : fits ? 'fits' : 'differs'
  };
  return ok({ header, footer, events, damage: sound ? null : damage, sha256: sumUpTo(bytes.length) });
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
