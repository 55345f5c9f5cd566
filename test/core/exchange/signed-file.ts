import type { CampaignEvent } from '#lib/core/campaign/event.ts';
import { closeFile, fileBody, type FileMaker } from '#lib/core/exchange/campaign-file.ts';
import type { FileSignature } from '#lib/core/exchange/file-schema.ts';
import type { CampaignFile } from '#lib/core/exchange/read-campaign-file.ts';
import { knownSignature, signedStatement } from '#lib/core/exchange/signed-statement.ts';

const curve = { name: 'ECDSA', namedCurve: 'P-256' } as const;
const scheme = { name: 'ECDSA', hash: 'SHA-256' } as const;
const base64url = (bytes: ArrayBuffer): string => Buffer.from(bytes).toString('base64url');

/** A file signed with a new key by Node's own cryptography, not by the program's, and its check in the same way. */
export async function signedFile(events: readonly CampaignEvent[], maker: FileMaker, pair?: CryptoKeyPair) {
  const { privateKey, publicKey } = pair ?? (await crypto.subtle.generateKey(curve, false, ['sign', 'verify']));
  const { x = '', y = '' } = await crypto.subtle.exportKey('jwk', publicKey);
  const body = fileBody(events, maker);
  const value = await crypto.subtle.sign(scheme, privateKey, Buffer.from(signedStatement(maker, body)));
  const signature: FileSignature = { version: 1, key: { kty: 'EC', crv: 'P-256', x, y }, value: base64url(value) };
  const check = (file: CampaignFile): Promise<boolean> => {
    const found = knownSignature(file.footer);
    if (!found || !file.footer) return Promise.resolve(false);
    const statement = Buffer.from(signedStatement(file.header, file.footer));
    return crypto.subtle.verify(scheme, publicKey, Buffer.from(found.value, 'base64url'), statement);
  };
  return { text: closeFile(body, signature), signature, check };
}
