import type { Finding } from './finding.ts';

/** Below this probability the same reading again and again is worth a look; common practice, no source. */
export const stuckLimit = 1e-3;

/**
 * Returns the probability that n readings of a normal quantity of scatter s fall into one and the same step d of the instrument,
 * P ≈ (d/s)^(n−1) · (2π)^(−(n−1)/2) · n^(−1/2), the integral of the joint density along the diagonal, good for d well below s;
 * at most 1.
 *
 * @param n how many equal readings in a row, at least 1
 * @param resolution smallest step of the instrument, d > 0
 * @param scatter standard deviation of such readings, s ≥ 0
 * Source: joint density of n independent normal variables integrated over the diagonal (elementary).
 * Checked by: test/core/campaign/checks/check-stuck.test.ts, against exact sums over the steps
 */
export function probabilityOfEqual(n: number, resolution: number, scatter: number): number {
  if (!(scatter > 0)) return 1;
  const step = resolution / scatter / Math.sqrt(2 * Math.PI);
  return Math.min(1, step ** (n - 1) / Math.sqrt(n));
}

/**
 * Returns a finding when the same reading has come so often in a row that, with this resolution and this scatter, the
 * instrument is more likely stuck than right. At least three equal readings are needed.
 *
 * @param value the reading now
 * @param before readings of the same kind before it, oldest first
 * @param resolution smallest step of the instrument; null: not known, no finding
 * @param scatter standard deviation of such readings over specimens; null: taken from the readings before that differ, at least four
 */
export function checkStuck(
  value: number,
  before: readonly number[],
  resolution: number | null,
  scatter: number | null
): Finding | null {
  if (resolution === null || !(resolution > 0)) return null;
  let times = 1;
  while (times <= before.length && before[before.length - times] === value) times++;
  if (times < 3) return null;
  const s = scatter ?? spread(before.slice(0, before.length - times + 1));
  if (s === null) return null;
  return probabilityOfEqual(times, resolution, s) < stuckLimit ? { check: 'stuck', value, times } : null;
}

function spread(values: readonly number[]): number | null {
  if (values.length < 4) return null;
  const mean = values.reduce((sum, x) => sum + x, 0) / values.length;
  return Math.sqrt(values.reduce((sum, x) => sum + (x - mean) ** 2, 0) / (values.length - 1));
}
