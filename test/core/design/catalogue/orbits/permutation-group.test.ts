import { expect, test } from 'vitest';
import { abelianGroup, abelianModuli } from '#lib/core/design/catalogue/orbits/abelian-group.ts';
import { affineOnPairsAndPlanes } from '#lib/core/design/catalogue/orbits/affine-line.ts';
import { generateGroup, scale, shift } from '#lib/core/design/catalogue/orbits/permutation-group.ts';
import { finiteField } from '#lib/core/numerics/finite-field.ts';

test('abelianModuli(n) lists as many groups as there are abelian groups of order n', () => {
  // On-Line Encyclopedia of Integer Sequences, A000688 (from memory).
  expect([1, 2, 4, 8, 12, 16, 30, 36, 64, 72].map((n) => abelianModuli(n).length)).toEqual([
    1, 1, 2, 3, 2, 5, 1, 4, 11, 6
  ]);
  for (const moduli of abelianModuli(72)) expect(moduli.reduce((x, y) => x * y, 1)).toBe(72);
  expect(abelianModuli(45)).toEqual([[45], [15, 3]]);
});

test('abelianGroup([p, p, …]) adds like the field of that order', () => {
  const field = finiteField(27)!;
  const group = abelianGroup([3, 3, 3]);
  for (let a = 0; a < 27; a++) for (let b = 0; b < 27; b++) expect(group.add(a, b)).toBe(field.add(a, b));
});

test('generateGroup([shift, scale]) has the order of the affine group they generate', () => {
  const layout = { n: 7, copies: 4, fixed: 3 };
  expect(generateGroup([shift(layout)], '').elements).toHaveLength(7);
  expect(generateGroup([shift(layout), scale(layout, 2, [1, 2, 0, 3], [1, 2, 0])], '').elements).toHaveLength(21);
  expect(
    generateGroup([shift({ n: 13, copies: 1, fixed: 0 }), scale({ n: 13, copies: 1, fixed: 0 }, 2)], '').elements
  ).toHaveLength(156);
});

test('affineOnPairsAndPlanes() has the 56 maps of GF(8), permutes its 71 points, and moves pairs and planes apart', () => {
  const { degree, elements } = affineOnPairsAndPlanes();
  expect([degree, elements.length]).toEqual([71, 56]);
  for (const g of elements) {
    expect(new Set(g).size).toBe(71);
    expect(g[70]).toBe(70);
  }
  expect(new Set(elements.map((g) => g[0])).size).toBe(56);
  expect(new Set(elements.map((g) => g[56])).size).toBe(14);
});
