import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';
import canonicalize from 'canonicalize';

/** The hash that stands where there is no event before. */
export const noHash = '0'.repeat(64);

/**
 * Canonical JSON of a plain value: one text for one value, whatever the order of keys.
 * Throws on NaN, infinities, lone surrogates and cycles: such a value is a bug of the caller.
 * Source: RFC 8785 (JSON Canonicalization Scheme). Checked by: test/core/campaign/seal.test.ts.
 */
export function canonicalJson(value: unknown): string {
  const text = canonicalize(value);
  if (text === undefined) throw new Error(`canonicalJson: expected a JSON value, got ${typeof value}`);
  return text;
}

/**
 * SHA-256 of a text's UTF-8 bytes, 64 lower-case hexadecimal digits; synchronous, so that it can run inside a database
 * transaction. Source: FIPS 180-4. Checked by: test/core/campaign/seal.test.ts.
 */
export const sha256OfText = (text: string): string => bytesToHex(sha256(utf8ToBytes(text)));

/** SHA-256 of bytes, 64 lower-case hexadecimal digits. */
export const sha256OfBytes = (bytes: Uint8Array): string => bytesToHex(sha256(bytes));

/** SHA-256 of bytes that come in parts; the sum so far may be asked for at any time. */
export class RunningSha256 {
  #hash = sha256.create();

  add(bytes: Uint8Array): this {
    this.#hash.update(bytes);
    return this;
  }

  /** 64 lower-case hexadecimal digits. */
  get sum(): string {
    return bytesToHex(this.#hash.clone().digest());
  }
}

/** An object's seal does not change: events are never edited after they are made. */
const known = new WeakMap<object, string>();

/** SHA-256 of the canonical JSON of an event (or any other plain object), computed once for each object. */
export function sealOf(event: object): string {
  let seal = known.get(event);
  if (seal === undefined) {
    seal = sha256OfText(canonicalJson(event));
    known.set(event, seal);
  }
  return seal;
}

/** Says what an event's seal is when the caller has just computed it from the exact text. */
export function rememberSeal(event: object, seal: string): void {
  known.set(event, seal);
}
