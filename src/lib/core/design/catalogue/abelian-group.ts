/** A finite abelian group, a product of cyclic ones, its elements numbered 0 … order − 1 with 0 neutral. */
export interface AbelianGroup {
  /** Orders of the cyclic factors; the first factor is the least significant digit of an element's number. */
  moduli: readonly number[];
  order: number;
  add(a: number, b: number): number;
  subtract(a: number, b: number): number;
}

/**
 * The group Z_{m₁} × Z_{m₂} × …, element (a₁, a₂, …) numbered a₁ + a₂m₁ + a₃m₁m₂ + …
 * The additive group of `finiteField(pⁿ)` is `abelianGroup([p, p, …])` with the same numbers.
 *
 * Checked by: test/core/design/catalogue/difference-family.test.ts
 */
export function abelianGroup(moduli: readonly number[]): AbelianGroup {
  const order = moduli.reduce((product, m) => product * m, 1);
  const combine = (a: number, b: number, sign: 1 | -1): number => {
    let sum = 0;
    let place = 1;
    for (const m of moduli) {
      const digit = (Math.floor(a / place) % m) + sign * (Math.floor(b / place) % m);
      sum += ((digit + m) % m) * place;
      place *= m;
    }
    return sum;
  };
  return { moduli, order, add: (a, b) => combine(a, b, 1), subtract: (a, b) => combine(a, b, -1) };
}

/** How the group is written in a sentence: Z_13, Z_3 × Z_3. */
export const groupName = (group: AbelianGroup): string => group.moduli.map((m) => `Z_${m}`).join(' × ');
