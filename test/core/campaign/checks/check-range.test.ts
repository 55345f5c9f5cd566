import { expect, it } from 'vitest';
import { checkRange } from '#lib/core/campaign/checks/check-range.ts';

const possible = { min: 0, max: 500 };
const expected = { min: 80, max: 90 };

it.each([
  [85, null],
  [80, null],
  [90, null],
  [79.9999, { check: 'unexpected', side: 'below', range: expected }],
  [90.0001, { check: 'unexpected', side: 'above', range: expected }],
  [-0.1, { check: 'impossible', side: 'below', range: possible }],
  [500.1, { check: 'impossible', side: 'above', range: possible }]
])('checkRange(%d) says %j', (value, finding) => {
  const said = checkRange(value, possible, expected);
  if (finding === null) expect(said).toBeNull();
  else expect(said).toEqual({ value, ...finding });
});

it('checkRange(value) is silent where no limit is set', () => {
  expect(checkRange(1e9, { min: 0, max: null }, { min: null, max: null })).toBeNull();
});
