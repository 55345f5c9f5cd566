import fc from 'fast-check';
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { addSession } from '#lib/core/design/add-session.ts';
import { aValue, pairVariance } from '#lib/core/design/a-value.ts';
import { concurrence, concurrenceRange, replications } from '#lib/core/design/concurrence.ts';
import { connectedParts, isConnected } from '#lib/core/design/connected-parts.ts';
import { efficiencyFactors } from '#lib/core/design/efficiency-factors.ts';
import { informationMatrix } from '#lib/core/design/information-matrix.ts';
import { moorePenrose } from '#lib/core/design/moore-penrose.ts';
import { symmetricEigen } from '#lib/core/numerics/symmetric-eigen.ts';

const FANO = [[0, 1, 2], [0, 3, 4], [0, 5, 6], [1, 3, 5], [1, 4, 6], [2, 3, 6], [2, 4, 5]]; // prettier-ignore

interface Found {
  A_value: number;
  E_canon: number;
  min_canonical: number;
  max_pair_var: number;
  min_pair_var: number;
  rep_min: number;
  rep_max: number;
  blocks: number[][];
}
const { cases } = JSON.parse(
  readFileSync(new URL('../../reference/designs/efficiency.json', import.meta.url), 'utf8')
) as {
  cases: { id: string; t: number; near_equal?: Found; free?: Found; best?: Found & { replicates: number[][][] } }[];
};
const found = cases.flatMap(({ id, t, near_equal, free, best }) => [
  ...(near_equal ? [{ id, t, ...near_equal }] : []),
  ...(free ? [{ id: `${id} free`, t, ...free }] : []),
  ...(best ? [{ id, t, ...best, blocks: best.replicates.flat() }] : [])
]);

const design = fc.integer({ min: 2, max: 8 }).chain((t) =>
  fc.record({
    t: fc.constant(t),
    blocks: fc.array(fc.uniqueArray(fc.integer({ min: 0, max: t - 1 }), { minLength: 1, maxLength: t }), {
      minLength: 1,
      maxLength: 12
    })
  })
);

describe('a balanced design', () => {
  test('aValue(blocks) is 2k/(λt) and efficiencyFactors(blocks) are λt/(rk)', () => {
    expect(aValue(FANO, 7)).toBeCloseTo((2 * 3) / 7, 12); // domain formula, John & Williams section 2.3
    const { factors, mean } = efficiencyFactors(FANO, 7);
    expect(factors).toHaveLength(6);
    for (const factor of factors) expect(factor).toBeCloseTo(7 / 9, 12);
    expect(mean).toBeCloseTo(7 / 9, 12);
    expect(replications(FANO, 7)).toEqual(Array(7).fill(3));
    expect(concurrenceRange(FANO, 7)).toEqual({ min: 1, max: 1 });
  });
});

describe('reference designs', () => {
  test.each(found)('aValue($id) and efficiencyFactors($id) equal the reference values', (one) => {
    expect(Math.abs(aValue(one.blocks, one.t) / one.A_value - 1)).toBeLessThan(1e-9);
    const { factors, mean } = efficiencyFactors(one.blocks, one.t);
    expect(Math.abs(mean / one.E_canon - 1)).toBeLessThan(1e-9);
    expect(Math.abs(factors[0]! - one.min_canonical)).toBeLessThan(1e-9);
    const inverse = moorePenrose(informationMatrix(one.blocks, one.t), one.t)!;
    const variances: number[] = [];
    for (let i = 0; i < one.t; i++) for (let j = 0; j < i; j++) variances.push(pairVariance(inverse, one.t, i, j));
    expect(Math.abs(Math.max(...variances) / one.max_pair_var - 1)).toBeLessThan(1e-9);
    expect(Math.abs(Math.min(...variances) / one.min_pair_var - 1)).toBeLessThan(1e-9);
    const r = replications(one.blocks, one.t);
    expect([Math.min(...r), Math.max(...r)]).toEqual([one.rep_min, one.rep_max]);
  });
});

