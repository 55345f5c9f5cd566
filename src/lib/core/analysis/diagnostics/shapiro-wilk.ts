import { normalQuantile, normalUpper } from '../../numerics/distributions/normal.ts';
import { fail, ok } from '../../result.ts';
import type { Section } from '../reason.ts';

const polynomial = (c: readonly number[], x: number): number => c.reduceRight((s, v) => s * x + v, 0);

/**
 * Shapiro & Wilk's W of a sample and its p-value by Royston's approximation.
 *
 * @param sample 3 to 5,000 values
 *
 * Source: P. Royston (1995), Remark AS R94, Applied Statistics 44, 547–551 (constants of that algorithm).
 * Checked by: test/reference-run (R's shapiro.test)
 */
export function shapiroWilk(sample: ArrayLike<number>): Section<{ W: number; p: number; n: number }> {
  const n = sample.length;
  if (n < 3) return fail({ tag: 'too-few-readings', have: n, need: 3 });
  if (n > 5000) return fail({ tag: 'too-large', have: n, limit: 5000 });
  const x = Float64Array.from(sample).sort();
  if (!(x[n - 1]! - x[0]! > 0)) return fail({ tag: 'no-scatter' });
  const a = weights(n);
  const mean = x.reduce((s, v) => s + v, 0) / n;
  let num = 0;
  let den = 0;
  for (let i = 0; i < n; i++) {
    num += a[i]! * (x[i]! - mean);
    den += (x[i]! - mean) ** 2;
  }
  const W = Math.min(1, (num * num) / den);
  return ok({ W, p: upperTail(W, n), n });
}

/** Antisymmetric weights of the order statistics, summing to one in squares. */
function weights(n: number): Float64Array {
  const half = n >> 1;
  const a = new Float64Array(n);
  if (n === 3) {
    a[0] = -Math.SQRT1_2;
    a[2] = Math.SQRT1_2;
    return a;
  }
  const m = Float64Array.from({ length: half }, (_, i) => normalQuantile((i + 1 - 0.375) / (n + 0.25)));
  const squares = 2 * m.reduce((s, v) => s + v * v, 0);
  const root = 1 / Math.sqrt(n);
  const first = polynomial([0, 0.221157, -0.147981, -2.07119, 4.434685, -2.706056], root) - m[0]! / Math.sqrt(squares);
  const top = [first];
  if (n > 5) {
    top.push(polynomial([0, 0.042981, -0.293762, -1.752461, 5.682633, -3.582633], root) - m[1]! / Math.sqrt(squares));
  }
  let left = squares;
  let one = 1;
  top.forEach((v, i) => {
    left -= 2 * m[i]! ** 2;
    one -= 2 * v * v;
  });
  const scale = Math.sqrt(left / one);
  for (let i = 0; i < half; i++) {
    const v = top[i] ?? -m[i]! / scale;
    a[i] = -v;
    a[n - 1 - i] = v;
  }
  return a;
}

function upperTail(W: number, n: number): number {
  if (n === 3) {
    // Exact for three values.
    const least = Math.asin(Math.sqrt(0.75));
    return Math.max(0, (6 / Math.PI) * (Math.asin(Math.sqrt(W)) - least));
  }
  const y = Math.log(1 - W);
  const log = Math.log(n);
  if (n <= 11) {
    const gamma = polynomial([-2.273, 0.459], n);
    if (y >= gamma) return 0;
    const mean = polynomial([0.544, -0.39978, 0.025054, -6.714e-4], n);
    const sd = Math.exp(polynomial([1.3822, -0.77857, 0.062767, -0.0020322], n));
    return normalUpper((-Math.log(gamma - y) - mean) / sd);
  }
  const mean = polynomial([-1.5861, -0.31082, -0.083751, 0.0038915], log);
  const sd = Math.exp(polynomial([-0.4803, -0.082676, 0.0030302], log));
  return normalUpper((y - mean) / sd);
}
