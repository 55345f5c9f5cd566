import { canonicalJson, sha256OfText } from '../campaign/seal.ts';
import type { FileFooter, FileHeader, FileSignature, PublicKey } from './file-schema.ts';
import { signatureVersion } from './file-schema.ts';

/**
 * The text that a device signs: what the file is of, which device wrote it, and the SHA-256 of every byte before the last
 * line. Its purpose stands in it, so that a signature can be used for nothing else.
 */
export const signedStatement = (
  { campaign, device }: Pick<FileHeader, 'campaign' | 'device'>,
  { events, sha256 }: Pick<FileFooter, 'events' | 'sha256'>
): string =>
  canonicalJson({ purpose: 'evenload campaign file', version: signatureVersion, campaign, device, events, sha256 });

/**
 * A key's fingerprint: its SHA-256 thumbprint, 64 hexadecimal digits.
 * Source: RFC 7638 (JSON Web Key Thumbprint), 3. Checked by: test/core/exchange/signature.test.ts.
 * @param key only the members that make the key
 */
export const fingerprintOf = (key: PublicKey): string => thumbprint({ ...key });

/** The thumbprint of the required members of any key. */
export const thumbprint = (members: Record<string, string>): string => sha256OfText(canonicalJson(members));

/** The signature of a file, if it is of the version that is understood here. */
export const knownSignature = (footer: FileFooter | null): FileSignature | null =>
  footer?.signature?.version === signatureVersion ? (footer.signature as FileSignature) : null;
