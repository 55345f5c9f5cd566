import { describe, expect, test } from 'vitest';
import { thermalNoise } from '#lib/core/design/search/thermal-noise.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';

describe('thermalNoise', () => {
  test('thermalNoise(random) has the mean and variance of the Gumbel distribution', () => {
    const random = seededRandom('gumbel');
    const n = 200000;
    let sum = 0;
    let squares = 0;
    for (let i = 0; i < n; i++) {
      const value = thermalNoise(random);
      sum += value;
      squares += value * value;
    }
    const mean = sum / n;
    expect(Math.abs(mean - 0.5772156649)).toBeLessThan(0.015); // Euler's constant; five standard errors
    expect(Math.abs(squares / n - mean * mean - Math.PI ** 2 / 6)).toBeLessThan(0.05);
  });

  test('thermalNoise(random) draws the largest of gain + noise in proportion to exp(gain)', () => {
    const random = seededRandom('heat bath');
    const gains = [0, 1, 2];
    const counts = [0, 0, 0];
    const n = 60000;
    for (let i = 0; i < n; i++) {
      const scores = gains.map((gain) => gain + thermalNoise(random));
      counts[scores.indexOf(Math.max(...scores))]! += 1;
    }
    const total = gains.reduce((sum, gain) => sum + Math.exp(gain), 0);
    gains.forEach((gain, at) => expect(Math.abs(counts[at]! / n - Math.exp(gain) / total)).toBeLessThan(0.01));
  });
});
