import { expect, test } from 'vitest';
import { testContrast } from '#lib/core/analysis/comparisons/test-contrast.ts';
import { fail, ok } from '#lib/core/result.ts';

test('testContrast(request, fit, alpha) gives t, p and the interval', () => {
  const { result } = testContrast({ name: 'A − B', weights: [1, -1] }, ok({ estimate: 2.228139, se: 1, df: 10 }), 0.05);
  if (!result.ok) throw new Error(result.error.tag);
  // 2.228 is the two-sided 5 % point of t with 10 df in every handbook.
  expect(result.value.p).toBeCloseTo(0.05, 6);
  expect(result.value.lower).toBeCloseTo(0, 5);
});

test('testContrast(request, fit, alpha) passes on why there is no estimate, and refuses readings without scatter', () => {
  const request = { name: 'A − B', weights: [1, -1] };
  expect(testContrast(request, fail({ tag: 'disconnected', parts: 2 }), 0.05).result).toEqual({
    ok: false,
    error: { tag: 'disconnected', parts: 2 }
  });
  expect(testContrast(request, ok({ estimate: 0, se: 0, df: 5 }), 0.05).result).toEqual({
    ok: false,
    error: { tag: 'no-scatter' }
  });
});
