/**
 * A smooth function tabulated as Chebyshev series on equal pieces, for many quick evaluations.
 *
 * A piece is computed when it is first asked for.
 *
 * Source: J. P. Boyd (2001), Chebyshev and Fourier Spectral Methods, 2nd ed., chapters 3 and 4 (interpolation at the
 * Chebyshev roots; Clenshaw's recurrence).
 * Checked by: test/core/numerics/piecewise-chebyshev.test.ts
 */
export class PiecewiseChebyshev {
  readonly #f: (x: number) => number;
  readonly #from: number;
  readonly #width: number;
  readonly #size: number;
  readonly #pieces: (Float64Array | undefined)[];

  /**
   * @param f the function, finite inside the range
   * @param from start of the range
   * @param to end of the range, above `from`
   * @param width about how wide a piece is; shrunk so that pieces fit
   * @param degree degree of the series of each piece
   */
  constructor(f: (x: number) => number, from: number, to: number, width: number, degree: number) {
    const pieces = Math.max(1, Math.ceil((to - from) / width));
    this.#f = f;
    this.#from = from;
    this.#width = (to - from) / pieces;
    this.#size = degree + 1;
    this.#pieces = new Array<Float64Array | undefined>(pieces).fill(undefined);
  }

  #tabulate(piece: number): Float64Array {
    const n = this.#size;
    const middle = this.#from + (piece + 0.5) * this.#width;
    const angle = (i: number) => (Math.PI * (i + 0.5)) / n;
    const values = Float64Array.from({ length: n }, (_, i) => this.#f(middle + 0.5 * this.#width * Math.cos(angle(i))));
    const coefficients = new Float64Array(n);
    for (let j = 0; j < n; j++) {
      let sum = 0;
      for (let i = 0; i < n; i++) sum += values[i]! * Math.cos(j * angle(i));
      coefficients[j] = ((j === 0 ? 1 : 2) * sum) / n;
    }
    this.#pieces[piece] = coefficients;
    return coefficients;
  }

  /** The tabulated function at x; outside the range the nearest piece is continued. */
  at(x: number): number {
    const position = (x - this.#from) / this.#width;
    const piece = Math.max(0, Math.min(this.#pieces.length - 1, Math.floor(position)));
    const coefficients = this.#pieces[piece] ?? this.#tabulate(piece);
    const twice = 4 * (position - piece) - 2;
    let next = 0;
    let afterNext = 0;
    for (let j = this.#size - 1; j > 0; j--) {
      const current = twice * next - afterNext + coefficients[j]!;
      afterNext = next;
      next = current;
    }
    return 0.5 * twice * next - afterNext + coefficients[0]!;
  }
}
