/** A finite abelian group, a product of cyclic ones, its elements numbered 0 … order − 1 with 0 neutral. */
export interface AbelianGroup {
  /** Orders of the cyclic factors; the first factor is the least significant digit of an element's number. */
  moduli: readonly number[];
  order: number;
  add(a: number, b: number): number;
  /** How the group is written in a sentence: Z_13, Z_3 × Z_3. */
  name: string;
}

/**
 * The group Z_{m₁} × Z_{m₂} × …, element (a₁, a₂, …) numbered a₁ + a₂m₁ + a₃m₁m₂ + …
 * The additive group of `finiteField(pⁿ)` is `abelianGroup([p, p, …])` with the same numbers.
 *
 * Checked by: test/core/design/catalogue/orbits/permutation-group.test.ts
 */
export function abelianGroup(moduli: readonly number[]): AbelianGroup {
  const order = moduli.reduce((product, m) => product * m, 1);
  const add = (a: number, b: number): number => {
    let sum = 0;
    let place = 1;
    for (const m of moduli) {
      sum += (((Math.floor(a / place) % m) + (Math.floor(b / place) % m)) % m) * place;
      place *= m;
    }
    return sum;
  };
  return { moduli, order, add, name: moduli.map((m) => `Z_${m}`).join(' × ') };
}

/**
 * The abelian groups of order n, cyclic first, each as its moduli: one for each way to split the prime powers of n.
 *
 * Source: the theorem on finite abelian groups (Frobenius & Stickelberger 1879), any textbook of algebra.
 * Checked by: test/core/design/catalogue/orbits/permutation-group.test.ts
 */
export function abelianModuli(n: number): number[][] {
  let groups: number[][] = [[]];
  let rest = n;
  for (let p = 2; rest > 1; p++) {
    let exponent = 0;
    for (; rest % p === 0; rest /= p) exponent += 1;
    if (exponent > 0) {
      groups = groups.flatMap((group) =>
        partitions(exponent, exponent).map((parts) => [...group, ...parts.map((e) => p ** e)])
      );
    }
  }
  return groups.map(joinCoprime);
}

/** The ways to write n as a sum of numbers not above `most`, largest first. */
function partitions(n: number, most: number): number[][] {
  if (n === 0) return [[]];
  return Array.from({ length: Math.min(n, most) }, (_, i) => Math.min(n, most) - i).flatMap((first) =>
    partitions(n - first, first).map((others) => [first, ...others])
  );
}

/** Z_a × Z_b is Z_ab when a and b share no factor: prime powers joined into as few cyclic factors as possible. */
function joinCoprime(primePowers: readonly number[]): number[] {
  const joined: number[] = [];
  for (const power of primePowers) {
    const at = joined.findIndex((m) => gcd(m, power) === 1);
    if (at === -1) joined.push(power);
    else joined[at]! *= power;
  }
  return joined.length > 0 ? joined : [1];
}

export const gcd = (a: number, b: number): number => (b === 0 ? a : gcd(b, a % b));
