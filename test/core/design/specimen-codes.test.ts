import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { checkCharacter, endsInCheckCharacter } from '#lib/core/design/check-character.ts';
import { CODE_ALPHABET, checkCode, drawSpecimenCodes } from '#lib/core/design/specimen-codes.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';

describe('checkCharacter', () => {
  test('checkCharacter(text) gives the published worked example of MOD 37-2', () => {
    // UK Blood Services, Red Book, annex 2: donation number G123 498 654 321, sum 148354, check value 17 = H.
    expect(checkCharacter('G123498654321')).toBe('H');
    expect(endsInCheckCharacter('G123498654321H')).toBe(true);
  });

  test('checkCharacter(text) refuses characters without a value', () => {
    for (const text of ['a', 'A*', 'Ä', 'A B']) expect(() => checkCharacter(text)).toThrow(RangeError);
    expect(endsInCheckCharacter('')).toBe(false);
    expect(endsInCheckCharacter('1')).toBe(false);
  });

  test('endsInCheckCharacter(text) holds for every text with its check character', () => {
    fc.assert(
      fc.property(fc.stringMatching(/^[0-9A-Z]{1,30}$/), (text) => endsInCheckCharacter(text + checkCharacter(text)))
    );
  });
});

describe('specimen codes', () => {
  const codes = drawSpecimenCodes(2000, seededRandom('codes'));

  test('drawSpecimenCodes(count, random) draws different, short codes of the alphabet', () => {
    expect(new Set(codes).size).toBe(2000);
    for (const code of codes) {
      expect(code.length).toBeLessThanOrEqual(6);
      expect([...code].every((character) => CODE_ALPHABET.includes(character))).toBe(true);
      expect(checkCode(code)).toEqual({ tag: 'good', code });
    }
    expect(drawSpecimenCodes(36, seededRandom('small')).every((code) => code.length === 4)).toBe(true);
    expect(drawSpecimenCodes(0, seededRandom('none'))).toEqual([]);
  });

  test('drawSpecimenCodes(count, random) repeats for the same seed', () => {
    expect(drawSpecimenCodes(2000, seededRandom('codes'))).toEqual(codes);
    expect(drawSpecimenCodes(2000, seededRandom('other'))).not.toEqual(codes);
  });

  test('checkCode(code) finds every single wrong character and every swap of neighbours', () => {
    for (const code of codes.slice(0, 200)) {
      for (let place = 0; place < code.length; place++) {
        for (const wrong of CODE_ALPHABET) {
          if (wrong === code[place]) continue;
          const typed = code.slice(0, place) + wrong + code.slice(place + 1);
          expect(checkCode(typed).tag).toBe('wrong-check-character');
        }
        const [here, next] = [code[place], code[place + 1]];
        if (next === undefined || next === here) continue;
        expect(checkCode(code.slice(0, place) + next + here + code.slice(place + 2)).tag).toBe('wrong-check-character');
      }
    }
  });

  test('checkCode(typed) reads small letters, spaces and hyphens, and names what is foreign', () => {
    const code = codes[0]!;
    expect(checkCode(` ${code.slice(0, 2).toLowerCase()}-${code.slice(2)} `)).toEqual({ tag: 'good', code });
    expect(checkCode('')).toEqual({ tag: 'empty' });
    expect(checkCode('O7')).toEqual({ tag: 'foreign-character', character: 'O' });
  });
});
