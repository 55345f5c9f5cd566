/** The Box–Cox power transformation of a positive number and what belongs to it. */

/** (u^λ − 1)/λ, the logarithm at λ = 0. */
export function power(u: number, lambda: number): number {
  const log = Math.log(u);
  return lambda === 0 ? log : Math.expm1(lambda * log) / lambda;
}

/** The u with power(u, λ) = z; null outside the range of the transformation. */
export function unpower(z: number, lambda: number): number | null {
  if (lambda === 0) return Math.exp(z);
  return 1 + lambda * z > 0 ? Math.exp(Math.log1p(lambda * z) / lambda) : null;
}

/** Derivative of power(u, λ) by λ. Near λ·log u = 0 the closed form cancels and its series is used. */
export function powerSlope(u: number, lambda: number): number {
  const log = Math.log(u);
  const x = lambda * log;
  if (Math.abs(x) < 1e-3) return log * log * (1 / 2 + x * (1 / 3 + x * (1 / 8 + x * (1 / 30 + x / 144))));
  return (Math.exp(x) * log - Math.expm1(x) / lambda) / lambda;
}
