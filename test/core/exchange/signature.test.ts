import { describe, expect, it } from 'vitest';
import { closeFile, fileBody, writeCampaignFile } from '#lib/core/exchange/campaign-file.ts';
import type { FileSignature } from '#lib/core/exchange/file-schema.ts';
import { type AcceptedTablet, judgeOrigin } from '#lib/core/exchange/judge-origin.ts';
import { type CampaignFile, readCampaignFile } from '#lib/core/exchange/read-campaign-file.ts';
import { fingerprintOf, thumbprint } from '#lib/core/exchange/signed-statement.ts';
import { campaign, deviceA, deviceB, Recorder } from '../campaign/story.ts';
import { signedFile } from './signed-file.ts';

const { events } = new Recorder(deviceA).begin();
const maker = { campaign, title: 'T', device: deviceA, at: '2026-03-02T08:00:00.000+01:00', app: '0.0.0' };
const read = (text: string): CampaignFile => {
  const found = readCampaignFile(new TextEncoder().encode(text));
  if (!found.ok) throw new Error(found.error.tag);
  return found.value;
};
const accepted = (signature: FileSignature, device = deviceA): AcceptedTablet => ({
  fingerprint: fingerprintOf(signature.key),
  key: signature.key,
  device,
  name: 'Tablet 1',
  at: maker.at,
  by: 'Operator 1'
});

describe('thumbprint', () => {
  it('thumbprint(key of RFC 7638) is the published one', () => {
    // RFC 7638, 3.1: an RSA key and its SHA-256 thumbprint in base64url.
    const n =
      '0vx7agoebGcQSuuPiLJXZptN9nndrQmbXEps2aiAFbWhM78LhWx4cbbfAAtVT86zwu1RK7aPFFxuhDR1L6tSoc_BJECPebWKRXjBZCiFV4n3ok' +
      'njhMstn64tZ_2W-5JsGY4Hc5n9yBXArwl93lqt7_RN5w6Cf0h4QyQ5v-65YGjQR0_FDW2QvzqY368QQMicAtaSqzs8KJZgnYb9c7d0zgdAZHzu' +
      '6qMQvRL5hajrn1n91CbOpbISD08qNLyrdkt-bFTWhAI4vMQFh6WeZu0fM4lFd2NcRwr3XPksINHaQ-G_xBniIqbw0Ls1jF44-csFCur-kEgU8a' +
      'wapJzKnqDKgw';
    const published = Buffer.from('NzbLsXh8uDCcd-6MNwXF4W_7noWXFZAfHkxZsRGC9Xs', 'base64url').toString('hex');
    expect(thumbprint({ n, kty: 'RSA', e: 'AQAB' })).toBe(published);
  });
});

describe('judgeOrigin', () => {
  it('judgeOrigin(signed file) is new, then known once its key is accepted, and own on the device that wrote it', async () => {
    const { text, signature } = await signedFile(events, maker);
    const file = read(text);
    const fingerprint = fingerprintOf(signature.key);
    expect(judgeOrigin(file, 'fits', [], null)).toEqual({
      tag: 'new',
      fingerprint,
      key: signature.key,
      device: deviceA
    });
    const tablet = accepted(signature);
    expect(judgeOrigin(file, 'fits', [tablet], null)).toEqual({ tag: 'known', fingerprint, tablet });
    // A device whose store was lost goes on under a new number; the key tells.
    expect(judgeOrigin(file, 'fits', [accepted(signature, deviceB)], null).tag).toBe('known');
    expect(judgeOrigin(file, 'fits', [tablet], fingerprint)).toEqual({ tag: 'own', fingerprint });
  });

  it('judgeOrigin(file of an accepted device signed by another key) never says known', async () => {
    const first = await signedFile(events, maker);
    const second = await signedFile(events, maker);
    const tablet = accepted(first.signature);
    expect(judgeOrigin(read(second.text), 'fits', [tablet], null)).toMatchObject({ tag: 'other-key', tablet });
  });

  it('judgeOrigin(file written anew with the old signature) is altered; the check sums alone do not tell', async () => {
    const { text, signature, check } = await signedFile(events, maker);
    expect(await check(read(text))).toBe(true);
    const forged = closeFile(fileBody(events.slice(0, 1), maker), signature);
    expect(read(forged).damage).toBeNull();
    expect(await check(read(forged))).toBe(false);
    expect(judgeOrigin(read(forged), 'differs', [accepted(signature)], null)).toEqual({
      tag: 'altered',
      why: 'signature'
    });
  });

  it('judgeOrigin(signature moved to another device’s or campaign’s file) does not fit', async () => {
    const { signature, check } = await signedFile(events, maker);
    const moved = closeFile(fileBody(events, { ...maker, device: deviceB }), signature);
    expect(await check(read(moved))).toBe(false);
  });

  it('judgeOrigin(unsigned file) says so, and that an accepted tablet would have signed', async () => {
    const { signature } = await signedFile(events, maker);
    const file = read(writeCampaignFile(events, maker));
    const tablet = accepted(signature);
    expect(judgeOrigin(file, 'not-checked', [], null)).toEqual({ tag: 'unsigned', tablet: null });
    expect(judgeOrigin(file, 'not-checked', [tablet], null)).toEqual({ tag: 'unsigned', tablet });
  });

  it('judgeOrigin(signature of a later version) is carried and named, not called altered', () => {
    const later = { version: 2, scheme: 'of the future', value: 'x' };
    const file = read(closeFile(fileBody(events, maker), later as unknown as FileSignature));
    expect(file.damage).toBeNull();
    expect(judgeOrigin(file, 'not-checked', [], null)).toEqual({ tag: 'later-signature', version: 2 });
  });

  it('judgeOrigin(cut or edited file) asks no signature', async () => {
    const { text, signature } = await signedFile(events, maker);
    const edited = read(text.replace('Operator 1', 'Operator 2'));
    const cut = read(text.slice(0, -100));
    expect(judgeOrigin(edited, 'fits', [accepted(signature)], null)).toEqual({ tag: 'altered', why: 'content' });
    expect(judgeOrigin(cut, 'fits', [accepted(signature)], null)).toEqual({ tag: 'incomplete' });
  });

  it('judgeOrigin(signed file) where nothing can be checked says that', async () => {
    const { text, signature } = await signedFile(events, maker);
    const fingerprint = fingerprintOf(signature.key);
    expect(judgeOrigin(read(text), 'not-checked', [accepted(signature)], null)).toEqual({
      tag: 'not-checked',
      fingerprint
    });
  });
});
