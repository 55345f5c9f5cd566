import { describe, expect, it } from 'vitest';
import { analyse } from '#lib/core/analysis/analyse.ts';
import type { RuinedAnalysis } from '#lib/core/analysis/analysis-result.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { campaignOf, drawReadings } from '../../../simulation/simulate-campaign.ts';
import { fixedOf } from '../kept-model.ts';

const fano = Array.from({ length: 7 }, (_, j) => [0, 1, 3].map((d) => (d + j) % 7));
const all = drawReadings(campaignOf([...fano, ...fano]), [0, 0, 0, 0, 0, 2.6, 0], 1, seededRandom('ruined'));
/** Two ruined runs that read, one that does not. */
const some: Observations = {
  ...all,
  rows: all.rows.map((row, i) =>
    i === 3
      ? { ...row, ruined: true, y: row.y! + 9 }
      : i === 8 || i === 20
        ? { ...row, ruined: true, y: i === 20 ? null : row.y }
        : row
  )
};

function ruinedOf(input: Observations): RuinedAnalysis {
  const result = analyse(input);
  if (!result.ok || !result.value.ruined.ok) throw new Error('no ruined runs');
  return result.value.ruined.value;
}

describe('analyseRuined', () => {
  it('analyseRuined counts the ruined runs by treatment, with and without a reading', () => {
    const { runs, withReading, byTreatment } = ruinedOf(some);
    expect([runs, withReading]).toEqual([3, 2]);
    expect(byTreatment.reduce((s, line) => s + line.ruined, 0)).toBe(3);
    expect(byTreatment.every((line) => line.ruined + line.kept === 6)).toBe(true);
  });

  it('analyseRuined at face value is the analysis of all readings, and the changes are the two side by side', () => {
    const { faceValue, changes } = ruinedOf(some);
    const taken = fixedOf({ ...some, rows: some.rows.map((row) => ({ ...row, ruined: false })) });
    const kept = fixedOf(some);
    if (!faceValue.ok) throw new Error(faceValue.error.tag);
    faceValue.value.pairs.forEach((line, i) => expect(line.pTukey).toBeCloseTo(taken.pairs[i]!.pTukey!, 10));
    changes.forEach(({ treatment, change }) => {
      expect(change).toBeCloseTo(kept.means[treatment]!.estimate! - taken.means[treatment]!.estimate!, 9);
    });
  });

  it('analyseRuined lists exactly the pairs whose verdict turns', () => {
    const wild = { ...all, rows: all.rows.map((row, i) => (i === 3 ? { ...row, ruined: true, y: row.y! + 60 } : row)) };
    const { turned } = ruinedOf(wild);
    const kept = fixedOf(wild);
    const taken = fixedOf({ ...wild, rows: wild.rows.map((row) => ({ ...row, ruined: false })) });
    const differs = (fit: typeof kept, i: number) => fit.pairs[i]!.pTukey! <= 0.05;
    const wanted = kept.pairs.flatMap(({ a, b }, i) =>
      differs(kept, i) === differs(taken, i) ? [] : [{ a, b, without: differs(kept, i), with: differs(taken, i) }]
    );
    expect(wanted.length).toBeGreaterThan(0);
    expect(turned).toEqual(wanted);
  });

  it('analyseRuined says why not: nothing ruined, no ruined run read', () => {
    const none = analyse(all);
    expect(none).toMatchObject({ value: { ruined: { ok: false, error: { tag: 'no-ruined-runs' } } } });
    const unread = { ...all, rows: all.rows.map((row, i) => (i === 3 ? { ...row, ruined: true, y: null } : row)) };
    expect(ruinedOf(unread).faceValue).toEqual({ ok: false, error: { tag: 'no-ruined-readings' } });
  });
});
