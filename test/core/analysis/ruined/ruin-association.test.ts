import { describe, expect, it } from 'vitest';
import { ruinAssociation } from '#lib/core/analysis/ruined/ruin-association.ts';

const counts = (ruined: number[], kept: number[]) => ruined.map((r, i) => ({ ruined: r, kept: kept[i]! }));

describe('ruinAssociation', () => {
  // R 4.2.2, fisher.test(rbind(ruined, kept))$p.value, 15 digits.
  it.each([
    [[3, 0, 0, 0], [1, 4, 4, 4], 0.0285714285714286],
    [[2, 1, 0, 0, 1], [3, 3, 5, 4, 2], 0.465329991645777],
    [[1, 1, 1, 0], [2, 3, 4, 6], 0.5625],
    [[5, 0, 1, 2, 0, 0], [5, 10, 9, 8, 10, 10], 0.00654902426545322]
  ])('ruinAssociation(%j of them with %j kept) agrees with fisher.test of R', (ruined, kept, p) => {
    const result = ruinAssociation(counts(ruined, kept), 1);
    expect(result).toMatchObject({ ok: true, value: { method: 'exact', error: 0 } });
    expect(result.ok && result.value.p).toBeCloseTo(p, 7);
  });

  it('ruinAssociation simulates many different treatments, with its error stated, the same for the same seed', () => {
    const sizes = Array.from({ length: 30 }, (_, i) => 11 + ((i * 37) % 29));
    const table = counts(
      sizes.map((n, i) => (i % 3 === 0 ? Math.floor(n / 3) : 1)),
      sizes.map((n, i) => n - (i % 3 === 0 ? Math.floor(n / 3) : 1))
    );
    const [one, two] = [ruinAssociation(table, 5), ruinAssociation(table, 5)];
    expect(one).toMatchObject({ ok: true, value: { method: 'simulated' } });
    expect(one.ok && one.value.p).toBeLessThan(0.001);
    expect(two).toEqual(one);
  });

  it('ruinAssociation(one treatment, or nothing kept) cannot be judged', () => {
    expect(ruinAssociation(counts([1], [3]), 1).ok).toBe(false);
    expect(ruinAssociation(counts([1, 2], [0, 0]), 1)).toEqual({ ok: false, error: { tag: 'no-kept-readings' } });
  });
});
