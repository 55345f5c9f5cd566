/** The exponent of p in n, and n freed of p. */
function split(n: number, p: number): { exponent: number; rest: number } {
  let exponent = 0;
  let rest = n;
  for (; rest % p === 0; rest /= p) exponent += 1;
  return { exponent, rest };
}

const modulo = (a: number, m: number): number => ((a % m) + m) % m;

/** The Legendre symbol (a/p), by listing squares; p an odd prime that does not divide a. */
function legendre(a: number, p: number): 1 | -1 {
  for (let x = 1; 2 * x < p; x++) if ((x * x) % p === modulo(a, p)) return 1;
  return -1;
}

/** The Hilbert symbol (a, b)_p of two non-zero whole numbers at the prime p. */
function hilbert(a: number, b: number, p: number): 1 | -1 {
  const { exponent: alpha, rest: u } = split(a, p);
  const { exponent: beta, rest: v } = split(b, p);
  let sign: number;
  if (p === 2) {
    const epsilon = (x: number): number => modulo((x - 1) / 2, 2);
    const omega = (x: number): number => (modulo(x, 8) === 3 || modulo(x, 8) === 5 ? 1 : 0);
    sign = epsilon(u) * epsilon(v) + alpha * omega(v) + beta * omega(u);
  } else {
    const minus = (x: number): number => (legendre(x, p) === -1 ? 1 : 0);
    sign = alpha * beta * ((p - 1) / 2) + beta * minus(u) + alpha * minus(v);
  }
  return sign % 2 === 0 ? 1 : -1;
}

const primesOf = (n: number): number[] => {
  const primes: number[] = [];
  let rest = Math.abs(n);
  for (let p = 2; p * p <= rest; p++) {
    if (rest % p === 0) primes.push(p);
    while (rest % p === 0) rest /= p;
  }
  return rest > 1 ? [...primes, rest] : primes;
};

/**
 * Why no symmetric design (t treatments, t sessions of k, each pair λ times) can exist by the theorem of Bruck, Ryser
 * and Chowla, or null where the theorem does not forbid it: for even t, k − λ must be a square; for odd t,
 * x² = (k−λ)y² + (−1)^((t−1)/2) λ z² must have a solution in whole numbers other than 0, 0, 0. Solvability is decided
 * by Hilbert symbols at 2 and at the primes of (k−λ)λ (theorem of Hasse and Minkowski).
 *
 * Source: R. H. Bruck & H. J. Ryser (1949), Canad. J. Math. 1, 88–93; S. Chowla & H. J. Ryser (1950), Canad. J. Math. 2,
 * 93–99; J.-P. Serre (1973), A Course in Arithmetic, chapter III, theorem 1 (the symbols).
 * Checked by: test/core/design/catalogue/bruck-ryser-chowla.test.ts
 */
export function bruckRyserChowla(t: number, k: number, lambda: number): string | null {
  const order = k - lambda;
  if (t % 2 === 0) {
    return Number.isInteger(Math.sqrt(order)) ? null : `t = ${t} is even and k − λ = ${order} is not a square`;
  }
  const c = ((t - 1) / 2) % 2 === 0 ? lambda : -lambda;
  const unsolvable = [...new Set([2, ...primesOf(order), ...primesOf(c)])].some((p) => hilbert(order, c, p) === -1);
  return unsolvable
    ? `x² = ${order}y² ${c < 0 ? '−' : '+'} ${Math.abs(c)}z² has no solution in whole numbers but zero`
    : null;
}
