import { expect, test } from 'vitest';
import { warnings } from '#lib/ui/texts/en/warnings.ts';
import { pIs } from '#lib/ui/texts/p-value.ts';

test('pIs(text) says p = or p <, never both', () => {
  expect(pIs('0.319')).toBe('p = 0.319');
  expect(pIs('< 0.0001')).toBe('p < 0.0001');
});

test('a warning with a tiny p reads as a sentence', () => {
  const { said } = warnings.scatter('< 0.0001');
  expect(said).toContain('p < 0.0001');
  expect(said).not.toContain('= <');
});
