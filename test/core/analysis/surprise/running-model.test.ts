import { readdirSync, readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { leftOutDeviations } from '#lib/core/analysis/surprise/left-out.ts';
import { fitRunningModel, type RunningReading } from '#lib/core/analysis/surprise/running-model.ts';
import { fitAtRatio, sessionTable } from '#lib/core/analysis/surprise/session-moments.ts';
import { tTwoSided, tUpperQuantile } from '#lib/core/numerics/distributions/student-t.ts';
import { normalQuantile } from '#lib/core/numerics/distributions/normal.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';

interface Case {
  id: string;
  model: { withinBlockFactors: string[]; betweenBlockFactors: string[] };
  data: { treatment: string[]; block: string[]; y: (number | null)[] };
  intra: { residualDf: number };
  reml: {
    varianceComponents: { gamma: number; varResidual: number };
    kenwardRoger: { means: { treatment: string[]; estimate: (number | null)[] } };
  };
}

const folder = new URL('../../../reference/cases/', import.meta.url);
const cases = readdirSync(folder)
  .filter((name) => name.endsWith('.json') && name !== 'index.json')
  .map((name) => JSON.parse(readFileSync(new URL(name, folder), 'utf8')) as Case)
  .filter(({ model }) => model.withinBlockFactors.length + model.betweenBlockFactors.length === 0);

function readingsOf({ data, reml }: Case): RunningReading[] {
  const treatments = reml.kenwardRoger.means.treatment;
  const sessions = [...new Set(data.block)];
  return data.y.flatMap((y, i) =>
    y === null
      ? []
      : [{ treatment: treatments.indexOf(data.treatment[i]!), session: sessions.indexOf(data.block[i]!), y }]
  );
}

const NONE: ReadonlySet<number> = new Set();

describe.each(cases)('$id (reference: lme4, R 4.2.2)', (one) => {
  const table = sessionTable(readingsOf(one), NONE);
  const { gamma, varResidual } = one.reml.varianceComponents;
  const fit = fitAtRatio(table, gamma);

  test('fitAtRatio(table, REML ratio) has the reference means and run variance', () => {
    expect(Math.abs(fit.squares / (table.n - table.place.size) / varResidual - 1)).toBeLessThan(1e-8);
    one.reml.kenwardRoger.means.estimate.forEach((mean, i) => {
      if (mean === null) return;
      const own = fit.beta[table.place.get(i)!]! + table.middle;
      expect(Math.abs(own - mean)).toBeLessThan(1e-7 * Math.max(Math.abs(mean), Math.sqrt(varResidual)));
    });
  });

  test('fitAtRatio(table, ratio) is likeliest at the REML ratio', () => {
    const lower = fitAtRatio(table, gamma === 0 ? 1e-4 : gamma * 0.99).logLik;
    const higher = fitAtRatio(table, gamma === 0 ? 1e-2 : gamma * 1.01).logLik;
    expect(fit.logLik).toBeGreaterThanOrEqual(lower - 1e-12);
    expect(fit.logLik).toBeGreaterThan(higher);
  });

  test('sessionTable(readings) counts the error degrees of freedom of fixed sessions', () => {
    expect(table.errorDf).toBe(one.intra.residualDf);
  });
});

test('leftOutDeviations(table, fit) are what a fit without the reading says, at the same ratio', () => {
  const readings = readingsOf(cases.find(({ id }) => id === 'sim_miss4_13_4_13')!);
  const ratio = 2.3;
  const table = sessionTable(readings, NONE);
  const all = leftOutDeviations(table, fitAtRatio(table, ratio));
  for (const row of [0, 7, 20, 41]) {
    const left = table.origin[row]!;
    const without = sessionTable(readings, new Set([left]));
    const fit = fitAtRatio(without, ratio);
    // The prediction written out with session effects: μ_i + c Σ e.
    const { treatment, session, y } = readings[left]!;
    const i = without.place.get(treatment)!;
    const j = without.session.get(session)!;
    const mean = without.middle + fit.beta[i]! + fit.shrink[j]! * fit.sessionSum[j]!;
    const scale = Math.abs((y - mean) / all[row]!);
    const variance = fit.squares / (without.n - without.place.size);
    expect(Math.sign(y - mean)).toBe(Math.sign(all[row]!));
    // scale² = variance·(1 + c + d'M⁻¹d): above the run variance times 1 + c, and the same for the running model.
    expect(scale * scale).toBeGreaterThan(variance * (1 + fit.shrink[j]!));
    const prediction = fitRunningModel(
      readings.filter((_, at) => at !== left),
      false
    ).predict(treatment, session, 0.05)!;
    expect(Math.abs(prediction.chance(y) - tTwoSided(all[row]!, without.n - without.place.size))).toBeLessThan(0.06);
  }
});

test('fitRunningModel(readings).predict in complete sessions with a huge session variance is the two-way t prediction', () => {
  // Sessions 100 apart: all information is inside sessions. Treatments 0..3 in sessions 0..4, then session 5 begun
  // with three readings: y* = ȳ_i. + (ȳ_.5 over the others) - their means, variance σ²(1 + 1/5 + (1 + 1/5)/3).
  const random = seededRandom('two-way');
  const readings: RunningReading[] = [];
  for (let session = 0; session < 6; session++) {
    for (let treatment = 0; treatment < (session === 5 ? 3 : 4); treatment++) {
      readings.push({ treatment, session, y: 100 * session + 5 * treatment + normalQuantile(random.next()) });
    }
  }
  const mean = (pick: (r: RunningReading) => boolean) => {
    const own = readings.filter(pick);
    return own.reduce((s, r) => s + r.y, 0) / own.length;
  };
  const full = (r: RunningReading) => r.session < 5;
  const expected =
    mean((r) => full(r) && r.treatment === 3) + mean((r) => r.session === 5) - mean((r) => full(r) && r.treatment < 3);
  let squares = 0;
  for (const r of readings.filter(full)) {
    const fitted =
      mean((q) => full(q) && q.treatment === r.treatment) + mean((q) => q.session === r.session) - mean(full);
    squares += (r.y - fitted) ** 2;
  }
  const own = (i: number) =>
    mean((r) => r.session === 5 && r.treatment === i) - mean((r) => full(r) && r.treatment === i);
  const gaps = [0, 1, 2].map(own);
  const middle = (gaps[0]! + gaps[1]! + gaps[2]!) / 3;
  squares += gaps.reduce((s, g) => s + (g - middle) ** 2, 0) * (5 / 6);
  const model = fitRunningModel(readings, false);
  const prediction = model.predict(3, 5, 0.05)!;
  expect(model.errorDf).toBe(14);
  expect(Math.abs(prediction.center - expected)).toBeLessThan(0.02);
  const half = tUpperQuantile(0.025, 14) * Math.sqrt((squares / 14) * (1 + 1 / 5 + 6 / 15));
  // Here n - t = 19 degrees of freedom share the sessions' variance out; inside sessions there are 14.
  expect((prediction.high - prediction.low) / 2 / half).toBeGreaterThan(0.9);
  expect((prediction.high - prediction.low) / 2 / half).toBeLessThan(1.1);
});

const campaign = (seed: string, change: (y: number, at: number) => number): RunningReading[] => {
  const random = seededRandom(seed);
  const blocks = [0, 1, 2, 3, 4, 5, 6].map((s) => [s, (s + 1) % 7, (s + 3) % 7]);
  return blocks.flatMap((block, session) => {
    const offset = 3 * normalQuantile(random.next());
    return block.map((treatment, slot) => ({
      treatment,
      session,
      y: change(50 + 2 * treatment + offset + normalQuantile(random.next()), session * 3 + slot)
    }));
  });
};

test('fitRunningModel(readings) sets one bad earlier reading aside and predicts as without it', () => {
  const bad = campaign('robust', (y, at) => (at === 7 ? y * 10 : y));
  const model = fitRunningModel(bad);
  expect(model.setAside).toEqual([7]);
  const clean = fitRunningModel(
    bad.filter((_, at) => at !== 7),
    false
  );
  const a = model.predict(4, 9, 0.01)!;
  const b = clean.predict(4, 9, 0.01)!;
  expect(a.center).toBeCloseTo(b.center, 9);
  expect(a.high - a.low).toBeCloseTo(b.high - b.low, 9);
  const blinded = fitRunningModel(bad, false).predict(4, 9, 0.01)!;
  expect(blinded.high - blinded.low).toBeGreaterThan(5 * (a.high - a.low));
});

test('fitRunningModel(readings).predict does not depend on order, numbering, and moves with shift and scale', () => {
  const readings = campaign('invariance', (y) => y);
  const plain = fitRunningModel(readings).predict(2, 6, 0.01)!;
  fc.assert(
    fc.property(
      fc.double({ min: -1e6, max: 1e6, noNaN: true }),
      fc.double({ min: 1e-6, max: 1e6, noNaN: true }),
      fc.shuffledSubarray(readings, { minLength: readings.length }),
      (shift, scale, order) => {
        const moved = order.map((r) => ({
          treatment: r.treatment + 40,
          session: 100 - r.session,
          y: r.y * scale + shift
        }));
        const prediction = fitRunningModel(moved).predict(42, 94, 0.01)!;
        const tolerance = 1e-6 * scale * (plain.high - plain.low) + 1e-9 * Math.abs(shift);
        expect(Math.abs(prediction.center - (plain.center * scale + shift))).toBeLessThan(tolerance);
        expect(Math.abs(prediction.low - (plain.low * scale + shift))).toBeLessThan(tolerance);
      }
    ),
    { numRuns: 20 }
  );
});

test('fitRunningModel(readings).predict is silent with few readings and no scatter', () => {
  const readings = campaign('silence', (y) => y);
  expect(fitRunningModel(readings.slice(0, 5)).predict(0, 3, 0.01)).toBeNull();
  expect(fitRunningModel([]).predict(0, 0, 0.01)).toBeNull();
  expect(fitRunningModel(readings.map((r) => ({ ...r, y: 5 }))).predict(0, 8, 0.01)).toBeNull();
});

test('fitRunningModel(readings).predict speaks widely from all readings while a treatment has said nothing', () => {
  const readings = campaign('pooled', (y) => y);
  const seen = fitRunningModel(readings).predict(0, 6, 0.01)!;
  const unseen = fitRunningModel(readings).predict(99, 6, 0.01)!;
  expect([seen.basis, unseen.basis]).toEqual(['treatment', 'all']);
  expect(unseen.high - unseen.low).toBeGreaterThan(seen.high - seen.low);
  const early = fitRunningModel(readings.slice(0, 7)).predict(3, 2, 0.01)!;
  expect(early.basis).toBe('all');
  // Good readings are near 55: neither ten times nor a tenth of one lies inside.
  expect(early.low).toBeGreaterThan(5.5);
  expect(early.high).toBeLessThan(550);
});

test('fitRunningModel(readings).predict gives the chance alpha at its own ends', () => {
  const prediction = fitRunningModel(campaign('ends', (y) => y)).predict(1, 7, 0.02)!;
  expect(prediction.chance(prediction.low)).toBeCloseTo(0.02, 5);
  expect(prediction.chance(prediction.high)).toBeCloseTo(0.02, 5);
  expect(prediction.chance(prediction.center)).toBeGreaterThan(0.9);
});
