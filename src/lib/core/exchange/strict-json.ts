import { canonicalJson } from '../campaign/seal.ts';
import { fail, ok, type Result } from '../result.ts';
import { fileLimits } from './file-limits.ts';

export type JsonFault = { tag: 'bad-json'; cause: 'not-json' | 'too-deep' | 'hostile-key' | 'not-canonical' };

const hostile = new Set(['__proto__', 'constructor', 'prototype']);

/** Nesting of a text that could not be parsed. */
function depthOf(text: string): number {
  let depth = 0;
  let deepest = 0;
  let inString = false;
  for (let at = 0; at < text.length; at++) {
    const code = text.charCodeAt(at);
    if (inString) {
      if (code === 92) at++;
      else if (code === 34) inString = false;
    } else if (code === 34) inString = true;
    else if (code === 123 || code === 91) deepest = Math.max(deepest, ++depth);
    else if (code === 125 || code === 93) depth--;
  }
  return deepest;
}

interface Keys {
  harmless: boolean;
  sorted: boolean;
  deepest: number;
}

/** Are the keys of every object harmless, do they stand in order (RFC 8785, 3.2.3: by UTF-16 code units), how deep is it? */
function look(one: unknown, found: Keys, depth: number): void {
  if (one === null || typeof one !== 'object') return;
  if (depth > found.deepest) found.deepest = depth;
  if (depth > fileLimits.depth) return;
  if (Array.isArray(one)) {
    for (const inner of one) look(inner, found, depth + 1);
    return;
  }
  let before: string | null = null;
  for (const key of Object.keys(one)) {
    if (hostile.has(key)) found.harmless = false;
    if (before !== null && !(before < key)) found.sorted = false;
    before = key;
    look((one as Record<string, unknown>)[key], found, depth + 1);
  }
}

/** A half character can only stand in canonical JSON as an escape; RFC 8785 refuses it (3.2.2.2). */
const halfCharacter = /(?<!\\)(?:\\\\)*\\ud[89a-f]/;

/**
 * Parses one line of a campaign file: only the very text that canonical JSON gives is accepted, so that what is hashed and
 * what is read cannot differ (doubled keys, other spellings of a number, white space).
 * Source: RFC 8785; ECMAScript's JSON.stringify writes strings and numbers as it asks.
 * Checked by: test/core/exchange/campaign-file.test.ts, test/core/exchange/campaign-file.fuzz.test.ts.
 */
export function strictJson(text: string): Result<unknown, JsonFault> {
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch {
    return fail({ tag: 'bad-json', cause: depthOf(text) > fileLimits.depth ? 'too-deep' : 'not-json' });
  }
  const found: Keys = { harmless: true, sorted: true, deepest: 0 };
  look(value, found, 1);
  const { harmless, sorted, deepest } = found;
  if (deepest > fileLimits.depth) return fail({ tag: 'bad-json', cause: 'too-deep' });
  if (!harmless) return fail({ tag: 'bad-json', cause: 'hostile-key' });
  if (text.includes('\\ud') && halfCharacter.test(text)) return fail({ tag: 'bad-json', cause: 'not-canonical' });
  // Keys that look like numbers come out of an object in another order than they went in.
  const canonical = sorted ? JSON.stringify(value) : canonicalJson(value);
  return canonical === text ? ok(value) : fail({ tag: 'bad-json', cause: 'not-canonical' });
}
