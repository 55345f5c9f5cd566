import { normalDensity, normalUpper } from '../../numerics/distributions/normal.ts';
import type { Limit } from '../observations.ts';

/** Contribution of one reading to the log-likelihood as a function of its standardised residual r. */
export interface LimitTerm {
  logLik: number;
  /** First derivative by r. */
  slope: number;
  /** Minus the second derivative by r, at least 0. */
  weight: number;
}

const HALF_LOG_2PI = 0.5 * Math.log(2 * Math.PI);

/**
 * Returns value and derivatives of log φ(r) for a reading, log Φ̄(r) for "at least", log Φ(r) for "at most".
 *
 * Source: J. Tobin (1958), Econometrica 26, 24–36; derivatives by hand.
 * Checked by: test/core/analysis/censored/limit-terms.test.ts (against differences)
 */
export function limitTerm(r: number, limit: Limit): LimitTerm {
  if (limit === 'none') return { logLik: -HALF_LOG_2PI - 0.5 * r * r, slope: -r, weight: 1 };
  if (limit === 'at-least') {
    const { log, hazard } = upperTail(r);
    return { logLik: log, slope: -hazard, weight: Math.max(0, hazard * (hazard - r)) };
  }
  const { log, hazard } = upperTail(-r);
  return { logLik: log, slope: hazard, weight: Math.max(0, hazard * (hazard + r)) };
}

/** log Φ̄(x) and φ(x)/Φ̄(x). Beyond 25 by the asymptotic series, whose error is there below 1e-14. */
function upperTail(x: number): { log: number; hazard: number } {
  if (x < 25) {
    const tail = normalUpper(x);
    return { log: Math.log(tail), hazard: normalDensity(x) / tail };
  }
  const v = 1 / (x * x);
  const series = 1 - v * (1 - v * (3 - v * (15 - v * 105)));
  return { log: -0.5 * x * x - HALF_LOG_2PI - Math.log(x) + Math.log(series), hazard: x / series };
}
