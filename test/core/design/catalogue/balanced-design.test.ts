import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { balancedDesign } from '#lib/core/design/catalogue/balanced-design.ts';
import { verifyBalanced } from '#lib/core/design/catalogue/verify-balanced.ts';

/** Anchors: existence of every admissible set with t ≤ 100 and r ≤ 15; see `provenance` in the file. */
const ANCHORS = JSON.parse(readFileSync('test/reference/designs/existence.json', 'utf8')) as {
  sets: { v: number; b: number; r: number; k: number; lam: number; status: string }[];
};

test('balancedDesign(t, k, r) gives the textbook numbers of sessions for 5 and 6 treatments', () => {
  // Cochran & Cox (1957), Experimental Designs, table 11.3 (from memory).
  const sessions = (t: number, k: number, r: number) => {
    const answer = balancedDesign(t, k, r);
    return answer.status === 'exists' ? verifyBalanced(answer.design.blocks, t) : answer;
  };
  expect(sessions(5, 4, 4)).toMatchObject({ b: 5, lambda: 3 });
  expect(sessions(5, 3, 6)).toMatchObject({ b: 10, lambda: 3 });
  expect(sessions(5, 2, 4)).toMatchObject({ b: 10, lambda: 1 });
  expect(sessions(6, 3, 10)).toMatchObject({ b: 20, lambda: 4 });
  expect(sessions(6, 3, 5)).toMatchObject({ b: 10, lambda: 2 });
});

test('balancedDesign(t, k, r) answers impossible or open as published for every anchor of up to 15 replications', () => {
  const wrong = ANCHORS.sets
    .filter((set) => set.status !== 'exists')
    .map((set) => ({ ...set, answer: balancedDesign(set.v, set.k, set.r).status }))
    .filter((set) => set.answer !== (set.status === 'open' ? 'open' : 'impossible'));
  expect(wrong).toEqual([]);
});
