import { describe, expect, test } from 'vitest';
import { aValue } from '#lib/core/design/a-value.ts';
import { replications } from '#lib/core/design/concurrence.ts';
import { isConnected } from '#lib/core/design/connected-parts.ts';
import { proposeDesigns } from '#lib/core/design/propose/propose-designs.ts';
import type { DesignChoice, DesignRequest, Progress, Proposal } from '#lib/core/design/propose-types.ts';
import { request } from './request.ts';

const answered = async (change: Partial<DesignRequest>): Promise<Proposal> => {
  const result = await proposeDesigns(request(change));
  if (!result.ok) throw new Error(JSON.stringify(result.error));
  return result.value;
};
const refused = async (change: Partial<DesignRequest>) => {
  const result = await proposeDesigns(request(change));
  return result.ok ? null : result.error;
};
const withSessions = (proposal: Proposal, b: number): DesignChoice =>
  proposal.choices.find((choice) => choice.sessions === b)!;

describe('proposeDesigns', () => {
  test('proposeDesigns(request) finds the balanced design of the budget, counted, priced and recommended', async () => {
    const proposal = await answered({ maxSessions: 12 });
    const choice = withSessions(proposal, 12);
    expect(choice).toMatchObject({
      balanced: true,
      sessions: 12,
      specimens: 36,
      replication: { min: 4, max: 4 },
      concurrence: { min: 1, max: 1 },
      time: { rounds: 12, machineMinutes: 480, shifts: 4 },
      fits: { sessions: true, specimens: true }
    });
    expect(choice.aValue).toBeCloseTo((2 * 3) / (1 * 9), 10); // 2k/(λt)
    expect(choice.efficiency).toBeCloseTo(9 / (4 * 3), 10); // λt/(rk)
    expect(choice.ofBound).toBeCloseTo(1, 10);
    expect(choice.precision.errorDf).toBe(36 - 12 - 9 + 1);
    expect(proposal.recommended).toEqual({
      id: choice.id,
      reason: { tag: 'balanced-in-budget', sessions: 12, meets: 1 }
    });
    expect(proposal.smallestBalanced).toEqual({ sessions: 12, replication: 4, meets: 1 });
  });

  test('proposeDesigns(textbook counts) knows the smallest balanced designs', async () => {
    // Montgomery, Design and Analysis of Experiments: 5 treatments in 4, 3, 2 need 5, 10, 10; 6 in 3 need 10 (r = 5, λ = 2).
    for (const [t, k, b] of [
      [5, 4, 5],
      [5, 3, 10],
      [5, 2, 10],
      [6, 3, 10]
    ] as const) {
      // prettier-ignore
      const proposal = await answered({ treatments: t, machines: [{ slots: k }], maxSessions: 20 });
      expect(proposal.smallestBalanced!.sessions).toBe(b);
      expect(withSessions(proposal, b).balanced).toBe(true);
    }
    const six = await answered({ treatments: 6, maxSessions: 20 });
    expect(withSessions(six, 20).concurrence).toEqual({ min: 4, max: 4 });
  });

  test('proposeDesigns(request) gives the same answer for the same request', async () => {
    const change = { treatments: 12, machines: [{ slots: 4 }], maxSessions: 9 };
    expect(await answered(change)).toEqual(await answered(change));
  });

  test('proposeDesigns(request) recommends the fewest sessions that find the difference', async () => {
    const proposal = await answered({ maxSessions: null, scatter: 1, difference: 2.5 });
    expect(proposal.recommended!.reason.tag).toBe('finds-difference');
    const chosen = proposal.choices.find(({ id }) => id === proposal.recommended!.id)!;
    expect(chosen.precision.power80!.tukey).toBeLessThanOrEqual(2.5);
    for (const other of proposal.choices) {
      if (other.sessions < chosen.sessions) expect(other.precision.power80!.tukey).toBeGreaterThan(2.5);
    }
    const cheaper = await answered({ maxSessions: null, scatter: 1, difference: 2.5, adjustment: 'unadjusted' });
    expect(cheaper.choices.find(({ id }) => id === cheaper.recommended!.id)!.sessions).toBeLessThan(chosen.sessions);
  });

  test('proposeDesigns(request) reports choices that only get better and ends with all work done', async () => {
    const reports: Progress[] = [];
    const result = await proposeDesigns(request({ treatments: 13, machines: [{ slots: 4 }], maxSessions: 20 }), {
      onProgress: (progress) => reports.push(progress)
    });
    expect(result.ok).toBe(true);
    expect(reports[0]!.choices).toHaveLength(1);
    const best = new Map<number, number>();
    let done = 0;
    for (const report of reports) {
      expect(report.done).toBeGreaterThanOrEqual(done);
      done = report.done;
      for (const choice of report.choices) {
        expect(choice.aValue).toBeLessThanOrEqual((best.get(choice.sessions) ?? Infinity) * (1 + 1e-9));
        best.set(choice.sessions, choice.aValue);
      }
    }
    expect(done).toBeGreaterThan(0.99);
  });

  test('proposeDesigns(request) stopped on the way answers with the best so far', async () => {
    const signal = { aborted: false };
    let seen = 0;
    const result = await proposeDesigns(request({ treatments: 30, machines: [{ slots: 6 }], maxSessions: 40 }), {
      signal,
      onProgress: ({ choices }) => {
        seen = choices.length;
        if (seen === 2) signal.aborted = true;
      }
    });
    if (!result.ok) throw new Error('refused');
    expect(result.value.cancelled).toBe(true);
    expect(result.value.choices).toHaveLength(2);
  });

  test('proposeDesigns(request) has the control in every session and shows both variances', async () => {
    const control = { treatments: [2], weigh: 'test-control' } as const;
    const proposal = await answered({ treatments: 7, machines: [{ slots: 4 }], maxSessions: 8, control });
    for (const choice of proposal.choices) {
      expect(choice.blocks.every((block) => block.includes(2))).toBe(true);
      expect(choice.control!.testControl).toBeLessThan(choice.control!.testTest);
      expect(choice.bound.by).toBe('control');
      expect(choice.labelClass[2]).not.toBe(choice.labelClass[0]);
      expect(choice.balanced).toBe(false);
    }
  });

  test('proposeDesigns(request) deals all treatments out in each shift group', async () => {
    const proposal = await answered({ treatments: 10, machines: [{ slots: 4 }], resolvable: true, maxSessions: 12 });
    for (const choice of proposal.choices) {
      for (const group of new Set(choice.groupOf)) {
        const held = choice.blocks.filter((_, j) => choice.groupOf![j] === group).flat();
        expect(held.sort((a, b) => a - b)).toEqual([...Array(10).keys()]);
      }
    }
    const nine = await answered({ resolvable: true, maxSessions: 12 });
    expect(withSessions(nine, 12)).toMatchObject({ balanced: true, time: { shifts: 4 } });
  });

  test('proposeDesigns(request) keeps to specimens, forbidden pairs and sessions of given sizes', async () => {
    const scarce = await answered({ specimens: [1, 2, null, null, null, null, null, null, null] });
    for (const choice of scarce.choices) {
      const r = replications(choice.blocks, 9);
      expect(r[0]).toBe(1);
      expect(r[1]).toBeLessThanOrEqual(2);
      expect(choice.fits.specimens).toBe(true);
    }
    const apart = await answered({ forbiddenPairs: [[0, 1], [5, 3]] }); // prettier-ignore
    for (const choice of apart.choices) {
      for (const block of choice.blocks) {
        expect(block.includes(0) && block.includes(1)).toBe(false);
        expect(block.includes(5) && block.includes(3)).toBe(false);
      }
      expect(new Set(choice.labelClass).size).toBe(5);
    }
    const given = await answered({ treatments: 7, machines: [{ slots: 4 }], sessionSizes: [4, 4, 4, 3, 3, 3, 3] });
    expect(given.choices).toHaveLength(1);
    expect(given.choices[0]!.blocks.map((block) => block.length)).toEqual([4, 4, 4, 3, 3, 3, 3]);
    expect(given.choices[0]!.aValue / 0.7290944885).toBeLessThan(1.003); // reference O045
  });

  test('proposeDesigns(request) puts every treatment in every session when the machine holds all', async () => {
    const proposal = await answered({ treatments: 4, machines: [{ slots: 6 }], maxSessions: 5 });
    for (const choice of proposal.choices) {
      expect(choice.construction.kind).toBe('complete');
      expect(choice.aValue).toBeCloseTo(2 / choice.sessions, 10);
    }
  });

  test('proposeDesigns(request) shares sessions among machines by their slots', async () => {
    const proposal = await answered({ treatments: 8, machines: [{ slots: 4 }, { slots: 3 }], maxSessions: 14 });
    for (const choice of proposal.choices) {
      choice.blocks.forEach((block, j) => expect(block.length).toBe(choice.machineOf[j] === 0 ? 4 : 3));
      expect(isConnected(choice.blocks, 8)).toBe(true);
      expect(choice.time.rounds).toBe(Math.ceil(choice.sessions / 2));
    }
  });

  test('proposeDesigns(request) offers free replication where runs are scarce', async () => {
    const proposal = await answered({ treatments: 8, machines: [{ slots: 2 }], maxSessions: 7 });
    expect(withSessions(proposal, 7).aValue).toBeCloseTo(3.5, 8); // reference O007, the star
    expect(aValue(withSessions(proposal, 7).blocks, 8)).toBeCloseTo(3.5, 8);
  });

  test('proposeDesigns(request) says why nothing can be proposed', async () => {
    expect(await refused({ maxSessions: 3 })).toEqual({ tag: 'too-few-sessions', needed: 4, sessions: 3 });
    expect(await refused({ sessionSizes: [3, 3, 3] })).toMatchObject({ tag: 'too-few-sessions', sessions: 3 });
    expect(await refused({ treatments: 1 })).toMatchObject({ tag: 'bad-request', path: 'treatments' });
    expect(await refused({ treatments: 101 })).toMatchObject({ tag: 'bad-request', path: 'treatments' });
    expect(await refused({ machines: [] })).toMatchObject({ tag: 'bad-request', path: 'machines' });
    expect(await refused({ alpha: 1 })).toMatchObject({ tag: 'bad-request', path: 'alpha' });
    expect(await refused({ scatter: -1 })).toMatchObject({ tag: 'bad-request', path: 'scatter' });
    expect(await refused({ specimens: [0, 1, 1, 1, 1, 1, 1, 1, 1] })).toEqual({
      tag: 'too-few-specimens',
      treatment: 0
    });
    expect(await refused({ specimens: Array<number>(9).fill(1) })).toMatchObject({ tag: 'too-few-specimens' });
    expect(await refused({ control: { treatments: [0, 1, 2], weigh: 'half' } })).toMatchObject({ tag: 'constraints-contradict' }); // prettier-ignore
    const all = [...Array(9).keys()].flatMap((i) => [...Array(i).keys()].map((l) => [i, l] as const));
    expect(await refused({ forbiddenPairs: all })).toMatchObject({ tag: 'constraints-contradict' });
  });
});
