import fc from 'fast-check';
import { expect, test } from 'vitest';
import { parseContrast } from '#lib/core/analysis/comparisons/parse-contrast.ts';

const names = ['A', 'B', 'C', 'Matt White', 'Silk-2', 'Silk', '2'];
const weights = (text: string) => {
  const result = parseContrast(text, names);
  if (!result.ok) throw new Error(JSON.stringify(result.error));
  return [...result.value].map((w) => Number(w.toFixed(12)) + 0);
};

test.each([
  ['A - B', [1, -1, 0, 0, 0, 0, 0]],
  ['A − B', [1, -1, 0, 0, 0, 0, 0]],
  ['a-b', [1, -1, 0, 0, 0, 0, 0]],
  ['(A+B)/2 - C', [0.5, 0.5, -1, 0, 0, 0, 0]],
  ['0,5 A + ½B − C', [0.5, 0.5, -1, 0, 0, 0, 0]],
  ['2A - (B + C)', [2, -1, -1, 0, 0, 0, 0]],
  ['2*(A - B) : 4', [0.5, -0.5, 0, 0, 0, 0, 0]],
  ['-A + B', [-1, 1, 0, 0, 0, 0, 0]],
  ['matt  white - A', [-1, 0, 0, 1, 0, 0, 0]],
  ['Silk-2 - Silk', [0, 0, 0, 0, 1, -1, 0]],
  ['Silk - 2', [0, 0, 0, 0, 0, 1, -1]],
  ['"2" - A', [-1, 0, 0, 0, 0, 0, 1]],
  ['(A + "2")/2 - B', [0.5, -1, 0, 0, 0, 0, 0.5]],
  ['A × 3 ÷ 3 − B', [1, -1, 0, 0, 0, 0, 0]]
])('parseContrast(%s) gives the weights', (text, expected) => {
  expect(weights(text)).toEqual(expected);
});

test.each([
  ['  ', { tag: 'empty' }],
  ['A - D', { tag: 'unknown-name', at: 4, found: 'D' }],
  ['A - Matt', { tag: 'unknown-name', at: 4, found: 'Matt' }],
  ['A -', { tag: 'ended-early' }],
  ['(A - B', { tag: 'unclosed', at: 0 }],
  ['A - B)', { tag: 'unexpected', at: 5, found: ')' }],
  ['A ^ B', { tag: 'unexpected', at: 2, found: '^' }],
  ['A * B', { tag: 'product-of-treatments', at: 2 }],
  ['A / B', { tag: 'division-by-treatments', at: 2 }],
  ['(A - B)/0', { tag: 'division-by-zero', at: 7 }],
  ['A - B + 3', { tag: 'number-without-treatment', constant: 3 }],
  ['A + B', { tag: 'weights-do-not-cancel', sum: 2 }],
  ['A', { tag: 'weights-do-not-cancel', sum: 1 }],
  ['A - A', { tag: 'nothing-left' }]
])('parseContrast(%s) says what is wrong', (text, error) => {
  expect(parseContrast(text, names)).toEqual({ ok: false, error });
});

test('parseContrast(any text) never throws', () => {
  const piece = fc.constantFrom(
    'A',
    'B',
    'Silk-2',
    '(',
    ')',
    '+',
    '-',
    '*',
    '/',
    '2',
    '0',
    '½',
    ' ',
    '"',
    'x',
    '.',
    ','
  );
  fc.assert(
    fc.property(
      fc.oneof(
        fc.string(),
        fc.array(piece).map((p) => p.join(''))
      ),
      (text) => {
        const result = parseContrast(text, names);
        if (result.ok) {
          const sum = result.value.reduce((s, w) => s + w, 0);
          const size = result.value.reduce((s, w) => s + Math.abs(w), 0);
          expect(Math.abs(sum)).toBeLessThanOrEqual(1e-9 * size);
        }
      }
    ),
    { numRuns: 500 }
  );
});

test('parseContrast(nested brackets) refuses what is too deep', () => {
  expect(parseContrast('('.repeat(500) + 'A - B' + ')'.repeat(500), names).ok).toBe(false);
});
