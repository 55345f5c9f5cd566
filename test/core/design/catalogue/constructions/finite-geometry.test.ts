import { expect, test } from 'vitest';
import { affineFlats, projectiveFlats } from '#lib/core/design/catalogue/constructions/finite-geometry.ts';
import { verifyBalanced } from '#lib/core/design/catalogue/verify-balanced.ts';

test.each([2, 3, 4, 5, 7, 8, 9])(
  'projectiveFlats(2, 1, %i) is a plane in which any two points lie on one line',
  (q) => {
    const t = q * q + q + 1;
    expect(verifyBalanced(projectiveFlats(2, 1, q)!, t)).toEqual({ t, b: t, r: q + 1, k: q + 1, lambda: 1 });
  }
);

test('projectiveFlats(n, d, q) gives the published parameters of spaces', () => {
  // Beth, Jungnickel & Lenz (1999), Design Theory, table A1 (from memory): PG(3,2) lines and planes, PG(3,3) lines.
  expect(verifyBalanced(projectiveFlats(3, 1, 2)!, 15)).toMatchObject({ b: 35, r: 7, k: 3, lambda: 1 });
  expect(verifyBalanced(projectiveFlats(3, 2, 2)!, 15)).toMatchObject({ b: 15, r: 7, k: 7, lambda: 3 });
  expect(verifyBalanced(projectiveFlats(3, 1, 3)!, 40)).toMatchObject({ b: 130, r: 13, k: 4, lambda: 1 });
});

test('affineFlats(n, d, q) gives the published parameters, parallel flats one after the other', () => {
  expect(verifyBalanced(affineFlats(2, 1, 5)!, 25)).toMatchObject({ b: 30, r: 6, k: 5, lambda: 1 });
  expect(verifyBalanced(affineFlats(3, 2, 3)!, 27)).toMatchObject({ b: 39, r: 13, k: 9, lambda: 4 });
  const blocks = affineFlats(3, 1, 2)!;
  for (let i = 0; i < blocks.length; i += 4) expect(new Set(blocks.slice(i, i + 4).flat()).size).toBe(8);
});

test('projectiveFlats(2, 1, 6) and affineFlats(2, 1, 6) give null: there is no field of order 6', () => {
  expect([projectiveFlats(2, 1, 6), affineFlats(2, 1, 6)]).toEqual([null, null]);
});
