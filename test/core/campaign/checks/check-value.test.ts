import { expect, test } from 'vitest';
import { checkValue } from '#lib/core/campaign/checks/check-value.ts';

const limits = { possible: { min: 0, max: 500 }, expected: { min: 2, max: 60 } };
const predicted = { low: 7, high: 11, center: 9 };

test('checkValue(value, …) says nothing about a value inside everything expected', () => {
  expect(checkValue(9.4, '9.4', limits, predicted, 'loss')).toEqual([]);
  expect(checkValue(7, '7', limits, predicted, 'loss')).toEqual([]);
  expect(checkValue(45, '45', limits, null, 'loss')).toEqual([]);
});

test('checkValue(value, …) names a surprise inside the expected range, and the slip that explains it', () => {
  const [surprise, slip] = checkValue(0.94 * 25, '23.5', limits, predicted, 'loss');
  expect(surprise).toEqual({ check: 'surprise', value: 23.5, measurand: 'loss', low: 7, high: 11, center: 9 });
  expect(slip).toBeUndefined();
  expect(checkValue(94, '94', limits, predicted, 'loss')).toEqual([
    { check: 'unexpected', value: 94, side: 'above', range: { min: 2, max: 60 } },
    { check: 'slip', value: 94, candidates: [{ value: 9.4, how: 'decimal', factor: 0.1 }] }
  ]);
});

test('checkValue(value, …) offers only what also lies inside the prediction', () => {
  const wide = { possible: { min: 0, max: 500 }, expected: { min: 0.5, max: 200 } };
  const [, slip] = checkValue(90, '90', wide, predicted, 'loss');
  // 0.9, 3.543 and 9 lie in the expected range; only 9 lies in the prediction.
  expect(slip).toEqual({ check: 'slip', value: 90, candidates: [{ value: 9, how: 'decimal', factor: 0.1 }] });
});

test('checkValue(value, …) names what cannot be before anything else', () => {
  expect(checkValue(900, '900', limits, predicted, 'loss')[0]).toMatchObject({ check: 'impossible', side: 'above' });
});
