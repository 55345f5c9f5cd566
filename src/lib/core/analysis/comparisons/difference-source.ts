/** What comparisons need to know of a fit: differences of adjusted means, with errors. */
export interface DifferenceSource {
  /** Number of treatments, those without kept readings included. */
  readonly treatments: number;
  /** Treatments with kept readings, ascending. */
  readonly present: readonly number[];
  /** Can a − b be estimated? An equivalence relation among the present. */
  readonly estimable: (a: number, b: number) => boolean;
  /** a − b; called for estimable pairs only, like the two below. */
  readonly estimate: (a: number, b: number) => number;
  /** Standard error of a − b. */
  readonly se: (a: number, b: number) => number;
  /** Degrees of freedom of that standard error. */
  readonly df: (a: number, b: number) => number;
}

/**
 * Correlations of the differences of several treatments to one reference treatment:
 * ρ_ij = (V_i + V_j − V_ij) / (2 √(V_i V_j)), with V_i the variance of i − reference and V_ij that of i − j.
 *
 * @returns row-major m×m for m others
 */
export function differenceCorrelation(
  source: DifferenceSource,
  reference: number,
  others: readonly number[]
): Float64Array {
  const m = others.length;
  const errors = others.map((i) => source.se(i, reference));
  const correlation = new Float64Array(m * m).fill(1);
  for (let i = 0; i < m; i++) {
    for (let j = 0; j < i; j++) {
      const between = source.se(others[i]!, others[j]!);
      // (V_i + V_j − V_ij) / 2√(V_i V_j), written with ratios so that no scale overflows.
      const ratio = errors[i]! / errors[j]!;
      const rho = 0.5 * (ratio + 1 / ratio - (between / errors[i]!) * (between / errors[j]!));
      const kept = Math.max(-1, Math.min(1, rho));
      correlation[i * m + j] = kept;
      correlation[j * m + i] = kept;
    }
  }
  return correlation;
}

/** The connected parts of the present treatments. */
export function partsOf(source: DifferenceSource): number[][] {
  const parts: number[][] = [];
  for (const treatment of source.present) {
    const own = parts.find((part) => source.estimable(part[0]!, treatment));
    if (own) own.push(treatment);
    else parts.push([treatment]);
  }
  return parts;
}
