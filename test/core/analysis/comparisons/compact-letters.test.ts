import fc from 'fast-check';
import { expect, test } from 'vitest';
import { compactLetters } from '#lib/core/analysis/comparisons/compact-letters.ts';

const lettersOf = (n: number, differs: (a: number, b: number) => boolean) => {
  const result = compactLetters(
    Array.from({ length: n }, (_, i) => i),
    differs
  );
  if (!result.ok) throw new Error(result.error.tag);
  return result.value.map((line) => line.letters);
};

test('compactLetters(ordered, differs) of Piepho’s pattern joins exactly the pairs that do not differ', () => {
  // H.-P. Piepho (2004), example of eight treatments with significant pairs, from memory of its section 2.
  const significant = new Set(['0 6', '0 7', '1 6', '1 7', '2 7', '3 4', '4 6', '4 7']);
  const differs = (a: number, b: number) => significant.has(`${Math.min(a, b)} ${Math.max(a, b)}`);
  const letters = lettersOf(8, differs);
  for (let a = 0; a < 8; a++) {
    for (let b = 0; b < a; b++) expect([...letters[a]!].some((l) => letters[b]!.includes(l))).toBe(!differs(a, b));
  }
});

test('compactLetters(ordered, differs) gives one letter when none differs and one each when all do', () => {
  expect(lettersOf(4, () => false)).toEqual(['a', 'a', 'a', 'a']);
  expect(lettersOf(4, () => true)).toEqual(['a', 'b', 'c', 'd']);
});

test('compactLetters(ordered, differs) of a sliding pattern is a, ab, bc, c', () => {
  expect(lettersOf(4, (a, b) => Math.abs(a - b) > 1)).toEqual(['a', 'ab', 'bc', 'c']);
});

test('compactLetters(ordered, differs) shares a letter exactly when a pair does not differ, for any pattern', () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 9 }), fc.array(fc.boolean(), { minLength: 36, maxLength: 36 }), (n, bits) => {
      const differs = (a: number, b: number) => {
        const [low, high] = a < b ? [a, b] : [b, a];
        return a !== b && bits[(high * (high - 1)) / 2 + low]!;
      };
      const letters = lettersOf(n, differs);
      for (let a = 0; a < n; a++) {
        expect(letters[a]).not.toBe('');
        for (let b = 0; b < a; b++) expect([...letters[a]!].some((l) => letters[b]!.includes(l))).toBe(!differs(a, b));
      }
    })
  );
});

test('compactLetters(100 treatments) keeps to few letters and one line each', () => {
  const letters = lettersOf(100, (a, b) => Math.abs(a - b) > 12);
  expect(new Set(letters.join('')).size).toBeLessThanOrEqual(88);
  expect(letters[0]).toBe('a');
});
