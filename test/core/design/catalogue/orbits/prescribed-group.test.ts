import { expect, test } from 'vitest';
import { orbitShapes, prescribedGroup } from '#lib/core/design/catalogue/orbits/prescribed-group.ts';

const recipe = { moduli: [13], copies: 1, fixed: 0, multipliers: 1 };

test('prescribedGroup(recipe) lists every map x → ax + s once', () => {
  const { group } = prescribedGroup({ ...recipe, multipliers: 3, copies: 2 })!;
  expect([group.degree, group.elements.length]).toEqual([26, 39]);
  expect(new Set(group.elements.map(String)).size).toBe(39);
  for (const g of group.elements) expect(new Set(g).size).toBe(26);
});

test('prescribedGroup(recipe) gives null when there are no multipliers of that order', () => {
  expect(prescribedGroup({ ...recipe, multipliers: 5 })).toBeNull();
  expect(prescribedGroup({ ...recipe, moduli: [4, 2], multipliers: 3 })).toBeNull();
});

test('prescribedGroup([3, 3], 4 multipliers) multiplies in the field of nine elements', () => {
  const { group } = prescribedGroup({ moduli: [3, 3], copies: 1, fixed: 0, multipliers: 4 })!;
  expect(group.elements).toHaveLength(36);
  expect(new Set(group.elements.map(String)).size).toBe(36);
});

test('orbitShapes(group, p) only lists shapes that add up to b sessions', () => {
  const prescribed = prescribedGroup({ moduli: [12], copies: 1, fixed: 0, multipliers: 1 })!;
  const shapes = orbitShapes(prescribed, { t: 12, b: 33, r: 11, k: 4, lambda: 3 });
  expect(shapes.length).toBeGreaterThan(0);
  for (const shape of shapes) {
    expect(shape.reduce((sum, { stabiliser, count }) => sum + (count * 12) / stabiliser.length, 0)).toBe(33);
  }
});
