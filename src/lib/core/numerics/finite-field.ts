import { primePower } from './prime-power.ts';

/** The field of `order` elements, its elements written as whole numbers 0 … order − 1 (0 is zero, 1 is one). */
export interface FiniteField {
  order: number;
  characteristic: number;
  degree: number;
  /** A generator of the multiplicative group. */
  primitive: number;
  add(a: number, b: number): number;
  negate(a: number): number;
  multiply(a: number, b: number): number;
  /** The reciprocal of a non-zero element; throws on zero. */
  invert(a: number): number;
  /** primitive^i; any whole i. */
  power(i: number): number;
}

/**
 * The field GF(q): polynomials over Z_p modulo the first primitive polynomial, an element a₀ + a₁x + … written
 * as the number a₀ + a₁p + a₂p² + …
 *
 * @param q a prime power, at most a few thousand (tables of length q are built)
 * @returns the field, or null when q is no prime power
 *
 * Source: R. Lidl & H. Niederreiter (1997), Finite Fields, 2nd ed., chapters 2 and 9 (logarithm tables).
 * Checked by: test/core/numerics/finite-field.test.ts
 */
export function finiteField(q: number): FiniteField | null {
  const power = primePower(q);
  if (!power) return null;
  const { p, n } = power;
  const top = q / p;

  const digitwise = (a: number, b: number, op: (x: number, y: number) => number): number => {
    let sum = 0;
    for (let place = 1; place < q; place *= p) {
      sum += op(Math.floor(a / place) % p, Math.floor(b / place) % p) * place;
    }
    return sum;
  };
  const add = (a: number, b: number): number =>
    n === 1 ? (a + b) % p : p === 2 ? a ^ b : digitwise(a, b, (x, y) => (x + y) % p);
  const scale = (a: number, c: number): number => digitwise(a, 0, (x) => (x * c) % p);

  /** The powers of g when `step` multiplies by g, or null when g is not primitive. */
  const orbit = (step: (a: number) => number): Int32Array | null => {
    const exp = new Int32Array(q - 1);
    let element = 1;
    for (let i = 0; i < q - 1; i++) {
      if (i > 0 && element <= 1) return null;
      exp[i] = element;
      element = step(element);
    }
    return element === 1 ? exp : null;
  };

  let exp: Int32Array | null = null;
  if (n === 1) {
    for (let g = 1; !exp && g < q; g++) exp = orbit((a) => (a * g) % p);
  } else {
    // xⁿ = `tail`: try every tail until x is primitive.
    for (let tail = 1; !exp && tail < q; tail++) {
      exp = orbit((a) => {
        const high = Math.floor(a / top);
        return add((a % top) * p, scale(tail, high));
      });
    }
  }
  if (!exp) throw new Error(`finiteField: no primitive element of GF(${q}) found`);
  const table = exp;
  const log = new Int32Array(q);
  table.forEach((element, i) => (log[element] = i));

  return {
    order: q,
    characteristic: p,
    degree: n,
    primitive: table[1 % (q - 1)]!,
    add,
    negate: (a) => (p === 2 ? a : digitwise(a, 0, (x) => (p - x) % p)),
    multiply: (a, b) => (a === 0 || b === 0 ? 0 : table[(log[a]! + log[b]!) % (q - 1)]!),
    invert: (a) => {
      if (a === 0) throw new Error('finiteField.invert: zero has no reciprocal');
      return table[(q - 1 - log[a]!) % (q - 1)]!;
    },
    power: (i) => table[((i % (q - 1)) + q - 1) % (q - 1)]!
  };
}
