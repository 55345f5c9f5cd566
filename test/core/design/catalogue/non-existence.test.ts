import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { isOpen, nonExistence } from '#lib/core/design/catalogue/non-existence.ts';
import { parametersOf } from '#lib/core/design/catalogue/parameters.ts';

/** Anchors with the theorem of each non-existence in words; see `provenance` in the file. */
const { sets } = JSON.parse(readFileSync('test/reference/designs/existence.json', 'utf8')) as {
  sets: { v: number; r: number; k: number; status: string; reason: string }[];
};

const THEOREM: [RegExp, string][] = [
  [/^Hall-Connor/, 'hall-connor'],
  [/^Bruck-Ryser-Chowla/, 'bruck-ryser-chowla'],
  [/^affine plane of order 6/, 'affine-plane'],
  [/computer search/, 'computer-search']
];

test('nonExistence(p) names the theorem of every anchor that does not exist, and none for any other', () => {
  for (const { v, r, k, status, reason } of sets) {
    const expected = status === 'does not exist' ? THEOREM.find(([words]) => words.test(reason))?.[1] : undefined;
    expect([v, k, r, nonExistence(parametersOf(v, k, r)!)?.theorem]).toEqual([v, k, r, expected]);
  }
});

test('nonExistence(p) refuses by Fisher fewer sessions than treatments', () => {
  expect(nonExistence({ t: 16, b: 8, r: 3, k: 6, lambda: 1 })).toMatchObject({ theorem: 'fisher' });
});

test('isOpen(p) holds for the anchors listed as open and for no other', () => {
  const open = sets.filter(({ v, r, k }) => isOpen(parametersOf(v, k, r)!));
  expect(open).toEqual(sets.filter(({ status }) => status === 'open'));
  expect(open).toHaveLength(5);
});
