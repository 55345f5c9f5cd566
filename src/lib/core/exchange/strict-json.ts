import { canonicalJson } from '../campaign/seal.ts';
import { fail, ok, type Result } from '../result.ts';
import { fileLimits } from './file-limits.ts';

export type JsonFault = { tag: 'bad-json'; cause: 'not-json' | 'too-deep' | 'hostile-key' | 'not-canonical' };

const hostile = new Set(['__proto__', 'constructor', 'prototype']);

/** Nesting of a JSON text, counted without parsing. */
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

/** Are the keys of every object harmless, and do they stand in order (RFC 8785, 3.2.3: by UTF-16 code units)? */
function keysOf(value: unknown): { harmless: boolean; sorted: boolean } {
  const found = { harmless: true, sorted: true };
  const visit = (one: unknown): void => {
    if (one === null || typeof one !== 'object') return;
    if (Array.isArray(one)) return one.forEach(visit);
    let before: string | null = null;
    for (const [key, inner] of Object.entries(one)) {
      if (hostile.has(key)) found.harmless = false;
      if (before !== null && !(before < key)) found.sorted = false;
      before = key;
      visit(inner);
    }
  };
  visit(value);
  return found;
}

/** A half character can only stand in canonical JSON as an escape; RFC 8785 refuses it (3.2.2.2). */
const halfCharacter = /(?<!\\)(?:\\\\)*\\ud[89a-f]/;

/**
 * Parses one line of a campaign file: only the very text that canonical JSON gives is accepted, so that what is hashed and
 * what is read cannot differ (doubled keys, other spellings of a number, white space).
 * Source: RFC 8785; ECMAScript's JSON.stringify writes strings and numbers as it asks.
 * Checked by: test/core/exchange/strict-json.test.ts.
 */
export function strictJson(text: string): Result<unknown, JsonFault> {
  if (depthOf(text) > fileLimits.depth) return fail({ tag: 'bad-json', cause: 'too-deep' });
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch {
    return fail({ tag: 'bad-json', cause: 'not-json' });
  }
  const { harmless, sorted } = keysOf(value);
  if (!harmless) return fail({ tag: 'bad-json', cause: 'hostile-key' });
  if (halfCharacter.test(text)) return fail({ tag: 'bad-json', cause: 'not-canonical' });
  // Keys that look like numbers come out of an object in another order than they went in.
  const canonical = sorted ? JSON.stringify(value) : canonicalJson(value);
  return canonical === text ? ok(value) : fail({ tag: 'bad-json', cause: 'not-canonical' });
}
