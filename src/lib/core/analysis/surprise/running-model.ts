import { cleanedModel } from './cleaned-model.ts';
import type { Prediction } from './prediction.ts';
import type { RunningReading } from './session-moments.ts';

export type { Prediction } from './prediction.ts';
export type { RunningReading } from './session-moments.ts';

/** Chance of a good reading outside its prediction, at which the bench asks to look again. */
export const SURPRISE_CHANCE = 0.005;

/** The session-random model of the kept readings so far. */
export interface RunningModel {
  readonly errorDf: number;
  /** Positions of earlier readings that were set aside because the others contradict them. */
  readonly setAside: readonly number[];
  /**
   * Predicts a reading.
   *
   * @param alpha chance of a good reading outside, in (0, 1)
   * @returns null while nothing can be said: fewer than 4 error degrees of freedom, no scatter
   */
  readonly predict: (treatment: number, session: number, alpha: number) => Prediction | null;
}

/**
 * Fits the model that stands behind the bench's surprise check: treatments fixed, sessions random.
 *
 * The prediction for treatment i in session j has, at a given ratio γ, mean β_i + b̂_j, variance
 * σ̂²(1 + c_j + dᵀM⁻¹d), d = e_i − c_j n_j, and n − t degrees of freedom. γ itself is uncertain after few sessions, so the
 * t distributions are averaged over γ, weighted by the restricted likelihood and a flat prior on the session's share of
 * the variance. Earlier readings that the others contradict (Bonferroni) are set aside one at a time, so that one bad
 * reading neither widens the prediction nor draws it away.
 *
 * While that model is silent (too few error degrees of freedom, a treatment not seen yet), the same model without
 * treatments speaks: a wide prediction from all readings so far, which still tells a slip of a decimal sign.
 *
 * @param readings kept readings in any order; numbers of treatments and sessions may be any
 * @param robust whether to set contradicted readings aside
 * Cost: below 5 ms for 30 treatments in 60 sessions of 8.
 * Source: D. A. Harville (1976), Annals of Statistics 4, 384–395 (prediction); the averaging is own work from
 * H. D. Patterson & R. Thompson (1971), Biometrika 58, 545–554.
 * Checked by: test/core/analysis/surprise/running-model.test.ts; npm run bench:checks
 */
export function fitRunningModel(readings: readonly RunningReading[], robust = true): RunningModel {
  const own = cleanedModel(readings, robust);
  let pooled: Pooled | null = null;
  return {
    errorDf: own.table.errorDf,
    setAside: own.setAside,
    predict: (treatment, session, alpha) => {
      const narrow = own.predict(treatment, session, alpha);
      if (narrow) return { ...narrow, basis: 'treatment' };
      pooled ??= poolTreatments(readings, robust);
      const wide = pooled(session, alpha);
      return wide && { ...wide, basis: 'all' };
    }
  };
}

type Pooled = (session: number, alpha: number) => Omit<Prediction, 'basis'> | null;

/**
 * The prediction without treatments. Readings that are all positive are looked at on the scale of their logarithms as
 * well, where a tenth is as far as tenfold; both scales must agree, each with half of the chance.
 */
function poolTreatments(readings: readonly RunningReading[], robust: boolean): Pooled {
  const asOne = readings.map((reading) => ({ ...reading, treatment: 0 }));
  const plain = cleanedModel(asOne, robust);
  if (!readings.every(({ y }) => y > 0)) return (session, alpha) => plain.predict(0, session, alpha);
  const logs = cleanedModel(
    asOne.map((reading) => ({ ...reading, y: Math.log(reading.y) })),
    robust
  );
  return (session, alpha) => {
    const a = plain.predict(0, session, alpha / 2);
    const b = logs.predict(0, session, alpha / 2);
    if (!a || !b) return a ?? b;
    const low = Math.max(a.low, Math.exp(b.low));
    const high = Math.min(a.high, Math.exp(b.high));
    if (!(low < high)) return a;
    return {
      center: Math.min(high, Math.max(low, a.center)),
      low,
      high,
      chance: (y) => Math.min(1, 2 * Math.min(a.chance(y), y > 0 ? b.chance(Math.log(y)) : 0))
    };
  };
}
