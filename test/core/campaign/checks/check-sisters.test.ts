import fc from 'fast-check';
import { expect, test } from 'vitest';
import { checkSisters } from '#lib/core/campaign/checks/check-sisters.ts';

/** Invented masses of one kind of panel. */
const masses = [44.21, 45.3, 43.9];

test('checkSisters(value, plain, sisters) offers the decimal sign that brings a value back among its sisters', () => {
  expect(checkSisters(442.1, '442.1', masses)).toEqual({
    check: 'slip',
    value: 442.1,
    candidates: [{ value: 44.21, how: 'decimal', factor: 0.1 }]
  });
  expect(checkSisters(4.39, '4.39', masses)).toMatchObject({ candidates: [{ value: 43.9 }] });
});

test('checkSisters(value, plain, sisters) tells inch from millimetre by the smaller distance', () => {
  // 44.21 / 25.4 = 1.741 in; times 10 it would be 17.41.
  expect(checkSisters(1.741, '1.741', masses)).toMatchObject({
    candidates: [{ value: 44.2214, how: 'inch', factor: 25.4 }]
  });
});

test('checkSisters(value, plain, sisters) speaks from the second reading on', () => {
  expect(checkSisters(442.1, '442.1', [])).toBeNull();
  expect(checkSisters(442.1, '442.1', [44.5])).not.toBeNull();
});

test('checkSisters(value, plain, sisters) is silent about twice and half of what came before', () => {
  for (const n of [1, 2, 3])
    for (const value of [22, 30, 60, 88]) expect(checkSisters(value, String(value), masses.slice(0, n))).toBeNull();
});

test('checkSisters(value, plain, sisters) is silent where sisters lie decades apart, or on both sides of zero', () => {
  expect(checkSisters(120, '120', [3, 41, 900, 15])).toBeNull();
  expect(checkSisters(0.5, '0.5', [0.04, -0.03, 0.05])).toBeNull();
  expect(checkSisters(0, '0', masses)).toBeNull();
});

test('checkSisters(c·value, …, c·sisters) says the same in every unit', () => {
  const places = fc.integer({ min: -6, max: 6 });
  fc.assert(
    fc.property(fc.array(fc.integer({ min: 30, max: 60 }), { minLength: 1, maxLength: 8 }), places, (sisters, e) => {
      const at = (x: number) => Number(`${x}e${e}`);
      for (const typed of [4, 45, 450]) {
        const here = checkSisters(typed, String(typed), sisters);
        const there = checkSisters(at(typed), `${typed}e${e}`, sisters.map(at));
        expect(there === null).toBe(here === null);
      }
    })
  );
});
