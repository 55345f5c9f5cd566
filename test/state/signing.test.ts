import 'fake-indexeddb/auto';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { closeFile, fileBody } from '#lib/core/exchange/campaign-file.ts';
import { readCampaignFile } from '#lib/core/exchange/read-campaign-file.ts';
import { campaign, deviceA, Recorder } from '../core/campaign/story.ts';

const hex = (text: string): string => Buffer.from(text, 'hex').toString('base64url');
const maker = { campaign, title: 'T', device: deviceA, at: '2026-03-02T08:00:00.000+01:00', app: '0.0.0' };
const body = fileBody(new Recorder(deviceA).begin().events, maker);

/** The program as it starts anew on the same device. */
async function startAnew() {
  vi.resetModules();
  return import('#lib/state/signing.ts');
}

afterEach(() => vi.unstubAllGlobals());

describe('verify', () => {
  // RFC 6979, A.2.5: ECDSA, P-256, SHA-256, message "sample".
  const key = {
    kty: 'EC' as const,
    crv: 'P-256' as const,
    x: hex('60FED4BA255A9D31C961EB74C6356D68C049B8923B61FA6CE669622E60F29FB6'),
    y: hex('7903FE1008B8BC99A41AE9E95628BC64F2F1B20C2D7E9F5177A3C294D4462299')
  };
  const r = 'EFD48B2AACB6A8FD1140DD9CD45E81D69D2C877B56AAF991C34D0EA84EAF3716';
  const s = 'F7CB1C942D657C41D436C7A1B6E29F65F3E900DBB9AFF4064DC4AB2F843ACDA8';
  const value = hex(r + s);

  it('verify(published signature) fits its message and no other', async () => {
    const { verify } = await startAnew();
    expect(await verify({ version: 1, key, value }, 'sample')).toBe('fits');
    expect(await verify({ version: 1, key, value }, 'samplf')).toBe('differs');
    expect(await verify({ version: 1, key: { ...key, y: key.x }, value }, 'sample')).toBe('differs');
  });

  it('verify(signature) without cryptography says that it was not checked', async () => {
    vi.stubGlobal('crypto', { getRandomValues: crypto.getRandomValues.bind(crypto) });
    const { verify } = await startAnew();
    expect(await verify({ version: 1, key, value }, 'sample')).toBe('not-checked');
  });
});

describe('signFile', () => {
  it('signFile(file) fits, with the same key after every start, whose private half cannot be read out', async () => {
    const first = await startAnew();
    const signature = await first.signFile(maker, body);
    if (!signature.ok) throw new Error(signature.error.tag);
    const read = readCampaignFile(new TextEncoder().encode(closeFile(body, signature.value)));
    if (!read.ok) throw new Error(read.error.tag);
    expect(read.value.damage).toBeNull();
    expect(await first.checkSignature(read.value.header, read.value.footer)).toBe('fits');
    const again = await startAnew();
    const [one, other] = [await first.ownKey(), await again.ownKey()];
    expect(one.ok && other.ok && one.value.fingerprint === other.value.fingerprint).toBe(true);
    expect(other.ok && other.value.privateKey.extractable).toBe(false);
  });

  it('signFile(file) on an insecure origin fails with a reason and does not throw', async () => {
    vi.stubGlobal('crypto', { getRandomValues: crypto.getRandomValues.bind(crypto) });
    vi.stubGlobal('CryptoKey', undefined);
    const { signFile } = await startAnew();
    expect(await signFile(maker, body)).toEqual({ ok: false, error: { tag: 'no-crypto' } });
  });

  it('signFile(file) whose key cannot be made fails with a reason and does not throw', async () => {
    vi.stubGlobal('indexedDB', new IDBFactory());
    const { signFile } = await startAnew();
    vi.spyOn(crypto.subtle, 'generateKey').mockRejectedValueOnce(new Error('no entropy'));
    expect(await signFile(maker, body)).toMatchObject({ ok: false, error: { tag: 'no-key' } });
  });
});
