import { slipCandidates } from './check-slip.ts';
import type { Finding, SlipCandidate } from './finding.ts';

/**
 * What is believed of readings of one kind before any is there: they scatter by a factor of two both ways (two standard
 * deviations of the natural logarithm), held as loosely as `df` readings would. Own choice, no source.
 */
const before = { scatter: Math.LN2 / 2, df: 3 };
/** A slip is named when it makes the value this much more probable than the value as typed. Own choice, no source. */
export const SLIP_RATIO = 30;
/** A candidate that the best one beats by more than this is not offered beside it. Own choice, no source. */
const CLEARLY_BEHIND = 4;
/** Where sisters scatter more than this (standard deviation of ln |y|), tenfold is nothing odd. Own choice, no source. */
export const WIDEST_SCATTER = 0.5;

/**
 * Returns the slip of a decimal sign, or of inch for millimetre, that would bring a reading back among its sisters: the
 * readings of the same kind so far, whatever their treatment and session. It speaks from the second reading of a campaign
 * on, long before a model of treatments and sessions can.
 *
 * Readings are compared on the scale of x = ln |y|, where a tenth is as far as tenfold. Given n sisters with mean x̄ and
 * sum of squares S, the next x has the density of Student's t with df₀ + n − 1 degrees of freedom about x̄, with squared
 * scale s²(1 + 1/n) and s² = (df₀ s₀² + S)/(df₀ + n − 1). A candidate c is named when density(ln c)/density(ln y) is at
 * least SLIP_RATIO. While s is above WIDEST_SCATTER nothing is said: lives over decades are none of its business.
 *
 * @param value the reading, in its unit
 * @param plain its digits as typed
 * @param sisters kept readings of the same kind; those of another sign than the value, and zeros, say nothing
 * Source: posterior predictive distribution of a normal quantity with a scaled inverse χ² prior of its variance: A. Gelman
 * et al., Bayesian Data Analysis, sections 3.2 and 3.3; from memory.
 * Checked by: test/core/campaign/checks/check-sisters.test.ts; npm run bench:checks
 */
export function checkSisters(value: number, plain: string, sisters: readonly number[]): Finding | null {
  const logs = sisters.filter((one) => one * value > 0).map((one) => Math.log(Math.abs(one)));
  const n = logs.length;
  // Readings on both sides of zero have no common scale of logarithms.
  if (n === 0 || n < sisters.length) return null;
  const mean = logs.reduce((sum, x) => sum + x, 0) / n;
  const squares = logs.reduce((sum, x) => sum + (x - mean) ** 2, 0);
  const df = before.df + n - 1;
  const variance = (before.df * before.scatter ** 2 + squares) / df;
  if (variance > WIDEST_SCATTER ** 2) return null;
  const scale2 = variance * (1 + 1 / n);
  const far = (x: number) => 1 + (Math.log(Math.abs(x)) - mean) ** 2 / (df * scale2);
  const ratio = ({ value: c }: SlipCandidate) => (c * value > 0 ? (far(value) / far(c)) ** ((df + 1) / 2) : 0);
  const likely = slipCandidates(value, plain)
    .filter(({ how }) => how !== 'swapped-digits')
    .map((candidate) => ({ candidate, ratio: ratio(candidate) }))
    .filter((one) => one.ratio >= SLIP_RATIO)
    .sort((a, b) => b.ratio - a.ratio);
  const best = likely[0]?.ratio ?? 0;
  const candidates = likely.filter((one) => one.ratio * CLEARLY_BEHIND >= best).map(({ candidate }) => candidate);
  return candidates.length > 0 ? { check: 'slip', value, candidates } : null;
}
