const VALUES = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ*';

/** Σ aᵢ·2ⁱ mod 37 over the characters, the rightmost at the given power; undefined when a character has no value. */
function weightedSum(text: string, lastPower: number): number | undefined {
  let sum = 0;
  for (const character of text) {
    const value = VALUES.indexOf(character);
    if (value < 0) return undefined;
    sum = (sum * 2 + value) % 37;
  }
  return (sum * 2 ** lastPower) % 37;
}

/**
 * Returns the check character of a text by ISO/IEC 7064 MOD 37-2.
 *
 * `c = (1 − Σ aᵢ 2ⁱ) mod 37`, i counted from 1 at the rightmost character; 0–9, A–Z, * stand for 0 … 36. The modulus is
 * prime and 2 generates its multiplicative group (order 36), so every single wrong character and every swap of two
 * neighbours is found, the check character included.
 *
 * @param text characters 0–9 and A–Z, at most 35 of them
 *
 * **Source**: ISO/IEC 7064:2003, clause 7 (pure systems with one check character); the recipe and the table as printed
 * in the UK Blood Services' Red Book, annex 2, *ISBT 128 check character calculation*.
 * **Checked by** test/core/design/specimen-codes.test.ts
 */
export function checkCharacter(text: string): string {
  const sum = text.includes('*') ? undefined : weightedSum(text, 1);
  if (sum === undefined) throw new RangeError(`checkCharacter: "${text}" has a character other than 0-9 and A-Z`);
  return VALUES[(38 - sum) % 37]!;
}

/** Whether the last character of the text is the ISO/IEC 7064 MOD 37-2 check character of the rest. */
export const endsInCheckCharacter = (text: string): boolean =>
  text.length >= 2 && !text.slice(0, -1).includes('*') && weightedSum(text, 0) === 1;
