import { expect, test } from 'vitest';
import { normalPlot } from '#lib/core/analysis/diagnostics/normal-plot.ts';
import { rowDiagnostics } from '#lib/core/analysis/diagnostics/row-diagnostics.ts';
import { solveFixed } from '#lib/core/analysis/fixed/fit-fixed.ts';
import { momentsOf } from '#lib/core/analysis/model/moments.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import { normalQuantile } from '#lib/core/numerics/distributions/normal.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import { campaignOf, drawReadings } from '../../../simulation/simulate-campaign.ts';
import { observations, tableOf } from '../kept-model.ts';

function plotOf(input: Observations, seed: number) {
  const table = tableOf(input);
  const fixed = solveFixed(table, momentsOf(table));
  return normalPlot(fixed, rowDiagnostics(fixed), seed);
}

const design = campaignOf(Array.from({ length: 7 }, (_, j) => [0, 1, 3].map((d) => (d + j) % 7)));
const random = seededRandom('normal plot');
const drawn = () => drawReadings(design, new Array<number>(7).fill(0), 1, random);

test('normalPlot orders the residuals against Blom’s positions', () => {
  const plot = plotOf(drawn(), 3);
  if (!plot.ok) throw new Error(plot.error.tag);
  const { points, draws } = plot.value;
  expect(draws).toBe(199);
  points.forEach(({ theoretical, observed, lower, upper }, i) => {
    expect(theoretical).toBeCloseTo(normalQuantile((i + 1 - 3 / 8) / (21 + 1 / 4)), 12);
    expect(lower).toBeLessThan(upper);
    if (i > 0) expect(observed).toBeGreaterThanOrEqual(points[i - 1]!.observed);
  });
});

test('normalPlot draws the same envelope from the same seed and another from another', () => {
  const input = drawn();
  expect(plotOf(input, 5)).toEqual(plotOf(input, 5));
  expect(plotOf(input, 5)).not.toEqual(plotOf(input, 6));
});

test('normalPlot’s envelope holds 95 % of the points of normal readings', () => {
  let inside = 0;
  let all = 0;
  for (let campaign = 0; campaign < 80; campaign++) {
    const plot = plotOf(drawn(), campaign);
    if (!plot.ok) throw new Error(plot.error.tag);
    for (const { observed, lower, upper } of plot.value.points) {
      all++;
      if (observed >= lower && observed <= upper) inside++;
    }
  }
  // 1,680 points, but dependent inside a campaign: hence the wide margin.
  expect(inside / all).toBeGreaterThan(0.91);
  expect(inside / all).toBeLessThan(0.985);
});

test('normalPlot says why not: no scatter, fewer than three residuals', () => {
  const flat = { ...design, rows: design.rows.map((row) => ({ ...row, y: 4 })) };
  expect(plotOf(flat, 1)).toEqual({ ok: false, error: { tag: 'no-scatter' } });
  const two = observations([
    [0, 0, 1],
    [0, 0, 2],
    [1, 1, 5]
  ]);
  expect(plotOf(two, 1)).toMatchObject({ ok: false, error: { tag: 'too-few-readings', have: 2, need: 3 } });
});
