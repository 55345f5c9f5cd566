import { describe, expect, test } from 'vitest';
import { aValue } from '#lib/core/design/a-value.ts';
import { planRepair } from '#lib/core/design/repair/plan-repair.ts';

const FANO = [[0, 1, 2], [0, 3, 4], [0, 5, 6], [1, 3, 5], [1, 4, 6], [2, 3, 6], [2, 4, 5]]; // prettier-ignore
const without = (...lost: number[]): number[][] => FANO.map((block, j) => (lost.includes(j) ? [] : block));

describe('planRepair', () => {
  test('planRepair(nothing ruined) has lost nothing', () => {
    const report = planRepair({ treatments: 7, planned: FANO, kept: FANO, slots: 3, specimens: null });
    expect(report.aValue).toBeCloseTo(6 / 7, 10);
    expect(report.options.map(({ kind }) => kind)).toEqual(['extra', 'leave']);
    for (const { planned, now } of report.pairs) expect(now).toBeCloseTo(planned, 10);
  });

  test('planRepair(two sessions ruined) prices rerun, extra session and leaving it', () => {
    const report = planRepair({ treatments: 7, planned: FANO, kept: without(0, 1), slots: 3, specimens: null });
    expect(report.aValue).toBeCloseTo(1.4523809524, 9); // reference O068
    const reruns = report.options.filter((option) => option.kind === 'rerun');
    expect(reruns.map(({ session }) => session)).toEqual([0, 1]);
    for (const rerun of reruns) expect(rerun.aValue).toBeCloseTo(1.0714285714, 9);
    expect(report.options[report.options.length - 1]).toMatchObject({ kind: 'leave' });
    const mean = report.pairs.reduce((sum, { now }) => sum + now!, 0) / report.pairs.length;
    expect(mean).toBeCloseTo(report.aValue!, 10);
  });

  test('planRepair(a disconnected design) names the parts and the session that reconnects them', () => {
    const kept = without(2, 4, 5, 6); // reference O069: treatment 6 is gone
    const report = planRepair({ treatments: 7, planned: FANO, kept, slots: 3, specimens: null });
    expect(report.aValue).toBeNull();
    expect(report.parts).toEqual([[0, 1, 2, 3, 4, 5], [6]]); // prettier-ignore
    expect(report.pairs.filter(({ now }) => now === null)).toHaveLength(6);
    const inside = report.pairs.filter(({ now }) => now !== null);
    expect(inside.reduce((sum, { now }) => sum + now!, 0) / 15).toBeCloseTo(aValue(kept.filter((block) => block.length), 6), 9); // prettier-ignore
    expect(report.options[0]).toMatchObject({ kind: 'extra', treatments: [2, 4, 6] });
    expect(report.options[0]!.aValue).toBeCloseTo(1.9880952381, 9);
  });

  test('planRepair(...) says which session cannot be run again for want of specimens', () => {
    const specimens = [0, 1, 1, 1, 1, 1, 1];
    const report = planRepair({ treatments: 7, planned: FANO, kept: without(0, 3), slots: 3, specimens });
    const possible = report.options.flatMap((option) =>
      option.kind === 'rerun' ? [[option.session, option.possible] as const] : []
    );
    expect(new Map(possible)).toEqual(new Map([[0, false], [3, true]])); // prettier-ignore
    const extra = report.options.find((option) => option.kind === 'extra')!;
    expect(extra.kind === 'extra' && extra.treatments.includes(0)).toBe(false);
  });

  test('planRepair(...) throws when kept and planned sessions differ in number', () => {
    expect(() => planRepair({ treatments: 7, planned: FANO, kept: [], slots: 3, specimens: null })).toThrow(RangeError);
  });
});
