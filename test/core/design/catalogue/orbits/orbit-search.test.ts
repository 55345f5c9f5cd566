import { expect, test } from 'vitest';
import { develop } from '#lib/core/design/catalogue/orbits/develop.ts';
import { orbitSearch } from '#lib/core/design/catalogue/orbits/orbit-search.ts';
import { pairOrbits } from '#lib/core/design/catalogue/orbits/pair-orbits.ts';
import { generateGroup, shift } from '#lib/core/design/catalogue/orbits/permutation-group.ts';
import { verifyBalanced } from '#lib/core/design/catalogue/verify-balanced.ts';

const cyclic = (n: number) => generateGroup([shift({ n, copies: 1, fixed: 0 })], `Z_${n}`);
const EFFORT = { tries: 5, steps: 5000 };

test('pairOrbits(Z_n) has one orbit for each difference up to sign, the half one short', () => {
  expect(pairOrbits(cyclic(7)).size).toEqual([7, 7, 7]);
  expect(pairOrbits(cyclic(8)).size).toEqual([8, 8, 8, 4]);
});

test('orbitSearch(Z_13, 4, 1) finds a perfect difference set', () => {
  const group = cyclic(13);
  const base = orbitSearch(group, 4, 1, [{ stabiliser: [group.elements[0]!], count: 1 }], EFFORT)!;
  expect(verifyBalanced(develop(group, base), 13)).toEqual({ t: 13, b: 13, r: 4, k: 4, lambda: 1 });
});

test('orbitSearch(Z_15, 3, 1) finds base blocks with one short orbit', () => {
  const group = cyclic(15);
  const thirds = group.elements.filter((g) => g[0]! % 5 === 0);
  const shapes = [
    { stabiliser: thirds, count: 1 },
    { stabiliser: [group.elements[0]!], count: 2 }
  ];
  const base = orbitSearch(group, 3, 1, shapes, EFFORT)!;
  expect(verifyBalanced(develop(group, base), 15)).toEqual({ t: 15, b: 35, r: 7, k: 3, lambda: 1 });
});

test('orbitSearch(Z_9, 3, 1) gives null: no Steiner triple system on nine points is cyclic', () => {
  // R. Peltesohn (1939), Compositio Math. 6, 251–257: cyclic ones exist for all t ≡ 1, 3 (mod 6) but 9.
  const group = cyclic(9);
  const thirds = group.elements.filter((g) => g[0]! % 3 === 0);
  const shapes = [
    { stabiliser: thirds, count: 1 },
    { stabiliser: [group.elements[0]!], count: 1 }
  ];
  expect(orbitSearch(group, 3, 1, shapes, EFFORT)).toBeNull();
});

test('orbitSearch(group, k, λ) gives null when its steps run out, and the same base blocks at every call', () => {
  const group = cyclic(31);
  const shapes = [{ stabiliser: [group.elements[0]!], count: 2 }];
  expect(orbitSearch(group, 6, 2, shapes, { tries: 1, steps: 10 })).toBeNull();
  const first = orbitSearch(group, 6, 2, shapes, { tries: 200, steps: 500 });
  expect(first).not.toBeNull();
  expect(orbitSearch(group, 6, 2, shapes, { tries: 200, steps: 500 })).toEqual(first);
});

test('develop(group, base) keeps a block once for each image when part of the group keeps it in place', () => {
  const group = cyclic(6);
  expect(develop(group, [{ block: [0, 3], stabiliser: 2 }])).toEqual([
    [0, 3],
    [1, 4],
    [2, 5]
  ]);
  expect(develop(group, [{ block: [0, 1], stabiliser: 1 }])).toHaveLength(6);
});
