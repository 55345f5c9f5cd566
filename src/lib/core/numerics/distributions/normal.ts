const INVERSE_SQRT_TWO_PI = 0.3989422804014327;

/**
 * Standard normal density.
 *
 * Checked by: test/core/numerics/distributions/normal.test.ts
 */
export function normalDensity(x: number): number {
  return INVERSE_SQRT_TWO_PI * Math.exp(-0.5 * x * x);
}

// Rational Chebyshev approximations, for |x| ≤ 0.66291, ≤ √32 and beyond.
const A = [2.2352520354606837, 161.02823106855587, 1067.6894854603709, 18154.98125334356, 0.06568233791820745] as const;
const B = [47.202581904688245, 976.0985517377767, 10260.932208618979, 45507.78933502673] as const;
const C = [
  0.39894151208813466, 8.883149794388377, 93.50665613217785, 597.2702763948002, 2494.5375852903726, 6848.190450536283,
  11602.65143764735, 9842.714838383978, 1.0765576773720192e-8
] as const;
const D = [
  22.266688044328117, 235.387901782625, 1519.3775994075547, 6485.558298266761, 18615.571640885097, 34900.95272114598,
  38912.00328609327, 19685.429676859992
] as const;
const P = [
  0.215898534057957, 0.12740116116024736, 0.022235277870649807, 0.0014216191932278934, 2.9112874951168793e-5,
  0.023073441764940174
] as const;
const Q = [
  1.284260096144911, 0.4682382124808651, 0.06598813786892856, 0.0037823963320275824, 7.297515550839662e-5
] as const;

/**
 * Upper tail of the standard normal distribution, P(Z > x), to full relative precision.
 *
 * @param x any number, infinities included
 * Source: W. J. Cody (1969), Rational Chebyshev approximations for the error function, Math. Comp. 23, 631–637,
 * in the scaling of Cody (1993), ACM Algorithm 715 (coefficients from memory to 17 digits, held to the table).
 * Checked by: test/core/numerics/distributions/normal.test.ts, tables.test.ts
 */
export function normalUpper(x: number): number {
  const size = x < 0 ? -x : x;
  if (size <= 0.66291) {
    const square = size > 1.11e-16 ? x * x : 0;
    const top = (((A[4] * square + A[0]) * square + A[1]) * square + A[2]) * square + A[3];
    const bottom = (((square + B[0]) * square + B[1]) * square + B[2]) * square + B[3];
    return 0.5 - (x * top) / bottom;
  }
  const tail = upperOf(size);
  return x > 0 ? tail : 1 - tail;
}

function upperOf(y: number): number {
  let ratio: number;
  if (y <= 5.656854249492381) {
    let top = C[8] * y;
    let bottom = y;
    for (let i = 0; i < 7; i++) {
      top = (top + C[i]!) * y;
      bottom = (bottom + D[i]!) * y;
    }
    ratio = (top + C[7]) / (bottom + D[7]);
  } else if (y < 39) {
    const square = 1 / (y * y);
    let top = P[5] * square;
    let bottom = square;
    for (let i = 0; i < 4; i++) {
      top = (top + P[i]!) * square;
      bottom = (bottom + Q[i]!) * square;
    }
    ratio = (INVERSE_SQRT_TWO_PI - (square * (top + P[4])) / (bottom + Q[4])) / y;
  } else {
    return Number.isNaN(y) ? NaN : 0;
  }
  // exp(−y²/2) in two factors: the first exponent is exact, so that no digits are lost far out.
  const coarse = Math.trunc(y * 16) / 16;
  return Math.exp(-0.5 * coarse * coarse) * Math.exp(-0.5 * (y - coarse) * (y + coarse)) * ratio;
}

/**
 * Standard normal distribution function, P(Z ≤ x), to full relative precision in the lower tail.
 *
 * Source and check: as for normalUpper.
 */
export function normalCdf(x: number): number {
  return normalUpper(-x);
}

/**
 * Standard normal quantile: the x with P(Z ≤ x) = p, relative error near 1e-15.
 *
 * @param p in [0, 1]; 0 gives −Infinity, 1 gives Infinity, anything else outside NaN
 * Source: M. J. Wichura (1988), Algorithm AS 241, Applied Statistics 37, 477–484 (PPND16; coefficients from memory,
 * held to the distribution function and the table).
 * Checked by: test/core/numerics/distributions/normal.test.ts
 */
export function normalQuantile(p: number): number {
  if (!(p >= 0 && p <= 1)) return NaN;
  if (p === 0) return -Infinity;
  if (p === 1) return Infinity;
  const q = p - 0.5;
  if (Math.abs(q) <= 0.425) {
    const r = 0.180625 - q * q;
    return (
      (q *
        (((((((2509.0809287301227 * r + 33430.57558358813) * r + 67265.7709270087) * r + 45921.95393154987) * r +
          13731.69376550946) *
          r +
          1971.5909503065513) *
          r +
          133.14166789178438) *
          r +
          3.3871328727963665)) /
      (((((((5226.495278852546 * r + 28729.085735721943) * r + 39307.89580009271) * r + 21213.794301586597) * r +
        5394.196021424751) *
        r +
        687.1870074920579) *
        r +
        42.31333070160091) *
        r +
        1)
    );
  }
  const tail = Math.sqrt(-Math.log(q < 0 ? p : 1 - p));
  const size = tail <= 5 ? middle(tail - 1.6) : far(tail - 5);
  return q < 0 ? -size : size;
}

function middle(r: number): number {
  return (
    (((((((0.0007745450142783414 * r + 0.022723844989269184) * r + 0.2417807251774506) * r + 1.2704582524523684) * r +
      3.6478483247632045) *
      r +
      5.769497221460691) *
      r +
      4.630337846156546) *
      r +
      1.4234371107496835) /
    (((((((1.0507500716444169e-9 * r + 0.0005475938084995345) * r + 0.015198666563616457) * r + 0.14810397642748008) *
      r +
      0.6897673349851) *
      r +
      1.6763848301838038) *
      r +
      2.053191626637759) *
      r +
      1)
  );
}

function far(r: number): number {
  return (
    (((((((2.0103343992922881e-7 * r + 2.7115555687434876e-5) * r + 0.0012426609473880784) * r + 0.026532189526576124) *
      r +
      0.29656057182850487) *
      r +
      1.7848265399172913) *
      r +
      5.463784911164114) *
      r +
      6.657904643501103) /
    (((((((2.0442631033899397e-15 * r + 1.421511758316446e-7) * r + 1.8463183175100548e-5) * r +
      0.0007868691311456133) *
      r +
      0.014875361290850615) *
      r +
      0.1369298809227358) *
      r +
      0.599832206555888) *
      r +
      1)
  );
}
