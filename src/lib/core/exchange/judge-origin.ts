import * as v from 'valibot';
import { type FileFooter, type FileHeader, type PublicKey, PublicKeySchema } from './file-schema.ts';
import type { Damage } from './read-campaign-file.ts';
import { fingerprintOf, knownSignature } from './signed-statement.ts';

/** A tablet whose key a person has accepted on this device. */
export const AcceptedTabletSchema = v.strictObject({
  /** Fingerprint of its key. */
  fingerprint: v.string(),
  key: PublicKeySchema,
  device: v.string(),
  /** What people call it. */
  name: v.string(),
  /** RFC 3339 time of acceptance. */
  at: v.string(),
  /** Who accepted it. */
  by: v.string()
});
export type AcceptedTablet = v.InferOutput<typeof AcceptedTabletSchema>;

/** What the signature's mathematics says; `not-checked` where the surroundings cannot compute it. */
export type SignatureCheck = 'fits' | 'differs' | 'not-checked';

/** Where a file comes from, as far as can be known. */
export type Origin =
  /** Signed by this very device. */
  | { tag: 'own'; fingerprint: string }
  /** Unchanged, from a device whose key was accepted. */
  | { tag: 'known'; fingerprint: string; tablet: AcceptedTablet }
  /** Unchanged since it was signed, by a key that nobody here has accepted. */
  | { tag: 'new'; fingerprint: string; key: PublicKey; device: string }
  /** Like `new`, but it bears the number of a device whose accepted key is another. */
  | { tag: 'other-key'; fingerprint: string; key: PublicKey; device: string; tablet: AcceptedTablet }
  /** Changed after it was written; or, `signature`, written anew by somebody who has not the key. */
  | { tag: 'altered'; why: 'content' | 'signature' }
  /** Cut before its last line, where a signature would stand. */
  | { tag: 'incomplete' }
  /** Not signed. `tablet`: the device's earlier files were. */
  | { tag: 'unsigned'; tablet: AcceptedTablet | null }
  | { tag: 'later-signature'; version: number }
  /** Signed, but signatures cannot be checked here. */
  | { tag: 'not-checked'; fingerprint: string };

/**
 * Says where a file comes from. A signature proves that the file came unchanged from whoever holds the key; not who typed,
 * nor that the values are true.
 * @param check what the signature's mathematics says; asked only for a signature of the known version
 * @param own fingerprint of this device's own key; null for none
 * Checked by: test/core/exchange/signature.test.ts.
 */
export function judgeOrigin(
  file: { header: FileHeader; footer: FileFooter | null; damage: Damage | null },
  check: SignatureCheck,
  accepted: readonly AcceptedTablet[],
  own: string | null
): Origin {
  const { header, footer, damage } = file;
  if (damage !== null) return damage.footer === 'absent' ? { tag: 'incomplete' } : { tag: 'altered', why: 'content' };
  const { device } = header;
  const sameDevice = accepted.findLast((tablet) => tablet.device === device) ?? null;
  if (!footer?.signature) return { tag: 'unsigned', tablet: sameDevice };
  const signature = knownSignature(footer);
  if (!signature) return { tag: 'later-signature', version: footer.signature.version };
  const { key } = signature;
  const fingerprint = fingerprintOf(key);
  if (check === 'not-checked') return { tag: 'not-checked', fingerprint };
  if (check === 'differs') return { tag: 'altered', why: 'signature' };
  if (fingerprint === own) return { tag: 'own', fingerprint };
  const tablet = accepted.find((one) => one.fingerprint === fingerprint);
  if (tablet) return { tag: 'known', fingerprint, tablet };
  if (sameDevice) return { tag: 'other-key', fingerprint, key, device, tablet: sameDevice };
  return { tag: 'new', fingerprint, key, device };
}
