import { expect, test } from 'vitest';
import { allCombinations } from '#lib/core/design/catalogue/all-combinations.ts';
import { affineFlats } from '#lib/core/design/catalogue/constructions/finite-geometry.ts';
import { findResolution, isResolution } from '#lib/core/design/catalogue/resolution/find-resolution.ts';

test('findResolution(all pairs of t) finds the rounds of an even number of treatments', () => {
  for (const t of [4, 6, 8, 10]) {
    const blocks = allCombinations(t, 2);
    const classes = findResolution(blocks, t, 20_000)!;
    expect(classes).toHaveLength(t - 1);
    expect(isResolution(classes, blocks, t)).toBe(true);
  }
});

test('findResolution(lines of an affine plane, shuffled) finds the parallel lines', () => {
  const blocks = affineFlats(2, 1, 5)!;
  const shuffled = blocks.map((_, i) => blocks[(i * 7) % 30]!);
  expect(isResolution(findResolution(shuffled, 25, 20_000)!, shuffled, 25)).toBe(true);
});

test('findResolution(blocks, t) gives null when no parallel class exists and when its steps run out', () => {
  expect(
    findResolution(
      [
        [0, 1],
        [0, 2],
        [0, 3],
        [1, 2],
        [1, 3],
        [1, 3]
      ],
      4,
      1000
    )
  ).toBeNull();
  expect(findResolution(allCombinations(10, 2), 10, 5)).toBeNull();
});

test('isResolution(classes, blocks, t) refuses a block used twice, one left out, and a class that repeats a treatment', () => {
  const blocks = [
    [0, 1],
    [2, 3],
    [0, 2],
    [1, 3]
  ];
  expect(
    isResolution(
      [
        [0, 1],
        [2, 3]
      ],
      blocks,
      4
    )
  ).toBe(true);
  expect(
    isResolution(
      [
        [0, 1],
        [0, 1]
      ],
      blocks,
      4
    )
  ).toBe(false);
  expect(isResolution([[0, 1]], blocks, 4)).toBe(false);
  expect(
    isResolution(
      [
        [0, 2],
        [1, 3]
      ],
      blocks,
      4
    )
  ).toBe(false);
  expect(isResolution([[0, 1, 2, 3]], blocks, 4)).toBe(false);
});
