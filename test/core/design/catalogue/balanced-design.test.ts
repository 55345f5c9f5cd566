import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { balancedDesign } from '#lib/core/design/catalogue/balanced-design.ts';
import { verifyBalanced } from '#lib/core/design/catalogue/verify-balanced.ts';

interface AnchorSet {
  v: number;
  b: number;
  r: number;
  k: number;
  lam: number;
  status: string;
}

/** Anchors: existence of every admissible set with t ≤ 100 and r ≤ 15; `provenance` in the file says how each is known. */
const ANCHORS = JSON.parse(readFileSync('test/reference/designs/existence.json', 'utf8')) as {
  sets: AnchorSet[];
  complements: (AnchorSet & { complement_of: number[] })[];
  trivial_leave_one_out: AnchorSet[];
  fails_fisher: AnchorSet[];
};

const EXPECTED: Record<string, string> = { exists: 'exists', 'does not exist': 'impossible', open: 'open' };

/** The sets that are not answered as the anchor says, or whose design does not count out to the anchor's numbers. */
function wronglyAnswered(sets: readonly AnchorSet[]): string[] {
  return sets.flatMap(({ v, b, r, k, lam, status }) => {
    const answer = balancedDesign(v, k, r);
    const counted = answer.status === 'exists' ? verifyBalanced(answer.design.blocks, v) : null;
    const right =
      answer.status === EXPECTED[status] &&
      (answer.status !== 'exists' ||
        (counted?.t === v && counted.b === b && counted.r === r && counted.k === k && counted.lambda === lam));
    return right ? [] : [`t=${v} k=${k} r=${r}: ${answer.status}`];
  });
}

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

test('balancedDesign(t, k, r) answers every anchor of up to 10 replications as published', () => {
  expect(wronglyAnswered(ANCHORS.sets.filter(({ r }) => r <= 10))).toEqual([]);
});

test('balancedDesign(t, k, r) answers every complement of an anchor of up to 10 replications as published', () => {
  expect(wronglyAnswered(ANCHORS.complements.filter(({ complement_of }) => complement_of[2]! <= 10))).toEqual([]);
});

test('balancedDesign(t, t − 1, r) leaves one treatment out of each session', () => {
  expect(wronglyAnswered(ANCHORS.trivial_leave_one_out)).toEqual([]);
});

test('balancedDesign(t, k, r) refuses by Fisher every set with fewer sessions than treatments', () => {
  expect(wronglyAnswered(ANCHORS.fails_fisher)).toEqual([]);
  expect(balancedDesign(16, 6, 3)).toMatchObject({ status: 'impossible', theorem: 'fisher' });
});

test('balancedDesign(t, k, r) answers every anchor of 11 to 15 replications as published but one, which it says it did not find', () => {
  expect(wronglyAnswered(ANCHORS.sets.filter(({ r }) => r > 10))).toEqual(['t=28 k=10 r=15: not-found']);
});

test('balancedDesign(t, k, r) says impossible by divisibility when sessions or meetings come out broken', () => {
  expect(balancedDesign(8, 3, 4)).toMatchObject({ status: 'impossible', theorem: 'divisibility' });
  expect(balancedDesign(10, 4, 4)).toMatchObject({ status: 'impossible', theorem: 'divisibility' });
});

test('balancedDesign(t, t, r) puts every treatment into every session', () => {
  const answer = balancedDesign(4, 4, 3);
  expect(answer).toMatchObject({ status: 'exists', design: { b: 3, lambda: 3, constructionId: 'complete-blocks' } });
});

test('balancedDesign(t, k, r) gives the same blocks when it is asked again', () => {
  expect(balancedDesign(10, 3, 9)).toEqual(balancedDesign(10, 3, 9));
  expect(balancedDesign(21, 6, 12)).toEqual(balancedDesign(21, 6, 12));
});

test('balancedDesign(t, k, r) only ever gives sessions that count out to what was asked', () => {
  const question = fc
    .tuple(fc.integer({ min: 2, max: 14 }), fc.integer({ min: 2, max: 14 }), fc.integer({ min: 1, max: 12 }))
    .filter(([t, k, r]) => k <= t && (r * t) % k === 0 && (r * (k - 1)) % (t - 1) === 0);
  fc.assert(
    fc.property(question, ([t, k, r]) => {
      const answer = balancedDesign(t, k, r);
      if (answer.status !== 'exists') return;
      expect(verifyBalanced(answer.design.blocks, t)).toEqual({
        t,
        b: (r * t) / k,
        r,
        k,
        lambda: (r * (k - 1)) / (t - 1)
      });
    }),
    { numRuns: 60 }
  );
});
