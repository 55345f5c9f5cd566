/** What the share of an exact test at 5 % is known to be. */
const KNOWN = 0.05;

/**
 * A share over simulated campaigns, with a control: an exact test on the same campaigns, whose own share is known to be 5 %.
 * What that test's share differs from 5 % is chance, and what goes along with it is taken off:
 *
 *     adjusted = mean(x) − b·(mean(z) − 0.05),   b = cov(x, z)/var(z)
 *
 * Source: S. S. Lavenberg & P. D. Welch (1981), A perspective on the use of control variables to increase the efficiency of
 * Monte Carlo simulations, Management Science 27, 322–335.
 */
export class Share {
  #n = 0;
  #x = 0;
  #xx = 0;
  #z = 0;
  #xz = 0;

  /**
   * @param x 1 if it happened in the campaign, 0 if not, or a share of the campaign's pairs
   * @param z 1 if the exact test rejected
   */
  add(x: number, z: number): void {
    this.#n++;
    this.#x += x;
    this.#xx += x * x;
    this.#z += z;
    this.#xz += x * z;
  }

  /** As counted. */
  get raw(): number {
    return this.#x / this.#n;
  }

  /** Less what chance did to the exact test on the same campaigns, with its standard error. */
  get adjusted(): { share: number; error: number } {
    const n = this.#n;
    const [x, z] = [this.#x / n, this.#z / n];
    const covariance = this.#xz / n - x * z;
    const variance = z * (1 - z);
    const b = variance > 0 ? covariance / variance : 0;
    const left = Math.max(0, this.#xx / n - x * x - b * covariance);
    return { share: x - b * (z - KNOWN), error: Math.sqrt(left / n) };
  }
}
