import * as v from 'valibot';
import {
  type FileFooter,
  type FileHeader,
  type FileSignature,
  PublicKeySchema
} from '#lib/core/exchange/file-schema.ts';
import type { SignatureCheck } from '#lib/core/exchange/judge-origin.ts';
import { fingerprintOf, knownSignature, signedStatement } from '#lib/core/exchange/signed-statement.ts';
import { fail, ok, type Result } from '#lib/core/result.ts';
import type { StorageFault } from '#lib/storage/fault.ts';
import { getSetting, settleSetting } from '#lib/storage/settings.ts';
import { connection } from './database.svelte.ts';

/** Why this device cannot sign. */
export type SigningFault =
  /** The page came over an address without encryption: the browser lends no cryptography there. */
  { tag: 'no-crypto' } | { tag: 'no-key'; detail: string } | StorageFault;

export interface OwnKey {
  privateKey: CryptoKey;
  key: FileSignature['key'];
  fingerprint: string;
}

const curve = { name: 'ECDSA', namedCurve: 'P-256' } as const;
const scheme = { name: 'ECDSA', hash: 'SHA-256' } as const;
const setting = 'signing-key';

/** Absent on insecure origins, whatever the types say. */
const subtle = (): SubtleCrypto | null => (globalThis.crypto?.subtle as SubtleCrypto | undefined) ?? null;

/** `CryptoKey` itself is absent on insecure origins. */
const isKey = (value: unknown): boolean => 'CryptoKey' in globalThis && value instanceof CryptoKey;
const StoredKeySchema = v.object({ privateKey: v.custom<CryptoKey>(isKey), key: PublicKeySchema });

let held: Promise<Result<OwnKey, SigningFault>> | null = null;

/** This device's signing key; made on first use, never leaves the browser (its private half cannot be read out). */
export function ownKey(): Promise<Result<OwnKey, SigningFault>> {
  held ??= findOwnKey().then((found) => {
    if (!found.ok) held = null;
    return found;
  });
  return held;
}

async function findOwnKey(): Promise<Result<OwnKey, SigningFault>> {
  const crypto = subtle();
  if (!crypto) return fail({ tag: 'no-crypto' });
  try {
    const before = await getSetting(connection, setting);
    const known = before.ok ? v.safeParse(StoredKeySchema, before.value) : null;
    if (known?.success) return ok({ ...known.output, fingerprint: fingerprintOf(known.output.key) });
    const pair = await crypto.generateKey(curve, false, ['sign', 'verify']);
    const { x, y } = await crypto.exportKey('jwk', pair.publicKey);
    // Another tab may have made one meanwhile: that one stands.
    const fresh = { privateKey: pair.privateKey, key: { kty: 'EC', crv: 'P-256', x, y } };
    const settled = await settleSetting(connection, setting, fresh);
    if (!settled.ok) return settled;
    const parsed = v.safeParse(StoredKeySchema, settled.value);
    if (!parsed.success) return fail({ tag: 'no-key', detail: parsed.issues[0].message });
    const { privateKey, key } = parsed.output;
    return ok({ privateKey, key, fingerprint: fingerprintOf(key) });
  } catch (cause) {
    return fail({ tag: 'no-key', detail: String(cause) });
  }
}

/** Signs what a file's footer says of it. An export goes out unsigned when this fails. */
export async function signFile(
  header: Pick<FileHeader, 'campaign' | 'device'>,
  body: Pick<FileFooter, 'events' | 'sha256'>
): Promise<Result<FileSignature, SigningFault>> {
  const own = await ownKey();
  if (!own.ok) return own;
  try {
    const bytes = new TextEncoder().encode(signedStatement(header, body));
    const value = await subtle()?.sign(scheme, own.value.privateKey, bytes);
    if (!value) return fail({ tag: 'no-crypto' });
    const signature: FileSignature = { version: 1, key: own.value.key, value: base64url(new Uint8Array(value)) };
    const check = await verify(signature, signedStatement(header, body));
    return check === 'fits' ? ok(signature) : fail({ tag: 'no-key', detail: `the signature made ${check}` });
  } catch (cause) {
    return fail({ tag: 'no-key', detail: String(cause) });
  }
}

/** What the mathematics says of a file's signature; a file without one has nothing that could differ. */
export async function checkSignature(header: FileHeader, footer: FileFooter | null): Promise<SignatureCheck> {
  const signature = knownSignature(footer);
  if (!footer || !signature) return 'not-checked';
  return verify(signature, signedStatement(header, footer));
}

/** Does a signature fit a text? A key that is no point of the curve fits nothing. */
export async function verify({ key, value }: FileSignature, text: string): Promise<SignatureCheck> {
  const crypto = subtle();
  if (!crypto) return 'not-checked';
  try {
    const publicKey = await crypto.importKey('jwk', key, curve, false, ['verify']);
    const fits = await crypto.verify(scheme, publicKey, bytesOf(value), new TextEncoder().encode(text));
    return fits ? 'fits' : 'differs';
  } catch {
    return 'differs';
  }
}

const base64url = (bytes: Uint8Array): string =>
  btoa(String.fromCharCode(...bytes))
    .replaceAll('+', '-')
    .replaceAll('/', '_')
    .replaceAll('=', '');

const bytesOf = (text: string): Uint8Array<ArrayBuffer> =>
  Uint8Array.from(atob(text.replaceAll('-', '+').replaceAll('_', '/')), (one) => one.charCodeAt(0));
