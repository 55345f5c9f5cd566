import { betaKernel, incompleteBeta } from './incomplete-beta.ts';
import { normalQuantile, normalUpper } from './normal.ts';
import { stirlingError } from './stirling-error.ts';
import { tailQuantile } from './tail-quantile.ts';

/** Above this many degrees of freedom Hill's normal transform is exact to double precision. */
const NEARLY_NORMAL = 1e7;
/** Beyond this t/√df the first term of the tail's expansion is all of it, and squares may overflow. */
const FAR = 1e9;

/**
 * Upper tail of Student's t, P(T > x), to full relative precision.
 *
 * @param x any number
 * @param df degrees of freedom above 0, fractional or Infinity
 * Source: Abramowitz & Stegun (1964) 26.5.27 (incomplete beta); above 1e7 df G. W. Hill (1970), Algorithm 395,
 * CACM 13, 617–619.
 * Checked by: test/core/numerics/distributions/student-t.test.ts, tables.test.ts
 */
export function tUpper(x: number, df: number): number {
  if (Number.isNaN(x) || !(df > 0)) return NaN;
  if (x < 0) return 1 - tUpper(-x, df);
  if (df === Infinity) return normalUpper(x);
  if (df > NEARLY_NORMAL) return normalUpper(nearlyNormal(x, df));
  return upperOf(x, df);
}

function upperOf(x: number, df: number): number {
  const ratio = x / Math.sqrt(df);
  if (ratio > FAR) return farTail(ratio, df);
  const square = ratio * ratio;
  return 0.5 * incompleteBeta(1 / (1 + square), square / (1 + square), df / 2, 0.5);
}

function farTail(ratio: number, df: number): number {
  if (ratio === Infinity) return 0;
  return Math.exp(-df * Math.log(ratio)) * (0.5 / (df / 2)) * inverseBeta(df);
}

/** 1 / B(df/2, ½). */
function inverseBeta(df: number): number {
  const a = df / 2;
  const n = a + 0.5;
  const exponent = stirlingError(n) - stirlingError(a) - stirlingError(0.5);
  return (
    Math.exp(exponent + a * Math.log1p(0.5 / a) + 0.5 * Math.log(n / 0.5)) * Math.sqrt((a * 0.5) / (2 * Math.PI * n))
  );
}

function nearlyNormal(x: number, df: number): number {
  const a = df - 0.5;
  const z = Math.sqrt(a * Math.log1p((x / df) * x));
  return z + ((z * z + 3) * z) / (48 * a * a);
}

/** P(T ≤ x) for Student's t. Arguments, source and check: as for tUpper. */
export function tCdf(x: number, df: number): number {
  return tUpper(-x, df);
}

/** P(|T| > |x|) for Student's t. Arguments, source and check: as for tUpper. */
export function tTwoSided(x: number, df: number): number {
  return 2 * tUpper(Math.abs(x), df);
}

/**
 * The x with P(T > x) = p for Student's t, relative error near 1e-14.
 *
 * @param p in [0, 1]
 * @param df degrees of freedom above 0, fractional or Infinity
 * Checked by: test/core/numerics/distributions/student-t.test.ts, tables.test.ts
 */
export function tUpperQuantile(p: number, df: number): number {
  if (!(p >= 0 && p <= 1) || !(df > 0)) return NaN;
  if (p > 0.5) return -tUpperQuantile(1 - p, df);
  if (p === 0.5) return 0;
  if (p === 0) return Infinity;
  if (df === Infinity) return -normalQuantile(p);
  const start = firstGuess(p, df);
  const scaledDensity = (x: number) => {
    const ratio = x / Math.sqrt(df);
    if (ratio > FAR) return df * farTail(ratio, df);
    const square = ratio * ratio;
    return betaKernel(1 / (1 + square), square / (1 + square), df / 2, 0.5);
  };
  if (p > 0.25) {
    // Near the median the distance from it, P(0 < T < x), is the small number.
    const within = (x: number) => {
      const square = (x / df) * x;
      return 0.5 * incompleteBeta(square / (1 + square), 1 / (1 + square), 0.5, df / 2);
    };
    return tailQuantile({ probability: within, scaledDensity, direction: 1 }, 0.5 - p, start);
  }
  return tailQuantile({ probability: (x) => tUpper(x, df), scaledDensity, direction: -1 }, p, start);
}

/** Hill's transform backwards from the normal quantile where that is sensible, else the far tail's power law. */
function firstGuess(p: number, df: number): number {
  const z = -normalQuantile(p);
  if (df > 2) {
    const grown = Math.expm1((z * z) / (df - 0.5));
    if (grown < 1e6) return Math.max(1e-300, Math.sqrt(df * grown));
  }
  if (p > 0.1) return Math.max(z, 1e-300);
  const logRatio = (Math.log(inverseBeta(df) / df) - Math.log(p)) / df;
  return Math.exp(Math.min(700, logRatio)) * Math.sqrt(df);
}

/** The x with P(T ≤ x) = p for Student's t. Arguments, errors and check: as for tUpperQuantile. */
export function tQuantile(p: number, df: number): number {
  return -tUpperQuantile(p, df);
}
