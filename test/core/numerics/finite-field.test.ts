import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { finiteField } from '#lib/core/numerics/finite-field.ts';
import { primePower } from '#lib/core/numerics/prime-power.ts';

const ORDERS = [2, 3, 4, 5, 7, 8, 9, 11, 13, 16, 25, 27, 32, 49, 64, 81, 121, 125, 128];

describe.each(ORDERS)('finiteField(%i)', (q) => {
  const field = finiteField(q)!;
  const element = fc.integer({ min: 0, max: q - 1 });

  test('obeys the laws of a field', () => {
    fc.assert(
      fc.property(element, element, element, (a, b, c) => {
        const { add, multiply, negate } = field;
        expect(add(a, b)).toBe(add(b, a));
        expect(multiply(a, b)).toBe(multiply(b, a));
        expect(add(add(a, b), c)).toBe(add(a, add(b, c)));
        expect(multiply(multiply(a, b), c)).toBe(multiply(a, multiply(b, c)));
        expect(multiply(a, add(b, c))).toBe(add(multiply(a, b), multiply(a, c)));
        expect(add(a, negate(a))).toBe(0);
        expect([add(a, 0), multiply(a, 1)]).toEqual([a, a]);
        if (a !== 0) expect(multiply(a, field.invert(a))).toBe(1);
      })
    );
  });

  test('lists every non-zero element once as a power of the primitive element', () => {
    const powers = Array.from({ length: q - 1 }, (_, i) => field.power(i));
    expect(new Set(powers).size).toBe(q - 1);
    expect(powers).not.toContain(0);
    expect(field.power(-1)).toBe(field.power(q - 2));
  });
});

test('finiteField(q) gives null when q is no prime power', () => {
  expect([0, 1, 6, 10, 12, 15, 100].map((q) => finiteField(q))).toEqual(Array.from({ length: 7 }, () => null));
});

test('finiteField(q).invert(0) throws', () => {
  expect(() => finiteField(9)!.invert(0)).toThrow('zero has no reciprocal');
});

test('primePower(q) names prime and exponent, or gives null', () => {
  expect(primePower(81)).toEqual({ p: 3, n: 4 });
  expect(primePower(97)).toEqual({ p: 97, n: 1 });
  expect([1, 6, 36, 100].map(primePower)).toEqual([null, null, null, null]);
});
