import { expect, test } from 'vitest';
import { analyse } from '#lib/core/analysis/analyse.ts';
import { observationsOfCase } from '../../../reference-run/reference-case.ts';
import { readCase } from '../../../reference-run/read-case.ts';
import { fixedOf } from '../kept-model.ts';

test('workingsOf(catalyst example) gives the totals and adjusted totals of the handbook', () => {
  // D. C. Montgomery, Design and Analysis of Experiments, balanced incomplete block design: treatment totals 218, 214, 216,
  // 222; batch totals 221, 224, 207, 218; Q = −9/3, −7/3, −4/3, 20/3.
  const analysis = analyse({ ...observationsOfCase(readCase('pub_catalyst')), control: null });
  if (!analysis.ok || !analysis.value.fixed.ok) throw new Error('no fit');
  const { lines, sessions } = analysis.value.fixed.value.workings;
  expect(lines.map((line) => line.T)).toEqual([218, 214, 216, 222].map((v) => expect.closeTo(v, 10)));
  expect(sessions.map((line) => [line.total, line.size])).toEqual(
    [221, 224, 207, 218].map((v) => [expect.closeTo(v, 10), 3])
  );
  expect(lines.map((line) => line.Q)).toEqual([-9, -7, -4, 20].map((v) => expect.closeTo(v / 3, 10)));
  for (const { T, B, kQ, Q, sessionMeans } of lines) {
    expect(kQ).toBeCloseTo(3 * T - B!, 9);
    expect(Q).toBeCloseTo(T - sessionMeans, 9);
  }
});

test('workingsOf(a design in parts) makes effects add to zero in each part, and has no handbook columns', () => {
  const { workings, means } = fixedOf(observationsOfCase(readCase('sim_disc_4_3')));
  expect(workings.balanced).toBeNull();
  for (const part of [0, 1]) {
    const own = workings.lines.filter((_, i) => means[i]!.part === part);
    expect(own.reduce((s, line) => s + line.effect!, 0)).toBeCloseTo(0, 9);
    expect(own.every((line) => line.B === null && line.kQ === null)).toBe(true);
  }
});
