import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { informationMatrix } from '#lib/core/design/information-matrix.ts';
import { moorePenrose } from '#lib/core/design/moore-penrose.ts';
import { blocksOf, designState, loadCells } from '#lib/core/design/search/design-state.ts';
import { addPairWeights, controlPairs } from '#lib/core/design/search/search-problem.ts';
import type { SearchProblem } from '#lib/core/design/search/search-problem.ts';
import { visitPair } from '#lib/core/design/search/visit-pair.ts';
import { visitSession } from '#lib/core/design/search/visit-session.ts';
import { seededRandom } from '#lib/core/numerics/random/seeded-random.ts';
import type { SeededRandom } from '#lib/core/numerics/random/seeded-random.ts';

/** trace(W C⁺) by a fresh factorisation. */
const longhand = (blocks: readonly (readonly number[])[], t: number, weights: Float64Array | null): number => {
  const inverse = moorePenrose(informationMatrix(blocks, t), t);
  if (!inverse) return Infinity;
  let sum = 0;
  if (!weights) for (let i = 0; i < t; i++) sum += (2 / (t - 1)) * inverse[i * t + i]!;
  else for (let i = 0; i < t * t; i++) sum += weights[i]! * inverse[i]!;
  return sum;
};
const close = (a: number, b: number): void => expect(Math.abs(a / b - 1)).toBeLessThan(1e-8);

/** A random connected design with sessions of several sizes; treatment 0 in every session when asked for. */
function randomState(random: SeededRandom, control: boolean, forbid: boolean) {
  const t = 4 + random.below(7);
  const first = control ? 1 : 0;
  const sizes = Array.from({ length: 4 + random.below(8) }, () => 2 + random.below(t - 2));
  const forbidden = forbid ? new Uint8Array(t * t) : null;
  const cells = sizes.flatMap((size) => {
    const others = random.shuffle([...Array(t - first).keys()].map((i) => i + first)).slice(0, size - first);
    return control ? [...others, 0] : others;
  });
  if (forbidden) {
    // Forbid two pairs that do not meet, so that the start keeps the rule.
    let at = 0;
    const blocks = sizes.map((size) => cells.slice(at, (at += size)));
    let found = 0;
    for (let i = 0; i < t && found < 2; i++) {
      for (let l = 0; l < i && found < 2; l++) {
        if (blocks.some((block) => block.includes(i) && block.includes(l))) continue;
        forbidden[i * t + l] = forbidden[l * t + i] = 1;
        found++;
      }
    }
  }
  const pairs = controlPairs(t, [0]);
  const weights = control ? addPairWeights(new Float64Array(t * t), t, pairs.testControl, 1) : null;
  const replication = { least: Array<number>(t).fill(1), most: Array<number>(t).fill(sizes.length - 1) };
  const problem: SearchProblem = {
    t,
    sizes,
    controls: control ? [0] : [],
    groupOf: null,
    replication,
    forbidden,
    weights
  };
  const state = designState(problem);
  return { problem, state, connected: loadCells(state, cells) };
}

const counts = (state: { holds: Uint8Array; b: number; t: number }): number[] =>
  Array.from({ length: state.t }, (_, i) =>
    Array.from({ length: state.b }, (__, j) => state.holds[j * state.t + i]!).reduce((a, b) => a + b, 0)
  );

describe.each([
  ['without a control', false, false],
  ['with a control', true, false],
  ['with forbidden pairs', false, true]
])('exchanges %s', (_, control, forbid) => {
  test('visitPair(...) at temperature zero makes the steepest fall there is, and its value is that of a refit', () => {
    fc.assert(
      fc.property(fc.integer(), (seed) => {
        const random = seededRandom(seed);
        const { problem, state, connected } = randomState(random, control, forbid);
        fc.pre(connected);
        const { t } = state;
        for (let step = 0; step < 6; step++) {
          const p = random.below(state.b);
          const q = (p + 1 + random.below(state.b - 1)) % state.b;
          const before = blocksOf(state);
          let least = state.value;
          for (const i of before[p]!) {
            for (const l of before[q]!) {
              if (before[p]!.includes(l) || before[q]!.includes(i) || (control && (i === 0 || l === 0))) continue;
              const after = before.map((block) => [...block]);
              after[p] = after[p]!.map((n) => (n === i ? l : n));
              after[q] = after[q]!.map((n) => (n === l ? i : n));
              const clash = [after[p]!, after[q]!].some((block) =>
                block.some((m) => block.some((n) => problem.forbidden?.[m * t + n]))
              );
              if (!clash) least = Math.min(least, longhand(after, t, problem.weights));
            }
          }
          const made = visitPair(state, problem.forbidden, p, q, 0, random);
          close(state.value, least);
          close(state.value, longhand(blocksOf(state), t, problem.weights));
          expect(made).toBe(blocksOf(state).some((block, j) => block.join() !== before[j]!.join()));
          expect(counts(state)).toEqual([...state.replication]);
        }
      }),
      { numRuns: 60 }
    );
  });

  test('visitPair(...) and visitSession(...) when hot keep value, counts and rules right over a long walk', () => {
    for (let seed = 0; seed < 12; seed++) {
      const random = seededRandom(`walk ${seed}`);
      const { problem, state, connected } = randomState(random, control, forbid);
      if (!connected) continue;
      const { t } = state;
      let made = 0;
      for (let step = 0; step < 700; step++) {
        const p = random.below(state.b);
        const heat = 0.05 * state.value;
        if (step % 2) {
          const q = (p + 1 + random.below(state.b - 1)) % state.b;
          if (visitPair(state, problem.forbidden, p, q, heat, random)) made++;
        } else if (visitSession(state, problem, p, heat, random)) made++;
        if (step % 50 === 0) close(state.value, longhand(blocksOf(state), t, problem.weights));
      }
      expect(made).toBeGreaterThan(20);
      const blocks = blocksOf(state);
      close(state.value, longhand(blocks, t, problem.weights));
      expect(counts(state)).toEqual([...state.replication]);
      for (const block of blocks) {
        expect(new Set(block).size).toBe(block.length);
        expect(block.some((m) => block.some((n) => problem.forbidden?.[m * t + n]))).toBe(false);
        if (control) expect(block).toContain(0);
      }
      state.replication.forEach((r, i) => {
        if (control && i === 0) return;
        expect(r).toBeGreaterThanOrEqual(1);
      });
    }
  });
});

describe('replacements', () => {
  test('visitSession(...) at temperature zero never raises the value and gives that of a refit', () => {
    for (let seed = 0; seed < 40; seed++) {
      const random = seededRandom(`replace ${seed}`);
      const { problem, state, connected } = randomState(random, false, false);
      if (!connected) continue;
      for (let step = 0; step < 20; step++) {
        const before = state.value;
        visitSession(state, problem, random.below(state.b), 0, random);
        expect(state.value).toBeLessThanOrEqual(before * (1 + 1e-10));
        close(state.value, longhand(blocksOf(state), state.t, null));
      }
    }
  });
});
