import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { canonicalJson, sha256OfText } from '#lib/core/campaign/seal.ts';
import { uuid7 } from '#lib/core/campaign/uuid7.ts';

describe('canonicalJson', () => {
  it('canonicalJson(sample of RFC 8785, 3.2.2) is the text of 3.2.3', () => {
    const sample = JSON.parse(
      String.raw`{"numbers":[333333333.33333329,1E30,4.50,2e-3,0.000000000000000000000000001],"string":"\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"\/","literals":[null,true,false]}`
    ) as unknown;
    expect(canonicalJson(sample)).toBe(
      String.raw`{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\u000f\nA'B\"\\\\\"/"}`
    );
  });

  it('canonicalJson(keys of RFC 8785, 3.2.3) sorts by UTF-16 code units', () => {
    const sample = JSON.parse(
      String.raw`{"\u20ac":"Euro Sign","\r":"Carriage Return","\ufb33":"Hebrew Letter Dalet With Dagesh","1":"One","\ud83d\ude00":"Emoji: Grinning Face","\u0080":"Control","\u00f6":"Latin Small Letter O With Diaeresis"}`
    ) as Record<string, string>;
    expect(Object.values(JSON.parse(canonicalJson(sample).replace('"1"', '"_1"')) as object)).toEqual([
      'Carriage Return',
      'One',
      'Control',
      'Latin Small Letter O With Diaeresis',
      'Euro Sign',
      'Emoji: Grinning Face',
      'Hebrew Letter Dalet With Dagesh'
    ]);
  });

  it('canonicalJson(NaN) throws: such a value is a bug', () => {
    expect(() => canonicalJson({ y: Number.NaN })).toThrow();
  });
});

describe('sha256OfText', () => {
  it('sha256OfText("abc") is the digest of the standard (FIPS 180-4 example, checked against OpenSSL below)', () => {
    expect(sha256OfText('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
  });

  it('sha256OfText(any text) agrees with OpenSSL through node:crypto', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 300 }), (text) => {
        expect(sha256OfText(text)).toBe(createHash('sha256').update(text, 'utf8').digest('hex'));
      }),
      { numRuns: 100 }
    );
  });
});

describe('uuid7', () => {
  it('uuid7(time and bits of RFC 9562, A.6) is the UUID printed there', () => {
    const random = Uint8Array.of(0x0c, 0xc3, 0x18, 0xc4, 0xdc, 0x0c, 0x0c, 0x07, 0x39, 0x8f);
    expect(uuid7(0x017f22e279b0, random)).toBe('017f22e2-79b0-7cc3-98c4-dc0c0c07398f');
  });

  it('uuid7(too few random bytes) throws', () => {
    expect(() => uuid7(1, new Uint8Array(9))).toThrow('needs 10 random bytes, got 9');
  });
});