describe('identities', () => {
  test('informationMatrix(blocks) has rows that sum to zero and rank t minus the number of parts', () => {
    fc.assert(
      fc.property(design, ({ t, blocks }) => {
        const c = informationMatrix(blocks, t);
        for (let i = 0; i < t; i++)
          expect(Math.abs(c.slice(i * t, i * t + t).reduce((a, b) => a + b))).toBeLessThan(1e-12);
        const parts = connectedParts(blocks, t);
        const zeros = symmetricEigen(c, t).values.filter((value) => Math.abs(value) < 1e-9).length;
        expect(zeros).toBe(parts.length);
        expect(parts.flat().sort((a, b) => a - b)).toEqual([...Array(t).keys()]);
        expect(isConnected(blocks, t)).toBe(parts.length === 1);
        expect(aValue(blocks, t) < Infinity).toBe(parts.length === 1);
      })
    );
  });

  test('moorePenrose(C) satisfies C C⁺ C = C and has rows that sum to zero', () => {
    fc.assert(
      fc.property(design, ({ t, blocks }) => {
        fc.pre(isConnected(blocks, t));
        const c = informationMatrix(blocks, t);
        const inverse = moorePenrose(c, t)!;
        const times = (a: Float64Array, b: Float64Array): Float64Array =>
          Float64Array.from({ length: t * t }, (_, at) => {
            let sum = 0;
            for (let m = 0; m < t; m++) sum += a[Math.floor(at / t) * t + m]! * b[m * t + (at % t)]!;
            return sum;
          });
        times(times(c, inverse), c).forEach((value, at) => expect(Math.abs(value - c[at]!)).toBeLessThan(1e-9));
        for (let i = 0; i < t; i++)
          expect(Math.abs(inverse.slice(i * t, i * t + t).reduce((a, b) => a + b))).toBeLessThan(1e-9);
      })
    );
  });

  test('aValue(blocks) does not change when treatments are renamed and sessions reordered', () => {
    fc.assert(
      fc.property(design, fc.infiniteStream(fc.nat()), ({ t, blocks }, stream) => {
        const name = [...Array(t).keys()]
          .map((i) => [stream.next().value as number, i] as const)
          .sort((a, b) => a[0] - b[0])
          .map(([, i]) => i);
        const renamed = blocks.map((block) => block.map((i) => name[i]!)).reverse();
        const [before, after] = [aValue(blocks, t), aValue(renamed, t)];
        if (before === Infinity) expect(after).toBe(Infinity);
        else expect(Math.abs(after / before - 1)).toBeLessThan(1e-9);
      })
    );
  });

  test('concurrence(blocks) has the replications on its diagonal', () => {
    fc.assert(
      fc.property(design, ({ t, blocks }) => {
        const meet = concurrence(blocks, t);
        expect(meet.map((row, i) => row[i])).toEqual(replications(blocks, t));
      })
    );
  });
});

describe('addSession', () => {
  test('addSession(C⁺, t, block) gives the C⁺ of the larger design', () => {
    fc.assert(
      fc.property(
        design.chain(({ t, blocks }) =>
          fc.record({
            t: fc.constant(t),
            blocks: fc.constant(blocks),
            more: fc.array(fc.integer({ min: 0, max: t - 1 }), { minLength: 1, maxLength: t })
          })
        ),
        ({ t, blocks, more }) => {
          const inverse = moorePenrose(informationMatrix(blocks, t), t);
          fc.pre(inverse !== undefined);
          addSession(inverse!, t, more);
          const direct = moorePenrose(informationMatrix([...blocks, more], t), t)!;
          inverse!.forEach((value, at) => expect(value).toBeCloseTo(direct[at]!, 10));
        }
      )
    );
  });

  test('addSession(C⁺, t, block) over two hundred sessions keeps the A-value to 1e-11', () => {
    const blocks = Array.from({ length: 200 }, (_, s) => [s % 20, (s * 7 + 3) % 20, (s * 11 + 8) % 20]);
    const first = blocks.slice(0, 40);
    const inverse = moorePenrose(informationMatrix(first, 20), 20)!;
    for (const block of blocks.slice(40)) addSession(inverse, 20, block);
    let trace = 0;
    for (let i = 0; i < 20; i++) trace += inverse[i * 20 + i]!;
    expect(Math.abs((2 * trace) / 19 / aValue(blocks, 20) - 1)).toBeLessThan(1e-11);
  });
});
