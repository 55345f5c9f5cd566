/**
 * The prime p and exponent n with q = pⁿ, or null when q is no prime power.
 *
 * @param q a whole number
 * @returns `{ p, n }` with p prime and n ≥ 1, or null
 *
 * Checked by: test/core/numerics/finite-field.test.ts
 */
export function primePower(q: number): { p: number; n: number } | null {
  if (!Number.isInteger(q) || q < 2) return null;
  let p = 2;
  while (p * p <= q && q % p !== 0) p += 1;
  if (q % p !== 0) p = q;
  let n = 0;
  let rest = q;
  for (; rest % p === 0; rest /= p) n += 1;
  return rest === 1 ? { p, n } : null;
}
