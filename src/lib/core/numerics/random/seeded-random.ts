import { sha256 } from '@noble/hashes/sha2.js';
import { utf8ToBytes } from '@noble/hashes/utils.js';
import { xoroshiro128plusFromState } from 'pure-rand/generator/xoroshiro128plus';

/** Name and version stored with whatever was drawn. A change of any rule below is a new version. */
export const GENERATOR = { name: 'xoroshiro128plus', version: 1 } as const;

/** A stream of pseudo-random numbers that depends on its seed and on nothing else. */
export interface SeededRandom {
  readonly name: typeof GENERATOR.name;
  readonly version: typeof GENERATOR.version;
  /** An unsigned 32-bit integer. */
  bits(): number;
  /** A number in [0, 1) with 53 random bits. */
  next(): number;
  /** An integer in 0 … n − 1, each equally likely (n from 1 to 2³¹). */
  below(n: number): number;
  /** Shuffles the array in place (Fisher–Yates), each order equally likely, and returns it. */
  shuffle<T>(array: T[]): T[];
}

/**
 * Returns the random stream of a seed: the same numbers on every device, for ever.
 *
 * Rules of version 1: the state is the first 16 bytes (big-endian 32-bit words) of the SHA-256 of the seed's UTF-8
 * text; the generator is xoroshiro128+ (rotations 24, 16, 37), low 32 bits of each output; `below` takes the top
 * ⌈log₂ n⌉ bits of a word and rejects what is not below n; `next` joins 27 and 26 top bits of two words. Only integer
 * arithmetic is used, so no engine can differ.
 *
 * @param seed any text or number; a number is read as its decimal text
 *
 * **Source**: Blackman & Vigna (2021), Scrambled linear pseudorandom number generators, ACM TOMS 47(4), 36, through the
 * package pure-rand; Durstenfeld (1964), CACM 7, 420, for the shuffle.
 * **Checked by** test/core/numerics/random/seeded-random.test.ts
 */
export function seededRandom(seed: string | number): SeededRandom {
  const digest = sha256(utf8ToBytes(String(seed)));
  const word = (at: number): number =>
    (digest[at]! << 24) | (digest[at + 1]! << 16) | (digest[at + 2]! << 8) | digest[at + 3]! | 0;
  const generator = xoroshiro128plusFromState([word(0), word(4), word(8), word(12)]);

  const bits = (): number => generator.next() >>> 0;
  const next = (): number => {
    const high = bits() >>> 5;
    return (high * 67108864 + (bits() >>> 6)) / 9007199254740992;
  };
  const below = (n: number): number => {
    if (!Number.isInteger(n) || n < 1 || n > 2147483648) throw new RangeError(`below: n is ${n}, not 1 to 2^31`);
    if (n === 1) return 0;
    const shift = Math.clz32(n - 1);
    let value = bits() >>> shift;
    while (value >= n) value = bits() >>> shift;
    return value;
  };
  const shuffle = <T>(array: T[]): T[] => {
    for (let last = array.length - 1; last > 0; last--) {
      const other = below(last + 1);
      const moved = array[last]!;
      array[last] = array[other]!;
      array[other] = moved;
    }
    return array;
  };
  return { ...GENERATOR, bits, next, below, shuffle };
}
