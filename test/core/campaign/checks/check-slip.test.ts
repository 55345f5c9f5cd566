import fc from 'fast-check';
import { expect, it } from 'vitest';
import { checkSlip } from '#lib/core/campaign/checks/check-slip.ts';

const expected = { min: 80, max: 90 };

it.each([
  ['842.13', 84.213, 'decimal'],
  ['8421.3', 84.213, 'decimal'],
  ['84213', 84.213, 'decimal'],
  ['8.4213', 84.213, 'decimal'],
  ['0.084213', 84.213, 'decimal'],
  ['48.2', 84.2, 'swapped-digits'],
  ['3.3150', 84.201, 'inch'],
  ['2159.0', 85, 'inch']
] as const)('checkSlip(%s) offers %d', (plain, meant, how) => {
  expect(checkSlip(Number(plain), plain, expected)).toContainEqual(expect.objectContaining({ value: meant, how }));
});

it('checkSlip(value) is silent when the value is expected, even if its digits could be swapped', () => {
  expect(checkSlip(84.2, '84.2', expected)).toEqual([]);
});

it('checkSlip(value) is silent when no slip leads into what was expected', () => {
  expect(checkSlip(61.7, '61.7', expected)).toEqual([]);
});

it('checkSlip(value) is silent when what is expected is open on one side', () => {
  expect(checkSlip(8, '8', { min: 80, max: null })).toEqual([]);
});

it('checkSlip(value) puts the candidate nearest to the middle first', () => {
  const [first] = checkSlip(15.8, '15.8', { min: 50, max: 260 });
  expect(first?.value).toBe(158);
});

it('checkSlip(0.07) moves the decimal sign in the digits, not in binary', () => {
  expect(checkSlip(0.07, '0.07', { min: 0.5, max: 0.9 })[0]?.value).toBe(0.7);
});

it('checkSlip(x·10^k) always offers x back', () => {
  const value = fc.integer({ min: 80001, max: 89999 });
  fc.assert(
    fc.property(value, fc.constantFrom(-3, -2, -1, 1, 2, 3), (thousandths, places) => {
      const meant = Number(`${thousandths}e-3`);
      const plain = `${thousandths}e${places - 3}`;
      expect(checkSlip(Number(plain), plain, expected).map((c) => c.value)).toContain(meant);
    })
  );
});
