import { describe, expect, test } from 'vitest';
import { connectedParts } from '#lib/core/design/connected-parts.ts';
import { assignMachines } from '#lib/core/design/propose/assign-machines.ts';

const pairs = (t: number): number[][] => Array.from({ length: t }, (_, i) => [i, (i + 1) % t]);

describe('assignMachines', () => {
  test('assignMachines(...) of one machine gives it everything', () => {
    expect(assignMachines(pairs(5), 5, [2])).toEqual({ machineOf: [0, 0, 0, 0, 0], connectedMachines: 1 });
  });

  test('assignMachines(...) makes each part connected where that can be', () => {
    // All 28 pairs of eight treatments on two machines: fourteen pairs each connect eight easily.
    const blocks = Array.from({ length: 64 }, (_, at) => [at >> 3, at & 7]).filter(([i, l]) => i! < l!);
    const { machineOf, connectedMachines } = assignMachines(blocks, 8, [2, 2]);
    expect(connectedMachines).toBe(2);
    for (const m of [0, 1]) {
      const mine = blocks.filter((_, j) => machineOf[j] === m);
      expect(mine).toHaveLength(14);
      expect(connectedParts(mine, 8)).toHaveLength(1);
      const visits = Array.from({ length: 8 }, (_, i) => mine.filter((block) => block.includes(i)).length);
      expect(Math.max(...visits) - Math.min(...visits)).toBeLessThanOrEqual(1);
    }
  });

  test('assignMachines(...) says so when a machine has too few runs to be connected', () => {
    // A ring of six pairs: three pairs cannot connect six treatments.
    expect(assignMachines(pairs(6), 6, [2, 2]).connectedMachines).toBe(0);
  });

  test('assignMachines(...) puts large sessions where the slots are', () => {
    const { machineOf } = assignMachines([[0, 1, 2], [0, 1], [1, 2], [2, 3, 0]], 4, [2, 3]); // prettier-ignore
    expect([machineOf[0], machineOf[3]]).toEqual([1, 1]);
    expect(() => assignMachines([[0, 1, 2]], 3, [2])).toThrow(RangeError);
  });
});
