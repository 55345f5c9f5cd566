import { describe, expect, test } from 'vitest';
import { layOutPlan } from '#lib/core/design/lay-out-plan.ts';
import type { LayoutRequest } from '#lib/core/design/lay-out-plan.ts';
import { checkCode } from '#lib/core/design/specimen-codes.ts';

const FANO = [[0, 1, 2], [0, 3, 4], [0, 5, 6], [1, 3, 5], [1, 4, 6], [2, 3, 6], [2, 4, 5]]; // prettier-ignore
const treatments = ['a', 'b', 'c', 'd', 'e', 'f', 'g'];
const machine = { id: 'm1', inService: [true, true, true] };

const plan = (change: Partial<LayoutRequest> = {}): LayoutRequest => ({
  treatments,
  blocks: FANO,
  machines: [machine],
  sessionsPerShift: 3,
  order: 'early-stop',
  seed: 'wet scrub 1',
  ...change
});

describe('layOutPlan', () => {
  test('layOutPlan(request) gives the same loading order for the same request and another for another seed', () => {
    expect(layOutPlan(plan())).toEqual(layOutPlan(plan()));
    expect(layOutPlan(plan({ seed: 'wet scrub 2' })).sessions).not.toEqual(layOutPlan(plan()).sessions);
  });

  test('layOutPlan(request) carries seed, generator and versions', () => {
    expect(layOutPlan(plan())).toMatchObject({
      seed: 'wet scrub 1',
      generator: 'xoroshiro128plus',
      generatorVersion: 1,
      algorithm: 'loading-order',
      algorithmVersion: 2
    });
  });

  test('layOutPlan(request) lays out the asked design: each block once, each treatment by its label', () => {
    const laid = layOutPlan(plan());
    expect([...laid.labelOf].sort()).toEqual([0, 1, 2, 3, 4, 5, 6]);
    expect(laid.sessions.map((session) => session.block).sort()).toEqual([0, 1, 2, 3, 4, 5, 6]);
    expect(laid.sessions.map((session) => session.number)).toEqual([1, 2, 3, 4, 5, 6, 7]);
    expect(laid.sessions.map((session) => session.shift)).toEqual([1, 1, 1, 2, 2, 2, 3]);
    for (const session of laid.sessions) {
      const labels = session.slots.map((slot) => laid.labelOf[treatments.indexOf(slot!.treatment)]!);
      expect(labels.sort()).toEqual(FANO[session.block]);
    }
    expect(laid.slotBalance).toMatchObject([{ machine: 'm1', balance: 'exact', range: 0 }]);
    const codes = laid.sessions.flatMap((session) => session.slots.map((slot) => slot!.specimen));
    expect(new Set(codes).size).toBe(21);
    for (const code of codes) expect(checkCode(code).tag).toBe('good');
  });

  test('layOutPlan(request) prefers an order connected early and says so', () => {
    const laid = layOutPlan(plan());
    expect(laid.connectedAfter).toBe(3); // three lines through one point of the plane hold all seven
    expect(laid.restrictions).toContainEqual({ tag: 'early-stop', connectedAfter: 3 });
    expect(layOutPlan(plan({ order: 'chance' })).restrictions).toEqual([{ tag: 'slots-balanced' }]);
  });

  test('layOutPlan(request) of one session in two slots is one of the two arrangements, both about equally often', () => {
    // By hand: one block {0, 1}, two slots; chance decides only who lies in the first slot.
    let first = 0;
    for (let seed = 0; seed < 400; seed++) {
      const small = plan({ treatments: ['x', 'y'], blocks: [[0, 1]], machines: [{ id: 'm', inService: [true, true] }], seed: `${seed}` }); // prettier-ignore
      const slots = layOutPlan(small).sessions[0]!.slots.map((slot) => slot!.treatment);
      expect([...slots].sort()).toEqual(['x', 'y']);
      if (slots[0] === 'x') first++;
    }
    expect(Math.abs(first - 200)).toBeLessThan(50); // five standard deviations of a fair coin
  });

  test('layOutPlan(request) draws labels only inside their classes', () => {
    const laid = layOutPlan(plan({ labelClass: [9, 0, 0, 0, 0, 0, 5] }));
    expect([laid.labelOf[0], laid.labelOf[6]]).toEqual([0, 6]);
    expect(laid.restrictions).toContainEqual({ tag: 'label-classes', classes: 3 });
  });

  test('layOutPlan(request) keeps shift groups together', () => {
    // Four replicates of the affine plane of order 2: six pairs of four treatments, three shifts of two sessions.
    const blocks = [[0, 1], [2, 3], [0, 2], [1, 3], [0, 3], [1, 2]]; // prettier-ignore
    for (let seed = 0; seed < 30; seed++) {
      const laid = layOutPlan(
        plan({ treatments: ['a', 'b', 'c', 'd'], blocks, groupOf: [0, 0, 1, 1, 2, 2], machines: [{ id: 'm', inService: [true, true] }], seed: `${seed}` }) // prettier-ignore
      );
      expect(laid.sessions.map((session) => session.shift)).toEqual([1, 1, 2, 2, 3, 3]);
      for (const shift of [1, 2, 3]) {
        const held = laid.sessions
          .filter((s) => s.shift === shift)
          .flatMap((s) => s.slots.map((slot) => slot!.treatment));
        expect(held.sort()).toEqual(['a', 'b', 'c', 'd']);
      }
    }
  });

  test('layOutPlan(request) loads several machines in turn, balances each and issues spares', () => {
    const laid = layOutPlan(plan({ machines: [machine, { ...machine, id: 'm2' }], sparesPerTreatment: 2 }));
    expect(laid.sessions.map((session) => session.machine)).toEqual(['m1', 'm2', 'm1', 'm2', 'm1', 'm2', 'm1']);
    expect(laid.slotBalance.every(({ range }) => range <= 1)).toBe(true);
    expect(laid.spares).toHaveLength(14);
    expect(new Set(laid.spares.map(({ specimen }) => specimen)).size).toBe(14);
  });

  test('layOutPlan(request) leaves slots out of service empty', () => {
    const laid = layOutPlan(plan({ machines: [{ id: 'm', inService: [true, false, true, true] }] }));
    expect(laid.sessions.every((session) => session.slots.length === 4 && session.slots[1] === null)).toBe(true);
  });

  test('layOutPlan(request) throws when the request contradicts itself', () => {
    expect(() => layOutPlan(plan({ treatments: ['a', 'a', 'c', 'd', 'e', 'f', 'g'] }))).toThrow(/twice/);
    expect(() => layOutPlan(plan({ blocks: [[0, 9]] }))).toThrow(/no label 9/);
    expect(() => layOutPlan(plan({ machines: [] }))).toThrow(/no machine/);
    expect(() => layOutPlan(plan({ groupOf: [0] }))).toThrow(/groupOf/);
    expect(() => layOutPlan(plan({ machines: [{ id: 'm', inService: [true, false, true] }] }))).toThrow(RangeError);
  });
});
