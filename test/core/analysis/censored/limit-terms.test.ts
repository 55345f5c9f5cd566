import { describe, expect, it } from 'vitest';
import { limitTerm } from '#lib/core/analysis/censored/limit-terms.ts';

describe('limitTerm', () => {
  it.each(['none', 'at-least', 'at-most'] as const)('limitTerm(r, %s) has the derivatives of its value', (limit) => {
    const h = 1e-4;
    for (const r of [-30, -26, -8, -2, -0.3, 0, 0.7, 3, 9, 24, 27, 40]) {
      const [low, at, high] = [r - h, r, r + h].map((x) => limitTerm(x, limit));
      const slope = (high!.logLik - low!.logLik) / (2 * h);
      const weight = -(high!.slope - low!.slope) / (2 * h);
      expect(Math.abs(at!.slope - slope)).toBeLessThan(1e-5 * (1 + Math.abs(slope)));
      expect(Math.abs(at!.weight - weight)).toBeLessThan(1e-5);
    }
  });

  it('limitTerm(r, at-least) is continuous where its series begins', () => {
    const [a, b] = [limitTerm(25 - 1e-9, 'at-least'), limitTerm(25 + 1e-9, 'at-least')];
    expect(b.logLik / a.logLik).toBeCloseTo(1, 9);
    expect(b.slope / a.slope).toBeCloseTo(1, 9);
  });

  it('limitTerm(0, at-least) is half', () => {
    // Φ̄(0) = ½ and φ(0)/Φ̄(0) = 2/√(2π).
    const { logLik, slope } = limitTerm(0, 'at-least');
    expect(logLik).toBeCloseTo(Math.log(0.5), 14);
    expect(slope).toBeCloseTo(-2 / Math.sqrt(2 * Math.PI), 14);
  });
});
