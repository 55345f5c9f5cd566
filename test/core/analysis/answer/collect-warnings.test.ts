import { describe, expect, it } from 'vitest';
import { analyse } from '#lib/core/analysis/analyse.ts';
import { disagreements } from '#lib/core/analysis/answer/collect-warnings.ts';
import type { PairLine, Warning } from '#lib/core/analysis/analysis-result.ts';
import type { ObservationRow, Observations } from '#lib/core/analysis/observations.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { campaignOf, drawReadings } from '../../../simulation/simulate-campaign.ts';

function warned(input: Observations): Warning[] {
  const result = analyse(input);
  if (!result.ok) throw new Error(result.error.tag);
  return result.value.warnings;
}
const tags = (input: Observations): string[] => warned(input).map(({ tag }) => tag);

const fano = Array.from({ length: 7 }, (_, j) => [0, 1, 3].map((d) => (d + j) % 7));
/** Four rounds of a balanced design with normal readings. */
const calm = drawReadings(
  campaignOf([...fano, ...fano, ...fano, ...fano]),
  new Array<number>(7).fill(0),
  1.5,
  seededRandom('calm')
);
const changed = (change: (row: ObservationRow, i: number) => Partial<ObservationRow>): Observations => ({
  ...calm,
  rows: calm.rows.map((row, i) => ({ ...row, ...change(row, i) }))
});

describe('collectWarnings', () => {
  it('collectWarnings has nothing to say about a campaign in which nothing is wrong', () => {
    expect(warned(calm)).toEqual([]);
  });

  it.each<[string, Observations, Partial<Warning>]>([
    ['a wild reading', changed((row, i) => (i === 40 ? { y: row.y! + 30 } : {})), { tag: 'outlier', row: 40 }],
    ['slots that differ', changed((row) => ({ y: row.y! + 3 * row.slot! })), { tag: 'slots-differ', inModel: false }],
    ['sessions that drift', changed((row) => ({ y: row.y! + row.session })), { tag: 'session-trend' }],
    [
      'one treatment that scatters more',
      changed((row, i) => (row.treatment === 2 ? { y: row.y! + (i % 2 ? 9 : -9) } : {})),
      { tag: 'scatter-differs' }
    ],
    ['readings that are powers', changed((row) => ({ y: 1.6 ** (row.y! - 40) })), { tag: 'other-scale' }],
    [
      'runs that stopped at a limit',
      changed((_, i) => (i < 2 ? { limit: 'at-least' } : {})),
      { tag: 'limits-taken-as-values', runs: 2 }
    ],
    [
      'a treatment never read',
      changed((row) => (row.treatment === 6 ? { y: null } : {})),
      { tag: 'treatments-without-readings', treatments: [6] }
    ],
    [
      'ruin on one treatment',
      changed((row) => (row.treatment === 3 && row.session > 6 ? { ruined: true } : {})),
      { tag: 'ruin-associated' }
    ],
    [
      'a session left with one run',
      changed((row, i) => (i === 0 || i === 1 ? { ruined: true } : {})),
      { tag: 'single-run-sessions', sessions: [0] }
    ],
    [
      'a factor with one level',
      { ...calm, factors: { slot: false, machine: true, shift: false } },
      { tag: 'factor-left-out', factor: 'machine' }
    ]
  ])('collectWarnings names %s', (_, input, warning) => {
    expect(warned(input)).toContainEqual(expect.objectContaining(warning));
  });

  it('collectWarnings names lost pairs and parts first where ruin parts the design', () => {
    const pairs = drawReadings(
      campaignOf([
        [0, 1],
        [0, 1],
        [2, 3],
        [3, 2],
        [1, 2]
      ]),
      [0, 0, 0, 0],
      1,
      seededRandom('parts')
    );
    const rows = pairs.rows.map((row) => ({ ...row, ruined: row.session === 4 }));
    const found = warned({ ...pairs, rows });
    expect(found.slice(0, 2)).toEqual([
      { tag: 'parts', parts: 2 },
      { tag: 'lost-pairs', pairs: 4 }
    ]);
    expect(found).toContainEqual({ tag: 'few-error-degrees-of-freedom', df: 2 });
  });

  it('collectWarnings says so when the session variance is put at zero', () => {
    // Sessions with equal sums differ less than chance lets them.
    const level = changed((row, i) => ({ y: 50 + [-2, 0, 2][(i + row.session) % 3]! + 0.1 * Math.sin(5 * i) }));
    expect(tags(level)).toContain('session-variance-zero');
  });
});

describe('disagreements', () => {
  it('disagreements counts pairs that one model tells apart and the other does not', () => {
    const line = (a: number, b: number, pTukey: number | null) => ({ a, b, pTukey }) as PairLine;
    const one = [line(0, 1, 0.04), line(0, 2, 0.2), line(1, 2, 0.01), line(0, 3, null)];
    const other = [line(0, 1, 0.06), line(0, 2, 0.05), line(1, 2, 0.02), line(0, 3, 0.01)];
    expect(disagreements(one, other, 0.05)).toBe(2);
  });
});
