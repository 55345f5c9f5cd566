import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { analyse } from '#lib/core/analysis/analyse.ts';
import type { Analysis } from '#lib/core/analysis/analysis-result.ts';
import type { Observations } from '#lib/core/analysis/observations.ts';
import { observationsOfCase } from '../../reference-run/reference-case.ts';
import { readCase } from '../../reference-run/read-case.ts';
import { observations } from './kept-model.ts';

function analysed(input: Observations): Analysis {
  const result = analyse(input);
  if (!result.ok) throw new Error(result.error.tag);
  return result.value;
}

/** Paths of everything in a result that is not a finite number, a text, a truth value, null, an array or a plain object. */
function strange(value: unknown, path = ''): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path} ${value}`];
  if (value === null || typeof value === 'string' || typeof value === 'boolean') return [];
  if (typeof value === 'object') return Object.entries(value).flatMap(([k, v]) => strange(v, `${path}.${k}`));
  return [`${path} ${typeof value}`];
}

/** Nine runs: three treatments, all pairs in sessions of two, three times. */
const small = observations(
  [0, 1, 2].flatMap((turn) =>
    [
      [0, 1],
      [0, 2],
      [1, 2]
    ].flatMap(([a, b], pair) => {
      const j = 3 * turn + pair;
      return [
        [a!, j, 10 + 3 * a! + j + ((7 * turn + pair) % 5) / 4, 0] as const,
        [b!, j, 10 + 3 * b! + j + ((3 * turn + 2 * pair) % 4) / 4, 1] as const
      ];
    })
  )
);

describe('analyse, input that cannot be analysed', () => {
  const row = small.rows[0]!;
  const cases: [string, Observations, string][] = [
    ['no treatments', { ...small, treatments: [] }, 'no-treatments'],
    ['no sessions', { ...small, sessions: [] }, 'no-sessions'],
    ['no rows', { ...small, rows: [] }, 'no-readings'],
    ['all runs ruined', { ...small, rows: small.rows.map((r) => ({ ...r, ruined: true })) }, 'no-readings'],
    ['no run read', { ...small, rows: small.rows.map((r) => ({ ...r, y: null })) }, 'no-readings'],
    ['NaN as a reading', { ...small, rows: [{ ...row, y: NaN }] }, 'not-a-number'],
    ['an infinite reading', { ...small, rows: [{ ...row, y: -Infinity }] }, 'not-a-number'],
    ['a text as a reading', { ...small, rows: [{ ...row, y: '12' as unknown as number }] }, 'not-a-number'],
    ['NaN as a covariate', { ...small, rows: [{ ...row, covariate: NaN }] }, 'not-a-number'],
    ['an unknown treatment', { ...small, rows: [{ ...row, treatment: 3 }] }, 'unknown-treatment'],
    ['half a treatment', { ...small, rows: [{ ...row, treatment: 0.5 }] }, 'unknown-treatment'],
    ['an unknown session', { ...small, rows: [{ ...row, session: -1 }] }, 'unknown-session'],
    ['an unknown control', { ...small, control: 9 }, 'unknown-control'],
    ['alpha 0', { ...small, alpha: 0 }, 'bad-alpha'],
    ['alpha NaN', { ...small, alpha: NaN }, 'bad-alpha'],
    ['a margin of 0', { ...small, equivalenceMargin: 0 }, 'bad-margin'],
    ['a target that is no number', { ...small, direction: { target: NaN } }, 'bad-target'],
    ['a seed that is no whole number', { ...small, seed: 0.5 }, 'bad-seed'],
    ['weights that do not cancel', { ...small, contrasts: [{ name: 'q', weights: [1, 1, 0] }] }, 'bad-contrast'],
    ['too few weights', { ...small, contrasts: [{ name: 'q', weights: [1, -1] }] }, 'bad-contrast']
  ];
  it.each(cases)('analyse(%s) says so', (_, input, tag) => {
    const result = analyse(input);
    expect(result.ok ? 'analysed' : result.error.tag).toBe(tag);
  });
});

describe('analyse, input with little in it', () => {
  const reason = (section: { ok: true } | { ok: false; error: { tag: string } }): string =>
    section.ok ? 'ok' : section.error.tag;

  it('analyse(one treatment) gives its plain average and says what is missing', () => {
    const result = analysed(
      observations([
        [0, 0, 3],
        [0, 1, 5]
      ])
    );
    expect(reason(result.fixed)).toBe('one-treatment');
    expect(reason(result.random)).toBe('one-treatment');
    expect(result.answer).toMatchObject({ tag: 'none', reason: { tag: 'one-treatment' } });
  });

  it('analyse(one session) compares inside it and has no errors', () => {
    const result = analysed(
      observations([
        [0, 0, 3],
        [1, 0, 5]
      ])
    );
    expect(reason(result.fixed)).toBe('ok');
    expect(reason(result.random)).toBe('one-session');
    expect(result.answer).toMatchObject({ tag: 'means-only', order: [0, 1] });
  });

  it('analyse(one run a session) has nothing to compare', () => {
    const result = analysed(
      observations([
        [0, 0, 3],
        [1, 1, 5]
      ])
    );
    expect(reason(result.fixed)).toBe('no-shared-session');
  });

  it('analyse(all readings equal) reports no scatter', () => {
    const result = analysed({ ...small, rows: small.rows.map((r) => ({ ...r, y: 7 })) });
    expect(result.fixed.ok && result.fixed.value.sigma).toBeNull();
    expect(result.answer).toMatchObject({ tag: 'means-only', reason: { tag: 'no-scatter' } });
    expect(strange(result)).toEqual([]);
  });

  it('analyse(any readings on any runs) holds no NaN and no undefined anywhere', () => {
    const anything = fc.record({
      runs: fc.array(
        fc.record({
          treatment: fc.nat(3),
          session: fc.nat(4),
          slot: fc.option(fc.nat(2)),
          y: fc.option(fc.oneof(fc.integer({ min: -3, max: 3 }), fc.double({ min: -1e6, max: 1e6, noNaN: true })), {
            freq: 8
          }),
          ruined: fc.boolean(),
          limit: fc.constantFrom('none' as const, 'none' as const, 'none' as const, 'at-least' as const)
        }),
        { minLength: 1, maxLength: 24 }
      ),
      random: fc.boolean(),
      slot: fc.boolean(),
      kind: fc.constantFrom('number' as const, 'rank' as const)
    });
    fc.assert(
      fc.property(anything, ({ runs, random, slot, kind }) => {
        const base = observations([
          [3, 4, 0],
          [0, 0, 0]
        ]);
        const result = analyse({
          ...base,
          rows: runs.map((run, i) => ({ ...run, ruined: run.ruined && i % 3 === 0, runId: `r${i}` })),
          primary: random ? 'random' : 'fixed',
          factors: { ...base.factors, slot },
          kind
        });
        if (result.ok) expect(strange(result.value)).toEqual([]);
        else expect(result.error.tag).toBe('no-readings');
      }),
      { numRuns: 40, seed: 20 }
    );
  });
});

describe('analyse, what must not matter', () => {
  const input = observationsOfCase(readCase('sim_miss1_9_3_12'));
  const plain = { ...input, control: null };
  const base = analysed(plain);
  const figures = (a: Analysis): number[] => {
    if (!a.fixed.ok || !a.random.ok) throw new Error('no fit');
    const pairs = [...a.fixed.value.pairs, ...a.random.value.kenwardRoger.pairs];
    return pairs.flatMap(({ estimate, se, p, pTukey }) => [estimate!, se!, p!, pTukey!]);
  };
  const close = (actual: number[], expected: number[]): void =>
    actual.forEach((v, i) => expect(Math.abs(v - expected[i]!)).toBeLessThan(1e-8 * (1 + Math.abs(expected[i]!))));

  it('analyse(rows in another order) gives the same figures', () => {
    fc.assert(
      fc.property(fc.shuffledSubarray([...plain.rows.keys()], { minLength: plain.rows.length }), (order) => {
        close(figures(analysed({ ...plain, rows: order.map((r) => plain.rows[r]!) })), figures(base));
      }),
      { numRuns: 4, seed: 1 }
    );
  });

  it('analyse(other labels) gives the same figures under the new labels', () => {
    const t = plain.treatments.length;
    const turn = (i: number): number => (i * 4 + 3) % t;
    const turned = analysed({ ...plain, rows: plain.rows.map((r) => ({ ...r, treatment: turn(r.treatment) })) });
    if (!turned.fixed.ok || !base.fixed.ok) throw new Error('no fit');
    for (const { a, b, estimate } of base.fixed.value.pairs) {
      const [x, y] = [turn(a), turn(b)];
      const line = turned.fixed.value.pairs.find((pair) => pair.a === Math.min(x, y) && pair.b === Math.max(x, y))!;
      expect(x < y ? line.estimate : -line.estimate!).toBeCloseTo(estimate!, 9);
    }
  });

  it('analyse(readings shifted and stretched) stretches differences and errors and leaves p-values', () => {
    const at = analysed({ ...plain, rows: plain.rows.map((r) => ({ ...r, y: r.y === null ? null : 4 * r.y - 300 })) });
    if (!at.fixed.ok || !base.fixed.ok || !at.random.ok || !base.random.ok) throw new Error('no fit');
    at.fixed.value.pairs.forEach((pair, i) => {
      const other = (base.fixed as { value: typeof at.fixed.value }).value.pairs[i]!;
      expect(pair.estimate).toBeCloseTo(4 * other.estimate!, 8);
      expect(pair.p).toBeCloseTo(other.p!, 10);
    });
    expect(at.random.value.variance.ratio).toBeCloseTo(base.random.value.variance.ratio, 8);
  });

  it('analyse(with a ruined run added) leaves the figures as they were', () => {
    const rows = [...plain.rows, { ...plain.rows[0]!, y: 1e4, ruined: true, runId: 'late' }];
    expect(figures(analysed({ ...plain, rows }))).toEqual(figures(base));
  });

  it('analyse(the design twice, with the same readings) halves the variance factor of every difference', () => {
    const b = plain.sessions.length;
    const twice = analysed({
      ...plain,
      sessions: [...plain.sessions, ...plain.sessions.map((s) => ({ ...s, id: `${s.id}x` }))],
      rows: [...plain.rows, ...plain.rows.map((r) => ({ ...r, session: r.session + b }))]
    });
    if (!twice.fixed.ok || !base.fixed.ok) throw new Error('no fit');
    const [one, two] = [base.fixed.value, twice.fixed.value];
    two.pairs.forEach(({ se }, i) => {
      const factor = (se! / two.sigma!) ** 2 / (one.pairs[i]!.se! / one.sigma!) ** 2;
      expect(factor).toBeCloseTo(0.5, 10);
    });
    const variance = (a: Analysis): number => a.design.kept.efficiency.pairVariance!.average;
    expect(variance(twice)).toBeCloseTo(variance(base) / 2, 10);
  });
});

describe('analyse, whole results', () => {
  it('analyse(catalyst example) gives one answer with its workings: k·Q sums to zero and effects are kQ/(λt)', () => {
    const result = analysed({ ...observationsOfCase(readCase('pub_catalyst')), control: null });
    if (!result.fixed.ok) throw new Error('no fit');
    const { workings } = result.fixed.value;
    expect(workings.balanced).toEqual({ t: 4, k: 3, r: 3, lambda: 2 });
    // Montgomery's totals: Q = −9/3, −7/3, −4/3, 20/3.
    [-9, -7, -4, 20].forEach((kQ, i) => {
      expect(workings.lines[i]!.kQ).toBeCloseTo(kQ, 9);
      expect(workings.lines[i]!.effect).toBeCloseTo(kQ / 8, 10);
    });
    expect(workings.lines.reduce((s, line) => s + line.Q, 0)).toBeCloseTo(0, 10);
    expect(result.answer).toMatchObject({ tag: 'several-best', leaders: [0, 1, 2], worse: [3] });
  });

  it('analyse tells the stages as they begin', () => {
    const stages: string[] = [];
    analyse(small, (stage) => stages.push(stage));
    expect(stages[0]).toBe('design');
    expect(stages.at(-1)).toBe('answer');
  });

  it('analyse(kind rank) answers by ranks', () => {
    const result = analysed({ ...small, kind: 'rank' });
    expect(['ranks-differ', 'ranks-do-not-differ']).toContain(result.answer.tag);
  });
});
