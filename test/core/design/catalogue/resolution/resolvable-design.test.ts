import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { balancedDesign } from '#lib/core/design/catalogue/balanced-design.ts';
import { isResolution } from '#lib/core/design/catalogue/resolution/find-resolution.ts';
import { verifyBalanced } from '#lib/core/design/catalogue/verify-balanced.ts';

/** Anchors: whether the sessions of each set can fall into groups that hold each treatment once; see `prov` in the file. */
const { sets } = JSON.parse(readFileSync('test/reference/designs/existence.json', 'utf8')) as {
  sets: { v: number; r: number; k: number; status: string; resolvable: { status: string; why: string } }[];
};

const asked = (v: number, k: number, r: number) => balancedDesign(v, k, r, { resolvable: true });

test('balancedDesign(…, {resolvable: true}) finds parallel classes for every anchor that is known to have them', () => {
  const resolvable = sets.filter((set) => set.resolvable.status === 'yes');
  expect(resolvable).toHaveLength(40);
  for (const { v, k, r } of resolvable) {
    const answer = asked(v, k, r);
    if (answer.status !== 'exists') throw new Error(`t=${v} k=${k} r=${r}: ${answer.status}`);
    const { blocks, resolution } = answer.design;
    expect(verifyBalanced(blocks, v)).toMatchObject({ t: v, k, r });
    expect(resolution).toHaveLength(r);
    expect(isResolution(resolution!, blocks, v)).toBe(true);
  }
});

test('balancedDesign(…, {resolvable: true}) says impossible for every anchor that cannot have parallel classes', () => {
  const impossible = sets.filter((set) => ['no', 'n/a'].includes(set.resolvable.status) && set.status !== 'open');
  const wrong = impossible.filter(({ v, k, r }) => {
    const { status } = asked(v, k, r);
    // 51 in sixes and the like: open as designs, impossible as resolvable ones only when the theorem says so.
    return status !== 'impossible';
  });
  expect(wrong).toEqual([]);
});

test('balancedDesign(…, {resolvable: true}) says open for 45 treatments in fives', () => {
  expect(asked(45, 5, 11).status).toBe('open');
});

test('balancedDesign(15, 5, 14, {resolvable: true}) is impossible by the search of Kaski and Östergård (2001)', () => {
  expect(asked(15, 5, 14)).toMatchObject({ status: 'impossible', theorem: 'computer-search' });
});

test('balancedDesign(…, {resolvable: true}) solves the schoolgirl problem and its larger sisters', () => {
  // T. P. Kirkman (1850): 15 girls, three abreast, seven days.
  for (const t of [15, 21, 27, 39, 51, 57, 63, 75, 93]) {
    const answer = asked(t, 3, (t - 1) / 2);
    expect(answer).toMatchObject({ status: 'exists', design: { lambda: 1 } });
  }
});

test('balancedDesign(t, k, r) without the wish still gives parallel classes where the construction has them', () => {
  for (const [t, k, r] of [
    [9, 3, 4],
    [8, 2, 7],
    [8, 4, 7],
    [16, 4, 5]
  ] as const) {
    const answer = balancedDesign(t, k, r);
    expect(answer).toMatchObject({ status: 'exists', design: { resolution: expect.any(Array) as unknown } });
  }
});
