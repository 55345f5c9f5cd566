import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { checkCharacter, endsInCheckCharacter } from './check-character.ts';

/**
 * The characters of specimen codes. Left out: what is taken for another character in handwriting, on a worn label or
 * upside down (0 O D Q, 1 I L J, 2 Z, 5 S, 6 G, 8 B, U V W M N), and vowels, so that no code is a word. Common practice,
 * no source.
 */
export const CODE_ALPHABET = '3479CFHKPRTXY';

/** How many codes exist for each one that is issued, so that a guessed or misread code is hardly ever another's. */
const SPARE = 8;

/**
 * Returns `count` different specimen codes drawn at random: short, without look-alikes, ending in an ISO/IEC 7064
 * MOD 37-2 check character that is itself of the alphabet. Any two differ in at least two places.
 *
 * The body has the fewest characters (three at least) that leave eight times as many codes as are asked for; a body
 * whose check character is not of the alphabet is drawn again.
 *
 * **Checked by** test/core/design/specimen-codes.test.ts
 */
export function drawSpecimenCodes(count: number, random: SeededRandom): string[] {
  const size = CODE_ALPHABET.length;
  let length = 3;
  while ((size ** length * size) / 37 < SPARE * count) length++;
  const codes = new Set<string>();
  while (codes.size < count) {
    let body = '';
    for (let i = 0; i < length; i++) body += CODE_ALPHABET[random.below(size)]!;
    const check = checkCharacter(body);
    if (CODE_ALPHABET.includes(check)) codes.add(body + check);
  }
  return [...codes];
}

/** What a typed or scanned specimen code is: good (as it is stored), or with the reason why it cannot be one. */
export type CodeCheck =
  | { tag: 'good'; code: string }
  | { tag: 'empty' }
  | { tag: 'foreign-character'; character: string }
  | { tag: 'wrong-check-character' };

/**
 * Returns what a typed specimen code is. Spaces and hyphens are dropped and small letters read as capitals.
 *
 * Every single wrong character and every swap of two neighbours in a good code is found (ISO/IEC 7064 MOD 37-2).
 *
 * **Checked by** test/core/design/specimen-codes.test.ts
 */
export function checkCode(typed: string): CodeCheck {
  const code = typed.replace(/[\s-]/gu, '').toUpperCase();
  if (code === '') return { tag: 'empty' };
  for (const character of code) if (!CODE_ALPHABET.includes(character)) return { tag: 'foreign-character', character };
  return endsInCheckCharacter(code) ? { tag: 'good', code } : { tag: 'wrong-check-character' };
}
