import { describe, expect, test } from 'vitest';
import { machinePlaces } from '#lib/ui/plan/machine-places.ts';
import { meetingScene } from '#lib/ui/plan/meeting-scene.ts';

const words = {
  title: 'Who meets whom',
  summary: '',
  meet: (one: string, other: string, times: number) => `${one}+${other}: ${times}`,
  columns: ['One', 'Other', 'Times'] as [string, string, string]
};

describe('meetingScene(options)', () => {
  const meets = [
    [2, 1, 0],
    [1, 2, 3],
    [0, 3, 2]
  ];
  test('has a point and a table row for each pair, once', () => {
    const scene = meetingScene({ width: 400, names: ['A', 'B', 'C'], meets, words });
    expect(scene.points.map(({ label }) => label)).toEqual(['B+A: 1', 'C+A: 0', 'C+B: 3']);
    expect(scene.table().rows).toEqual([
      ['A', 'B', '1'],
      ['A', 'C', '0'],
      ['B', 'C', '3']
    ]);
  });

  test('shows a pair that never meets by another fill and by its number', () => {
    const { marks } = meetingScene({ width: 400, names: ['A', 'B', 'C'], meets, words });
    expect(marks.filter(({ role }) => role === 'cell-none')).toHaveLength(1);
    expect(marks.flatMap((mark) => (mark.kind === 'text' ? [mark.text] : []))).toContain('0');
  });

  test('stays inside its width and draws few elements for 100 treatments', () => {
    const many = Array.from({ length: 100 }, (_, i) => Array.from({ length: 100 }, (_, j) => (i + j) % 4));
    const scene = meetingScene({ width: 390, names: many.map((_, i) => `Treatment ${i}`), meets: many, words });
    expect(scene.points).toHaveLength(4950);
    expect(Math.max(...scene.points.map(({ x }) => x))).toBeLessThan(390);
    expect(scene.marks.length).toBeLessThan(60);
  });
});

describe('machinePlaces(layout, slots)', () => {
  test.each([
    [{ kind: 'row' as const }, 1],
    [{ kind: 'row' as const }, 12],
    [{ kind: 'ring' as const }, 1],
    [{ kind: 'ring' as const }, 3],
    [{ kind: 'ring' as const }, 24],
    [{ kind: 'grid' as const, columns: 4 }, 10],
    [{ kind: 'grid' as const, columns: 50 }, 3]
  ])('keeps slots of %j apart and inside, %d of them', (layout, slots) => {
    const { at, size, ratio } = machinePlaces(layout, slots);
    expect(at).toHaveLength(slots);
    for (const { x, y } of at) {
      expect(x - size / 2).toBeGreaterThanOrEqual(-0.01);
      expect(x + size / 2).toBeLessThanOrEqual(100.01);
      expect(y - size / 2).toBeGreaterThanOrEqual(-0.01);
      expect(y + size / 2).toBeLessThanOrEqual(100 / ratio + 0.01);
    }
    at.forEach((a, i) =>
      at.slice(i + 1).forEach((b) => expect(Math.hypot(a.x - b.x, a.y - b.y)).toBeGreaterThan(size * 0.99))
    );
  });
});
