import { expect, test } from 'vitest';
import { verifyBalanced } from '#lib/core/design/catalogue/verify-balanced.ts';

// R. A. Fisher & F. Yates (1963), Statistical Tables, table XVIII: the plane of seven points (from memory).
const SEVEN = [0, 1, 2, 3, 4, 5, 6].map((i) => [i, (i + 1) % 7, (i + 3) % 7]);

test('verifyBalanced(blocks, t) counts t, b, r, k and λ of a balanced design', () => {
  expect(verifyBalanced(SEVEN, 7)).toEqual({ t: 7, b: 7, r: 3, k: 3, lambda: 1 });
});

test('verifyBalanced(blocks, t) refuses a design in which one pair meets too often', () => {
  expect(verifyBalanced([...SEVEN.slice(1), [0, 1, 2]], 7)).toBeNull();
});

test('verifyBalanced(blocks, t) refuses a ring of pairs, in which every treatment comes equally often but not every pair', () => {
  expect(
    verifyBalanced(
      [
        [0, 1],
        [1, 2],
        [2, 3],
        [3, 0]
      ],
      4
    )
  ).toBeNull();
});

test('verifyBalanced(blocks, t) refuses a treatment twice in a session', () => {
  expect(
    verifyBalanced(
      [
        [0, 0, 1],
        [1, 1, 2],
        [2, 2, 0]
      ],
      3
    )
  ).toBeNull();
});

test('verifyBalanced(blocks, t) refuses sessions of unequal size, a treatment never used and no sessions at all', () => {
  expect(
    verifyBalanced(
      [
        [0, 1],
        [0, 1, 2]
      ],
      3
    )
  ).toBeNull();
  expect(
    verifyBalanced(
      [
        [0, 1],
        [0, 2],
        [1, 2]
      ],
      4
    )
  ).toBeNull();
  expect(verifyBalanced([], 4)).toBeNull();
});
