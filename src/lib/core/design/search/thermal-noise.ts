import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';

const BITS = 12;

/** Natural logarithm by additions, multiplications and divisions only, so that every engine gives the same bits. */
function exactlyRepeatedLog(x: number): number {
  let mantissa = x;
  let twos = 0;
  for (; mantissa < 0.75; twos--) mantissa *= 2;
  for (; mantissa > 1.5; twos++) mantissa /= 2;
  const y = (mantissa - 1) / (mantissa + 1);
  let power = y;
  let sum = 0;
  for (let n = 1; n < 60; n += 2) {
    sum += power / n;
    power *= y * y;
  }
  return 2 * sum + twos * 0.6931471805599453;
}

const TABLE = Float64Array.from({ length: 2 ** BITS }, (_, at) => {
  const u = (at + 0.5) / 2 ** BITS;
  return -exactlyRepeatedLog(-exactlyRepeatedLog(u));
});

/** Largest minus smallest noise that can be drawn: a choice that lags by more than this never wins. */
export const NOISE_RANGE = TABLE[TABLE.length - 1]! - TABLE[0]!;

/**
 * Returns Gumbel noise, `−ln(−ln u)`: of several choices the one with the largest `gain/T + noise` is a draw with
 * probability proportional to `exp(gain/T)` (heat bath at temperature T), and no exponential need be computed.
 *
 * The table has 4096 equally likely values made of the four operations alone; `Math.log` may differ between engines.
 *
 * **Source**: Gumbel (1954), Statistical theory of extreme values and some practical applications, NBS Applied Mathematics
 * Series 33; Geman & Geman (1984), IEEE PAMI 6, 721–741, for the heat bath.
 * **Checked by** test/core/design/search/thermal-noise.test.ts
 */
export const thermalNoise = (random: SeededRandom): number => TABLE[random.bits() >>> (32 - BITS)]!;
