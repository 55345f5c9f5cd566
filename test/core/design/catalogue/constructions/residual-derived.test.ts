import { expect, test } from 'vitest';
import { projectiveFlats } from '#lib/core/design/catalogue/constructions/finite-geometry.ts';
import { complement, derived, residual } from '#lib/core/design/catalogue/constructions/residual-derived.ts';
import { verifyBalanced } from '#lib/core/design/catalogue/verify-balanced.ts';

/** 15 treatments, 7 to a session, each pair three times. */
const PLANES = projectiveFlats(3, 2, 2)!;

test('residual(symmetric) has t − k treatments, k − λ to a session, each pair λ times', () => {
  expect(verifyBalanced(residual(PLANES), 8)).toEqual({ t: 8, b: 14, r: 7, k: 4, lambda: 3 });
});

test('derived(symmetric) has k treatments, λ to a session, each pair λ − 1 times', () => {
  expect(verifyBalanced(derived(PLANES), 7)).toEqual({ t: 7, b: 14, r: 6, k: 3, lambda: 2 });
});

test('complement(blocks, t) is balanced with b − 2r + λ, and its complement is the design again', () => {
  const left = complement(PLANES, 15);
  expect(verifyBalanced(left, 15)).toEqual({ t: 15, b: 15, r: 8, k: 8, lambda: 4 });
  expect(complement(left, 15)).toEqual(PLANES);
});
