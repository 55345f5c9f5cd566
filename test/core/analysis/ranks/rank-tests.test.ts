import { readdirSync, readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { durbinTest } from '#lib/core/analysis/ranks/durbin-test.ts';
import { friedmanTest } from '#lib/core/analysis/ranks/friedman-test.ts';
import { skillingsMackTest } from '#lib/core/analysis/ranks/skillings-mack-test.ts';
import type { RankRow } from '#lib/core/analysis/ranks/rank-sessions.ts';

interface Case {
  id: string;
  data: { treatment: string[]; block: string[]; y: (number | null)[] };
  intra: { means: { treatment: string[] } };
  tests: Record<'durbin' | 'skillingsMack' | 'friedman', Record<string, unknown> | null>;
}

const folder = new URL('../../../reference/cases/', import.meta.url);
const cases = readdirSync(folder)
  .filter((name) => name.endsWith('.json') && name !== 'index.json')
  .map((name) => JSON.parse(readFileSync(new URL(name, folder), 'utf8')) as Case);

function rowsOf({ data, intra }: Case): RankRow[] {
  const sessions = [...new Set(data.block)];
  return data.y.flatMap((y, i) =>
    y === null
      ? []
      : [{ treatment: intra.means.treatment.indexOf(data.treatment[i]!), session: sessions.indexOf(data.block[i]!), y }]
  );
}

/** Every number of `wanted` is in `got`, to 1e-9 relative (rank statistics are sums of few small numbers). */
function agree(got: object, wanted: Record<string, unknown>, fields: readonly string[]): void {
  const found = got as Record<string, unknown>;
  for (const field of fields) {
    const a = [found[field]].flat() as number[];
    const b = [wanted[field]].flat() as number[];
    expect(a.length, field).toBe(b.length);
    a.forEach((v, i) => expect(Math.abs(v - b[i]!), field).toBeLessThanOrEqual(1e-9 * Math.max(1e-3, Math.abs(b[i]!))));
  }
}

describe.each(cases)('$id (reference: R 4.2.2)', (one) => {
  const t = one.intra.means.treatment.length;
  const rows = rowsOf(one);

  test('durbinTest(rows, t) agrees, or refuses what is not balanced', () => {
    const result = durbinTest(rows, t);
    const wanted = one.tests.durbin;
    expect(result.ok).toBe(wanted !== null);
    if (!result.ok || !wanted) return;
    agree(result.value, wanted, ['rankSum', 'A', 'C', 'T1', 'df', 'p', 'T2', 'df1', 'df2', 'pF', 'pairSe']);
    expect(result.value.ties).toBe(wanted.ties);
  });

  test('skillingsMackTest(rows, t) agrees', () => {
    const result = skillingsMackTest(rows, t);
    const wanted = one.tests.skillingsMack!;
    if (!result.ok) throw new Error(result.error.tag);
    agree(result.value, wanted, ['A', 'covarianceDiagonal', 'statistic', 'df', 'p']);
    expect(result.value.sessionsUsed).toBe(wanted.nBlocksUsed);
  });

  test('friedmanTest(rows, t) agrees, or refuses what is not complete', () => {
    const result = friedmanTest(rows, t);
    const wanted = one.tests.friedman;
    expect(result.ok).toBe(wanted !== null);
    if (result.ok && wanted) agree(result.value, wanted, ['statistic', 'df', 'p']);
  });
});

test('durbinTest(rows, t) pairs add up and say what their standard error says', () => {
  const one = cases.find((c) => c.id === 'sim_bibd_7_3_7')!;
  const result = durbinTest(rowsOf(one), 7);
  if (!result.ok) throw new Error(result.error.tag);
  const { pairs, rankSum, pairSe } = result.value;
  expect(pairs).toHaveLength(21);
  for (const { a, b, difference, t } of pairs) {
    expect(difference).toBe(rankSum[a]! - rankSum[b]!);
    expect(t).toBeCloseTo(difference / pairSe, 12);
  }
});

test('rank tests do not change under any rising change of scale', () => {
  const one = cases.find((c) => c.id === 'sim_ties_5_3_10')!;
  const rows = rowsOf(one);
  const bent = rows.map((row) => ({ ...row, y: Math.exp(row.y / 7) - 3 }));
  expect(durbinTest(bent, 5)).toEqual(durbinTest(rows, 5));
  expect(skillingsMackTest(bent, 5)).toEqual(skillingsMackTest(rows, 5));
});

test('durbinTest, friedmanTest and skillingsMackTest agree on complete sessions without ties', () => {
  fc.assert(
    fc.property(
      fc.integer({ min: 2, max: 5 }),
      fc.integer({ min: 2, max: 6 }),
      fc.infiniteStream(fc.nat()),
      (t, b, stream) => {
        const rows: RankRow[] = [];
        const values = new Set<number>();
        for (let session = 0; session < b; session++) {
          for (let treatment = 0; treatment < t; treatment++) {
            let y = stream.next().value!;
            while (values.has(y)) y += 0.37;
            values.add(y);
            rows.push({ treatment, session, y });
          }
        }
        const [durbin, friedman, mack] = [durbinTest(rows, t), friedmanTest(rows, t), skillingsMackTest(rows, t)];
        if (!durbin.ok || !friedman.ok || !mack.ok) throw new Error('refused');
        expect(durbin.value.T1).toBeCloseTo(friedman.value.statistic, 9);
        expect(mack.value.statistic).toBeCloseTo(friedman.value.statistic, 9);
      }
    )
  );
});

test('rank tests refuse repeats in a session, ranks without scatter and readings that share no session', () => {
  const twice = [0, 0, 1].map((treatment, y) => ({ treatment, session: 0, y }));
  const equal = [0, 1, 0, 1].map((treatment, i) => ({ treatment, session: i >> 1, y: 5 }));
  const apart = [0, 1].map((treatment) => ({ treatment, session: treatment, y: 1 }));
  expect(durbinTest(twice, 2)).toEqual({ ok: false, error: { tag: 'repeated-in-session' } });
  expect(durbinTest(equal, 2)).toEqual({ ok: false, error: { tag: 'no-scatter' } });
  expect(friedmanTest(equal, 2)).toEqual({ ok: false, error: { tag: 'no-scatter' } });
  expect(skillingsMackTest(apart, 2)).toEqual({ ok: false, error: { tag: 'no-shared-session' } });
});

test('durbinTest(rows, t) of sessions that all agree has an infinite T2 and p of zero', () => {
  const rows = [0, 1, 2, 0, 1, 2].map((treatment, i) => ({ treatment, session: i < 3 ? 0 : 1, y: treatment }));
  const result = durbinTest(rows, 3);
  if (!result.ok) throw new Error(result.error.tag);
  expect(result.value.T2).toBe(Infinity);
  expect(result.value.pF).toBe(0);
  expect(result.value.pairs.every(({ p }) => p === 0)).toBe(true);
});
